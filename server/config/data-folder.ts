import { randomBytes } from 'node:crypto';
import {
  chmodSync,
  existsSync,
  mkdirSync,
  readFileSync,
  realpathSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { join } from 'node:path';

/** The name of the file with the secret that signs session cookies. */
export const SECRET_FILE = 'session-secret';
const SECRET_BYTES = 48;

/** Where things are in a data folder. */
export interface DataFolder {
  readonly root: string;
  readonly database: string;
  readonly client: string;
  readonly files: string;
  readonly logs: string;
  readonly dumps: string;
}

/**
 * Makes the data folder and its parts when they are missing.
 * @throws Error when it is not a folder or cannot be written.
 */
export function openDataFolder(root: string): DataFolder {
  if (existsSync(root) && !statSync(root).isDirectory()) throw new Error(`${root} is not a folder`);
  mkdirSync(root, { recursive: true, mode: 0o700 });
  const folder = nameDataFolder(root);
  for (const part of [folder.files, folder.logs, folder.dumps])
    mkdirSync(part, { recursive: true, mode: 0o700 });
  return folder;
}

/** The names of a data folder's parts, whether they exist or not. */
export function nameDataFolder(given: string): DataFolder {
  // One name for one folder, whatever links lead to it: a running database is found by it.
  const root = existsSync(given) ? realpathSync(given) : given;
  return {
    root,
    database: join(root, 'database'),
    client: join(root, 'client'),
    files: join(root, 'files'),
    logs: join(root, 'logs'),
    dumps: join(root, 'dumps'),
  };
}

/** The secret that signs session cookies: the given one, or the one kept in the data folder (mode 0600), made when absent. */
export function readSessionSecret(folder: DataFolder, given: string | undefined): string {
  if (given !== undefined) return given;
  const path = join(folder.root, SECRET_FILE);
  if (!existsSync(path)) {
    writeFileSync(path, randomBytes(SECRET_BYTES).toString('base64url'), { mode: 0o600, flag: 'wx' });
  }
  chmodSync(path, 0o600);
  const secret = readFileSync(path, 'utf8').trim();
  if (secret.length < 32) throw new Error(`${path} is damaged: remove it, and everybody signs in anew`);
  return secret;
}
