import { STATUS_CODES } from 'node:http';
import type { ErrorRequestHandler, Request, Response } from 'express';
import { ERROR_STATUS, type ErrorCode, type Refusal } from '@/shared/errors';
import type { ProblemDocument } from '@/shared/api/problem';
import { RefusalError } from './refusal-error';

const DRAIN_LIMIT_BYTES = 64 * 1024 * 1024;

/** How the body parser and Express name what they refuse, and what we answer. */
const KNOWN_ERRORS: Readonly<Record<string, Refusal>> = {
  'entity.too.large': { code: 'too-large', message: 'What was sent is larger than 1 MB.' },
  'entity.parse.failed': { code: 'invalid', message: 'What was sent is not JSON.' },
  'too-deep': { code: 'too-deep', message: 'What was sent is nested too deep.' },
  'charset.unsupported': { code: 'wrong-media-type', message: 'Send JSON in UTF-8.' },
  'encoding.unsupported': { code: 'wrong-media-type', message: 'This content encoding is not known here.' },
  'request.size.invalid': { code: 'invalid', message: 'The request is shorter than it says.' },
};

/** Turns whatever a handler threw into a problem document; an unknown error is logged and answered without details. */
export function answerError(): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (isHangUp(error) || response.writableEnded) {
      request.log.info('the request was given up by its sender');
      response.destroy();
      return;
    }
    const refusal = recognizeRefusal(error);
    if (refusal === undefined) request.log.error({ err: error }, 'unexpected error');
    if (response.headersSent) {
      next(error);
      return;
    }
    if (refusal?.code === 'too-large') drain(request, response);
    answerRefusal(
      request,
      response,
      refusal ?? {
        code: 'internal',
        message: 'Something went wrong here. It has been written down; try again.',
      },
    );
  };
}

/** Answers a refusal as a problem document (RFC 9457). */
export function answerRefusal(request: Request, response: Response, refusal: Refusal): void {
  const status = ERROR_STATUS[refusal.code];
  const document: ProblemDocument = {
    type: `urn:elbowroom:problem:${refusal.code}`,
    title: STATUS_CODES[status] ?? 'Refused',
    status,
    detail: refusal.message,
    code: refusal.code,
    requestId: String(request.id),
    ...(refusal.problems ? { problems: [...refusal.problems] } : {}),
  };
  if (status === 503) response.setHeader('Retry-After', '2');
  response.status(status).type('application/problem+json').send(JSON.stringify(document));
}

function recognizeRefusal(error: unknown): Refusal | undefined {
  if (error instanceof RefusalError) return error.refusal;
  if (typeof error !== 'object' || error === null) return undefined;
  const { type, status, code, name } = error as {
    type?: string;
    status?: number;
    code?: string;
    name?: string;
  };
  const known = type === undefined ? undefined : KNOWN_ERRORS[type];
  if (known) return known;
  if (error instanceof URIError) return { code: 'invalid', message: 'The address is not well formed.' };
  if (isDatabaseAway(name, code)) {
    return {
      code: 'unavailable',
      message: 'The database cannot be reached at the moment; try again in a little while.',
    };
  }
  if (typeof status === 'number' && status >= 400 && status < 500)
    return { code: codeOfStatus(status), message: 'The request is not well formed.' };
  return undefined;
}

function codeOfStatus(status: number): ErrorCode {
  if (status === 404) return 'not-found';
  if (status === 413) return 'too-large';
  if (status === 415) return 'wrong-media-type';
  return 'invalid';
}

function isDatabaseAway(name: string | undefined, code: string | undefined): boolean {
  return (
    /^Sequelize(Connection|HostNot|Access|Invalid)/.test(name ?? '') || code === 'ER_GET_CONNECTION_TIMEOUT'
  );
}

function isHangUp(error: unknown): boolean {
  if (typeof error !== 'object' || error === null) return false;
  const { type, code } = error as { type?: string; code?: string };
  return type === 'request.aborted' || code === 'ECONNRESET' || code === 'EPIPE';
}

// A sender that is still writing would see its connection reset instead of the answer: read on, but not for ever.
function drain(request: Request, response: Response): void {
  response.setHeader('Connection', 'close');
  let left = DRAIN_LIMIT_BYTES;
  request.on('data', (chunk: Buffer) => {
    left -= chunk.length;
    if (left < 0) request.destroy();
  });
  request.resume();
}
