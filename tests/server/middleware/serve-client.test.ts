import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startTestServer, type TestServer } from '../../support/test-server';

const SCRIPT = `/_expo/static/js/web/entry-${'0123456789abcdef'.repeat(2)}.js`;
const PAGE = '<!doctype html><title>Elbowroom</title>';
let folder: string;
let server: TestServer;
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'elbowroom-client-'));
  mkdirSync(join(folder, '_expo/static/js/web'), { recursive: true });
  writeFileSync(join(folder, 'index.html'), PAGE);
  writeFileSync(join(folder, '.inputs'), 'hash');
  writeFileSync(join(folder, SCRIPT), `// ${'x'.repeat(5000)}`);
  server = await startTestServer({ clientFolder: folder });
});
afterAll(async () => {
  await server.stop();
  rmSync(folder, { recursive: true });
});

test.each(['/', '/jobs', '/jobs/abc%20def?x=1', '/r/0123', '/invitation/abc', '/index.html'])(
  '%s is the page, looked for anew each time',
  async (path) => {
    const response = await fetch(server.url + path);
    expect([response.status, await response.text()]).toEqual([200, PAGE]);
    expect(response.headers.get('cache-control')).toBe('no-cache');
    expect(response.headers.get('content-type')).toMatch('text/html');
  },
);

test('a file with a hash in its name is kept for a year and sent compressed', async () => {
  const response = await fetch(server.url + SCRIPT, { headers: { 'accept-encoding': 'gzip' } });
  expect(response.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
  expect(response.headers.get('content-encoding')).toBe('gzip');
});

test.each([
  '/_expo/static/js/web/missing.js',
  '/assets/missing.ttf',
  '/api/missing',
  '/_expo',
  '/socket.io/x',
])('%s is missing instead of being the page', async (path) => {
  const response = await fetch(server.url + path, { headers: { origin: server.url } });
  expect(response.status).toBeGreaterThanOrEqual(400);
  expect(await response.text()).not.toContain('<!doctype html>');
});

test.each(['/.inputs', '/../package.json', '/%2e%2e/package.json', '/..%2fpackage.json', '/%00'])(
  '%s shows nothing of the folder or beside it',
  async (path) => {
    const response = await fetch(server.url + path);
    const text = await response.text();
    expect(text).not.toContain('hash');
    expect(text).not.toContain('"name"');
    expect(response.status).toBeLessThan(500);
  },
);

test('the page may run only what comes from here, and WebAssembly', async () => {
  const policy = (await fetch(server.url)).headers.get('content-security-policy') ?? '';
  expect(policy).toContain("script-src 'self' 'wasm-unsafe-eval'");
  expect(policy).toContain("connect-src 'self'");
  expect(policy).not.toContain('upgrade-insecure-requests');
});
