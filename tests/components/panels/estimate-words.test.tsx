import {
  countsLine,
  frequencyText,
  headlineOf,
  pairBasis,
  pairMargin,
} from '@/components/panels/estimate-words';
import { buildEstimate, buildPair } from '@/tests/support/build-estimate';

const labelOf = (id: string) => id.toUpperCase();
const RULE = { code: 'never-together', message: 'An interlock keeps them apart.' };
const REASON = { code: 'raised', message: 'It stands on a plane of its own.' };

describe('the one sentence that matters', () => {
  test.each([
    [buildPair('a2', 'a3', 'lacking', -8.3), 'A2 into A3 lacks 8 dB'],
    [buildPair('a2', 'a3', 'lacking', -0.02), 'A2 into A3 lacks 0.1 dB'],
    [buildPair('a2', 'a3', 'tight', 3.2), 'A2 into A3 is tight, 3 dB left'],
    [buildPair('a2', 'a3', 'tight', 0), 'A2 into A3 is tight, 0 dB left'],
    [buildPair('a2', 'a3', 'clear', 20), 'All clear, A2 into A3 has 20 dB left'],
    [buildPair('a2', 'a3', 'not held', null, { reason: REASON }), 'A2 into A3 is not held'],
  ])('names the pair and what it comes to', (pair, sentence) => {
    expect(headlineOf(buildEstimate([pair]), labelOf)).toEqual({ state: pair.state, sentence, pair });
  });

  test('speaks of the worst pair, never of one that is never together', () => {
    const pairs = [
      buildPair('a', 'b', 'never together', -60, { reason: RULE }),
      buildPair('a', 'c', 'clear', 9),
      buildPair('c', 'a', 'lacking', -1),
      buildPair('b', 'c', 'lacking', -4),
    ];
    expect(headlineOf(buildEstimate(pairs), labelOf).sentence).toBe('B into C lacks 4 dB');
  });

  test('speaks of what is judged before what no model holds, and does not call that clear', () => {
    const open = buildPair('a', 'b', 'not held', null, { reason: REASON });
    const sentenceOf = (...pairs: Parameters<typeof buildEstimate>[0]) =>
      headlineOf(buildEstimate(pairs), labelOf).sentence;
    expect(sentenceOf(open, buildPair('a', 'c', 'tight', 5))).toBe('A into C is tight, 5 dB left');
    expect(sentenceOf(open, buildPair('a', 'c', 'clear', 21))).toBe(
      'Clear where held, A into C has 21 dB left',
    );
    expect(sentenceOf(open)).toBe('A into B is not held');
  });

  test('says what is missing where there is nothing to judge', () => {
    expect(headlineOf(null, labelOf)).toEqual({
      state: null,
      sentence: 'The estimate is on its way',
      pair: null,
    });
    expect(headlineOf(buildEstimate([]), labelOf).sentence).toBe(
      'Two radios on the plan make the first pair',
    );
    const apart = [buildPair('a', 'b', 'never together', null, { reason: RULE })];
    expect(headlineOf(buildEstimate(apart), labelOf).sentence).toBe('No pair needs to be judged');
  });
});

describe('what the rest comes to', () => {
  test('is counted with the model and what it assumes', () => {
    const pairs = [
      buildPair('a', 'b', 'lacking', -1),
      buildPair('b', 'a', 'clear', 9),
      buildPair('a', 'c', 'clear', 9),
    ];
    expect(countsLine(buildEstimate(pairs))).toBe(
      '1 lacking, 2 clear. Live estimate, infinite flat metal roof.',
    );
  });

  test('of a pair is its isolation, frequency and mechanism, or why there is no number', () => {
    expect(pairBasis(buildPair('a', 'b', 'tight', 3.4))).toBe('43 dB at 155.5 MHz, overload');
    expect(pairBasis(buildPair('a', 'b', 'not held', null, { reason: REASON }))).toBe(REASON.message);
    expect(pairBasis(buildPair('a', 'b', 'never together', null, { reason: RULE }))).toBe(RULE.message);
  });

  test('shows no margin where none is held', () => {
    expect(pairMargin(buildPair('a', 'b', 'not held', 30, { reason: REASON }))).toBe('not held');
    expect(pairMargin(buildPair('a', 'b', 'never together', 30))).toBe('–');
    expect(pairMargin(buildPair('a', 'b', 'clear', 12.4))).toBe('+12');
  });
});

test.each([
  [155.5e6, '155.5 MHz'],
  [156.8e6, '156.8 MHz'],
  [1575.42e6, '1575 MHz'],
  [2.4e9, '2400 MHz'],
  [10.5e9, '10.5 GHz'],
])('%d Hz in short is %s', (hertz, text) => {
  expect(frequencyText(hertz)).toBe(text);
});
