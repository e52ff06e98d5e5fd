import type { RequestHandler } from 'express';
import type { IncomingMessage } from 'node:http';
import type { Config } from '../config/config';
import { refuseRequest } from './refusal-error';

/** The settings that say where requests may come from. */
export type OriginSettings = Pick<Config, 'publicUrl' | 'trustProxy'>;

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Refuses an unsafe request from another site's page, and one that says nothing of where it comes from. */
export function guardOrigin(config: OriginSettings): RequestHandler {
  return (request, _response, next) => {
    if (!SAFE_METHODS.has(request.method) && !isSameOrigin(request, config)) {
      refuseRequest('foreign-origin', 'This request does not come from a page of this server.');
    }
    next();
  };
}

/** Refuses a body that is neither JSON nor multipart; a page of another site can send no other without asking first. */
export function guardMediaType(): RequestHandler {
  return (request, _response, next) => {
    const hasBody =
      request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length']) > 0;
    if (hasBody && request.is(['application/json', 'multipart/form-data']) === false) {
      refuseRequest('wrong-media-type', 'Send JSON, or a form with files.');
    }
    next();
  };
}

/**
 * Whether the Origin header names this server: by PUBLIC_URL, by the Host the request was sent to, or by the host
 * that a trusted proxy was asked for. Serves requests as well as Socket.IO's handshake.
 */
export function isSameOrigin(request: IncomingMessage, { publicUrl, trustProxy }: OriginSettings): boolean {
  const { origin } = request.headers;
  if (origin === undefined || !URL.canParse(origin)) return false;
  if (publicUrl !== undefined && new URL(publicUrl).origin === origin) return true;
  const forwarded = trustProxy === false ? undefined : request.headers['x-forwarded-host'];
  const host = (typeof forwarded === 'string' ? forwarded.split(',')[0] : undefined) ?? request.headers.host;
  return host !== undefined && new URL(origin).host === host.trim().toLowerCase();
}
