import { Membership } from '@/server/models/membership';
import { Person } from '@/server/models/person';
import { loadDemo } from '@/server/database/demo/load-demo';
import { sessionSchema, setupSchema, type Setup } from '@/shared/api/session';
import { ROLES } from '@/shared/api/fields';
import { startTestServer, type TestServer } from '../../support/test-server';

const VISIT = {
  team: 'Workshop',
  name: 'First Visitor',
  email: 'first@example.com',
  password: 'a first password',
};

describe('an empty database without the demo', () => {
  let server: TestServer;
  beforeEach(async () => {
    server = await startTestServer();
  });
  afterEach(() => server.stop());

  test('greets the first visitor', async () => {
    const response = await server.visitor().get('/api/setup');
    expect(setupSchema.parse(response.body)).toEqual({ state: 'first-visit', demo: false, demoAccounts: [] });
  });

  test('lets the holder of the printed code make the team and its administrator', async () => {
    const agent = server.visitor();
    const { code } = server.services.firstVisit;
    const response = await agent.post('/api/setup').send({ ...VISIT, code: ` ${code.toUpperCase()} ` });
    expect(response.status).toBe(201);
    const session = sessionSchema.parse(response.body);
    expect(session.team.name).toBe('Workshop');
    expect(session.member.roles).toEqual(['administrator']);
    expect(session.abilities.administer).toBe(true);
    expect((await agent.get('/api/session')).status).toBe(200);
    expect((await agent.get('/api/setup')).body.state).toBe('ready');
  });

  test('refuses another code, naming the field', async () => {
    const response = await server
      .visitor()
      .post('/api/setup')
      .send({ ...VISIT, code: 'aaaaa-bbbbb-ccccc' });
    expect(response.status).toBe(403);
    expect(response.body.problems[0].path).toBe('code');
    expect(await Person.count()).toBe(0);
  });

  test('makes one team however many hold the code at once', async () => {
    const { code } = server.services.firstVisit;
    const answers = await Promise.all(
      ['a', 'b', 'c'].map((name) =>
        server
          .visitor()
          .post('/api/setup')
          .send({ ...VISIT, code, email: `${name}@example.com` }),
      ),
    );
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
    expect(await Membership.count()).toBe(1);
    const again = await server
      .visitor()
      .post('/api/setup')
      .send({ ...VISIT, code });
    expect(again.status).toBe(409);
  });

  test('names every field that is wrong', async () => {
    const response = await server
      .visitor()
      .post('/api/setup')
      .send({ code: '', team: ' ', email: 'x', password: 'short' });
    expect(response.status).toBe(400);
    const paths = response.body.problems.map((problem: { path: string }) => problem.path);
    expect(paths).toEqual(['code', 'team', 'name', 'email', 'password']);
  });
});

describe('the demo', () => {
  let server: TestServer;
  let setup: Setup;
  beforeAll(async () => {
    server = await startTestServer({ demo: true });
    await loadDemo(server.database.sequelize, server.services.sessionSecret);
    setup = setupSchema.parse((await server.visitor().get('/api/setup')).body);
  });
  afterAll(() => server.stop());

  test('is loaded into an empty database once', async () => {
    const before = await Person.count();
    expect(await loadDemo(server.database.sequelize, server.services.sessionSecret)).toBe(false);
    expect(await Person.count()).toBe(before);
  });

  test('offers an account for each role, and one with several', () => {
    expect(setup).toMatchObject({ state: 'ready', demo: true });
    for (const role of ROLES)
      expect(setup.demoAccounts.some(({ roles }) => roles.join() === role)).toBe(true);
    expect(setup.demoAccounts.some(({ roles }) => roles.length > 1)).toBe(true);
    expect(setup.demoAccounts.every(({ email }) => email.endsWith('@example.com'))).toBe(true);
  });

  test('offers accounts that sign in', async () => {
    for (const { email, password, roles } of setup.demoAccounts) {
      const response = await server.visitor().post('/api/session').send({ email, password });
      expect(response.status).toBe(200);
      expect(response.body).toMatchObject({ demo: true, member: { roles }, abilities: { seeMails: true } });
    }
  });

  test('no longer offers an account whose password was changed', async () => {
    const account = setup.demoAccounts[0];
    if (account === undefined) throw new Error('there is no demo account');
    const agent = server.visitor();
    await agent.post('/api/session').send({ email: account.email, password: account.password });
    await agent
      .put('/api/account/password')
      .send({ currentPassword: account.password, password: 'a password of my own' });
    const after = setupSchema.parse((await server.visitor().get('/api/setup')).body);
    expect(after.demoAccounts.map(({ email }) => email)).not.toContain(account.email);
  });
});
