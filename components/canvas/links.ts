import type { Estimate, PairResult, PairState } from '@/shared/estimate/estimate-result';

/** A line between two antennas that speaks for the worse of their two directions. */
export type Link = {
  readonly key: string;
  /** The antenna that the link is drawn from: the chosen one, else the pair's transmitting side. */
  readonly near: string;
  readonly far: string;
  readonly pair: PairResult;
};

const WORST_SHOWN = 6;
const BADNESS: Readonly<Record<PairState, number>> = {
  lacking: 0,
  'not held': 1,
  tight: 2,
  clear: 3,
  'never together': 4,
};

/** Name of the two directions of a pair in one. */
export function linkKey(one: string, other: string): string {
  return one < other ? `${one} ${other}` : `${other} ${one}`;
}

/**
 * Links to draw, worst first: of the chosen antenna to every neighbour it forms a pair with; without a choice
 * those that need attention (lacking, not held by a model, tight), and the worst pair in any case.
 */
export function linksToDraw(estimate: Estimate | null, chosen: string | null): readonly Link[] {
  if (estimate === null) return [];
  const links = new Map<string, Link>();
  for (const pair of estimate.pairs) {
    if (chosen !== null && pair.from !== chosen && pair.into !== chosen) continue;
    const key = linkKey(pair.from, pair.into);
    const before = links.get(key);
    if (before && !isWorse(pair, before.pair)) continue;
    const near = chosen ?? pair.from;
    links.set(key, { key, near, far: near === pair.from ? pair.into : pair.from, pair });
  }
  const sorted = [...links.values()].sort((one, other) => (isWorse(one.pair, other.pair) ? -1 : 1));
  if (chosen !== null) return sorted;
  const urgent = sorted.filter(({ pair }) => pair.state === 'lacking' || pair.state === 'tight');
  return urgent.length > 0 ? urgent.slice(0, WORST_SHOWN) : sorted.slice(0, 1);
}

/** Whether a pair needs attention more than another: by state, then by margin. */
export function isWorse(pair: PairResult, other: PairResult): boolean {
  const byState = BADNESS[pair.state] - BADNESS[other.state];
  if (byState !== 0) return byState < 0;
  return (pair.marginDb ?? Infinity) < (other.marginDb ?? Infinity);
}
