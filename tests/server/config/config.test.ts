import { ConfigError, parseConfig } from '@/server/config/config';

const DATABASES = {
  DATABASE_URL: 'mariadb://app:a@db.example.com/elbowroom',
  DATABASE_OWNER_URL: 'mariadb://owner:b@db.example.com/elbowroom',
};

test('nothing set: a private database, a loopback port and the demo', () => {
  expect(parseConfig({})).toMatchObject({
    port: 8080,
    host: '127.0.0.1',
    database: { kind: 'private' },
    demo: true,
    trustProxy: false,
    client: { kind: 'build' },
    warnings: [],
  });
  expect(parseConfig({ PORT: '', HOST: '' }).port).toBe(8080);
});

test('the demo is only for the private database on a loopback address', () => {
  expect(parseConfig({ DEMO: 'off' }).demo).toBe(false);
  expect(parseConfig({ HOST: '::1' }).demo).toBe(true);
  expect(parseConfig({ HOST: 'localhost' }).demo).toBe(true);
  const open = parseConfig({ HOST: '0.0.0.0', DEMO: 'on' });
  expect(open.demo).toBe(false);
  expect(open.warnings.filter((line) => line.startsWith('HOST'))).toHaveLength(1);
  expect(parseConfig({ ...DATABASES, DEMO: 'on' }).demo).toBe(false);
});

test('another HOST gives one warning', () => {
  expect(parseConfig({ HOST: '192.0.2.1' }).warnings).toHaveLength(1);
});

test.each([
  ['a port that is none', { PORT: '99999' }, 'PORT'],
  ['a port in words', { PORT: 'eighty' }, 'PORT'],
  ['a short secret', { SESSION_SECRET: 'short' }, 'SESSION_SECRET'],
  ['an address of mail that is none', { SMTP_URL: 'mail.example.com' }, 'SMTP_URL'],
  ['a public address that is none', { PUBLIC_URL: 'example.com' }, 'PUBLIC_URL'],
  ['another kind of database', { ...DATABASES, DATABASE_URL: 'postgres://a@b/c' }, 'DATABASE_URL'],
  ['one of the two database users', { DATABASE_URL: DATABASES.DATABASE_URL }, 'DATABASE_OWNER_URL'],
  [
    'the same user twice',
    { ...DATABASES, DATABASE_OWNER_URL: DATABASES.DATABASE_URL },
    'two different users',
  ],
  [
    'two databases',
    { ...DATABASES, DATABASE_OWNER_URL: 'mariadb://owner:b@db.example.com/x' },
    'same server',
  ],
  [
    'no database’s name',
    { DATABASE_URL: 'mariadb://a@h', DATABASE_OWNER_URL: 'mariadb://b@h' },
    'name of the database',
  ],
  ['a switch that is none', { DEMO: 'perhaps' }, 'DEMO'],
])('%s is refused in a line that names it', (_case, environment, name) => {
  const parse = () => parseConfig(environment);
  expect(parse).toThrow(ConfigError);
  expect(parse).toThrow(name);
});

test('a proxy is trusted only as TRUST_PROXY says', () => {
  expect(parseConfig({ TRUST_PROXY: '1' }).trustProxy).toBe(1);
  expect(parseConfig({ TRUST_PROXY: 'loopback' }).trustProxy).toBe('loopback');
  expect(parseConfig({ TRUST_PROXY: 'true' }).trustProxy).toBe(true);
});

test('an https address without a trusted proxy gives a warning about cookies', () => {
  expect(parseConfig({ PUBLIC_URL: 'https://plan.example.com' }).warnings.join()).toContain('Secure');
  expect(parseConfig({ PUBLIC_URL: 'https://plan.example.com', TRUST_PROXY: '1' }).warnings).toEqual([]);
});
