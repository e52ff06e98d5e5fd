import type { Sequelize, Transaction } from 'sequelize';

const ATTEMPTS = 4;
const RETRIED_ERRNOS = new Set([1213, 1205]);

/**
 * Runs the work in one transaction, and again when the database chose it as the victim of a deadlock or a
 * lock wait ran out. The work must therefore have no effect outside the database.
 */
export async function transact<T>(
  sequelize: Sequelize,
  work: (transaction: Transaction) => Promise<T>,
): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await sequelize.transaction(work);
    } catch (error) {
      if (attempt >= ATTEMPTS || !RETRIED_ERRNOS.has(readDatabaseErrno(error) ?? 0)) throw error;
    }
  }
}

/** The MariaDB error number behind an error, if it came from the database. */
export function readDatabaseErrno(error: unknown): number | undefined {
  if (typeof error !== 'object' || error === null) return undefined;
  const { original } = error as { original?: { errno?: unknown } };
  return typeof original?.errno === 'number' ? original.errno : undefined;
}
