/** The closed list of refusal codes, each with the HTTP status it is answered with. */
export const ERROR_STATUS = {
  invalid: 400,
  'too-deep': 400,
  'wrong-credentials': 401,
  'not-signed-in': 401,
  'wrong-password': 403,
  forbidden: 403,
  'foreign-origin': 403,
  'own-submission': 403,
  'not-found': 404,
  'method-not-allowed': 405,
  conflict: 409,
  'wrong-state': 409,
  'last-administrator': 409,
  'already-there': 409,
  'removed-object': 409,
  'not-placeable': 409,
  'outdated-client': 409,
  expired: 410,
  'too-large': 413,
  'wrong-media-type': 415,
  'limit-reached': 422,
  'too-many': 429,
  internal: 500,
  stopping: 503,
  unavailable: 503,
} as const;

/** One of the closed list of refusal codes. */
export type ErrorCode = keyof typeof ERROR_STATUS;

/** One thing that is wrong, where it is (`path` in dots, empty for the whole) and what to do about it. */
export type Problem = { readonly path: string; readonly message: string };

/** A normal refusal as a value: a code, a sentence for a person, and every problem with its path. */
export type Refusal = {
  readonly code: ErrorCode;
  readonly message: string;
  readonly problems?: readonly Problem[];
};

/** Either a value or a refusal; broken invariants throw instead. */
export type Result<T> =
  { readonly ok: true; readonly value: T } | { readonly ok: false; readonly refusal: Refusal };

/** Wraps a value as a success. */
export function accept<T>(value: T): Result<T> {
  return { ok: true, value };
}

/** Wraps a code and a sentence as a refusal. */
export function refuse<T = never>(
  code: ErrorCode,
  message: string,
  problems?: readonly Problem[],
): Result<T> {
  return { ok: false, refusal: problems ? { code, message, problems } : { code, message } };
}

/**
 * The end of every `switch` on tags.
 * @throws Error always: an unknown tag is a broken invariant.
 */
export function assertNever(tag: never): never {
  throw new Error(`unknown tag ${JSON.stringify(tag)}`);
}
