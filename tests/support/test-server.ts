import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Server as SocketServer } from 'socket.io';
import { agent as createAgent } from 'supertest';
import { createApp } from '@/server/app';
import { FirstVisit } from '@/server/auth/first-visit';
import { SocketRevocation } from '@/server/auth/socket-revocation';
import { attachCollaboration } from '@/server/collaboration/attach';
import { LiveLayouts } from '@/server/collaboration/live-layouts';
import { parseConfig } from '@/server/config/config';
import { createLog } from '@/server/config/logger';
import { Lifecycle } from '@/server/lifecycle';
import type { Mail } from '@/server/mail/mailer';
import type { RateLimits } from '@/server/middleware/limit-rate';
import { Person } from '@/server/models/person';
import type { Membership } from '@/server/models/membership';
import type { Services } from '@/server/services';
import { createSocketServer } from '@/server/socket-server';
import { TaskWorker } from '@/server/tasks/worker';
import { TEST_PASSWORD } from './factories';
import { createTestDatabase, type TestDatabase } from './test-database';

/** An agent that keeps cookies and says where it comes from, as a page of the server does. */
export type TestAgent = ReturnType<typeof createAgent>;

/** A real server on a free port with a database of its own. */
export interface TestServer {
  readonly database: TestDatabase;
  readonly services: Services;
  readonly lifecycle: Lifecycle;
  readonly http: Server;
  readonly io: SocketServer;
  readonly url: string;
  /** Mail that was sent; `performTasks` sends what waits. */
  readonly outbox: Mail[];
  /** Lines of the log, as JSON. */
  readonly logLines: string[];
  /** An agent that is not signed in. */
  visitor(): TestAgent;
  /** An agent signed in as a member, by the password that factories give. */
  signIn(membership: Membership): Promise<TestAgent>;
  /** Does the tasks that are due, once, until none is. */
  performTasks(): Promise<void>;
  stop(): Promise<void>;
}

/** What a test may choose. */
export interface TestServerOptions {
  readonly demo?: boolean;
  readonly limits?: Partial<RateLimits>;
  readonly publicUrl?: string;
  readonly clientFolder?: string;
}

const WIDE_LIMITS: RateLimits = {
  requestsPerMinute: 100_000,
  attemptsPerAccount: 1000,
  attemptsPerAddress: 10_000,
};

/** Starts a server for one test file; call it in `beforeAll`, and `stop` in `afterAll`. */
export async function startTestServer(options: TestServerOptions = {}): Promise<TestServer> {
  const database = await createTestDatabase();
  const filesFolder = mkdtempSync(join(tmpdir(), 'elbowroom-files-'));
  const outbox: Mail[] = [];
  const logLines: string[] = [];
  const lifecycle = new Lifecycle();
  let url = '';
  const log = createLog('debug', { write: (line: string) => logLines.push(line) });
  const services: Services = {
    config: parseConfig({
      PORT: '0',
      ELBOWROOM_DATA: filesFolder,
      DEMO: options.demo ? 'on' : 'off',
      ELBOWROOM_CLIENT: 'none',
      PUBLIC_URL: options.publicUrl,
    }),
    log,
    sequelize: database.sequelize,
    revocation: new SocketRevocation(),
    live: new LiveLayouts({ sequelize: database.sequelize, log }),
    firstVisit: new FirstVisit(),
    mailer: { send: async (mail) => void outbox.push(mail), close: () => undefined },
    limits: { ...WIDE_LIMITS, ...options.limits },
    sessionSecret: 'a secret that only tests know, long enough',
    filesFolder,
    baseUrl: () => options.publicUrl ?? url,
  };
  const { app, sessionHandlers } = createApp(services, {
    lifecycle,
    ...(options.clientFolder === undefined ? {} : { clientFolder: options.clientFolder }),
  });
  const http = createServer(app);
  const io = createSocketServer(http, services, sessionHandlers);
  const collaboration = attachCollaboration(io, services);
  await new Promise<void>((resolve) => http.listen(0, '127.0.0.1', resolve));
  url = `http://127.0.0.1:${(http.address() as AddressInfo).port}`;
  lifecycle.enter('ready');
  const visitor = () => createAgent(url).set('Origin', url);
  return {
    database,
    services,
    lifecycle,
    http,
    io,
    url,
    outbox,
    logLines,
    visitor,
    signIn: async (membership) => {
      const person = await Person.findByPk(membership.personId, { rejectOnEmpty: true });
      const agent = visitor();
      const response = await agent
        .post('/api/session')
        .send({ email: person.email, password: TEST_PASSWORD });
      if (response.status !== 200)
        throw new Error(`signing in was answered ${response.status}: ${response.text}`);
      if (response.body.team.id !== membership.teamId)
        await agent.patch('/api/session').send({ teamId: membership.teamId });
      return agent;
    },
    performTasks: () => new TaskWorker(services).performDue(),
    stop: async () => {
      lifecycle.enter('stopping');
      await collaboration.drain();
      await io.close();
      http.closeAllConnections();
      await database.drop();
      rmSync(filesFolder, { recursive: true, force: true });
    },
  };
}
