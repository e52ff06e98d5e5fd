import { compareEstimates } from '@/components/editor/compare-estimates';
import type { Estimate } from '@/shared/estimate/estimate-result';
import { estimateByDistance } from '@/tests/support/distance-estimator';
import { vanRoof } from '@/tests/support/van-roof';

const own = estimateByDistance(vanRoof());

function shifted(byDb: number): Estimate {
  return {
    ...own,
    pairs: own.pairs.map((pair) => ({ ...pair, isolationDb: (pair.isolationDb ?? 0) + byDb })),
  };
}

test('rounding between two machines is no difference, a hundredth of a decibel and more is', () => {
  expect(compareEstimates(own, { sequence: 3, result: shifted(0.009) }, 3).kind).toBe('confirmed');
  expect(compareEstimates(own, { sequence: 3, result: shifted(0.02) }, 3).kind).toBe('differs');
});

test('a pair that one of the two lacks is a difference', () => {
  expect(compareEstimates(own, { sequence: 3, result: { ...own, pairs: own.pairs.slice(1) } }, 3).kind).toBe(
    'differs',
  );
});

test('another state of the same margin is rounding at its boundary, of another margin a difference', () => {
  const tight = own.pairs.map((pair) => ({ ...pair, state: 'tight' as const }));
  expect(compareEstimates(own, { sequence: 3, result: { ...own, pairs: tight } }, 3).kind).toBe('confirmed');
  const notHeld = own.pairs.map((pair) => ({ ...pair, state: 'not held' as const, marginDb: null }));
  expect(compareEstimates(own, { sequence: 3, result: { ...own, pairs: notHeld } }, 3).kind).toBe('differs');
});

test('an estimate of an earlier sequence number says nothing yet', () => {
  expect(compareEstimates(own, { sequence: 2, result: own }, 3)).toEqual({ kind: 'waiting' });
  expect(compareEstimates(null, { sequence: 3, result: own }, 3)).toEqual({ kind: 'waiting' });
});
