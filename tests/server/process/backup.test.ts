import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { agent as createAgent } from 'supertest';
import { PRIVATE_DATABASE } from '@/server/database/open-database';
import { addressInstance, startPrivateDatabase } from '@/server/local/private-database';
import { runTool } from '@/server/local/run-tool';
import { jobDetailSchema, jobListSchema } from '@/shared/api/jobs';
import { setupSchema } from '@/shared/api/session';
import { makeDataFolder, removeDataFolder, spawnServer } from '../../support/spawned-server';

jest.setTimeout(120_000);

let folder: string;
let restored: string;
beforeEach(() => {
  folder = makeDataFolder();
  restored = makeDataFolder();
});
afterEach(() => {
  removeDataFolder(folder);
  removeDataFolder(restored);
});

async function command(name: 'backup' | 'restore', data: string, ...args: string[]) {
  const run = spawnServer(data, {}, [`server/cli/${name}.ts`, ...args]);
  return { code: await run.exit, complaint: run.complaint() };
}

/** Every row and trigger of a data folder's database, and the hashes of its revisions. */
async function readEverything(data: string) {
  const instance = await startPrivateDatabase(join(data, 'database'));
  try {
    const address = addressInstance(instance.socket);
    const dump = await runTool('mariadb-dump', [
      ...address,
      '--skip-comments',
      '--skip-dump-date',
      '--order-by-primary',
      '--skip-extended-insert',
      '--hex-blob',
      '--triggers',
      PRIVATE_DATABASE,
    ]);
    const hashes = await runTool('mariadb', [
      ...address,
      '--default-character-set=utf8mb4',
      '--batch',
      '-e',
      'SELECT id, letter, hash, CAST(SHA2(content, 256) AS BINARY) = CAST(hash AS BINARY) AS fits FROM revisions ORDER BY id',
      PRIVATE_DATABASE,
    ]);
    if (dump.code !== 0 || hashes.code !== 0) throw new Error(dump.complaint + hashes.complaint);
    return { rows: dump.output, hashes: hashes.output };
  } finally {
    await instance.stop();
  }
}

/** A line of a revision whose hash is that of its content: the demo has one, and `freezeRevision` adds one. */
const FITTING_HASH = /\tA\t[0-9a-f]{64}\t1\n/g;

/** Saves a revision of the demo's first layout, submits it and has it frozen, as its people would. */
async function freezeRevision(url: string): Promise<void> {
  const { demoAccounts } = setupSchema.parse((await createAgent(url).get('/api/setup')).body);
  const signIn = async (email: string) => {
    const agent = createAgent(url).set('Origin', url);
    const account = demoAccounts.find((candidate) => candidate.email === email);
    await agent.post('/api/session').send({ email, password: account?.password }).expect(200);
    return { agent, password: account?.password };
  };
  const { agent } = await signIn('integrator@example.com');
  const [job] = jobListSchema.parse((await agent.get('/api/jobs')).body).items;
  const { platforms } = jobDetailSchema.parse((await agent.get(`/api/jobs/${job?.id}`)).body);
  const layoutId = platforms[0]?.layouts[0]?.id;
  const note = 'Größe geprüft \u{1F4E1}';
  const saved = await agent.post(`/api/layouts/${layoutId}/revisions`).send({ note }).expect(201);
  await agent.post(`/api/revisions/${saved.body.id}/submit`).expect(200);
  const approver = await signIn('approver@example.com');
  await approver.agent
    .post(`/api/revisions/${saved.body.id}/freeze`)
    .send({ reason: 'Agreed.', password: approver.password })
    .expect(200);
}

test('a backup made while the server runs comes back with every row, file, secret and revision hash', async () => {
  const server = spawnServer(folder);
  await freezeRevision(await server.ready);
  mkdirSync(join(folder, 'files', 'ab'), { recursive: true });
  writeFileSync(join(folder, 'files', 'ab', 'measured.s2p'), Buffer.from([0, 1, 2, 255]));
  const archive = join(restored, 'backup.tgz');
  expect(await command('backup', folder, archive)).toEqual({ code: 0, complaint: '' });
  expect(statSync(archive).mode & 0o777).toBe(0o600);
  expect((await command('backup', folder, archive)).complaint).toMatch(/exists already.*\n$/);
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
  const target = join(restored, 'data');
  expect(await command('restore', target, archive)).toEqual({ code: 0, complaint: '' });
  expect(readFileSync(join(target, 'files', 'ab', 'measured.s2p'))).toEqual(Buffer.from([0, 1, 2, 255]));
  expect(readFileSync(join(target, 'session-secret'))).toEqual(readFileSync(join(folder, 'session-secret')));
  const [before, after] = [await readEverything(folder), await readEverything(target)];
  expect(after).toEqual(before);
  expect(after.hashes.match(FITTING_HASH)).toHaveLength(2);
  const again = spawnServer(target);
  expect(again.output()).not.toContain('Loaded the demo');
  await again.ready;
  again.child.kill('SIGTERM');
  expect(await again.exit).toBe(0);
});

test('a backup made while it is stopped keeps saved revisions and their immutability', async () => {
  const server = spawnServer(folder);
  await freezeRevision(await server.ready);
  server.child.kill('SIGTERM');
  expect(await server.exit).toBe(0);
  const archive = join(restored, 'backup.tgz');
  expect((await command('backup', folder, archive)).code).toBe(0);
  const target = join(restored, 'data');
  expect((await command('restore', target, archive)).code).toBe(0);
  const [before, after] = [await readEverything(folder), await readEverything(target)];
  expect(after).toEqual(before);
  expect(after.hashes.match(FITTING_HASH)).toHaveLength(2);
  const copy = await startPrivateDatabase(join(target, 'database'));
  const refused = await runTool(
    'mariadb',
    [...addressInstance(copy.socket), PRIVATE_DATABASE],
    'DELETE FROM revisions',
  );
  await copy.stop();
  expect(refused.complaint).toContain('immutable');
});

test('restoring refuses a folder with something in it, and leaves an empty one empty when the archive is bad', async () => {
  writeFileSync(join(folder, 'something'), '');
  const archive = join(restored, 'bad.tgz');
  writeFileSync(archive, 'no archive');
  expect(await command('restore', folder, archive)).toMatchObject({
    code: 1,
    complaint: expect.stringMatching(/is not empty.*\n$/),
  });
  const target = join(restored, 'data');
  expect((await command('restore', target, archive)).code).toBe(1);
  expect(existsSync(target) ? readdirSync(target) : []).toEqual([]);
});

test('a backup of nothing, or to nowhere, is one line', async () => {
  expect(await command('backup', folder, join(restored, 'x.tgz'))).toMatchObject({
    code: 1,
    complaint: expect.stringMatching(/^There is nothing to save in .*\n$/),
  });
  expect(await command('backup', folder)).toMatchObject({
    code: 1,
    complaint: 'Type: npm run backup -- FILE\n',
  });
  expect(await command('restore', folder)).toMatchObject({
    code: 1,
    complaint: 'Type: npm run restore -- FILE\n',
  });
});
