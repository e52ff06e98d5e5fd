import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { findInstance } from '@/server/local/find-instance';

const ROOT = resolve(__dirname, '../..');

/** A process that was started, with what it said. */
export interface SpawnedProcess {
  readonly child: ChildProcess;
  /** Everything on standard output up to now. */
  output(): string;
  /** Everything on standard error up to now. */
  complaint(): string;
  /** The address once the server says that it is ready. */
  readonly ready: Promise<string>;
  /** The exit code. */
  readonly exit: Promise<number | null>;
}

const running = new Map<ChildProcess, string>();

/** Runs a file of the server as `npm start` does, without the client. */
export function spawnServer(
  dataFolder: string,
  environment: Readonly<Record<string, string>> = {},
  args: readonly string[] = ['server/main.ts'],
): SpawnedProcess {
  const child = spawn(process.execPath, ['--import', 'tsx', ...args], {
    cwd: ROOT,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      PORT: '0',
      ELBOWROOM_DATA: dataFolder,
      ELBOWROOM_CLIENT: 'none',
      ...environment,
    },
  });
  let output = '';
  let complaint = '';
  running.set(child, dataFolder);
  const exit = new Promise<number | null>((done) =>
    child.once('close', (code) => {
      running.delete(child);
      done(code);
    }),
  );
  const ready = new Promise<string>((fulfil, reject) => {
    child.stdout.on('data', (chunk: Buffer) => {
      output += chunk.toString();
      const url = /Elbowroom is ready at (\S+)/.exec(output)?.[1];
      if (url !== undefined) fulfil(url);
    });
    void exit.then((code) => reject(new Error(`ended with ${code}: ${complaint}`)));
  });
  // Whoever waits for it sees the failure; a start that is meant to fail has nobody who waits.
  ready.catch(() => undefined);
  child.stderr.on('data', (chunk: Buffer) => (complaint += chunk.toString()));
  return { child, output: () => output, complaint: () => complaint, ready, exit };
}

/** A folder for data that `removeDataFolder` takes away again, with whatever still runs on it. */
export function makeDataFolder(): string {
  return mkdtempSync(join(tmpdir(), 'elbowroom-data-'));
}

/** Ends what a failed test left running on the folder and a database that a killed server left, and removes it. */
export function removeDataFolder(folder: string): void {
  for (const [child, dataFolder] of running) if (dataFolder === folder) child.kill('SIGKILL');
  const instance = findInstance(join(folder, 'database', 'data'));
  if (instance) process.kill(instance.pid, 'SIGKILL');
  rmSync(folder, { recursive: true, force: true });
}

/** A port that nobody uses at the moment. */
export function findPort(): Promise<number> {
  return new Promise((fulfil, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => fulfil(port));
    });
  });
}
