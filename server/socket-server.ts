import type { RequestHandler } from 'express';
import type { IncomingMessage, Server as HttpServer, ServerResponse } from 'node:http';
import { Server as SocketServer } from 'socket.io';
import { isSameOrigin } from './middleware/guard-origin';
import type { Services } from './services';

const MESSAGE_LIMIT_BYTES = 1024 * 1024;

type EngineRequest = IncomingMessage & { _query?: { sid?: string } };

/**
 * Makes the socket server on the same port: a handshake from another site's page is refused, and carries the
 * session (`socket.request.signedIn`, `socket.request.sessionID`).
 */
export function createSocketServer(
  http: HttpServer,
  services: Services,
  sessionHandlers: readonly RequestHandler[],
  options: { readonly foreignUpgrades?: boolean } = {},
): SocketServer {
  const io = new SocketServer(http, {
    serveClient: false,
    // In development another server takes the upgrades that are not ours.
    destroyUpgrade: !options.foreignUpgrades,
    maxHttpBufferSize: MESSAGE_LIMIT_BYTES,
    // CORS settings do not guard websockets.
    allowRequest: (request, answer) => {
      const allowed = isSameOrigin(request, services.config);
      answer(allowed ? null : 'foreign origin', allowed);
    },
  });
  for (const handler of sessionHandlers) io.engine.use(onHandshake(handler));
  return io;
}

// Later requests of a connection carry its `sid` and were let in before.
function onHandshake(handler: RequestHandler) {
  return (request: EngineRequest, response: ServerResponse, next: (error?: unknown) => void) => {
    if (request._query?.sid !== undefined) return next();
    handler(request as Parameters<RequestHandler>[0], response as Parameters<RequestHandler>[1], next);
  };
}
