import { QueryTypes, type Sequelize } from 'sequelize';
import { readDatabaseErrno } from './transaction';

/** Tables that only ever grow: the application may read and add, never change or remove. */
export const APPEND_ONLY_TABLES: ReadonlySet<string> = new Set([
  'operations',
  'revisions',
  'revision_events',
  'audit',
]);
const OWNER_TABLES: ReadonlySet<string> = new Set(['schema_migrations']);
const NO_SUCH_GRANT_ERRNOS = new Set([1141, 1147]);

/** A database account as MariaDB writes it: name and the host it may come from. */
export interface DatabaseAccount {
  readonly user: string;
  readonly host: string;
}

/** Gives the application's account exactly its rights, table by table, after taking away what it had. */
export async function grantApplication(owner: Sequelize, account: DatabaseAccount): Promise<void> {
  const database = owner.getDatabaseName();
  const grantee = `${owner.escape(account.user)}@${owner.escape(account.host)}`;
  await revoke(owner, `\`${database}\`.*`, grantee);
  for (const table of await listTables(owner, database)) {
    const target = `\`${database}\`.\`${table}\``;
    await revoke(owner, target, grantee);
    const rights = listRights(table);
    if (rights !== undefined) {
      await owner.query(`GRANT ${rights} ON ${target} TO ${grantee}`, { type: QueryTypes.RAW });
    }
  }
}

/**
 * Looks, as the application, at what it may do.
 * @throws Error when it could change an append-only table, so that an existing server with wide rights is not taken.
 */
export async function verifyApplicationRights(application: Sequelize): Promise<void> {
  const grants = await application.query<Record<string, string>>('SHOW GRANTS', { type: QueryTypes.SELECT });
  for (const grant of grants.flatMap((row) => Object.values(row))) {
    const [, rights = '', target = ''] = /^GRANT (.+?) ON (\S+) TO /.exec(grant) ?? [];
    if (!/\b(UPDATE|DELETE|DROP|ALL PRIVILEGES|ALTER|TRIGGER)\b/.test(rights)) continue;
    const table = /`([^`]*)`$/.exec(target)?.[1];
    if (table === undefined || APPEND_ONLY_TABLES.has(table)) {
      throw new Error(
        `the application's database user may change saved revisions (${rights} on ${target}): take that right away`,
      );
    }
  }
}

function listRights(table: string): string | undefined {
  if (OWNER_TABLES.has(table)) return undefined;
  return APPEND_ONLY_TABLES.has(table) ? 'SELECT, INSERT' : 'SELECT, INSERT, UPDATE, DELETE';
}

async function revoke(owner: Sequelize, target: string, grantee: string): Promise<void> {
  try {
    await owner.query(`REVOKE ALL PRIVILEGES ON ${target} FROM ${grantee}`, { type: QueryTypes.RAW });
  } catch (error) {
    // There was nothing to take away.
    if (!NO_SUCH_GRANT_ERRNOS.has(readDatabaseErrno(error) ?? 0)) throw error;
  }
}

async function listTables(owner: Sequelize, database: string): Promise<readonly string[]> {
  const rows = await owner.query<{ name: string }>(
    'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = ? ORDER BY table_name',
    { replacements: [database], type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.name);
}
