import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Figure } from './figure';

const ROOT = path.resolve(__dirname, '../..');

/** From `npm start` in a data folder that was used before, with its client built, to the line that says "ready". */
export const figures: readonly Figure[] = [
  {
    name: 'start.warm',
    unit: 's',
    group: 'start',
    measure: async () => {
      const folder = mkdtempSync(path.join(tmpdir(), 'elbowroom-bench-'));
      try {
        await startAndStop(folder);
        return await startAndStop(folder);
      } finally {
        rmSync(folder, { recursive: true, force: true });
      }
    },
  },
];

/** Seconds from the start to ready. */
function startAndStop(folder: string): Promise<number> {
  const begin = performance.now();
  // npm passes no signals on, so the whole process group is signalled.
  const child = spawn('npm', ['start'], {
    cwd: ROOT,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, PORT: '0', ELBOWROOM_DATA: folder },
  });
  return new Promise((resolve, reject) => {
    let output = '';
    let seconds: number | undefined;
    const listen = (chunk: Buffer) => {
      output += chunk.toString();
      if (seconds !== undefined || !output.includes('Elbowroom is ready at')) return;
      seconds = (performance.now() - begin) / 1000;
      if (child.pid !== undefined) process.kill(-child.pid, 'SIGTERM');
    };
    child.stdout.on('data', listen);
    child.stderr.on('data', listen);
    child.on('error', reject);
    // The pipes end when the last process of the group has: the database's folder is free by then.
    child.on('close', () => {
      if (seconds === undefined) reject(new Error(output.trim().split('\n').at(-1)));
      else resolve(seconds);
    });
  });
}
