import type { Estimate, PairResult } from '@/shared/estimate/estimate-result';
import type { Agreement } from './editor-snapshot';

/** The same solver on two machines differs by rounding only; a tenth of the last digit shown is a difference. */
const SAME_DB = 0.01;

/** Compares this client's estimate of the confirmed document with the server's for the same sequence number. */
export function compareEstimates(
  own: Estimate | null,
  server: { readonly sequence: number; readonly result: Estimate } | null,
  sequence: number,
): Agreement {
  if (!own || !server || server.sequence !== sequence) return { kind: 'waiting' };
  if (own.solverVersion !== server.result.solverVersion) {
    const message = 'The server computes with another version of the solver. Reload this page.';
    return { kind: 'differs', sequence, message };
  }
  const theirs = new Map(server.result.pairs.map((pair) => [pairKey(pair), pair]));
  const isSame =
    own.pairs.length === theirs.size &&
    own.pairs.every((pair) => {
      const other = theirs.get(pairKey(pair));
      return other !== undefined && samePair(pair, other);
    });
  if (isSame) return { kind: 'confirmed', sequence };
  return { kind: 'differs', sequence, message: 'The server’s estimate of this layout is another one.' };
}

function pairKey({ from, into }: PairResult): string {
  return `${from} ${into}`;
}

function samePair(a: PairResult, b: PairResult): boolean {
  return (
    a.mechanism === b.mechanism &&
    isSameDb(a.isolationDb, b.isolationDb) &&
    isSameDb(a.neededDb, b.neededDb) &&
    isSameDb(a.marginDb, b.marginDb) &&
    (a.state === b.state || isOnTheLine(a, b))
  );
}

/** Two states for margins that differ by rounding only: the margin lies on the boundary. */
function isOnTheLine(a: PairResult, b: PairResult): boolean {
  return a.marginDb !== null && b.marginDb !== null && isSameDb(a.marginDb, b.marginDb);
}

function isSameDb(a: number | null, b: number | null): boolean {
  return a === null || b === null ? a === b : Math.abs(a - b) <= SAME_DB;
}
