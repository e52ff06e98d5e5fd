import { randomBytes } from 'node:crypto';
import { QueryTypes, type Sequelize } from 'sequelize';
import { connect } from '@/server/database/connection';
import { grantApplication } from '@/server/database/grants';
import { migrate } from '@/server/database/migrate';
import { APPLICATION_USER, createPrivateDatabase } from '@/server/local/private-accounts';
import { bindModels } from '@/server/models/bind-models';

/** A database of one test file, with the two accounts kept apart as in a running server. */
export interface TestDatabase {
  readonly name: string;
  /** The application's connection, which the models use. */
  readonly sequelize: Sequelize;
  /** The migrating account, for tests of what even it cannot do. */
  readonly owner: Sequelize;
  drop(): Promise<void>;
}

/** Makes a migrated database and binds the models to it; call it in `beforeAll`, and `drop` in `afterAll`. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const name = `elbowroom_test_${randomBytes(6).toString('hex')}`;
  const ownerUrl = readVariable('TEST_DATABASE_OWNER_URL');
  await createPrivateDatabase(readVariable('TEST_DATABASE_SOCKET'), name);
  const owner = connect(`${ownerUrl}/${name}`, 3);
  await migrate(owner);
  await grantApplication(owner, { user: APPLICATION_USER, host: '127.0.0.1' });
  const sequelize = connect(`${readVariable('TEST_DATABASE_URL')}/${name}`);
  bindModels(sequelize);
  return {
    name,
    sequelize,
    owner,
    drop: async () => {
      await sequelize.close();
      await owner.query(`DROP DATABASE \`${name}\``, { type: QueryTypes.RAW });
      await owner.close();
    },
  };
}

function readVariable(name: string): string {
  // eslint-disable-next-line expo/no-dynamic-env-var -- the rule is about what a bundler replaces; this runs in Node
  const value = process.env[name];
  if (value === undefined) throw new Error(`${name} is missing: the test run did not start its database`);
  return value;
}
