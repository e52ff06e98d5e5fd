import { QueryTypes, type Sequelize } from 'sequelize';
import { APPEND_ONLY_TABLES, verifyApplicationRights } from '@/server/database/grants';
import { migrate } from '@/server/database/migrate';
import { readDatabaseErrno } from '@/server/database/transaction';
import { recordAudit } from '@/server/models/audit-entry';
import { createTestDatabase, type TestDatabase } from '../../support/test-database';

// ER_TABLEACCESS_DENIED_ERROR and ER_DBACCESS_DENIED_ERROR
const DENIED = [1142, 1044];
let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase();
});
afterAll(() => database.drop());

async function errnoOf(connection: Sequelize, statement: string): Promise<number | undefined> {
  return connection.query(statement, { type: QueryTypes.RAW }).then(
    () => 0,
    (error: unknown) => readDatabaseErrno(error),
  );
}

test('the application reads and adds to append-only tables, and may do nothing else to them', async () => {
  await recordAudit({ action: 'signed-in' });
  for (const table of APPEND_ONLY_TABLES) {
    expect(await errnoOf(database.sequelize, `SELECT * FROM ${table} LIMIT 1`)).toBe(0);
    for (const statement of [
      `DELETE FROM ${table}`,
      `TRUNCATE TABLE ${table}`,
      `DROP TABLE ${table}`,
      `ALTER TABLE ${table} ADD COLUMN x INT`,
      `CREATE TRIGGER t BEFORE INSERT ON ${table} FOR EACH ROW SET @x = 1`,
      `RENAME TABLE ${table} TO other`,
    ]) {
      expect([statement, DENIED.includes((await errnoOf(database.sequelize, statement)) ?? 0)]).toEqual([
        statement,
        true,
      ]);
    }
  }
  expect(await errnoOf(database.sequelize, "UPDATE audit SET action = 'x'")).toBe(1142);
  expect(
    await errnoOf(
      database.sequelize,
      "REPLACE INTO audit (id, action, details, created_at) VALUES (1, 'x', '', NOW())",
    ),
  ).toBe(1142);
  expect(
    await errnoOf(
      database.sequelize,
      "INSERT INTO audit (id, action, details, created_at) VALUES (1, 'x', '', NOW()) ON DUPLICATE KEY UPDATE action = 'x'",
    ),
  ).toBe(1142);
});

test('the application cannot make tables, see the list of migrations, or pass on rights', async () => {
  for (const statement of [
    'CREATE TABLE x (a INT)',
    'SELECT * FROM schema_migrations',
    'SET FOREIGN_KEY_CHECKS = 1, GLOBAL max_connections = 1',
  ]) {
    expect(await errnoOf(database.sequelize, statement)).not.toBe(0);
  }
});

test('an application with wider rights is not taken', async () => {
  await expect(verifyApplicationRights(database.sequelize)).resolves.toBeUndefined();
  await expect(verifyApplicationRights(database.owner)).rejects.toThrow('may change saved revisions');
});

test('migrating again changes nothing; migrations at once wait for each other', async () => {
  const [first, second] = await Promise.all([migrate(database.owner), migrate(database.owner)]);
  expect([first, second]).toEqual([[], []]);
});

test('every connection has our sql_mode, time zone and character set', async () => {
  const [row] = await database.sequelize.query<Record<string, string>>(
    'SELECT @@sql_mode AS mode, @@time_zone AS zone, @@character_set_connection AS charset, @@tx_isolation AS isolation',
    { type: QueryTypes.SELECT },
  );
  expect(row).toMatchObject({ zone: '+00:00', charset: 'utf8mb4', isolation: 'READ-COMMITTED' });
  expect(row?.['mode']).toContain('STRICT_TRANS_TABLES');
});

test('a raw SELECT without a type answers with its rows', async () => {
  const [rows] = await database.sequelize.query('SELECT 1 AS one UNION SELECT 2');
  expect(rows).toEqual([{ one: 1 }, { one: 2 }]);
});
