import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { redactAddress } from '../config/logger';

/** Gives every request an id and writes one line about each. */
export function logRequests(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    // The serializers of the log say what is written of a request.
    wrapSerializers: false,
    customLogLevel: (_request, response, error) => {
      if (error || response.statusCode >= 500) return 'error';
      return response.statusCode >= 400 ? 'info' : 'debug';
    },
    customSuccessMessage: (request, response) =>
      `${request.method} ${redactAddress(request.url ?? '')} ${response.statusCode}`,
    customErrorMessage: (request, response) =>
      `${request.method} ${redactAddress(request.url ?? '')} ${response.statusCode}`,
  });
}
