import type { IncomingMessage } from 'node:http';
import { isSameOrigin } from '@/server/middleware/guard-origin';

function same(
  headers: Record<string, string>,
  settings: { publicUrl?: string; trustProxy?: boolean } = {},
): boolean {
  return isSameOrigin({ headers } as unknown as IncomingMessage, {
    publicUrl: settings.publicUrl,
    trustProxy: settings.trustProxy ?? false,
  });
}

test.each([
  ['the host itself', { origin: 'http://127.0.0.1:8080', host: '127.0.0.1:8080' }, true],
  ['the host, spelled in capitals', { origin: 'http://plan.example.com', host: 'PLAN.example.com' }, true],
  ['another port', { origin: 'http://127.0.0.1:8081', host: '127.0.0.1:8080' }, false],
  ['another host', { origin: 'http://elsewhere.example.com', host: '127.0.0.1:8080' }, false],
  [
    'a host that only begins alike',
    { origin: 'http://plan.example.com.evil.example', host: 'plan.example.com' },
    false,
  ],
  ['nothing', { host: '127.0.0.1:8080' }, false],
  ['null', { origin: 'null', host: '127.0.0.1:8080' }, false],
  ['no address', { origin: 'http://', host: '' }, false],
])('an origin of %s', (_case, headers, expected) => {
  expect(same(headers as unknown as Record<string, string>)).toBe(expected);
});

test('the public address counts, whatever host a proxy asks for', () => {
  const headers = { origin: 'https://plan.example.com', host: '127.0.0.1:8080' };
  expect(same(headers)).toBe(false);
  expect(same(headers, { publicUrl: 'https://plan.example.com' })).toBe(true);
  expect(
    same({ ...headers, origin: 'http://plan.example.com' }, { publicUrl: 'https://plan.example.com' }),
  ).toBe(false);
});

test('a forwarded host counts only from a trusted proxy', () => {
  const headers = {
    origin: 'http://plan.example.com',
    host: '127.0.0.1',
    'x-forwarded-host': 'plan.example.com, inner',
  };
  expect(same(headers)).toBe(false);
  expect(same(headers, { trustProxy: true })).toBe(true);
});
