import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  createWriteStream,
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { readEnvironment } from '../config/environment';
import { StartProblem } from './start-problem';

const ROOT = resolve(__dirname, '../..');
const INPUTS = [
  'app',
  'components',
  'shared',
  'assets',
  'public',
  'app.json',
  'babel.config.js',
  'metro.config.js',
  'tsconfig.json',
  'package-lock.json',
];
const STAMP = '.inputs';

/** What building the client needs. */
export interface BuildOptions {
  /** Where the built client is to be. */
  readonly folder: string;
  /** File that takes what the bundler says. */
  readonly logPath: string;
  readonly say: (line: string) => void;
  readonly signal?: AbortSignal;
}

/**
 * Builds the web client when its inputs changed since the last time: beside, then swapped by rename.
 * @throws StartProblem when the bundler fails.
 */
export async function buildClient({ folder, logPath, say, signal }: BuildOptions): Promise<void> {
  const inputs = hashInputs();
  const stamp = join(folder, STAMP);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === inputs) return;
  say('Building the web client (a minute or two at the first time) ...');
  const beside = `${folder}.new`;
  rmSync(beside, { recursive: true, force: true });
  mkdirSync(dirname(folder), { recursive: true });
  await exportClient(beside, logPath, signal);
  if (!existsSync(join(beside, 'index.html')))
    throw new StartProblem(`The web client was not built; see ${logPath}`);
  writeFileSync(join(beside, STAMP), inputs);
  const former = `${folder}.old`;
  rmSync(former, { recursive: true, force: true });
  if (existsSync(folder)) renameSync(folder, former);
  renameSync(beside, folder);
  rmSync(former, { recursive: true, force: true });
}

/** What tells whether the client must be built anew: every input's path and content. */
export function hashInputs(): string {
  const hash = createHash('sha256');
  for (const input of INPUTS) {
    const path = join(ROOT, input);
    if (existsSync(path)) hashTree(path, input, hash);
  }
  return hash.digest('hex');
}

function hashTree(path: string, name: string, hash: ReturnType<typeof createHash>): void {
  const entries = listFolder(path);
  if (entries === undefined) {
    hash.update(`${name}\0`).update(createHash('sha256').update(readFileSync(path)).digest());
    return;
  }
  for (const entry of entries) hashTree(join(path, entry), `${name}/${entry}`, hash);
}

function listFolder(path: string): readonly string[] | undefined {
  try {
    return readdirSync(path).sort();
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOTDIR') return undefined;
    throw error;
  }
}

function exportClient(outputFolder: string, logPath: string, signal: AbortSignal | undefined): Promise<void> {
  const cli = join(ROOT, 'node_modules/expo/bin/cli');
  // The bundler keeps its cache here; in a shared one, files of another user would stop it.
  const scratch = join(tmpdir(), `elbowroom-build-${process.getuid?.() ?? 0}`);
  mkdirSync(scratch, { recursive: true, mode: 0o700 });
  const log = createWriteStream(logPath, { mode: 0o600 });
  return new Promise((fulfil, reject) => {
    const child = spawn(
      process.execPath,
      [cli, 'export', '--platform', 'web', '--output-dir', outputFolder],
      {
        cwd: ROOT,
        stdio: ['ignore', 'pipe', 'pipe'],
        env: {
          ...readEnvironment(),
          NODE_ENV: 'production',
          NODE_OPTIONS: '',
          CI: '1',
          EXPO_NO_TELEMETRY: '1',
          EXPO_OFFLINE: '1',
          TMPDIR: scratch,
        },
        // The bundler takes its time over SIGTERM, and nothing of its half-made folder is used.
        ...(signal ? { signal, killSignal: 'SIGKILL' as const } : {}),
      },
    );
    child.stdout.pipe(log, { end: false });
    child.stderr.pipe(log, { end: false });
    child.on('error', (error) => {
      log.end();
      reject(
        signal?.aborted ? error : new StartProblem(`The web client could not be built: ${error.message}`),
      );
    });
    child.on('close', (code) => {
      log.end(() => {
        if (code === 0) fulfil();
        else
          reject(
            new StartProblem(`The web client could not be built: ${findComplaint(logPath)} (see ${logPath})`),
          );
      });
    });
  });
}

function findComplaint(logPath: string): string {
  const lines = readFileSync(logPath, 'utf8').trim().split('\n');
  return (lines.find((line) => /error/i.test(line)) ?? lines.at(-1) ?? '').trim().slice(0, 300);
}
