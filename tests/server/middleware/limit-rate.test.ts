import { buildMember, buildPerson, TEST_PASSWORD } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeEach(async () => {
  server = await startTestServer({ limits: { attemptsPerAccount: 3, attemptsPerAddress: 6 } });
});
afterEach(() => server.stop());

async function attempt(email: string, password = 'not the right one'): Promise<number> {
  return (await server.visitor().post('/api/session').send({ email, password })).status;
}

test('refused sign-ins are limited for an account, however it is spelled, and other accounts go on', async () => {
  const statuses = [];
  for (let count = 0; count < 4; count += 1) statuses.push(await attempt('a@example.com'));
  expect(statuses).toEqual([401, 401, 401, 429]);
  expect(await attempt(' A@example.com')).toBe(429);
  expect(await attempt('b@example.com')).toBe(401);
});

test('refused sign-ins are limited for an address, whatever the account', async () => {
  const statuses = [];
  for (let count = 0; count < 7; count += 1) statuses.push(await attempt(`${count}@example.com`));
  expect(statuses).toEqual([401, 401, 401, 401, 401, 401, 429]);
});

test('sign-ins that succeed do not count', async () => {
  const person = await buildPerson();
  await buildMember(['reviewer'], { person });
  for (let count = 0; count < 8; count += 1) expect(await attempt(person.email, TEST_PASSWORD)).toBe(200);
});

test('asking for new passwords is limited, with the same answers whether the account exists or not', async () => {
  const person = await buildPerson();
  for (const email of [person.email, 'nobody@example.com']) {
    const statuses = [];
    for (let count = 0; count < 3; count += 1) {
      statuses.push((await server.visitor().post('/api/passwords/forgotten').send({ email })).status);
    }
    expect(statuses).toEqual([202, 202, 202]);
  }
  const response = await server.visitor().post('/api/passwords/forgotten').send({ email: person.email });
  expect([response.status, response.body.code]).toEqual([429, 'too-many']);
  expect(response.headers['retry-after']).toBeDefined();
});
