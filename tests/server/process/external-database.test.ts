import { createPrivateDatabase } from '@/server/local/private-accounts';
import { administer } from '@/server/local/private-database';
import { makeDataFolder, removeDataFolder, spawnServer } from '../../support/spawned-server';

jest.setTimeout(60_000);

const NAME = 'elbowroom_test_external';
const socket = process.env['TEST_DATABASE_SOCKET'] ?? '';
const environment = {
  DATABASE_URL: `${process.env['TEST_DATABASE_URL']}/${NAME}`,
  DATABASE_OWNER_URL: `${process.env['TEST_DATABASE_OWNER_URL']}/${NAME}`,
};
let folder: string;
beforeEach(async () => {
  folder = makeDataFolder();
  await createPrivateDatabase(socket, NAME);
});
afterEach(async () => {
  removeDataFolder(folder);
  await administer(socket, `DROP DATABASE \`${NAME}\``);
});

test('an existing MariaDB is migrated, served without the demo, and left running', async () => {
  const server = spawnServer(folder, { ...environment, DEMO: 'on' });
  const url = await server.ready;
  expect(await (await fetch(`${url}/api/health`)).json()).toEqual({ status: 'ok' });
  expect(await (await fetch(`${url}/api/setup`)).json()).toEqual({
    state: 'first-visit',
    demo: false,
    demoAccounts: [],
  });
  expect(server.output()).toContain('DEMO is left off');
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
  await administer(socket, `SELECT 1 FROM \`${NAME}\`.people`);
});

test('an application user with rights everywhere is not taken', async () => {
  await administer(
    socket,
    "CREATE USER 'wide'@'127.0.0.1' IDENTIFIED BY 'wide'; GRANT UPDATE ON *.* TO 'wide'@'127.0.0.1'",
  );
  const wide = new URL(environment.DATABASE_URL);
  wide.username = 'wide';
  wide.password = 'wide';
  const server = spawnServer(folder, { ...environment, DATABASE_URL: wide.href });
  expect(await server.exit).toBe(1);
  expect(server.complaint()).toMatch(/^The application's database user may change saved revisions.*\n$/);
  await administer(socket, "DROP USER 'wide'@'127.0.0.1'");
});

test('a wrong password of the database is one line', async () => {
  const wrong = new URL(environment.DATABASE_OWNER_URL);
  wrong.password = 'wrong';
  const server = spawnServer(folder, { ...environment, DATABASE_OWNER_URL: wrong.href });
  expect(await server.exit).toBe(1);
  expect(server.complaint()).toMatch(/refuses a user or password.*\n$/);
});
