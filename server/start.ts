import type { RequestHandler } from 'express';
import type { Server } from 'node:http';
import type { Logger } from 'pino';
import { createApp } from './app';
import { listDemoAccounts } from './auth/demo-accounts';
import { sweepSessions } from './auth/end-sessions';
import { FirstVisit } from './auth/first-visit';
import { SocketRevocation } from './auth/socket-revocation';
import { attachCollaboration } from './collaboration/attach';
import { LiveLayouts } from './collaboration/live-layouts';
import type { Config } from './config/config';
import { openDataFolder, readSessionSecret, type DataFolder } from './config/data-folder';
import { openLog } from './config/logger';
import { loadDemo } from './database/demo/load-demo';
import { openDatabase } from './database/open-database';
import { openFrontDoor } from './front-door';
import { Lifecycle } from './lifecycle';
import { buildClient } from './local/build-client';
import { lockFolder } from './local/lock-folder';
import { startMailCatcher } from './local/mail-catcher';
import { explainFileError } from './local/start-problem';
import { createMailer } from './mail/mailer';
import { DEFAULT_RATE_LIMITS } from './middleware/limit-rate';
import { bindModels } from './models/bind-models';
import { CaughtMail } from './models/caught-mail';
import { Person } from './models/person';
import type { Services } from './services';
import { createSocketServer } from './socket-server';
import { TaskWorker } from './tasks/worker';

const SWEEP_MS = 60_000;

/** What stands in for the built client, in development. */
export interface Front {
  readonly handler: RequestHandler;
  close(): Promise<void>;
}

/** What a start is given besides its settings. */
export interface StartOptions {
  /** Short lines for whoever watches the console. */
  readonly say: (line: string) => void;
  readonly signal: AbortSignal;
  readonly openFront?: (http: Server) => Promise<Front>;
}

/** A server that is ready. */
export interface RunningServer {
  readonly url: string;
  readonly log: Logger;
  /** Ends everything in order: new work, commits, sockets, connections, the database. */
  stop(): Promise<void>;
}

type Undo = () => void | Promise<void>;

/**
 * Starts everything; what was begun is undone when a later step fails or the signal aborts.
 * @throws StartProblem in one line that says what to do.
 */
export async function startServer(config: Config, options: StartOptions): Promise<RunningServer> {
  const undo: Undo[] = [];
  const undoAll = async (log?: Logger) => {
    for (const step of undo.splice(0).reverse()) {
      await Promise.resolve(step()).catch((error: unknown) =>
        log?.error({ err: error }, 'stopping went wrong'),
      );
    }
  };
  try {
    return await startSteps(config, options, undo, undoAll);
  } catch (error) {
    await undoAll();
    throw explainFileError(error, config.dataFolder) ?? error;
  }
}

async function startSteps(
  config: Config,
  options: StartOptions,
  undo: Undo[],
  undoAll: (log: Logger) => Promise<void>,
): Promise<RunningServer> {
  const { say, signal } = options;
  const goOn = () => signal.throwIfAborted();
  const folder = openDataFolder(config.dataFolder);
  const lock = lockFolder(folder.root);
  undo.push(() => lock.release());
  const { log, close: closeLog } = openLog(config);
  undo.push(closeLog);
  const sessionSecret = readSessionSecret(folder, config.sessionSecret);
  const lifecycle = new Lifecycle();
  const door = await openFrontDoor(config, lifecycle);
  undo.push(() => door.close());
  const url = config.publicUrl ?? `http://${formatHost(config.host)}:${door.port}`;
  log.info({ url }, 'starting');
  goOn();

  const database = await openDatabase(config, folder, say, (error) => {
    log.error({ err: error }, 'the database is away');
  });
  undo.push(() => database.close());
  const { sequelize } = database;
  bindModels(sequelize);
  goOn();
  const catcher = config.smtpUrl === undefined ? await startMailCatcher(keepMail) : undefined;
  if (catcher) undo.push(() => catcher.close());
  const mailer = createMailer(config.smtpUrl ?? catcher?.smtpUrl ?? '');
  undo.push(() => mailer.close());
  const services: Services = {
    config,
    log,
    sequelize,
    revocation: new SocketRevocation(),
    live: new LiveLayouts({ sequelize, log }),
    firstVisit: new FirstVisit(),
    mailer,
    limits: DEFAULT_RATE_LIMITS,
    sessionSecret,
    filesFolder: folder.files,
    baseUrl: () => url,
  };
  if (config.demo && (await loadDemo(sequelize, sessionSecret))) say('Loaded the demo scenario.');
  goOn();
  const front = await openFront(config, folder, options, door.http);
  if (front.close) undo.push(front.close);
  goOn();

  const { app, sessionHandlers } = createApp(services, { lifecycle, ...front.serving });
  const io = createSocketServer(door.http, services, sessionHandlers, {
    foreignUpgrades: front.close !== undefined,
  });
  const collaboration = attachCollaboration(io, services);
  const worker = new TaskWorker(services);
  const sweep = setInterval(() => {
    sweepSessions(services, new Date()).catch((error: unknown) =>
      log.warn({ err: error }, 'sessions were not swept'),
    );
  }, SWEEP_MS);
  undo.push(
    () => clearInterval(sweep),
    async () => {
      await io.close();
    },
    () => worker.stop(),
    () => collaboration.drain(),
    () => door.drain(),
    () => lifecycle.enter('stopping'),
  );
  worker.start();
  door.open(app);
  lifecycle.enter('ready');
  log.info({ url }, 'ready');
  await announce(services, url, catcher !== undefined, say);
  return {
    url,
    log,
    stop: async () => {
      log.info('stopping');
      await undoAll(log);
    },
  };
}

async function openFront(config: Config, folder: DataFolder, options: StartOptions, http: Server) {
  if (options.openFront) {
    const front = await options.openFront(http);
    return { serving: { front: front.handler }, close: () => front.close() };
  }
  switch (config.client.kind) {
    case 'build':
      await buildClient({
        folder: folder.client,
        logPath: `${folder.logs}/client-build.log`,
        say: options.say,
        signal: options.signal,
      });
      return { serving: { clientFolder: folder.client } };
    case 'folder':
      return { serving: { clientFolder: config.client.folder } };
    case 'none':
      return { serving: {} };
  }
}

async function announce(services: Services, url: string, keepsMail: boolean, say: (line: string) => void) {
  const { config } = services;
  for (const warning of config.warnings) say(`Warning: ${warning}`);
  if (keepsMail && !config.demo)
    say('Warning: SMTP_URL is not set: mail is kept in the database and not sent.');
  const accounts = await listDemoAccounts(services);
  const lines = accounts.map(
    ({ email, password, roles }) => `  ${email}  ${password}  (${roles.join(', ')})`,
  );
  if (lines.length > 0) lines.unshift('Demo sign-ins:');
  if ((await Person.count()) === 0) {
    lines.push(`First visit: make your team with the code ${services.firstVisit.code}`);
  }
  say([`Elbowroom is ready at ${url}`, ...lines].join('\n'));
}

async function keepMail(message: { recipient: string; subject: string; text: string }): Promise<void> {
  await CaughtMail.create({
    recipient: message.recipient.slice(0, 254),
    subject: message.subject.slice(0, 250),
    body: message.text,
    receivedAt: new Date(),
  });
}

function formatHost(host: string): string {
  if (host === '0.0.0.0' || host === '::') return '127.0.0.1';
  return host.includes(':') ? `[${host}]` : host;
}
