import { spawn } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Figure } from './figure';

const ROOT = path.resolve(__dirname, '../..');
const SCRIPTS = path.join('_expo', 'static', 'js', 'web');

/** Every script of the page itself, the root of all screens, and the sign-in: what stands before the first screen. */
export const figures: readonly Figure[] = [
  {
    name: 'web.entry.gzip',
    unit: 'kB',
    group: 'web',
    measure: async () => {
      const folder = mkdtempSync(path.join(tmpdir(), 'elbowroom-bench-'));
      try {
        await exportClient(folder);
        const page = readFileSync(path.join(folder, 'index.html'), 'utf8');
        const named = [...page.matchAll(/<script src="([^"]+)"/g)].map((match) => match[1] ?? '');
        if (named.length === 0) throw new Error('the page of the built client names no script');
        const files = [
          ...named.map((name) => path.join(folder, name)),
          ...partsNamed(folder, ['_layout', 'sign-in']),
        ];
        return files.reduce((sum, file) => sum + gzipSync(readFileSync(file)).byteLength, 0) / 1000;
      } finally {
        rmSync(folder, { recursive: true, force: true });
      }
    },
  },
];

/** The parts of the program that belong to these routes. */
function partsNamed(folder: string, routes: readonly string[]): string[] {
  const parts = readdirSync(path.join(folder, SCRIPTS));
  return routes.map((route) => {
    const part = parts.find((name) => new RegExp(`^${route}-[0-9a-f]+\\.js$`).test(name));
    if (!part) throw new Error(`no part of the built client belongs to the route ${route}`);
    return path.join(folder, SCRIPTS, part);
  });
}

function exportClient(folder: string): Promise<void> {
  const child = spawn('npx', ['expo', 'export', '--platform', 'web', '--output-dir', folder], {
    cwd: ROOT,
    stdio: ['ignore', 'ignore', 'pipe'],
  });
  return new Promise((resolve, reject) => {
    let problems = '';
    child.stderr.on('data', (chunk: Buffer) => (problems += chunk.toString()));
    child.on('error', reject);
    child.on('close', (code) =>
      code === 0 ? resolve() : reject(new Error(`the client was not built: ${problems.trim()}`)),
    );
  });
}
