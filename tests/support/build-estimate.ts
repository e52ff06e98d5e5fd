import type { Estimate, PairResult, PairState } from '@/shared/estimate/estimate-result';

/** A pair with a margin of so many decibels over the 40 that it needs; null where no model holds. */
export function buildPair(
  from: string,
  into: string,
  state: PairState,
  marginDb: number | null,
  overrides: Partial<PairResult> = {},
): PairResult {
  const isolationDb = marginDb === null ? null : 40 + marginDb;
  return {
    from,
    into,
    state,
    model: 'live',
    mechanism: marginDb === null ? null : 'overload',
    frequency: marginDb === null ? null : 155.5e6,
    isolationDb,
    neededDb: 40,
    marginDb,
    mechanisms: [],
    reason: null,
    ...overrides,
  };
}

/** An estimate of these pairs, in the order they are given. */
export function buildEstimate(pairs: readonly PairResult[], overrides: Partial<Estimate> = {}): Estimate {
  const count = (state: PairState) => pairs.filter((pair) => pair.state === state).length;
  return {
    solverVersion: 'test',
    model: 'live',
    assumption: 'infinite flat metal roof',
    pairs,
    antennas: {},
    counts: {
      clear: count('clear'),
      tight: count('tight'),
      lacking: count('lacking'),
      'not held': count('not held'),
      'never together': count('never together'),
    },
    warnings: [],
    ...overrides,
  };
}
