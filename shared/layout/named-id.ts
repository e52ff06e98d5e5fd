import { sha256 } from '@noble/hashes/sha2';
import { utf8ToBytes } from '@noble/hashes/utils';

const ALPHABET = '0123456789abcdefghjkmnpqrstvwxyz';
const ID_LENGTH = 26;

/**
 * An identifier that always belongs to the same name: for what starters and the demo scenario bring along, so
 * that building them twice gives the same document. Everything else gets its identifier from `createId`.
 */
export function idFromName(name: string): string {
  const bytes = sha256(utf8ToBytes(name)).subarray(0, ID_LENGTH);
  return Array.from(bytes, (byte) => ALPHABET.charAt(byte & 31)).join('');
}
