import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { findInstance } from '@/server/local/find-instance';
import { findPort, makeDataFolder, removeDataFolder, spawnServer } from '../../support/spawned-server';

// A first start makes a database (about two seconds here); a loaded machine takes longer.
jest.setTimeout(120_000);

let folder: string;
beforeEach(() => {
  folder = makeDataFolder();
});
afterEach(() => removeDataFolder(folder));

const instanceOf = (data: string) => findInstance(join(data, 'database', 'data'));

async function signIn(url: string): Promise<string> {
  const setup = await (await fetch(`${url}/api/setup`)).json();
  const { email, password } = setup.demoAccounts[0];
  const response = await fetch(`${url}/api/session`, {
    method: 'POST',
    headers: { origin: url, 'content-type': 'application/json' },
    body: JSON.stringify({ email, password }),
  });
  expect(response.status).toBe(200);
  return response.headers.getSetCookie()[0]?.split(';')[0] ?? '';
}

test('a start answers "starting", then is ready with demo sign-ins; SIGTERM stops all of it', async () => {
  const port = await findPort();
  const server = spawnServer(folder, { PORT: String(port) });
  const seen = new Set<string>();
  while (!server.output().includes('ready at')) {
    const response = await fetch(`http://127.0.0.1:${port}/api/health`).catch(() => undefined);
    if (response) seen.add(`${response.status} ${await response.text()}`);
    await delay(10);
    if (server.child.exitCode !== null) throw new Error(server.complaint());
  }
  expect(seen).toContain('503 {"status":"starting"}');
  const url = await server.ready;
  expect(url).toBe(`http://127.0.0.1:${port}`);
  expect(await (await fetch(`${url}/api/health`)).json()).toEqual({ status: 'ok' });
  expect(server.output()).toMatch(/integrator@example\.com\s+\S+/);
  expect(instanceOf(folder)).toBeDefined();
  expect(statSync(join(folder, 'session-secret')).mode & 0o777).toBe(0o600);
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
  expect(server.complaint()).toBe('');
  expect(instanceOf(folder)).toBeUndefined();
  expect(existsSync(join(folder, 'lock'))).toBe(false);
});

test('SIGINT during the first start ends it, database included', async () => {
  const server = spawnServer(folder);
  while (instanceOf(folder) === undefined) await delay(10);
  server.child.kill('SIGINT');
  expect(await server.exit).toBe(0);
  expect(instanceOf(folder)).toBeUndefined();
  const again = spawnServer(folder);
  await again.ready;
  again.child.kill('SIGINT');
  expect(await again.exit).toBe(0);
});

test('a second start on the same folder, or a taken port, is one line and exit code 1', async () => {
  const server = spawnServer(folder);
  const url = await server.ready;
  const second = spawnServer(folder);
  expect(await second.exit).toBe(1);
  expect(second.complaint().trimEnd().split('\n')).toHaveLength(1);
  expect(second.complaint()).toContain(`process ${server.child.pid}`);
  const elsewhere = makeDataFolder();
  const taken = spawnServer(elsewhere, { PORT: new URL(url).port });
  expect(await taken.exit).toBe(1);
  expect(taken.complaint()).toMatch(/^Port \d+ on 127\.0\.0\.1 is taken: .*\n$/);
  expect(instanceOf(elsewhere)).toBeUndefined();
  removeDataFolder(elsewhere);
  expect((await fetch(`${url}/api/health`)).status).toBe(200);
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
});

test('after SIGKILL the next start adopts the database, and what was committed is there', async () => {
  const first = spawnServer(folder);
  const cookie = await signIn(await first.ready);
  first.child.kill('SIGKILL');
  await first.exit;
  const left = instanceOf(folder);
  expect(left).toBeDefined();
  const second = spawnServer(folder);
  const url = await second.ready;
  expect(second.output()).toContain('Took over the database');
  expect(instanceOf(folder)).toEqual(left);
  expect((await fetch(`${url}/api/session`, { headers: { cookie } })).status).toBe(200);
  second.child.kill('SIGTERM');
  expect(await second.exit).toBe(0);
  expect(instanceOf(folder)).toBeUndefined();
});

