import { Invitation } from '@/server/models/invitation';
import { Person } from '@/server/models/person';
import { Task } from '@/server/models/task';
import { invitationListSchema, invitationSchema, sessionSchema } from '@/shared/api/session';
import { createId } from '@/shared/ids';
import { buildMember, buildPerson, buildTeam, TEST_PASSWORD } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

const PASSWORD = 'a password for a newcomer';
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function buildAdministrator() {
  const team = await buildTeam();
  const administrator = await buildMember(['administrator'], { team });
  return { team, administrator, agent: await server.signIn(administrator) };
}

function newAddress(): string {
  return `${createId()}@example.com`;
}

async function readToken(email: string): Promise<string> {
  await server.performTasks();
  const mail = server.outbox.findLast(({ to }) => to === email);
  const token = /\/invitation\/([\w-]+)/.exec(mail?.text ?? '')?.[1];
  if (token === undefined) throw new Error(`no invitation was sent to ${email}`);
  return token;
}

test('an invited person sets name and password, and is a member with the given roles', async () => {
  const { team, agent } = await buildAdministrator();
  const email = newAddress();
  const invited = await agent.post('/api/invitations').send({ email, roles: ['approver', 'reviewer'] });
  expect(invited.status).toBe(201);
  expect(invitationSchema.parse(invited.body).roles).toEqual(['reviewer', 'approver']);
  const token = await readToken(email);
  const newcomer = server.visitor();
  const shown = await newcomer.get(`/api/invitations/by-token/${token}`);
  expect(shown.body).toEqual({ email, team: team.name, roles: ['reviewer', 'approver'], hasAccount: false });
  const accepted = await newcomer
    .post('/api/invitations/accept')
    .send({ token, name: 'New Comer', password: PASSWORD });
  expect(accepted.status).toBe(201);
  const session = sessionSchema.parse(accepted.body);
  expect(session.team.id).toBe(team.id);
  expect(session.member).toMatchObject({
    name: 'New Comer',
    initials: 'NC',
    roles: ['reviewer', 'approver'],
  });
  expect((await newcomer.get('/api/session')).status).toBe(200);
  expect((await server.visitor().post('/api/session').send({ email, password: PASSWORD })).status).toBe(200);
});

test('a link works once', async () => {
  const { agent } = await buildAdministrator();
  const email = newAddress();
  await agent.post('/api/invitations').send({ email, roles: ['reviewer'] });
  const body = { token: await readToken(email), name: 'Once', password: PASSWORD };
  const answers = await Promise.all([
    server.visitor().post('/api/invitations/accept').send(body),
    server.visitor().post('/api/invitations/accept').send(body),
  ]);
  expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
  expect((await server.visitor().get(`/api/invitations/by-token/${body.token}`)).status).toBe(410);
});

test('only the hash of the token is kept, and no trace of it once the mail was sent', async () => {
  const { agent } = await buildAdministrator();
  const email = newAddress();
  await agent.post('/api/invitations').send({ email, roles: ['reviewer'] });
  const token = await readToken(email);
  await server.visitor().get(`/api/invitations/by-token/${token}`);
  const rows = JSON.stringify([await Invitation.findAll(), await Task.findAll(), server.logLines]);
  expect(rows).not.toContain(token);
});

test('somebody with an account comes in with the password of that account', async () => {
  const { team, agent } = await buildAdministrator();
  const person = await buildPerson();
  await buildMember(['installer'], { person });
  await agent.post('/api/invitations').send({ email: person.email, roles: ['integrator'] });
  const token = await readToken(person.email);
  expect((await server.visitor().get(`/api/invitations/by-token/${token}`)).body.hasAccount).toBe(true);
  const wrong = await server.visitor().post('/api/invitations/accept').send({ token, password: PASSWORD });
  expect(wrong.status).toBe(403);
  expect(wrong.body.problems[0].path).toBe('password');
  const right = await server
    .visitor()
    .post('/api/invitations/accept')
    .send({ token, password: TEST_PASSWORD });
  expect(right.status).toBe(201);
  expect(right.body.team.id).toBe(team.id);
  expect(right.body.teams).toHaveLength(2);
});

test.each([
  ['no name', { name: undefined }, 'name'],
  ['a short password', { password: 'eleven char' }, 'password'],
  ['a password of 73 bytes', { password: 'ä'.repeat(36) + 'x' }, 'password'],
])('a newcomer with %s is told where', async (_case, change, path) => {
  const { agent } = await buildAdministrator();
  const email = newAddress();
  await agent.post('/api/invitations').send({ email, roles: ['reviewer'] });
  const token = await readToken(email);
  const response = await server
    .visitor()
    .post('/api/invitations/accept')
    .send({ token, name: 'Name', password: PASSWORD, ...change });
  expect(response.status).toBe(400);
  expect(response.body.problems.map((problem: { path: string }) => problem.path)).toEqual([path]);
});

