import { z } from 'zod';
import { ApiProblem, describeError, fieldProblems, Unreachable } from '@/components/api/api-problem';
import { request } from '@/components/api/request';
import { setSessionRenewal } from '@/components/api/session-renewal';
import { done, refused, StubApi } from '@/tests/support/stub-api';

const THINGS = 'GET /api/things';
const schema = z.strictObject({ name: z.string() });
const expired = refused('not-signed-in', 'Sign in first.');

afterEach(() => setSessionRenewal(null));

/** The error that a request ends with. */
async function errorOf(promise: Promise<unknown>): Promise<unknown> {
  return promise.then(
    () => {
      throw new Error('the request succeeded');
    },
    (error: unknown) => error,
  );
}

describe('a request', () => {
  test('answers with what the server said', async () => {
    new StubApi().prepare(THINGS, done({ name: 'Whip' }));
    expect(await request('GET', '/api/things', { schema })).toEqual({ name: 'Whip' });
  });

  test('sends its body as JSON', async () => {
    const api = new StubApi().prepare('PATCH /api/things/1', done({ name: 'Dipole' }));
    await request('PATCH', '/api/things/1', { body: { name: 'Dipole' }, schema });
    expect(api.sentTo('PATCH /api/things/1')).toEqual([{ name: 'Dipole' }]);
  });

  test('that is refused carries the code, every problem and its path', async () => {
    const problems = [
      { path: 'body.name', message: 'is empty' },
      { path: '', message: 'Nothing was changed.' },
    ];
    new StubApi().prepare(THINGS, refused('invalid', 'This does not hold.', problems));
    const error = await errorOf(request('GET', '/api/things'));
    if (!(error instanceof ApiProblem)) throw error;
    expect([error.code, error.status]).toEqual(['invalid', 400]);
    expect(fieldProblems(error)).toEqual([problems[0]]);
    expect(describeError(error)).toBe('This does not hold. Nothing was changed.');
  });

  test('that does not arrive says so, and that nothing is lost', async () => {
    new StubApi().prepare(THINGS, 'unreachable');
    const error = await errorOf(request('GET', '/api/things'));
    expect(error).toBeInstanceOf(Unreachable);
    expect(describeError(error)).toContain('nothing typed is lost');
  });

  test('answered by something that is not our server is out of reach, not understood somehow', async () => {
    new StubApi().prepare(THINGS, { status: 502, body: '<html>Bad gateway</html>' });
    expect(await errorOf(request('GET', '/api/things'))).toBeInstanceOf(Unreachable);
  });
});

describe('a request after the session ran out', () => {
  test('is sent again once somebody has signed in in place', async () => {
    const api = new StubApi().prepare(THINGS, expired, done({ name: 'Whip' }));
    setSessionRenewal(async () => true);
    expect(await request('GET', '/api/things', { schema })).toEqual({ name: 'Whip' });
    expect(api.sentTo(THINGS)).toHaveLength(2);
  });

  test('is refused when that is put aside', async () => {
    new StubApi().prepare(THINGS, expired);
    setSessionRenewal(async () => false);
    expect(await errorOf(request('GET', '/api/things'))).toMatchObject({ code: 'not-signed-in' });
  });

  test('asks once, not for ever', async () => {
    const api = new StubApi().prepare(THINGS, expired);
    let asked = 0;
    setSessionRenewal(async () => {
      asked += 1;
      return true;
    });
    expect(await errorOf(request('GET', '/api/things'))).toMatchObject({ code: 'not-signed-in' });
    expect([asked, api.sentTo(THINGS).length]).toEqual([1, 2]);
  });
});
