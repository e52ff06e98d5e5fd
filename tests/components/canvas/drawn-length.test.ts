import fc from 'fast-check';
import { drawnLength, readLength } from '@/components/canvas/drawn-length';
import {
  gridSpacing,
  roundLengthBelow,
  scaleBarLength,
  UNIT_LENGTH,
  type LengthUnit,
} from '@/components/canvas/round-length';

const unit = fc.constantFrom<LengthUnit>('mm', 'in');

/** Whether a length is 1, 2 or 5 times a power of ten of the unit. */
function isRound(length: number, inUnit: LengthUnit): boolean {
  const value = length / UNIT_LENGTH[inUnit];
  const digit = value / 10 ** Math.floor(Math.log10(value * (1 + 1e-9)));
  return [1, 2, 5].some((round) => Math.abs(digit - round) < 1e-6);
}

describe('a length on the drawing', () => {
  test.each<[number, LengthUnit, string]>([
    [1.25, 'mm', '1250'],
    [0.0254, 'mm', '25.4'],
    [0.02, 'mm', '20'],
    [0.1234, 'mm', '123'],
    [-0.3, 'mm', '−300'],
    [-0.00001, 'mm', '0'],
    [0.3048, 'in', '12.0 in'],
    [-0.0254, 'in', '−1.0 in'],
  ])('%d m in %s is %s', (metres, inUnit, text) => {
    expect(drawnLength(metres, inUnit)).toBe(text);
  });

  test('names its unit where no drawing says it', () => {
    expect(readLength(1.25, 'mm')).toBe('1250 mm');
    expect(readLength(0.3048, 'in')).toBe('12.0 in');
  });
});

describe('a round length', () => {
  test('is the longest of 1, 2 or 5 times a power of ten that fits', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-5, max: 500, noNaN: true }), unit, (most, inUnit) => {
        const length = roundLengthBelow(most, inUnit);
        return isRound(length, inUnit) && length <= most * (1 + 1e-8) && length * 2.5 >= most * (1 - 1e-8);
      }),
      { seed: 1, numRuns: 500 },
    );
  });

  test('that fits exactly is taken', () => {
    for (const length of [0.001, 0.002, 0.005, 0.01, 0.1, 0.2, 1, 5]) {
      expect(roundLengthBelow(length, 'mm')).toBeCloseTo(length, 12);
    }
  });

  test('as a scale bar fits into its room; as a grid stands at least 22 px apart', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 50_000, noNaN: true }), unit, (scale, inUnit) => {
        const [bar, grid] = [scaleBarLength(scale, 120, inUnit), gridSpacing(scale, inUnit)];
        const apart = grid * scale;
        return (
          bar * scale <= 120 * (1 + 1e-6) && isRound(grid, inUnit) && apart >= 22 * (1 - 1e-6) && apart < 56
        );
      }),
      { seed: 2, numRuns: 500 },
    );
  });
});
