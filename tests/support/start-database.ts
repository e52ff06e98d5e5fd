import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { preparePrivateAccounts } from '../../server/local/private-accounts';
import { startPrivateDatabase, type PrivateDatabase } from '../../server/local/private-database';

/** What the teardown needs of the setup: both run in the same process. */
export interface RunningTestDatabase {
  readonly database: PrivateDatabase;
  readonly folder: string;
}

declare global {
  var runningTestDatabase: RunningTestDatabase | undefined;
}

/** Starts a throw-away MariaDB for a test run; test files make their own databases in it. */
export default async function startDatabase(): Promise<void> {
  const folder = mkdtempSync(join(tmpdir(), 'elbowroom-test-'));
  try {
    const database = await startPrivateDatabase(folder, { throwAway: true });
    const accounts = await preparePrivateAccounts(database);
    globalThis.runningTestDatabase = { database, folder };
    process.env['TEST_DATABASE_OWNER_URL'] = accounts.ownerUrl;
    process.env['TEST_DATABASE_URL'] = accounts.applicationUrl;
    process.env['TEST_DATABASE_SOCKET'] = database.socket;
  } catch (error) {
    rmSync(folder, { recursive: true, force: true });
    throw error;
  }
}
