import { createLog, describeError, redactAddress } from '@/server/config/logger';

test('an address is written without its query and without tokens', () => {
  const token = 'A1b2-_'.repeat(8);
  expect(redactAddress(`/api/passwords/${token}?x=secret`)).toBe('/api/passwords/[token]');
  expect(redactAddress(`/api/invitations/by-token/${token}/more`)).toBe(
    '/api/invitations/by-token/[token]/more',
  );
  expect(redactAddress('/api/members/0123456789abcdefghjkmnpqrs')).toBe(
    '/api/members/0123456789abcdefghjkmnpqrs',
  );
});

test('a database error is written without its statement and parameters', () => {
  const error = new Error(
    "Duplicate entry 'x'\nsql: INSERT INTO people VALUES (?) - parameters:['hash of a password']",
  );
  const lines: string[] = [];
  createLog('info', { write: (line: string) => lines.push(line) }).error({ err: error }, 'failed');
  expect(lines.join('')).not.toContain('hash of a password');
  expect(describeError(error)).toMatchObject({ type: 'Error', message: "Duplicate entry 'x'" });
});

test('the text of a body that could not be read is not written', () => {
  const error = Object.assign(new SyntaxError('Unexpected token'), { body: '{"password":"secret words"' });
  expect(JSON.stringify(describeError(error))).not.toContain('secret words');
});

test('the cause of an error is written as well', () => {
  expect(describeError(new Error('outer', { cause: new Error('inner') }))).toMatchObject({
    cause: { message: 'inner' },
  });
});