test('a database that is killed alone is started again, and the server goes on', async () => {
  const server = spawnServer(folder);
  const url = await server.ready;
  const cookie = await signIn(url);
  process.kill(instanceOf(folder)?.pid ?? 0, 'SIGKILL');
  const seen: number[] = [];
  while (!(seen.includes(503) && seen.at(-1) === 200)) {
    seen.push((await fetch(`${url}/api/health`)).status);
    await delay(20);
  }
  expect((await fetch(`${url}/api/session`, { headers: { cookie } })).status).toBe(200);
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
  expect(instanceOf(folder)).toBeUndefined();
});

test('a database that was killed as well is recovered', async () => {
  const first = spawnServer(folder);
  const cookie = await signIn(await first.ready);
  first.child.kill('SIGKILL');
  process.kill(instanceOf(folder)?.pid ?? 0, 'SIGKILL');
  await first.exit;
  const second = spawnServer(folder);
  const url = await second.ready;
  expect((await fetch(`${url}/api/session`, { headers: { cookie } })).status).toBe(200);
  second.child.kill('SIGTERM');
  expect(await second.exit).toBe(0);
});

describe('a broken data folder is one line and exit code 1', () => {
  test('a file in its place', async () => {
    const file = join(folder, 'a-file');
    writeFileSync(file, '');
    const server = spawnServer(file);
    expect(await server.exit).toBe(1);
    expect(server.complaint()).toMatch(/a-file is not a folder.*\n$/);
  });

  test('a damaged database', async () => {
    mkdirSync(join(folder, 'database', 'data', 'mysql'), { recursive: true });
    writeFileSync(join(folder, 'database', 'data', 'ibdata1'), 'not a tablespace');
    const server = spawnServer(folder);
    expect(await server.exit).toBe(1);
    expect(server.complaint()).toMatch(/^MariaDB did not start on .*\n$/);
  });

  test('a damaged secret', async () => {
    writeFileSync(join(folder, 'session-secret'), 'short');
    const server = spawnServer(folder);
    expect(await server.exit).toBe(1);
    expect(server.complaint()).toMatch(/session-secret is damaged.*\n$/);
  });
});

test.each([
  [
    'an unreachable database',
    { DATABASE_URL: 'mariadb://a:b@127.0.0.1:1/x', DATABASE_OWNER_URL: 'mariadb://c:d@127.0.0.1:1/x' },
    /cannot be reached/,
  ],
  ['half a setting', { DATABASE_URL: 'mariadb://a:b@127.0.0.1:1/x' }, /DATABASE_OWNER_URL/],
  ['a port that is none', { PORT: 'eighty' }, /^PORT: /],
  ['an address that is not ours', { HOST: '192.0.2.1' }, /HOST 192\.0\.2\.1 is no address of this machine/],
])('%s is one line and exit code 1', async (_case, environment, line) => {
  const server = spawnServer(folder, environment);
  expect(await server.exit).toBe(1);
  expect(server.complaint()).toMatch(line);
  expect(server.complaint().trimEnd().split('\n')).toHaveLength(1);
});

test('without the demo the first start prints the code of the first visit, and logs hold no secret', async () => {
  const server = spawnServer(folder, { DEMO: 'off' });
  const url = await server.ready;
  while (!server.output().includes('with the code')) await delay(10);
  const code = /with the code (\S+)/.exec(server.output())?.[1] ?? '';
  const password = 'a password for the first';
  const response = await fetch(`${url}/api/setup`, {
    method: 'POST',
    headers: { origin: url, 'content-type': 'application/json' },
    body: JSON.stringify({ code, team: 'T', name: 'N', email: 'n@example.com', password }),
  });
  expect(response.status).toBe(201);
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
  const logs = readdirSync(join(folder, 'logs')).map((name) =>
    readFileSync(join(folder, 'logs', name), 'utf8'),
  );
  const secret = readFileSync(join(folder, 'session-secret'), 'utf8');
  for (const text of [code, password, secret]) expect(logs.join('')).not.toContain(text);
  for (const line of logs.join('').trim().split('\n')) expect(() => JSON.parse(line)).not.toThrow();
});
