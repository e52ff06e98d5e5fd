import { PasswordReset } from '@/server/models/password-reset';
import { Task } from '@/server/models/task';
import { buildMember, buildPerson, TEST_PASSWORD } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

const NEW_PASSWORD = 'quite another password';
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function buildMemberWithAgent() {
  const person = await buildPerson();
  const member = await buildMember(['reviewer'], { person });
  return { person, member, agent: await server.signIn(member) };
}

async function askForLink(email: string): Promise<string> {
  const before = await Task.count();
  expect((await server.visitor().post('/api/passwords/forgotten').send({ email })).status).toBe(202);
  // The answer does not wait for the row, so that its time tells nothing.
  while ((await Task.count()) === before) await new Promise((resolve) => setImmediate(resolve));
  await server.performTasks();
  const text = server.outbox.findLast(({ to }) => to === email)?.text ?? '';
  return /\/password\/([\w-]+)/.exec(text)?.[1] ?? '';
}

describe('a forgotten password', () => {
  test('is replaced by the link, which ends every session', async () => {
    const { person, member, agent } = await buildMemberWithAgent();
    const token = await askForLink(person.email);
    const rooms: string[] = [];
    const stop = server.services.revocation.onRevoke((room) => rooms.push(room));
    expect((await server.visitor().get(`/api/passwords/${token}`)).body).toEqual({ email: person.email });
    expect(
      (await server.visitor().post('/api/passwords').send({ token, password: NEW_PASSWORD })).status,
    ).toBe(204);
    stop();
    expect((await agent.get('/api/session')).status).toBe(401);
    expect(rooms).toContain(`member:${member.id}`);
    const signIn = (password: string) =>
      server.visitor().post('/api/session').send({ email: person.email, password });
    expect((await signIn(TEST_PASSWORD)).status).toBe(401);
    expect((await signIn(NEW_PASSWORD)).status).toBe(200);
  });

  test('is answered the same whether the account exists or not', async () => {
    const { person } = await buildMemberWithAgent();
    const known = await server.visitor().post('/api/passwords/forgotten').send({ email: person.email });
    const unknown = await server
      .visitor()
      .post('/api/passwords/forgotten')
      .send({ email: 'nobody@example.com' });
    expect([unknown.status, unknown.body]).toEqual([known.status, known.body]);
  });

  test('has a link that works once, and that ends the others', async () => {
    const { person } = await buildMemberWithAgent();
    const [first, second] = [await askForLink(person.email), await askForLink(person.email)];
    const use = (token: string) =>
      server.visitor().post('/api/passwords').send({ token, password: NEW_PASSWORD });
    expect((await use(second)).status).toBe(204);
    expect((await use(second)).status).toBe(410);
    expect((await use(first)).status).toBe(410);
  });

  test('has a link that ends with its time', async () => {
    const { person } = await buildMemberWithAgent();
    const token = await askForLink(person.email);
    await PasswordReset.update(
      { expiresAt: new Date(Date.now() - 1000) },
      { where: { personId: person.id } },
    );
    expect((await server.visitor().get(`/api/passwords/${token}`)).status).toBe(410);
    expect(
      (await server.visitor().post('/api/passwords').send({ token, password: NEW_PASSWORD })).status,
    ).toBe(410);
  });

  test('keeps only the hash of the link’s token', async () => {
    const { person } = await buildMemberWithAgent();
    const token = await askForLink(person.email);
    await server.visitor().get(`/api/passwords/${token}`);
    const rows = JSON.stringify([await PasswordReset.findAll(), await Task.findAll(), server.logLines]);
    expect(rows).not.toContain(token);
  });

  test.each([
    ['11 characters', 'eleven char', 'password'],
    ['73 bytes', 'ä'.repeat(36) + 'x', 'password'],
  ])('is not replaced by one of %s', async (_case, password, path) => {
    const token = 'x'.repeat(43);
    const response = await server.visitor().post('/api/passwords').send({ token, password });
    expect(response.status).toBe(400);
    expect(response.body.problems[0].path).toBe(path);
  });

  test('needs an address', async () => {
    const response = await server.visitor().post('/api/passwords/forgotten').send({ email: 'no' });
    expect(response.status).toBe(400);
    expect((await server.visitor().get('/api/passwords/short')).status).toBe(404);
  });
});

describe('one’s own account', () => {
  test('changes its password by the current one, ending the other sessions only', async () => {
    const { member, agent } = await buildMemberWithAgent();
    const other = await server.signIn(member);
    const response = await agent
      .put('/api/account/password')
      .send({ currentPassword: TEST_PASSWORD, password: NEW_PASSWORD });
    expect(response.status).toBe(204);
    expect((await agent.get('/api/session')).status).toBe(200);
    expect((await other.get('/api/session')).status).toBe(401);
  });

  test('keeps its password when the current one is wrong', async () => {
    const { agent } = await buildMemberWithAgent();
    const response = await agent
      .put('/api/account/password')
      .send({ currentPassword: 'not the current one', password: NEW_PASSWORD });
    expect(response.status).toBe(403);
    expect(response.body.code).toBe('wrong-password');
    expect(response.body.problems[0].path).toBe('currentPassword');
  });

  test('takes another name, trimmed, script or not', async () => {
    const { agent } = await buildMemberWithAgent();
    const name = '<script>alert(1)</script>';
    const response = await agent.patch('/api/account').send({ name: `  ${name} ` });
    expect(response.status).toBe(200);
    expect(response.body.person.name).toBe(name);
    expect(response.headers['content-type']).toMatch('application/json');
  });

  test.each([
    ['empty', ' '],
    ['too long', 'x'.repeat(121)],
    ['with a control character', 'a\u0000b'],
    ['a number', 7],
  ])('does not take a name that is %s', async (_case, name) => {
    const { agent } = await buildMemberWithAgent();
    const response = await agent.patch('/api/account').send({ name });
    expect(response.status).toBe(400);
    expect(response.body.problems[0].path).toBe('name');
  });

  test('needs somebody signed in', async () => {
    const visitor = server.visitor();
    expect((await visitor.patch('/api/account').send({ name: 'x' })).status).toBe(401);
    const change = { currentPassword: TEST_PASSWORD, password: NEW_PASSWORD };
    expect((await visitor.put('/api/account/password').send(change)).status).toBe(401);
  });
});
