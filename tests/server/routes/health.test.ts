import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeEach(async () => {
  server = await startTestServer({ limits: { requestsPerMinute: 5 } });
});
afterEach(() => server.stop());

test('health asks the database and is not limited', async () => {
  for (let count = 0; count < 10; count += 1) {
    const response = await server.visitor().get('/api/health');
    expect([response.status, response.body]).toEqual([200, { status: 'ok' }]);
  }
  const limited = [];
  for (let count = 0; count < 6; count += 1) limited.push((await server.visitor().get('/api/setup')).status);
  expect(limited).toEqual([200, 200, 200, 200, 200, 429]);
});

test('health is 503 without the database, and nothing else falls over', async () => {
  await server.database.sequelize.close();
  const response = await server.visitor().get('/api/health');
  expect([response.status, response.body]).toEqual([503, { status: 'without database' }]);
  const setup = await server.visitor().get('/api/setup');
  expect(setup.status).toBeGreaterThanOrEqual(500);
  expect(JSON.stringify(setup.body)).not.toMatch(/sequelize|ConnectionManager/i);
});

test('health is 503 while stopping, and new work is refused', async () => {
  server.lifecycle.enter('stopping');
  expect((await server.visitor().get('/api/health')).body).toEqual({ status: 'stopping' });
  const response = await server.visitor().get('/api/setup');
  expect([response.status, response.body.code]).toEqual([503, 'stopping']);
});
