import { spawn } from 'node:child_process';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  openSync,
  closeSync,
  readFileSync,
  renameSync,
  rmSync,
  statfsSync,
} from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { readEnvironment } from '../config/environment';
import { findInstance, isDatabaseServer, type Instance } from './find-instance';
import { runTool } from './run-tool';
import { StartProblem } from './start-problem';

const POLL_MS = 50;
const READY_WITHIN_MS = 90_000;
const STOPPED_WITHIN_MS = 60_000;
const SOCKET_PATH_LIMIT = 90;
/** Room that a new instance needs (about 100 MB) and that a used one needs to go on. */
const ROOM_TO_INSTALL_BYTES = 256 * 1024 * 1024;
const ROOM_TO_START_BYTES = 16 * 1024 * 1024;

/** How an instance is run besides the usual. */
export interface PrivateDatabaseOptions {
  /** For throw-away data: not safe against power loss, but quick; ends together with the process that started it. */
  readonly throwAway?: boolean;
}

/** A MariaDB server of our own, bound to 127.0.0.1, administered through its socket by the operating system's user. */
export interface PrivateDatabase {
  readonly port: number;
  readonly socket: string;
  readonly adopted: boolean;
  /** Whether the server still runs. */
  isAlive(): boolean;
  /** Starts the server again on the same port, after it ended by itself or was killed. */
  revive(): Promise<void>;
  /** Ends the server and waits until it is gone. */
  stop(): Promise<void>;
}

/**
 * Starts the instance of a folder, made at the first time; one that a killed start left running is adopted.
 * @throws StartProblem in one line, when there is no server to run, no room, or the folder is damaged.
 */
export async function startPrivateDatabase(
  folder: string,
  options: PrivateDatabaseOptions = {},
): Promise<PrivateDatabase> {
  const dataFolder = join(folder, 'data');
  const found = findInstance(dataFolder);
  if (found) {
    const adopted = await waitUntilReady(found, folder, () => isDatabaseServer(found.pid));
    if (adopted) return describeInstance(found, true, folder, options);
    // It was on its way out; by now the folder is free.
  }
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  if (!existsSync(dataFolder)) await install(folder, dataFolder);
  checkRoom(folder, ROOM_TO_START_BYTES);
  const place = { port: await findFreePort(), socket: makeSocketPath() };
  return describeInstance(await launch(folder, options, place), false, folder, options);
}

/** How to address the instance through its socket with MariaDB's own tools. */
export function addressInstance(socket: string): readonly string[] {
  return ['--no-defaults', `--socket=${socket}`, `--user=${nameSystemUser()}`];
}

/** Runs statements as the instance's administrator. */
export async function administer(socket: string, statements: string): Promise<void> {
  const answer = await runTool('mariadb', addressInstance(socket), `${statements};\n`);
  if (answer.code !== 0) throw new Error(`the database refused: ${lastLine(answer.complaint)}`);
}

async function install(folder: string, dataFolder: string): Promise<void> {
  checkRoom(folder, ROOM_TO_INSTALL_BYTES);
  // Made beside and renamed, so that a killed first start leaves no half of a database.
  const beside = join(folder, 'data.new');
  rmSync(beside, { recursive: true, force: true });
  const answer = await runServerTool('mariadb-install-db', [
    '--no-defaults',
    `--datadir=${beside}`,
    `--user=${nameSystemUser()}`,
    '--auth-root-authentication-method=socket',
    `--auth-root-socket-user=${nameSystemUser()}`,
    '--skip-test-db',
    '--skip-name-resolve',
  ]);
  if (answer.code !== 0) {
    rmSync(beside, { recursive: true, force: true });
    throw new StartProblem(
      `The database could not be made in ${folder}: ${lastLine(answer.complaint || answer.output)}`,
    );
  }
  renameSync(beside, dataFolder);
}

async function launch(
  folder: string,
  options: PrivateDatabaseOptions,
  { port, socket }: Omit<Instance, 'pid'>,
): Promise<Instance> {
  const dataFolder = join(folder, 'data');
  const logPath = join(folder, 'mariadb.log');
  const args = [
    '--no-defaults',
    `--datadir=${dataFolder}`,
    `--socket=${socket}`,
    `--pid-file=${socket}.pid`,
    `--port=${port}`,
    '--bind-address=127.0.0.1',
    '--skip-name-resolve',
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    `--innodb-flush-log-at-trx-commit=${options.throwAway ? 0 : 1}`,
    `--innodb-buffer-pool-size=${options.throwAway ? '64M' : '256M'}`,
    '--innodb-log-file-size=64M',
    '--default-time-zone=+00:00',
    '--performance-schema=OFF',
    `--max-connections=${options.throwAway ? 300 : 60}`,
    '--max-allowed-packet=64M',
    '--sql-mode=STRICT_TRANS_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION,ONLY_FULL_GROUP_BY',
    ...(isRoot() ? ['--user=root'] : []),
  ];
  const log = openSync(logPath, 'a', 0o600);
  // Its own session: a terminal's Ctrl-C must not reach it, we stop it ourselves and last.
  const child = options.throwAway
    ? spawn('setpriv', ['--pdeathsig', 'KILL', findServerTool('mariadbd'), ...args], {
        stdio: ['ignore', log, log],
        detached: true,
      })
    : spawn(findServerTool('mariadbd'), args, { stdio: ['ignore', log, log], detached: true });
  closeSync(log);
  const failed = new Promise<never>((_resolve, reject) => child.once('error', reject));
  child.unref();
  const pid = child.pid;
  if (pid === undefined) return failed;
  const instance = { pid, port, socket };
  const alive = () => child.exitCode === null && child.signalCode === null;
  if (await Promise.race([waitUntilReady(instance, folder, alive), failed])) return instance;
  throw new StartProblem(
    `MariaDB did not start on ${folder}: ${lastError(logPath)} (the whole story is in ${logPath})`,
  );
}

