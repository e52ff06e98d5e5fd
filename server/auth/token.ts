import { createHash, randomBytes } from 'node:crypto';

const TOKEN_BYTES = 32;

/** A secret for a link (256 random bits, base64url). */
export function makeToken(): string {
  return randomBytes(TOKEN_BYTES).toString('base64url');
}

/** What is kept of a token: its SHA-256, in hexadecimal. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
