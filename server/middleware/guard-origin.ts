import type { RequestHandler } from 'express';
import type { IncomingMessage } from 'node:http';
import { refuseRequest } from './refusal-error';

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Refuses an unsafe request from another site's page, and one that says nothing of where it comes from. */
export function guardOrigin(publicUrl: string | undefined): RequestHandler {
  return (request, _response, next) => {
    if (!SAFE_METHODS.has(request.method) && !isSameOrigin(request, publicUrl)) {
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
 * Whether the Origin header names this server: PUBLIC_URL when it is set, otherwise the Host the request was
 * sent to. Serves requests as well as Socket.IO's handshake.
 */
export function isSameOrigin(request: IncomingMessage, publicUrl: string | undefined): boolean {
  const { origin, host } = request.headers;
  if (origin === undefined || !URL.canParse(origin)) return false;
  if (publicUrl !== undefined && new URL(publicUrl).origin === origin) return true;
  return host !== undefined && new URL(origin).host === host.toLowerCase();
}
