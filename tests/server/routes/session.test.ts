import type { RevokedRoom } from '@/server/auth/socket-revocation';
import { AuditEntry } from '@/server/models/audit-entry';
import { Person } from '@/server/models/person';
import { SessionRecord } from '@/server/models/session-record';
import { sessionSchema } from '@/shared/api/session';
import { buildMember, buildPerson, buildTeam, TEST_PASSWORD } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

function watchRevocations(): { readonly rooms: RevokedRoom[]; stop: () => void } {
  const rooms: RevokedRoom[] = [];
  return { rooms, stop: server.services.revocation.onRevoke((room) => rooms.push(room)) };
}

describe('signing in', () => {
  test('answers with the person, the member, the team and what they may do', async () => {
    const member = await buildMember(['integrator', 'approver']);
    const agent = server.visitor();
    const person = await Person.findByPk(member.personId, { rejectOnEmpty: true });
    const response = await agent
      .post('/api/session')
      .send({ email: `  ${person.email.toUpperCase()} `, password: TEST_PASSWORD });
    expect(response.status).toBe(200);
    const session = sessionSchema.parse(response.body);
    expect(session.member.roles).toEqual(['integrator', 'approver']);
    expect(session.abilities).toEqual({
      seeJobs: true,
      createJob: true,
      editParts: true,
      administer: false,
      seeMails: false,
    });
    expect((await agent.get('/api/session')).body).toEqual(response.body);
  });

  test('sets a cookie that scripts and other sites do not get', async () => {
    const person = await buildPerson();
    await buildMember(['reviewer'], { person });
    const response = await server
      .visitor()
      .post('/api/session')
      .send({ email: person.email, password: TEST_PASSWORD });
    const cookie = String(response.headers['set-cookie']);
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
  });

  test('gives the session a new identifier and ends the former one', async () => {
    const person = await buildPerson();
    await buildMember(['reviewer'], { person });
    const agent = server.visitor();
    const signIn = () => agent.post('/api/session').send({ email: person.email, password: TEST_PASSWORD });
    const first = String((await signIn()).headers['set-cookie']).split(';')[0] ?? '';
    const second = String((await signIn()).headers['set-cookie']).split(';')[0] ?? '';
    expect(second).not.toBe(first);
    expect((await server.visitor().get('/api/session').set('Cookie', first)).status).toBe(401);
  });

  test.each([
    ['a wrong password', { password: 'another password entirely' }],
    ['an unknown address', { email: 'nobody@example.com' }],
  ])('is refused the same way for %s', async (_case, change) => {
    const person = await buildPerson();
    await buildMember(['reviewer'], { person });
    const response = await server
      .visitor()
      .post('/api/session')
      .send({ email: person.email, password: TEST_PASSWORD, ...change });
    expect(response.status).toBe(401);
    expect(response.body.code).toBe('wrong-credentials');
  });

  test.each([
    ['nothing', {}, ['email', 'password']],
    ['no address', { email: 'no address', password: 'x' }, ['email']],
    ['a list for a password', { email: 'a@example.com', password: ['x'] }, ['password']],
    ['an unknown key', { email: 'a@example.com', password: 'x', admin: true }, ['admin']],
  ])('names every problem with its path: %s', async (_case, body, paths) => {
    const response = await server.visitor().post('/api/session').send(body);
    expect(response.status).toBe(400);
    expect(response.headers['content-type']).toMatch('application/problem+json');
    expect(response.body.problems.map((problem: { path: string }) => problem.path)).toEqual(paths);
  });

  test('is refused to somebody whose last membership was ended', async () => {
    const person = await buildPerson();
    await buildMember(['administrator'], { person, deactivatedAt: new Date() });
    const response = await server
      .visitor()
      .post('/api/session')
      .send({ email: person.email, password: TEST_PASSWORD });
    expect(response.status).toBe(403);
    expect(response.headers['set-cookie']).toBeUndefined();
  });

  test('is written to the audit, refused or not, without the password', async () => {
    const person = await buildPerson();
    await buildMember(['reviewer'], { person });
    await server
      .visitor()
      .post('/api/session')
      .send({ email: person.email, password: 'wrong and secret words' });
    await server.visitor().post('/api/session').send({ email: person.email, password: TEST_PASSWORD });
    const entries = await AuditEntry.findAll({ order: [['id', 'DESC']], limit: 2 });
    expect(entries.map((entry) => entry.action)).toEqual(['signed-in', 'sign-in-refused']);
    expect(JSON.stringify([entries, server.logLines])).not.toContain('wrong and secret words');
  });
});

