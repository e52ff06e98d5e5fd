import express, { type RequestHandler } from 'express';
import type { IncomingMessage } from 'node:http';

const BODY_LIMIT_BYTES = 1024 * 1024;
const DEPTH_LIMIT = 64;
const OPENING = new Set([0x7b, 0x5b]);
const CLOSING = new Set([0x7d, 0x5d]);
const QUOTE = 0x22;
const BACKSLASH = 0x5c;

/** Reads a JSON body of at most 1 MB and 64 levels; `__proto__` keys are left to the strict schemas to refuse. */
export function readJson(): RequestHandler {
  return express.json({
    limit: BODY_LIMIT_BYTES,
    strict: true,
    verify: (_request: IncomingMessage, _response, body: Buffer) => {
      if (measureDepth(body) > DEPTH_LIMIT) throw Object.assign(new Error('too deep'), { type: 'too-deep' });
    },
  });
}

/** How deep brackets are nested in a JSON text, not counting those within strings. */
export function measureDepth(json: Uint8Array): number {
  let depth = 0;
  let deepest = 0;
  let quoted = false;
  for (let index = 0; index < json.length; index += 1) {
    const byte = json[index] as number;
    if (quoted) {
      if (byte === BACKSLASH) index += 1;
      else if (byte === QUOTE) quoted = false;
    } else if (byte === QUOTE) quoted = true;
    else if (OPENING.has(byte)) deepest = Math.max(deepest, (depth += 1));
    else if (CLOSING.has(byte)) depth -= 1;
  }
  return deepest;
}
