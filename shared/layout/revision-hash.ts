import { sha256 } from '@noble/hashes/sha2';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils';
import canonicalize from 'canonicalize';
import type { LayoutDocument } from './document';

/** What a revision's hash is taken of. `results` is the estimate as it was stored. */
export type RevisionContent = {
  readonly layoutId: string;
  readonly letter: string;
  readonly document: LayoutDocument;
  readonly results: unknown;
  readonly solverVersion: string;
};

/**
 * One JSON text of a value: fields sorted, no spaces, numbers as ECMAScript prints them.
 * @source RFC 8785, JSON Canonicalization Scheme (2020)
 * @throws Error when the value is none of JSON's (undefined, a function, a number that is not finite).
 */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new Error('only JSON values have a canonical text');
  return text;
}

/** SHA-256 of a revision's canonical JSON, 64 hexadecimal digits. */
export function revisionHash(content: RevisionContent): string {
  const { layoutId, letter, document, results, solverVersion } = content;
  return bytesToHex(
    sha256(utf8ToBytes(canonicalJson({ layoutId, letter, document, results, solverVersion }))),
  );
}
