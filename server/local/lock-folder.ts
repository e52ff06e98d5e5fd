import { linkSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { readStartTime } from './find-instance';
import { StartProblem } from './start-problem';

const LOCK_FILE = 'lock';

/** One holder for each data folder. */
export interface FolderLock {
  release(): void;
}

/**
 * Takes the data folder for this process. A lock whose process is gone (also when its number was given to another)
 * is taken over.
 * @throws StartProblem when another process holds it.
 */
export function lockFolder(folder: string): FolderLock {
  const path = join(folder, LOCK_FILE);
  const mine = `${process.pid} ${readStartTime(process.pid) ?? ''}`;
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, mine, { mode: 0o600 });
  try {
    // A link is made whole or not at all, so nobody ever reads half a lock.
    for (let attempt = 0; attempt < 3; attempt += 1) {
      if (tryLink(draft, path)) return { release: () => rmSync(path, { force: true }) };
      const holder = readHolder(path);
      if (holder !== undefined && isAlive(holder)) {
        throw new StartProblem(
          `Another Elbowroom (process ${holder.split(' ')[0]}) runs on ${folder}: stop it, or set ELBOWROOM_DATA to another folder.`,
        );
      }
      rmSync(path, { force: true });
    }
    throw new StartProblem(`${path} cannot be taken: remove it and start again.`);
  } finally {
    rmSync(draft, { force: true });
  }
}

/** Whether a living process holds the folder. */
export function isFolderLocked(folder: string): boolean {
  const holder = readHolder(join(folder, LOCK_FILE));
  return holder !== undefined && isAlive(holder);
}

function tryLink(draft: string, path: string): boolean {
  try {
    linkSync(draft, path);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
    throw error;
  }
}

function readHolder(path: string): string | undefined {
  try {
    return readFileSync(path, 'utf8');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return undefined;
    throw error;
  }
}

function isAlive(holder: string): boolean {
  const [pid, startTime] = holder.split(' ');
  return startTime !== '' && startTime !== undefined && readStartTime(Number(pid)) === startTime;
}
