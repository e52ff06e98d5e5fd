import { join } from 'node:path';
import { QueryTypes, type Sequelize } from 'sequelize';
import type { Config } from '../config/config';
import type { DataFolder } from '../config/data-folder';
import { APPLICATION_USER, createPrivateDatabase, preparePrivateAccounts } from '../local/private-accounts';
import { addressInstance, startPrivateDatabase } from '../local/private-database';
import { StartProblem } from '../local/start-problem';
import { watchDatabase } from '../local/watch-database';
import { connect } from './connection';
import { dumpDatabase, targetOfUrl, type ToolTarget } from './dump';
import { grantApplication, verifyApplicationRights, type DatabaseAccount } from './grants';
import { migrate } from './migrate';

/** The name of the database in a private instance. */
export const PRIVATE_DATABASE = 'elbowroom';
const NEEDED_VERSION = [10, 6] as const;

/** A database that is migrated and open to the application. */
export interface OpenDatabase {
  readonly sequelize: Sequelize;
  /** Closes the connections and, last of all, a private instance. */
  close(): Promise<void>;
}

interface Access {
  readonly ownerUrl: string;
  readonly applicationUrl: string;
  readonly account: DatabaseAccount;
  readonly dumpTarget: ToolTarget;
}

/**
 * Opens the configured database: migrates it as the owner, gives the application its rights, and connects as the
 * application.
 * @throws StartProblem in one line when it cannot be reached or used.
 */
export async function openDatabase(
  config: Config,
  folder: DataFolder,
  say: (line: string) => void,
  report: (error: unknown) => void,
): Promise<OpenDatabase> {
  if (config.database.kind === 'external') {
    const access = await reachExternal(config.database.applicationUrl, config.database.ownerUrl);
    const sequelize = await prepare(access, folder, say);
    return { sequelize, close: () => sequelize.close() };
  }
  const instance = await startPrivateDatabase(folder.database);
  try {
    if (instance.adopted) say('Took over the database that an earlier start left running.');
    const accounts = await preparePrivateAccounts(instance);
    await createPrivateDatabase(instance.socket, PRIVATE_DATABASE);
    const sequelize = await prepare(
      {
        ownerUrl: `${accounts.ownerUrl}/${PRIVATE_DATABASE}`,
        applicationUrl: `${accounts.applicationUrl}/${PRIVATE_DATABASE}`,
        account: { user: APPLICATION_USER, host: '127.0.0.1' },
        dumpTarget: { args: addressInstance(instance.socket), database: PRIVATE_DATABASE },
      },
      folder,
      say,
    );
    const watch = watchDatabase(instance, report);
    return {
      sequelize,
      close: async () => {
        await watch.stop();
        await sequelize.close();
        await instance.stop();
      },
    };
  } catch (error) {
    await instance.stop();
    throw error;
  }
}

async function prepare(access: Access, folder: DataFolder, say: (line: string) => void): Promise<Sequelize> {
  const owner = connect(access.ownerUrl, 3);
  try {
    await migrate(owner, {
      beforeChange: async (pending) => {
        say(
          `Saving a dump before ${pending.length === 1 ? 'a migration' : `${pending.length} migrations`} ...`,
        );
        const time = new Date().toISOString().replace(/[:.]/g, '-');
        await dumpDatabase(access.dumpTarget, join(folder.dumps, `${time}-before-${pending[0]}.sql.gz`));
      },
    });
    await grantApplication(owner, access.account);
  } finally {
    await owner.close();
  }
  const sequelize = connect(access.applicationUrl);
  try {
    await verifyApplicationRights(sequelize);
  } catch (error) {
    await sequelize.close();
    throw error instanceof Error
      ? new StartProblem(`${error.message[0]?.toUpperCase()}${error.message.slice(1)}`)
      : error;
  }
  return sequelize;
}

async function reachExternal(applicationUrl: string, ownerUrl: string): Promise<Access> {
  const owner = connect(ownerUrl, 1);
  // The application may hold no right in the database yet, so it is asked for its name without one.
  const application = connect(applicationUrl.replace(/(:\/\/[^/]+)\/[^?]*/, '$1'), 1);
  const place = new URL(ownerUrl).host;
  try {
    const [row] = await owner.query<{ version: string }>('SELECT VERSION() AS version', {
      type: QueryTypes.SELECT,
    });
    checkVersion(row?.version ?? '', place);
    const [current] = await application.query<{ account: string }>('SELECT CURRENT_USER() AS account', {
      type: QueryTypes.SELECT,
    });
    const [user = '', host = ''] = (current?.account ?? '').split('@');
    return { ownerUrl, applicationUrl, account: { user, host }, dumpTarget: targetOfUrl(ownerUrl) };
  } catch (error) {
    throw explainUnreachable(error, place);
  } finally {
    await owner.close();
    await application.close();
  }
}

function checkVersion(version: string, place: string): void {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  const [neededMajor, neededMinor] = NEEDED_VERSION;
  if (!version.includes('MariaDB') || major < neededMajor || (major === neededMajor && minor < neededMinor)) {
    throw new StartProblem(
      `The database at ${place} is ${version}; MariaDB ${NEEDED_VERSION.join('.')} or later is needed.`,
    );
  }
}

function explainUnreachable(error: unknown, place: string): unknown {
  if (error instanceof StartProblem || !(error instanceof Error)) return error;
  if (error.name === 'SequelizeAccessDeniedError') {
    return new StartProblem(
      `The database at ${place} refuses a user or password of DATABASE_URL or DATABASE_OWNER_URL.`,
    );
  }
  if (/^Sequelize(Connection|HostNot|Invalid)/.test(error.name)) {
    return new StartProblem(
      `The database at ${place} cannot be reached: check DATABASE_URL and that it runs.`,
    );
  }
  return error;
}
