import fc from 'fast-check';
import { linkKey, linksToDraw } from '@/components/canvas/links';
import { marginText, pillText } from '@/components/canvas/margin-text';
import { speakAntenna, worstPairOf } from '@/components/canvas/spoken-antenna';
import type { PairResult } from '@/shared/estimate/estimate-result';
import { buildEstimate, buildPair as pair } from '@/tests/support/build-estimate';
import { vanRoof } from '@/tests/support/van-roof';

const estimateOf = (...pairs: readonly PairResult[]) => buildEstimate(pairs);

describe('links on the plan', () => {
  test('speak for the worse of their two directions', () => {
    const links = linksToDraw(estimateOf(pair('a', 'b', 'tight', 3), pair('b', 'a', 'lacking', -2)), null);
    expect(links.map(({ key, near, far, pair: worst }) => [key, near, far, worst.marginDb])).toEqual([
      ['a b', 'b', 'a', -2],
    ]);
    expect(linkKey('b', 'a')).toBe('a b');
  });

  test('without a choice are those that need attention, at most six, worst first', () => {
    const many = Array.from({ length: 9 }, (_, index) => pair(`a${index}`, 'b', 'lacking', -index));
    const margins = linksToDraw(estimateOf(...many, pair('x', 'y', 'clear', 20)), null).map(
      ({ pair: { marginDb } }) => marginDb,
    );
    expect(margins).toEqual([-8, -7, -6, -5, -4, -3]);
  });

  test('show the worst pair when all are clear', () => {
    const links = linksToDraw(estimateOf(pair('a', 'b', 'clear', 20), pair('a', 'c', 'clear', 12)), null);
    expect(links.map(({ key }) => key)).toEqual(['a c']);
  });

  test('of a chosen antenna go to every neighbour it forms a pair with', () => {
    const estimate = estimateOf(
      pair('a', 'b', 'clear', 20),
      pair('c', 'a', 'tight', 2),
      pair('b', 'c', 'lacking', -9),
    );
    expect(linksToDraw(estimate, 'a').map(({ near, far }) => [near, far])).toEqual([
      ['a', 'c'],
      ['a', 'b'],
    ]);
  });

  test('are none before there is an estimate', () => {
    expect(linksToDraw(null, null)).toEqual([]);
  });
});

describe('a margin in words', () => {
  test.each([
    [12.4, '+12'],
    [-7.6, '−8'],
    [5.96, '+5.9'],
    [6, '+6'],
    [-0.02, '−0.1'],
    [0, '0'],
    [0.34, '+0.3'],
    [-0.5, '−0.5'],
  ])('of %d dB is %s', (marginDb, text) => {
    expect(marginText(marginDb)).toBe(text);
  });

  test('never tells another state than the margin: below 0 lacking, below 6 tight', () => {
    const stateOf = (margin: number) => (margin < 0 ? 'lacking' : margin < 6 ? 'tight' : 'clear');
    fc.assert(
      fc.property(fc.double({ min: -80, max: 200, noNaN: true }), (margin) => {
        const shown = Number(marginText(margin).replace('−', '-'));
        return stateOf(shown) === stateOf(margin) && Math.abs(shown - margin) <= 0.5;
      }),
      { seed: 1, numRuns: 2000 },
    );
  });

  test('gives way to words where there is no number to hold', () => {
    expect(pillText(pair('a', 'b', 'lacking', -8))).toEqual({ first: '−8', second: '32 dB' });
    expect(pillText(pair('a', 'b', 'not held', 30))).toEqual({ first: 'not held', second: null });
    expect(pillText(pair('a', 'b', 'never together', null))).toEqual({
      first: 'never together',
      second: null,
    });
  });
});

describe('an antenna to a screen reader', () => {
  const [a1, a2] = Object.values(vanRoof().antennas).sort((one, other) =>
    one.label.localeCompare(other.label),
  );
  if (!a1 || !a2) throw new Error('the van roof has no antennas');
  const labelOf = (id: string) => (id === a2.id ? 'A2' : 'A1');

  test('is its mark, its name, its position and its worst margin', () => {
    const estimate = estimateOf(pair(a1.id, a2.id, 'clear', 20), pair(a2.id, a1.id, 'lacking', -8));
    expect(speakAntenna(a1, estimate, 'mm', labelOf)).toBe(
      'A1 Whip A1, x 500 mm, y −300 mm, worst margin −8 dB from A2, lacking',
    );
  });

  test('says when no model holds, and when there is nothing to judge', () => {
    expect(speakAntenna(a1, estimateOf(pair(a1.id, a2.id, 'not held', null)), 'in', labelOf)).toBe(
      'A1 Whip A1, x 19.7 in, y −11.8 in, worst margin not held',
    );
    expect(speakAntenna(a1, null, 'mm', labelOf)).toContain('no pairs to judge');
  });

  test('counts what is never together as no pair', () => {
    const estimate = estimateOf(pair(a1.id, a2.id, 'never together', -40), pair(a2.id, a1.id, 'clear', 9));
    expect(worstPairOf(a1.id, estimate)?.state).toBe('clear');
  });
});
