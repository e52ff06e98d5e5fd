import fc from 'fast-check';
import { valuesEqual } from '@/shared/layout/equality';
import { canonicalJson } from '@/shared/layout/revision-hash';

describe('equal values', () => {
  test('are those with one canonical text', () => {
    fc.assert(
      fc.property(fc.jsonValue(), fc.jsonValue(), (a, b) => {
        expect(valuesEqual(a, b)).toBe(canonicalJson(a) === canonicalJson(b));
        expect(valuesEqual(a, JSON.parse(JSON.stringify(a)))).toBe(true);
      }),
      { seed: 95, numRuns: 400 },
    );
  });

  test.each<[unknown, unknown]>([
    [[], {}],
    [null, {}],
    [{ a: undefined }, {}],
    [{ a: undefined }, { b: undefined }],
    [
      [1, 2],
      [2, 1],
    ],
    ['1', 1],
  ])('%j is not %j', (a, b) => {
    expect(valuesEqual(a, b)).toBe(false);
    expect(valuesEqual(b, a)).toBe(false);
  });
});