describe('a session', () => {
  test('is needed', async () => {
    const response = await server.visitor().get('/api/session');
    expect(response.status).toBe(401);
    expect(response.body.code).toBe('not-signed-in');
  });

  test.each(['elbowroom.sid=garbage', 'elbowroom.sid=s%3Aabc.def', 'elbowroom.sid=%E0%A4%A', '=;;=%%%'])(
    'is not made of the cookie %s',
    async (cookie) => {
      const response = await server.visitor().get('/api/session').set('Cookie', cookie);
      expect(response.status).toBe(401);
    },
  );

  test('ends on signing out, with its sockets', async () => {
    const member = await buildMember(['reviewer']);
    const agent = await server.signIn(member);
    const record = await SessionRecord.findOne({ where: { personId: member.personId }, rejectOnEmpty: true });
    const watch = watchRevocations();
    expect((await agent.delete('/api/session')).status).toBe(204);
    watch.stop();
    expect((await agent.get('/api/session')).status).toBe(401);
    expect(watch.rooms).toContain(`session:${record.sid}`);
    expect(await SessionRecord.count({ where: { personId: member.personId } })).toBe(0);
  });

  test('signing out without one is no error', async () => {
    expect((await server.visitor().delete('/api/session')).status).toBe(204);
  });

  test('ends everywhere at once, in every team', async () => {
    const person = await buildPerson();
    const here = await buildMember(['reviewer'], { person });
    const there = await buildMember(['installer'], { person });
    const phone = await server.signIn(here);
    const desktop = await server.signIn(here);
    const watch = watchRevocations();
    expect((await desktop.delete('/api/sessions')).status).toBe(204);
    watch.stop();
    expect((await phone.get('/api/session')).status).toBe(401);
    expect((await desktop.get('/api/session')).status).toBe(401);
    expect(watch.rooms).toEqual(expect.arrayContaining([`member:${here.id}`, `member:${there.id}`]));
  });

  test('signing out everywhere needs one', async () => {
    expect((await server.visitor().delete('/api/sessions')).status).toBe(401);
  });
});

describe('the current team', () => {
  test('is switched among the teams of the person', async () => {
    const person = await buildPerson();
    const first = await buildMember(['reviewer'], { person, team: await buildTeam({ name: 'A first' }) });
    const second = await buildMember(['administrator'], {
      person,
      team: await buildTeam({ name: 'B second' }),
    });
    const agent = await server.signIn(first);
    const response = await agent.patch('/api/session').send({ teamId: second.teamId });
    expect(response.status).toBe(200);
    expect((await agent.get('/api/session')).body.team.id).toBe(second.teamId);
    expect(response.body.teams.map((team: { name: string }) => team.name)).toEqual(['A first', 'B second']);
  });

  test('is not switched to another one', async () => {
    const agent = await server.signIn(await buildMember(['reviewer']));
    const other = await buildTeam();
    expect((await agent.patch('/api/session').send({ teamId: other.id })).status).toBe(404);
    expect((await agent.patch('/api/session').send({ teamId: 'x' })).status).toBe(400);
    expect((await server.visitor().patch('/api/session').send({ teamId: other.id })).status).toBe(401);
  });
});
