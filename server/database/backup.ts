import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { z } from 'zod';
import type { Config } from '../config/config';
import { nameDataFolder, readSessionSecret, SECRET_FILE, type DataFolder } from '../config/data-folder';
import { findInstance } from '../local/find-instance';
import { lockFolder } from '../local/lock-folder';
import { createPrivateDatabase, preparePrivateAccounts } from '../local/private-accounts';
import { addressInstance, startPrivateDatabase } from '../local/private-database';
import { runTool } from '../local/run-tool';
import { StartProblem } from '../local/start-problem';
import { dumpDatabase, loadDump, targetOfUrl, type ToolTarget } from './dump';
import { PRIVATE_DATABASE } from './open-database';

const DUMP = 'database.sql.gz';
const MANIFEST = 'manifest.json';
const FILES = 'files';
const manifestSchema = z.looseObject({ product: z.literal('elbowroom'), format: z.literal(1) });

/**
 * Writes one archive with a consistent dump, the files and the secret; the server may run meanwhile.
 * @throws StartProblem in one line when there is nothing to save or it cannot be saved.
 */
export async function makeBackup(config: Config, path: string): Promise<void> {
  const target = resolve(path);
  const folder = nameDataFolder(config.dataFolder);
  if (existsSync(target)) throw new StartProblem(`${target} exists already: choose another name.`);
  if (!existsSync(folder.files)) throw new StartProblem(`There is nothing to save in ${folder.root}.`);
  if (!existsSync(dirname(target))) throw new StartProblem(`There is no folder ${dirname(target)}.`);
  const draft = mkdtempSync(join(folder.root, 'backup-'));
  try {
    // First the rows, then the files: what a row names is there by then, and files are only ever added.
    await withDatabase(config, folder, (database) => dumpDatabase(database, join(draft, DUMP)));
    writeFileSync(join(draft, SECRET_FILE), readSessionSecret(folder, config.sessionSecret), { mode: 0o600 });
    writeFileSync(
      join(draft, MANIFEST),
      JSON.stringify({ product: 'elbowroom', format: 1, madeAt: new Date() }),
    );
    const archive = `${target}.part`;
    writeFileSync(archive, '', { mode: 0o600 });
    await tar(['-czf', archive, '-C', draft, MANIFEST, DUMP, SECRET_FILE, '-C', folder.root, FILES]);
    renameSync(archive, target);
  } finally {
    rmSync(draft, { recursive: true, force: true });
    rmSync(`${target}.part`, { force: true });
  }
}

/**
 * Brings an archive back into an empty data folder (and an empty database, when that is an existing server's).
 * @throws StartProblem in one line, leaving the folder empty, when it cannot be done.
 */
export async function restoreBackup(config: Config, path: string): Promise<void> {
  const archive = resolve(path);
  if (!existsSync(archive)) throw new StartProblem(`There is no file ${archive}.`);
  const { dataFolder } = config;
  if (existsSync(dataFolder) && readdirSync(dataFolder).length > 0) {
    throw new StartProblem(
      `${dataFolder} is not empty: a backup is restored into an empty data folder only.`,
    );
  }
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 });
  const folder = nameDataFolder(dataFolder);
  const lock = lockFolder(folder.root);
  try {
    await tar(['-xzf', archive, '--no-same-owner', '-C', folder.root, MANIFEST, DUMP, SECRET_FILE, FILES]);
    manifestSchema.parse(JSON.parse(readFileSync(join(folder.root, MANIFEST), 'utf8')));
    await loadIntoEmpty(config, folder);
    rmSync(join(folder.root, DUMP));
    rmSync(join(folder.root, MANIFEST));
  } catch (error) {
    for (const entry of readdirSync(folder.root))
      rmSync(join(folder.root, entry), { recursive: true, force: true });
    if (error instanceof StartProblem) throw error;
    throw new StartProblem(
      `${archive} could not be restored: ${error instanceof Error ? firstLine(error) : 'unknown'}`,
    );
  } finally {
    lock.release();
  }
}

async function withDatabase(
  config: Config,
  folder: DataFolder,
  work: (target: ToolTarget) => Promise<void>,
): Promise<void> {
  if (config.database.kind === 'external') return work(targetOfUrl(config.database.ownerUrl));
  const running = findInstance(join(folder.database, 'data'));
  if (running) return work({ args: addressInstance(running.socket), database: PRIVATE_DATABASE });
  if (!existsSync(folder.database)) throw new StartProblem(`There is no database in ${folder.root}.`);
  const lock = lockFolder(folder.root);
  try {
    const instance = await startPrivateDatabase(folder.database);
    try {
      await work({ args: addressInstance(instance.socket), database: PRIVATE_DATABASE });
    } finally {
      await instance.stop();
    }
  } finally {
    lock.release();
  }
}

async function loadIntoEmpty(config: Config, folder: DataFolder): Promise<void> {
  const dump = join(folder.root, DUMP);
  if (config.database.kind === 'external') {
    const target = targetOfUrl(config.database.ownerUrl);
    const tables = await runTool(
      'mariadb',
      [...target.args, '-N', '-e', 'SHOW TABLES', target.database],
      '',
      {
        MYSQL_PWD: target.password ?? '',
      },
    );
    if (tables.code !== 0) throw new Error(tables.complaint.trim());
    if (tables.output.trim() !== '') throw new StartProblem(`The database ${target.database} is not empty.`);
    return loadDump(target, dump);
  }
  const instance = await startPrivateDatabase(folder.database);
  try {
    await preparePrivateAccounts(instance);
    await createPrivateDatabase(instance.socket, PRIVATE_DATABASE);
    await loadDump({ args: addressInstance(instance.socket), database: PRIVATE_DATABASE }, dump);
  } finally {
    await instance.stop();
  }
}

async function tar(args: readonly string[]): Promise<void> {
  const answer = await runTool('tar', args);
  if (answer.code !== 0) throw new StartProblem(`tar failed: ${answer.complaint.trim().split('\n')[0]}`);
}

function firstLine(error: Error): string {
  return error.message.split('\n')[0] ?? '';
}
