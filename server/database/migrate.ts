import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { QueryTypes, type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';

const MIGRATIONS_FOLDER = join(__dirname, 'migrations');
const LOCK_NAME = 'elbowroom-migrations';
const LOCK_WAIT_S = 120;

/** What a migration file exports: raw statements only, never models. */
export interface Migration {
  up(run: RunStatement): Promise<void>;
}

/** Runs one statement as the owner. */
export type RunStatement = (statement: string) => Promise<void>;

/** What a migration run does besides migrating. */
export interface MigrationOptions {
  /** Called before pending migrations touch a database that already holds some. */
  readonly beforeChange?: (pending: readonly string[]) => Promise<void>;
  /** The last migration to apply; left out, all of them. */
  readonly upTo?: string;
}

/**
 * Applies every pending migration as the owner, one process at a time.
 * @throws Error when another process holds the lock for too long, or a migration fails.
 */
export async function migrate(owner: Sequelize, options: MigrationOptions = {}): Promise<readonly string[]> {
  return withMigrationLock(owner, async () => {
    const umzug = createUmzug(owner);
    const pending = (await umzug.pending())
      .map((migration) => migration.name)
      .filter((name) => options.upTo === undefined || name <= options.upTo);
    if (pending.length === 0) return [];
    const executed = await umzug.executed();
    if (executed.length > 0 && options.beforeChange) await options.beforeChange(pending);
    await umzug.up({ migrations: pending });
    return pending;
  });
}

function createUmzug(owner: Sequelize): Umzug<Sequelize> {
  const names = readdirSync(MIGRATIONS_FOLDER)
    .filter((file) => /^\d{4}-[a-z0-9-]+\.ts$/.test(file))
    .map((file) => file.slice(0, -'.ts'.length))
    .sort();
  return new Umzug({
    migrations: names.map((name) => ({
      name,
      up: async () => {
        const migration = (await import(join(MIGRATIONS_FOLDER, `${name}.ts`))) as Migration;
        await migration.up(async (statement) => {
          await owner.query(statement, { type: QueryTypes.RAW });
        });
      },
    })),
    context: owner,
    storage: new SequelizeStorage({ sequelize: owner, tableName: 'schema_migrations' }),
    logger: undefined,
  });
}

// GET_LOCK belongs to a connection, so a transaction pins one for as long as the lock is held.
async function withMigrationLock<T>(owner: Sequelize, work: () => Promise<T>): Promise<T> {
  const name = `${LOCK_NAME}-${owner.getDatabaseName()}`.slice(0, 64);
  const transaction = await owner.transaction();
  try {
    const [row] = await owner.query<{ held: number | null }>('SELECT GET_LOCK(?, ?) AS held', {
      replacements: [name, LOCK_WAIT_S],
      type: QueryTypes.SELECT,
      transaction,
    });
    if (row?.held !== 1) throw new Error('another process is migrating this database');
    try {
      return await work();
    } finally {
      await owner.query('SELECT RELEASE_LOCK(?)', {
        replacements: [name],
        type: QueryTypes.SELECT,
        transaction,
      });
    }
  } finally {
    await transaction.rollback();
  }
}
