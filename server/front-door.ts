import {
  createServer,
  type IncomingMessage,
  type RequestListener,
  type Server,
  type ServerResponse,
} from 'node:http';
import type { AddressInfo } from 'node:net';
import type { ProblemDocument } from '@/shared/api/problem';
import type { Config } from './config/config';
import type { Lifecycle } from './lifecycle';
import { StartProblem } from './local/start-problem';

const DRAIN_WITHIN_MS = 10_000;

/** The port: it answers from the first moment, and knows what it still owes an answer. */
export interface FrontDoor {
  readonly http: Server;
  readonly port: number;
  /** Hands requests to the application from now on. */
  open(listener: RequestListener): void;
  /** Waits until every request in hand was answered, but not for ever. */
  drain(): Promise<void>;
  close(): Promise<void>;
}

/**
 * Listens. Until `open`, health says "starting" and everything else gets a page that says so.
 * @throws StartProblem when the port or address cannot be had.
 */
export async function openFrontDoor(config: Config, lifecycle: Lifecycle): Promise<FrontDoor> {
  let listener: RequestListener | undefined;
  const inHand = new Set<ServerResponse>();
  const http = createServer((request, response) => {
    inHand.add(response);
    response.once('close', () => inHand.delete(response));
    if (listener) listener(request, response);
    else answerStarting(request, response, lifecycle.phase);
  });
  http.requestTimeout = 60_000;
  http.headersTimeout = 20_000;
  await listen(http, config);
  return {
    http,
    port: (http.address() as AddressInfo).port,
    open: (next) => {
      listener = next;
    },
    drain: () => waitUntilEmpty(inHand),
    close: () =>
      new Promise((resolve) => {
        http.close(() => resolve());
        http.closeAllConnections();
      }),
  };
}

function listen(http: Server, { host, port }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    http.once('error', (error: NodeJS.ErrnoException) => reject(explainListenError(error, host, port)));
    http.listen(port, host, () => {
      http.removeAllListeners('error');
      resolve();
    });
  });
}

function explainListenError(error: NodeJS.ErrnoException, host: string, port: number): Error {
  switch (error.code) {
    case 'EADDRINUSE':
      return new StartProblem(`Port ${port} on ${host} is taken: stop what uses it, or set PORT to another.`);
    case 'EACCES':
      return new StartProblem(`This user may not listen on port ${port}: set PORT to 1024 or more.`);
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
      return new StartProblem(`HOST ${host} is no address of this machine: set HOST to 127.0.0.1.`);
    default:
      return error;
  }
}

function answerStarting(request: IncomingMessage, response: ServerResponse, status: string): void {
  const path = (request.url ?? '/').split('?', 1)[0] ?? '/';
  const answer =
    path === '/api/health'
      ? { type: 'application/json', body: JSON.stringify({ status }) }
      : path.startsWith('/api/')
        ? { type: 'application/problem+json', body: JSON.stringify(STARTING_PROBLEM) }
        : { type: 'text/html; charset=utf-8', body: STARTING_PAGE };
  response.writeHead(503, {
    'Content-Type': answer.type,
    'Cache-Control': 'no-store',
    'Retry-After': '2',
    Connection: 'close',
  });
  response.end(answer.body);
}

async function waitUntilEmpty(inHand: ReadonlySet<ServerResponse>): Promise<void> {
  const answered = [...inHand].map((response) => new Promise((resolve) => response.once('close', resolve)));
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise((resolve) => {
    timer = setTimeout(resolve, DRAIN_WITHIN_MS);
  });
  await Promise.race([Promise.all(answered), late]);
  clearTimeout(timer);
}

const STARTING_PROBLEM: ProblemDocument = {
  type: 'urn:elbowroom:problem:unavailable',
  title: 'Service Unavailable',
  status: 503,
  detail: 'The server is starting. Try again in a little while.',
  code: 'unavailable',
};

const STARTING_PAGE = `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8" />
    <meta name="viewport" content="width=device-width" />
    <meta http-equiv="refresh" content="2" />
    <title>Elbowroom is starting</title>
    <style>
      body { margin: 20vh auto; max-width: 30em; padding: 0 1em; font: 18px/1.5 sans-serif; background: #f7f4ec; color: #17252e; }
      @media (prefers-color-scheme: dark) { body { background: #10191e; color: #f7f4ec; } }
    </style>
  </head>
  <body>
    <h1>Elbowroom is starting</h1>
    <p>This page looks again every two seconds.</p>
  </body>
</html>
`;
