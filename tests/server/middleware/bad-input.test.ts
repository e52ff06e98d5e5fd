import { request as sendRequest } from 'node:http';
import { connect } from 'node:net';
import { problemSchema } from '@/shared/api/problem';
import { buildMember } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());
afterEach(async () => {
  expect((await server.visitor().get('/api/health')).status).toBe(200);
});

function post(body: string, headers: Record<string, string> = {}) {
  return fetch(`${server.url}/api/session`, {
    method: 'POST',
    body,
    headers: { origin: server.url, 'content-type': 'application/json', ...headers },
  });
}

async function readProblem(response: Response) {
  expect(response.headers.get('content-type')).toMatch('application/problem+json');
  const problem = problemSchema.parse(await response.json());
  expect(problem.requestId).toBe(response.headers.get('x-request-id'));
  expect(problem.status).toBe(response.status);
  return problem.code;
}

test.each([
  ['a foreign origin', { origin: 'http://elsewhere.example.com' }, 403, 'foreign-origin'],
  ['a null origin', { origin: 'null' }, 403, 'foreign-origin'],
  ['a form’s media type', { 'content-type': 'application/x-www-form-urlencoded' }, 415, 'wrong-media-type'],
  ['plain text', { 'content-type': 'text/plain' }, 415, 'wrong-media-type'],
  ['another charset', { 'content-type': 'application/json; charset=iso-8859-1' }, 415, 'wrong-media-type'],
  ['an unknown encoding', { 'content-encoding': 'unheard-of' }, 415, 'wrong-media-type'],
] as const)('%s is refused', async (_case, headers, status, code) => {
  const response = await post('{"email":"a@example.com","password":"x"}', headers);
  expect(response.status).toBe(status);
  expect(await readProblem(response)).toBe(code);
});

test('an unsafe request without an origin is refused', async () => {
  const response = await fetch(`${server.url}/api/session`, { method: 'DELETE' });
  expect([response.status, await readProblem(response)]).toEqual([403, 'foreign-origin']);
});

test.each([
  ['no JSON', '{"email":', 400, 'invalid'],
  ['a bare word', '"word"', 400, 'invalid'],
  ['a list', '[]', 400, 'invalid'],
  ['nested a thousand deep', '['.repeat(1000) + ']'.repeat(1000), 400, 'too-deep'],
  ['objects nested a thousand deep', '{"a":'.repeat(1000) + '1' + '}'.repeat(1000), 400, 'too-deep'],
  ['a prototype', '{"__proto__":{"email":"a@example.com"}}', 400, 'invalid'],
] as const)('a body that is %s is refused', async (_case, body, status, code) => {
  const response = await post(body);
  expect([response.status, await readProblem(response)]).toEqual([status, code]);
});

test('brackets within a string are no nesting', async () => {
  const response = await post(JSON.stringify({ email: 'a@example.com', password: '['.repeat(150) + '\\"{' }));
  expect(response.status).toBe(401);
});

test('a body of 50 MB gets its answer, announced or not', async () => {
  const large = `{"email":"${'x'.repeat(50 * 1024 * 1024)}"}`;
  const announced = await post(large);
  expect([announced.status, await readProblem(announced)]).toEqual([413, 'too-large']);
  const status = await new Promise<number | undefined>((resolve, reject) => {
    const request = sendRequest(`${server.url}/api/session`, {
      method: 'POST',
      headers: { origin: server.url, 'content-type': 'application/json', 'transfer-encoding': 'chunked' },
    });
    request.on('response', (response) => resolve(response.resume().statusCode));
    request.on('error', reject);
    for (let count = 0; count < 50; count += 1) request.write('x'.repeat(1024 * 1024));
    request.end();
  });
  expect(status).toBe(413);
});

describe('every way in that takes a body', () => {
  const id = '0123456789abcdefghjkmnpqrs';
  const ways = [
    ['POST', '/api/jobs'],
    ['PATCH', `/api/jobs/${id}`],
    ['POST', `/api/jobs/${id}/platforms`],
    ['PATCH', `/api/platforms/${id}`],
    ['POST', `/api/platforms/${id}/layouts`],
    ['POST', '/api/parts'],
    ['PUT', `/api/parts/${id}`],
    ['PATCH', `/api/parts/${id}`],
    ['PATCH', `/api/layouts/${id}`],
    ['POST', `/api/layouts/${id}/comments`],
    ['POST', `/api/layouts/${id}/revisions`],
    ['POST', `/api/comments/${id}/replies`],
    ['PATCH', `/api/comments/${id}`],
    ['POST', `/api/revisions/${id}/return`],
    ['POST', `/api/revisions/${id}/freeze`],
    ['POST', `/api/revisions/${id}/comments`],
  ] as const;
  const large = `{"name":"${'x'.repeat(50 * 1024 * 1024)}"}`;
  const deep = `{"content":${'{"a":'.repeat(1000)}1${'}'.repeat(1000)}}`;
  const send = (method: string, path: string, body: string) =>
    fetch(`${server.url}${path}`, {
      method,
      body,
      headers: { origin: server.url, 'content-type': 'application/json' },
    });

  test.each(ways)('%s %s refuses 50 MB and a thousand levels', async (method, path) => {
    const tooLarge = await send(method, path, large);
    expect([tooLarge.status, await readProblem(tooLarge)]).toEqual([413, 'too-large']);
    const tooDeep = await send(method, path, deep);
    expect([tooDeep.status, await readProblem(tooDeep)]).toEqual([400, 'too-deep']);
  });

  test('bodies that are no objects are refused with a path', async () => {
    const agent = await server.signIn(await buildMember(['integrator']));
    for (const body of ['[]', '{"content":[]}', '{"content":null}', '{"content":{"kind":"antenna"}}']) {
      const response = await agent.post('/api/parts').type('json').send(body);
      expect(response.status).toBe(400);
      expect(problemSchema.parse(response.body).problems?.length).toBeGreaterThan(0);
    }
  });
});

test.each(['/api/%E0%A4%A', '/api/members/%00', '/api/nothing', '/api/invitations/by-token/%ff'])(
  'the address %s is a 4xx',
  async (path) => {
    const response = await fetch(`${server.url}${path}`);
    expect(response.status).toBeGreaterThanOrEqual(400);
    expect(response.status).toBeLessThan(500);
    await readProblem(response);
  },
);

test('a sender that hangs up in the middle of its body harms nobody', async () => {
  const { port } = new URL(server.url);
  for (let count = 0; count < 20; count += 1) {
    await new Promise<void>((resolve) => {
      const socket = connect(Number(port), '127.0.0.1', () => {
        socket.write(
          `POST /api/session HTTP/1.1\r\nHost: 127.0.0.1:${port}\r\nOrigin: ${server.url}\r\n` +
            'Content-Type: application/json\r\nContent-Length: 1000\r\n\r\n{"email"',
          () => socket.destroy(),
        );
      });
      socket.on('close', () => resolve());
    });
  }
  expect(server.logLines.filter((line) => line.includes('unexpected error'))).toEqual([]);
});

test('an unknown error is written down with its request and answered without details', async () => {
  const agent = await server.signIn(await buildMember(['administrator']));
  const failing = jest
    .spyOn(server.database.sequelize, 'transaction')
    .mockRejectedValueOnce(new Error('secret detail'));
  const response = await agent.post('/api/invitations').send({ email: 'a@example.com', roles: ['reviewer'] });
  failing.mockRestore();
  expect(response.status).toBe(500);
  expect(response.text).not.toContain('secret detail');
  const line = server.logLines.find((text) => text.includes('secret detail'));
  expect(line).toContain(response.body.requestId);
});