test('an invitation ends with its time, and when it is withdrawn', async () => {
  const { agent } = await buildAdministrator();
  const [late, withdrawn] = [newAddress(), newAddress()];
  await agent.post('/api/invitations').send({ email: late, roles: ['reviewer'] });
  const { body } = await agent.post('/api/invitations').send({ email: withdrawn, roles: ['reviewer'] });
  const [lateToken, withdrawnToken] = [await readToken(late), await readToken(withdrawn)];
  await Invitation.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { email: late } });
  expect((await agent.delete(`/api/invitations/${body.id}`)).status).toBe(204);
  for (const token of [lateToken, withdrawnToken]) {
    const response = await server
      .visitor()
      .post('/api/invitations/accept')
      .send({ token, name: 'X', password: PASSWORD });
    expect(response.status).toBe(410);
  }
  expect((await agent.delete(`/api/invitations/${body.id}`)).status).toBe(404);
});

test('sending again replaces the link', async () => {
  const { agent } = await buildAdministrator();
  const email = newAddress();
  const { body } = await agent.post('/api/invitations').send({ email, roles: ['reviewer'] });
  const first = await readToken(email);
  expect((await agent.post(`/api/invitations/${body.id}/send`)).status).toBe(200);
  const second = await readToken(email);
  expect((await server.visitor().get(`/api/invitations/by-token/${first}`)).status).toBe(410);
  expect((await server.visitor().get(`/api/invitations/by-token/${second}`)).status).toBe(200);
});

test('a second invitation to the same address ends the first; both spellings are the same address', async () => {
  const { agent } = await buildAdministrator();
  const email = newAddress();
  await agent.post('/api/invitations').send({ email, roles: ['reviewer'] });
  await agent.post('/api/invitations').send({ email: email.toUpperCase(), roles: ['approver'] });
  const { items } = invitationListSchema.parse((await agent.get('/api/invitations')).body);
  expect(items.map(({ roles }) => roles)).toEqual([['approver']]);
});

test('somebody who is in the team is not invited again', async () => {
  const { team, agent } = await buildAdministrator();
  const person = await buildPerson();
  await buildMember(['reviewer'], { team, person });
  const response = await agent.post('/api/invitations').send({ email: person.email, roles: ['reviewer'] });
  expect(response.status).toBe(409);
  expect(response.body.code).toBe('already-there');
});

test('an open invitation is listed until it is accepted', async () => {
  const { administrator, agent } = await buildAdministrator();
  const email = newAddress();
  await agent.post('/api/invitations').send({ email, roles: ['reviewer'] });
  const name = (await Person.findByPk(administrator.personId, { rejectOnEmpty: true })).name;
  expect((await agent.get('/api/invitations')).body.items).toMatchObject([{ email, invitedBy: name }]);
  const token = await readToken(email);
  await server.visitor().post('/api/invitations/accept').send({ token, name: 'X', password: PASSWORD });
  expect((await agent.get('/api/invitations')).body.items).toEqual([]);
});

test.each(['integrator', 'reviewer', 'approver', 'installer'] as const)(
  'an %s may not invite',
  async (role) => {
    const agent = await server.signIn(await buildMember([role]));
    const invitation = { email: newAddress(), roles: ['administrator'] };
    expect((await agent.get('/api/invitations')).status).toBe(403);
    expect((await agent.post('/api/invitations').send(invitation)).status).toBe(403);
    expect((await agent.post(`/api/invitations/${createId()}/send`)).status).toBe(403);
    expect((await agent.delete(`/api/invitations/${createId()}`)).status).toBe(403);
  },
);

test('inviting needs somebody signed in', async () => {
  const visitor = server.visitor();
  expect((await visitor.get('/api/invitations')).status).toBe(401);
  expect((await visitor.post('/api/invitations').send({})).status).toBe(401);
  expect((await visitor.post(`/api/invitations/${createId()}/send`)).status).toBe(401);
  expect((await visitor.delete(`/api/invitations/${createId()}`)).status).toBe(401);
});

test('an invitation of another team is not found', async () => {
  const { agent } = await buildAdministrator();
  const other = await buildAdministrator();
  const { body } = await other.agent
    .post('/api/invitations')
    .send({ email: newAddress(), roles: ['reviewer'] });
  expect((await agent.post(`/api/invitations/${body.id}/send`)).status).toBe(404);
  expect((await agent.delete(`/api/invitations/${body.id}`)).status).toBe(404);
});

test('an invitation without address or role is refused with its paths', async () => {
  const { agent } = await buildAdministrator();
  const response = await agent.post('/api/invitations').send({ email: 'x', roles: [] });
  expect(response.status).toBe(400);
  expect(response.body.problems.map((problem: { path: string }) => problem.path)).toEqual(['email', 'roles']);
  expect((await server.visitor().get('/api/invitations/by-token/short')).status).toBe(404);
  const accepted = await server.visitor().post('/api/invitations/accept').send({ token: 'short', name: '' });
  expect(accepted.status).toBe(400);
  const paths = accepted.body.problems.map((problem: { path: string }) => problem.path);
  expect(paths).toEqual(['token', 'name', 'password']);
});
