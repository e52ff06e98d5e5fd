import { ipKeyGenerator, rateLimit, type Options } from 'express-rate-limit';
import type { Request, RequestHandler } from 'express';
import { normalizeEmail } from '../models/person';
import { answerRefusal } from './answer-error';

/** How often something may be asked. */
export interface RateLimits {
  /** Requests to the interface from one address in a minute. */
  readonly requestsPerMinute: number;
  /** Refused sign-ins, or requests for a new password, for one account from one address in a quarter of an hour. */
  readonly attemptsPerAccount: number;
  /** The same from one address, whatever the account. */
  readonly attemptsPerAddress: number;
}

/** The limits of a running server. */
export const DEFAULT_RATE_LIMITS: RateLimits = {
  requestsPerMinute: 6000,
  attemptsPerAccount: 10,
  attemptsPerAddress: 50,
};

const MINUTE_MS = 60_000;
const QUARTER_HOUR_MS = 15 * MINUTE_MS;

/** Limits requests by address. */
export function limitRequests(limits: RateLimits): RequestHandler {
  return createLimiter({ windowMs: MINUTE_MS, limit: limits.requestsPerMinute, keyGenerator: readAddress });
}

/** Limits guesses at secrets: by account (who is signed in, or the address typed) and address together, and by address alone. Successes do not count. */
export function limitAttempts(limits: RateLimits): RequestHandler[] {
  return [
    createLimiter({
      windowMs: QUARTER_HOUR_MS,
      limit: limits.attemptsPerAddress,
      skipSuccessfulRequests: true,
      keyGenerator: readAddress,
    }),
    createLimiter({
      windowMs: QUARTER_HOUR_MS,
      limit: limits.attemptsPerAccount,
      skipSuccessfulRequests: true,
      keyGenerator: (request) => `${readAddress(request)} ${readAccount(request)}`,
    }),
  ];
}

/** Limits what sends mail: every request counts, whatever its answer. */
export function limitMail(limits: RateLimits): RequestHandler[] {
  return [
    createLimiter({ windowMs: QUARTER_HOUR_MS, limit: limits.attemptsPerAddress, keyGenerator: readAddress }),
    createLimiter({
      windowMs: QUARTER_HOUR_MS,
      limit: limits.attemptsPerAccount,
      keyGenerator: (request) => `${readAddress(request)} ${readAccount(request)}`,
    }),
  ];
}

function createLimiter(options: Partial<Options>): RequestHandler {
  return rateLimit({
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (request, response) => {
      answerRefusal(request, response, {
        code: 'too-many',
        message: 'Too many attempts in a short time. Wait a while and try again.',
      });
    },
    ...options,
  });
}

function readAddress(request: Request): string {
  return ipKeyGenerator(request.ip ?? '');
}

function readAccount(request: Request): string {
  if (request.signedIn) return request.signedIn.person.id;
  const body: unknown = request.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : undefined;
  return typeof email === 'string' ? normalizeEmail(email).slice(0, 254) : '';
}
