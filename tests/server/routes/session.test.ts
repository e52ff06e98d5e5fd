import { buildMember } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
}, 60_000);
afterAll(() => server.stop());

test('health answers', async () => {
  const response = await server.visitor().get('/api/health');
  expect(response.status).toBe(200);
  expect(response.body).toEqual({ status: 'ok' });
});

test('a member signs in and sees who they are', async () => {
  const member = await buildMember(['integrator']);
  const agent = await server.signIn(member);
  const response = await agent.get('/api/session');
  expect(response.status).toBe(200);
  expect(response.body.member.roles).toEqual(['integrator']);
});