/** Whether it answers; false when it ended instead. */
async function waitUntilReady(instance: Instance, folder: string, isAlive: () => boolean): Promise<boolean> {
  const end = Date.now() + READY_WITHIN_MS;
  while (Date.now() < end) {
    if (!isAlive()) {
      rmSync(dirname(instance.socket), { recursive: true, force: true });
      return false;
    }
    const answer = await runTool('mariadb-admin', [
      ...addressInstance(instance.socket),
      '--connect-timeout=2',
      'ping',
    ]);
    if (answer.code === 0) return true;
    await delay(POLL_MS);
  }
  throw new StartProblem(`MariaDB on ${folder} does not answer; see ${join(folder, 'mariadb.log')}`);
}

function describeInstance(
  first: Instance,
  adopted: boolean,
  folder: string,
  options: PrivateDatabaseOptions,
): PrivateDatabase {
  let instance = first;
  return {
    port: first.port,
    socket: first.socket,
    adopted,
    isAlive: () => isDatabaseServer(instance.pid),
    revive: async () => {
      mkdirSync(dirname(first.socket), { recursive: true, mode: 0o700 });
      instance = await launch(folder, options, first);
    },
    stop: () => stopInstance(instance),
  };
}

async function stopInstance(instance: Instance): Promise<void> {
  if (isDatabaseServer(instance.pid)) process.kill(instance.pid, 'SIGTERM');
  const end = Date.now() + STOPPED_WITHIN_MS;
  // The pid file vanishes before the shutdown is complete; the process tells the truth.
  while (isDatabaseServer(instance.pid)) {
    if (Date.now() > end) throw new Error(`MariaDB (process ${instance.pid}) does not stop`);
    await delay(POLL_MS);
  }
  rmSync(dirname(instance.socket), { recursive: true, force: true });
}

function makeSocketPath(): string {
  const preferred = join(tmpdir(), 'elbowroom-');
  return join(mkdtempSync(preferred.length > SOCKET_PATH_LIMIT ? '/tmp/elbowroom-' : preferred), 's');
}

/** A port of 127.0.0.1 that nobody uses at the moment. */
export function findFreePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo;
      server.close(() => resolve(port));
    });
  });
}

async function runServerTool(name: string, args: readonly string[]) {
  return runTool(findServerTool(name), args);
}

// Debian keeps the server in /usr/sbin, which an ordinary user's PATH leaves out.
function findServerTool(name: string): string {
  const folders = [
    ...(readEnvironment()['PATH'] ?? '').split(':'),
    '/usr/sbin',
    '/usr/local/sbin',
    '/usr/bin',
  ];
  const path = folders.map((folder) => join(folder, name)).find((candidate) => existsSync(candidate));
  if (path === undefined) {
    throw new StartProblem(
      'MariaDB is missing: type  apt-get install mariadb-server-core mariadb-client mariadb-client-core  as root, and start again.',
    );
  }
  return path;
}

function checkRoom(folder: string, neededBytes: number): void {
  const { bavail, bsize } = statfsSync(folder);
  if (bavail * bsize < neededBytes) {
    throw new StartProblem(
      `The disk that holds ${folder} is full: ${Math.round(neededBytes / 1024 / 1024)} MB are needed. Make room, or set ELBOWROOM_DATA to another folder.`,
    );
  }
}

// `os.userInfo()` throws for a user without an entry in /etc/passwd; root addresses the instance as root.
function nameSystemUser(): string {
  if (isRoot()) return 'root';
  const uid = String(process.getuid?.());
  const entry = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
    .find((fields) => fields[2] === uid);
  if (entry?.[0] === undefined) {
    throw new StartProblem(
      `The user with number ${uid} has no name in /etc/passwd, which MariaDB needs; start as another user.`,
    );
  }
  return entry[0];
}

function isRoot(): boolean {
  return process.getuid?.() === 0;
}

function lastError(logPath: string): string {
  const lines = readFileSync(logPath, 'utf8').trimEnd().split('\n').slice(-200);
  const errors = lines.filter((line) => line.includes('[ERROR]'));
  return (
    errors.findLast((line) => !/Aborting|Failed to initialize plugins/.test(line)) ??
    lines.at(-1) ??
    ''
  )
    .replace(/^.*\[ERROR\]\s*/, '')
    .trim();
}

function lastLine(text: string): string {
  return text.trim().split('\n').at(-1) ?? '';
}
