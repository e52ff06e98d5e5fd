import { compare, hash } from 'bcryptjs';

const COST = 10;
// Made by us with far more than enough randomness, so that a slow hash adds nothing but waiting.
const RANDOM_PASSWORD_COST = 5;
// The hash of a random password that nobody kept: comparing with it takes as long as comparing with a real one.
let dummyHash: Promise<string> | undefined;

/** Hashes a password of at most 72 bytes. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

/** Hashes a password that was drawn at random. */
export function hashRandomPassword(password: string): Promise<string> {
  return hash(password, RANDOM_PASSWORD_COST);
}

/** Whether the password fits the hash; takes as long when there is no account. */
export async function verifyPassword(password: string, passwordHash: string | undefined): Promise<boolean> {
  if (Buffer.byteLength(password) > 72) return false;
  if (passwordHash === undefined) {
    dummyHash ??= hash(crypto.randomUUID(), COST);
    await compare(password, await dummyHash);
    return false;
  }
  return compare(password, passwordHash);
}
