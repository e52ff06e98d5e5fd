import compression from 'compression';
import express, { type Express, type RequestHandler } from 'express';
import helmet from 'helmet';
import { createSessionHandlers } from './auth/session';
import type { Lifecycle } from './lifecycle';
import { answerError } from './middleware/answer-error';
import { guardMediaType, guardOrigin } from './middleware/guard-origin';
import { limitRequests } from './middleware/limit-rate';
import { logRequests } from './middleware/log-requests';
import { readJson } from './middleware/read-json';
import { refuseRequest } from './middleware/refusal-error';
import { refuseWhileStopping } from './middleware/refuse-while-stopping';
import { serveClient } from './middleware/serve-client';
import { createHealthRouter } from './routes/health';
import { listRouters } from './routes/list-routers';
import type { Services } from './services';

/** The application without a socket to listen on. */
export interface Application {
  readonly app: Express;
  /** What makes `request.signedIn`; give the same to Socket.IO's engine, for the handshake. */
  readonly sessionHandlers: readonly RequestHandler[];
}

/** What an application may be given besides its services. */
export interface ApplicationOptions {
  readonly lifecycle: Lifecycle;
  /** A folder with the built client; left out, only the interface is served. */
  readonly clientFolder?: string;
  /** Stands in for the built client, in development. */
  readonly front?: RequestHandler;
}

/** Builds the Express application. */
export function createApp(services: Services, options: ApplicationOptions): Application {
  const { config } = services;
  const app = express();
  const sessionHandlers = createSessionHandlers(services);
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(logRequests(services.log));
  app.use('/api/health', createHealthRouter(services, options.lifecycle));
  app.use(refuseWhileStopping(options.lifecycle));
  if (options.front === undefined)
    app.use(helmet({ contentSecurityPolicy: { directives: CONTENT_SECURITY_POLICY } }));
  app.use(compression());
  app.use(
    '/api',
    limitRequests(services.limits),
    forbidCaching,
    guardOrigin(config),
    guardMediaType(),
    ...sessionHandlers,
    readJson(),
  );
  for (const { path, router } of listRouters(services)) app.use(path, router);
  app.use('/api', () => refuseRequest('not-found', 'There is nothing at this address.'));
  if (options.front) app.use(options.front);
  if (options.clientFolder !== undefined) app.use(serveClient(options.clientFolder));
  app.use(() => refuseRequest('not-found', 'There is nothing at this address.'));
  app.use(answerError());
  return { app, sessionHandlers };
}

// 'self' covers a websocket to the same origin; the solver is WebAssembly in a worker; plain http stays plain.
const CONTENT_SECURITY_POLICY = {
  'default-src': ["'self'"],
  'script-src': ["'self'", "'wasm-unsafe-eval'"],
  'style-src': ["'self'", "'unsafe-inline'"],
  'img-src': ["'self'", 'data:', 'blob:'],
  'font-src': ["'self'", 'data:'],
  'connect-src': ["'self'"],
  'worker-src': ["'self'", 'blob:'],
  'object-src': ["'none'"],
  'frame-ancestors': ["'none'"],
  'base-uri': ["'self'"],
  'form-action': ["'self'"],
  'upgrade-insecure-requests': null,
};

const forbidCaching: RequestHandler = (_request, response, next) => {
  response.setHeader('Cache-Control', 'no-store');
  next();
};
