import { accept, refuse, type Result } from '@/shared/errors';

const MOST_FIELDS = 3;

/** Where the next page of a list begins: the order keys of the last item of this one. */
export function encodeCursor(keys: readonly (string | number)[]): string {
  return Buffer.from(JSON.stringify(keys)).toString('base64url');
}

/** The order keys of a cursor that we gave away; refused when it is none of ours. */
export function decodeCursor(
  cursor: string,
  kinds: readonly ('string' | 'number')[],
): Result<readonly (string | number)[]> {
  const wrong = refuse<readonly (string | number)[]>('invalid', 'The page of this list is not known.', [
    { path: 'cursor', message: 'is not a cursor of this list' },
  ]);
  let keys: unknown;
  try {
    keys = JSON.parse(Buffer.from(cursor, 'base64url').toString());
  } catch (error) {
    if (error instanceof SyntaxError) return wrong;
    throw error;
  }
  if (!Array.isArray(keys) || keys.length !== kinds.length || keys.length > MOST_FIELDS) return wrong;
  const fits = kinds.every((kind, index) => typeof keys[index] === kind && isUsable(keys[index]));
  return fits ? accept(keys as (string | number)[]) : wrong;
}

function isUsable(key: unknown): boolean {
  return typeof key === 'number' ? Number.isSafeInteger(key) && key >= 0 && key < 8.64e15 : true;
}
