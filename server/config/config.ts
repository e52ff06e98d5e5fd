import { resolve } from 'node:path';
import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65535);
const url = (protocols: readonly string[]) =>
  z.string().refine((text) => URL.canParse(text) && protocols.includes(new URL(text).protocol), {
    message: `must be an address that starts with ${protocols.join(' or ')}//`,
  });
const flag = z.enum(['on', 'off', 'true', 'false', '1', '0', 'yes', 'no']).transform((text) => {
  return ['on', 'true', '1', 'yes'].includes(text);
});

/** Every setting, with its default. An empty variable counts as absent. */
const environmentSchema = z.object({
  PORT: port.default(8080),
  HOST: z.string().min(1).default('127.0.0.1'),
  ELBOWROOM_DATA: z.string().min(1).default('.data'),
  DATABASE_URL: url(['mariadb:', 'mysql:']).optional(),
  DATABASE_OWNER_URL: url(['mariadb:', 'mysql:']).optional(),
  SMTP_URL: url(['smtp:', 'smtps:']).optional(),
  PUBLIC_URL: url(['http:', 'https:']).optional(),
  TRUST_PROXY: z.string().min(1).optional(),
  SESSION_SECRET: z.string().min(32).optional(),
  DEMO: flag.optional(),
  ELBOWROOM_CLIENT: z.string().min(1).default('build'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
});

/** Where the rows live: an instance of our own, or an existing server with its two users. */
export type DatabaseSetting =
  | { readonly kind: 'private' }
  | { readonly kind: 'external'; readonly applicationUrl: string; readonly ownerUrl: string };

/** Where the web client comes from: built here, a folder that already holds it, or nowhere. */
export type ClientSetting =
  | { readonly kind: 'build' }
  | { readonly kind: 'folder'; readonly folder: string }
  | { readonly kind: 'none' };

/** The settings of one process. */
export interface Config {
  readonly port: number;
  readonly host: string;
  readonly dataFolder: string;
  readonly database: DatabaseSetting;
  readonly smtpUrl: string | undefined;
  readonly publicUrl: string | undefined;
  readonly trustProxy: boolean | number | string;
  readonly sessionSecret: string | undefined;
  readonly demo: boolean;
  readonly client: ClientSetting;
  readonly logLevel: z.infer<typeof environmentSchema>['LOG_LEVEL'];
  readonly warnings: readonly string[];
}

/** A setting that cannot be used; each line names one setting and what to do. */
export class ConfigError extends Error {
  constructor(readonly lines: readonly string[]) {
    super(lines.join('\n'));
    this.name = 'ConfigError';
  }
}

/**
 * Reads the settings from an environment.
 * @throws ConfigError when a setting is unusable.
 */
export function parseConfig(environment: Readonly<Record<string, string | undefined>>): Config {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''));
  const parsed = environmentSchema.safeParse(given);
  if (!parsed.success) {
    throw new ConfigError(parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`));
  }
  const settings = parsed.data;
  const database = parseDatabase(settings.DATABASE_URL, settings.DATABASE_OWNER_URL);
  const loopback = isLoopback(settings.HOST);
  const demoAllowed = database.kind === 'private' && loopback;
  const warnings: string[] = [];
  if (!loopback) {
    warnings.push(
      `HOST is ${settings.HOST}: other machines can reach this server; put TLS in front of it and set PUBLIC_URL.`,
    );
  }
  if (settings.PUBLIC_URL?.startsWith('https:') && settings.TRUST_PROXY === undefined) {
    warnings.push('PUBLIC_URL is https, but TRUST_PROXY is not set: session cookies are not marked Secure.');
  }
  if (settings.DEMO === true && !demoAllowed) {
    warnings.push('DEMO is left off: it is only for the private database on a loopback address.');
  }
  return {
    port: settings.PORT,
    host: settings.HOST,
    dataFolder: resolve(settings.ELBOWROOM_DATA),
    database,
    smtpUrl: settings.SMTP_URL,
    publicUrl: settings.PUBLIC_URL?.replace(/\/+$/, ''),
    trustProxy: parseTrustProxy(settings.TRUST_PROXY),
    sessionSecret: settings.SESSION_SECRET,
    demo: demoAllowed && (settings.DEMO ?? true),
    client: parseClient(settings.ELBOWROOM_CLIENT),
    logLevel: settings.LOG_LEVEL,
    warnings,
  };
}

/** Whether an address is one that only this machine can reach. */
export function isLoopback(host: string): boolean {
  return host === 'localhost' || host === '::1' || /^127(\.\d{1,3}){3}$/.test(host);
}

function parseDatabase(applicationUrl: string | undefined, ownerUrl: string | undefined): DatabaseSetting {
  if (applicationUrl === undefined && ownerUrl === undefined) return { kind: 'private' };
  if (applicationUrl === undefined || ownerUrl === undefined) {
    throw new ConfigError([
      'DATABASE_URL and DATABASE_OWNER_URL belong together: the first is the application, which must not be able to change saved revisions; the second migrates.',
    ]);
  }
  const application = new URL(applicationUrl);
  const owner = new URL(ownerUrl);
  const problems: string[] = [];
  if (application.pathname.length < 2)
    problems.push('DATABASE_URL: the name of the database is missing at the end.');
  if (application.pathname !== owner.pathname || application.host !== owner.host) {
    problems.push('DATABASE_URL and DATABASE_OWNER_URL must name the same server and database.');
  }
  if (application.username === owner.username) {
    problems.push('DATABASE_URL and DATABASE_OWNER_URL must name two different users.');
  }
  if (problems.length > 0) throw new ConfigError(problems);
  return { kind: 'external', applicationUrl, ownerUrl };
}

function parseTrustProxy(text: string | undefined): boolean | number | string {
  if (text === undefined || text === 'false' || text === 'off') return false;
  if (text === 'true' || text === 'on') return true;
  return /^\d+$/.test(text) ? Number(text) : text;
}

function parseClient(text: string): ClientSetting {
  if (text === 'build' || text === 'none') return { kind: text };
  return { kind: 'folder', folder: resolve(text) };
}
