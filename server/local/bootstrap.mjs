/**
 * Makes sure of what the commands need before TypeScript can run: Node.js, the packages, MariaDB, and for the tests
 * Chromium. Depends on nothing but Node.js itself.
 *
 *   node server/local/bootstrap.mjs start|test|solve
 *
 * What it says goes to the error stream: the output belongs to the command that follows.
 */
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { accessSync, constants, existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const NEEDED_NODE = [20, 19];
const STAMP = path.join(ROOT, 'node_modules', '.elbowroom-packages');

/** Debian's packages and the programs that tell whether they are there. */
const DATABASE_SERVER = {
  packages: ['mariadb-server-core', 'mariadb-client', 'mariadb-client-core'],
  programs: ['mariadbd', 'mariadb-install-db', 'mariadb', 'mariadb-admin', 'mariadb-dump'],
};
const DATABASE_CLIENT = { packages: ['mariadb-client-core'], programs: ['mariadb', 'mariadb-dump'] };
const BROWSER = { packages: ['chromium'], programs: ['chromium'] };

const purpose = process.argv[2];
checkNode();
seeToPackages();
if (purpose === 'start') seeToPrograms(process.env.DATABASE_URL ? DATABASE_CLIENT : DATABASE_SERVER);
if (purpose === 'test') for (const programs of [DATABASE_SERVER, BROWSER]) seeToPrograms(programs);

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  const fits = major > NEEDED_NODE[0] || (major === NEEDED_NODE[0] && minor >= NEEDED_NODE[1]);
  if (!fits) give(`Node.js ${NEEDED_NODE.join('.')} or newer is needed; this is ${process.versions.node}.`);
}

function seeToPackages() {
  const lockPath = path.join(ROOT, 'package-lock.json');
  const lock = readFileSync(lockPath);
  const wanted = `${createHash('sha256').update(lock).digest('hex')} ${process.versions.modules}\n`;
  if (existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted) return;
  if (!isInstalled(JSON.parse(lock.toString('utf8')))) {
    say('Installing the packages (about a minute) ...');
    const [command, ...args] = process.env.npm_execpath?.endsWith('.js')
      ? [process.execPath, process.env.npm_execpath]
      : ['npm'];
    const outcome = run(command, [
      ...args,
      'ci',
      '--include=dev',
      '--no-audit',
      '--no-fund',
      '--loglevel=error',
    ]);
    if (outcome.status !== 0) give(`The packages could not be installed: ${outcome.reason}`);
  }
  writeFileSync(STAMP, wanted);
}

/** Whether node_modules holds exactly what the lock file names, by npm's own record of it. */
function isInstalled(lock) {
  const recordPath = path.join(ROOT, 'node_modules', '.package-lock.json');
  if (!existsSync(recordPath)) return false;
  const installed = JSON.parse(readFileSync(recordPath, 'utf8')).packages;
  return Object.entries(lock.packages).every(([place, wanted]) => {
    if (place === '' || wanted.link) return true;
    const found = installed[place];
    if (found === undefined) return Boolean(wanted.optional);
    return found.version === wanted.version && found.integrity === wanted.integrity;
  });
}

function seeToPrograms({ packages, programs }) {
  if (programs.every(findProgram)) return;
  const typed = `apt-get update && apt-get install --no-install-recommends ${packages.join(' ')}`;
  if (!findProgram('apt-get'))
    give(`${packages[0]} is missing, and there is no apt-get here: install it, then start again.`);
  const prefix = findPrivilege();
  if (prefix === undefined) give(`${packages[0]} is missing. As root, type: ${typed}`);
  say(`Installing ${packages.join(', ')} ...`);
  const apt = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', '-qq', '-o', 'Dpkg::Use-Pty=0'];
  const updated = run(apt[0], [...apt.slice(1), 'update']);
  const installed = run(apt[0], [...apt.slice(1), 'install', '-y', '--no-install-recommends', ...packages]);
  if (installed.status !== 0 || !programs.every(findProgram)) {
    const reason = installed.reason || updated.reason;
    give(`${packages[0]} could not be installed (${reason}). As root, type: ${typed}`);
  }
}

/** What to put before a command to run it as root: nothing, sudo without a password, or undefined when it cannot be. */
function findPrivilege() {
  if (process.getuid?.() === 0) return [];
  if (findProgram('sudo') && run('sudo', ['-n', 'true']).status === 0) return ['sudo', '-n'];
  return undefined;
}

function findProgram(name) {
  const folders = [
    ...(process.env.PATH ?? '').split(path.delimiter),
    '/usr/sbin',
    '/usr/bin',
    '/sbin',
    '/bin',
  ];
  return folders.some((folder) => {
    if (folder === '') return false;
    try {
      accessSync(path.join(folder, name), constants.X_OK);
      return true;
    } catch {
      return false; // not in this folder
    }
  });
}

function run(command, args) {
  const outcome = spawnSync(command, args, {
    cwd: ROOT,
    stdio: ['ignore', 'ignore', 'pipe'],
    encoding: 'utf8',
  });
  const lines = (outcome.stderr ?? '').trim().split('\n');
  const telling = lines.findLast((line) => /^(E:|npm error)/.test(line)) ?? lines.at(-1) ?? '';
  return { status: outcome.status, reason: outcome.error?.message ?? telling };
}

function say(line) {
  process.stderr.write(`${line}\n`);
}

function give(line) {
  process.stderr.write(`${line}\n`);
  process.exit(1);
}
