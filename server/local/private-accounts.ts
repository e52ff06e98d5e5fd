import { randomBytes } from 'node:crypto';
import { administer, type PrivateDatabase } from './private-database';

/** The account of migrations in a private instance. */
export const OWNER_USER = 'elbowroom_owner';
/** The account of the application in a private instance. */
export const APPLICATION_USER = 'elbowroom';
const HOST = '127.0.0.1';

/** Addresses of the two accounts, without a database's name at the end. */
export interface PrivateAccounts {
  readonly ownerUrl: string;
  readonly applicationUrl: string;
}

/** Makes the two accounts of a private instance, with passwords that are new at every start and kept nowhere. */
export async function preparePrivateAccounts(database: PrivateDatabase): Promise<PrivateAccounts> {
  const [ownerPassword, applicationPassword] = [makePassword(), makePassword()];
  await administer(
    database.socket,
    [
      `CREATE USER IF NOT EXISTS '${OWNER_USER}'@'${HOST}'`,
      `ALTER USER '${OWNER_USER}'@'${HOST}' IDENTIFIED BY '${ownerPassword}'`,
      `CREATE USER IF NOT EXISTS '${APPLICATION_USER}'@'${HOST}'`,
      `ALTER USER '${APPLICATION_USER}'@'${HOST}' IDENTIFIED BY '${applicationPassword}'`,
    ].join(';\n'),
  );
  const url = (user: string, password: string) => `mariadb://${user}:${password}@${HOST}:${database.port}`;
  return {
    ownerUrl: url(OWNER_USER, ownerPassword),
    applicationUrl: url(APPLICATION_USER, applicationPassword),
  };
}

/**
 * Makes a database unless it exists. The owner gets its rights under the very name, not a pattern: only then may it
 * pass them on.
 */
export async function createPrivateDatabase(socket: string, name: string): Promise<void> {
  await administer(
    socket,
    [
      `CREATE DATABASE IF NOT EXISTS \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
      `GRANT ALL PRIVILEGES ON \`${name}\`.* TO '${OWNER_USER}'@'${HOST}' WITH GRANT OPTION`,
    ].join(';\n'),
  );
}

function makePassword(): string {
  return randomBytes(24).toString('hex');
}
