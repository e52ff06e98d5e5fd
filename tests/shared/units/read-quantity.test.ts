import fc from 'fast-check';
import { readQuantity } from '@/shared/units/read-quantity';
import type { QuantityKind, UnitSymbol } from '@/shared/units/unit-table';

/** Twelve digits are kept, so that a result may differ by half of the twelfth. */
const TWELVE_DIGITS = 5e-12;

type Example = readonly [text: string, kind: QuantityKind, value: number, unit?: UnitSymbol];

const READ: readonly Example[] = [
  ['12 in', 'length', 0.3048],
  ['12in', 'length', 0.3048],
  ['310 mm', 'length', 0.31],
  ['310 MM', 'length', 0.31],
  ['31 cm', 'length', 0.31],
  ['0.31 m', 'length', 0.31],
  ['0,31 m', 'length', 0.31],
  ['.5 in', 'length', 0.0127],
  [',5 in', 'length', 0.0127],
  ['3.1e-1 m', 'length', 0.31],
  ['250 µm', 'length', 0.00025],
  ['250 um', 'length', 0.00025],
  ['5 ft 3 in', 'length', 1.6002],
  ['5ft3in', 'length', 1.6002],
  [`5' 3"`, 'length', 1.6002],
  ['5′ 3″', 'length', 1.6002],
  ['5’ 3”', 'length', 1.6002],
  ["5' 3''", 'length', 1.6002],
  ['5 feet 3 inches', 'length', 1.6002],
  [`-5' 3"`, 'length', -1.6002],
  ['−5 ft 3 in', 'length', -1.6002],
  ['5 ft 3 1/2 in', 'length', 1.6129],
  ['5 ft 1/2 in', 'length', 1.5367],
  ['1 m 20 cm 5 mm', 'length', 1.205],
  ['1/4 in', 'length', 0.00635],
  ['1⁄4 in', 'length', 0.00635],
  ['5 1/2 in', 'length', 0.1397],
  ['5½ in', 'length', 0.1397],
  ['½ in', 'length', 0.0127],
  ['(1/2 + 1/4) in', 'length', 0.01905],
  ['300 mm + 1/2 in', 'length', 0.3127],
  ['300 mm - 12 mm', 'length', 0.288],
  ['2 * (3 in + 1 in)', 'length', 0.2032],
  ['2 × 3 in', 'length', 0.1524],
  ['12 in / 4', 'length', 0.0762],
  ['1 m ÷ 4', 'length', 0.25],
  ['5 ft 3 in / 2', 'length', 0.8001],
  [`5' - 3"`, 'length', 1.4478],
  ['5 - 1/2', 'length', 0.0045, 'mm'],
  ['310', 'length', 0.31, 'mm'],
  ['310', 'length', 310],
  ['12', 'length', 0.3048, 'in'],
  ['0.1 + 0.2', 'length', 0.3],
  ['100 / 3', 'length', 0.846666666667, 'in'],
  ['310\u202fmm', 'length', 0.31],
  [' \t310\u00a0mm ', 'length', 0.31],
  ['--5 mm', 'length', 0.005],
  ['155.5 MHz', 'frequency', 155.5e6],
  ['155,5 MHz', 'frequency', 155.5e6],
  ['156,800 MHz', 'frequency', 156.8e6],
  ['155.5mhz', 'frequency', 155.5e6],
  ['155.5', 'frequency', 155.5e6, 'MHz'],
  ['2.4 GHz', 'frequency', 2.4e9],
  ['12.5 kHz', 'frequency', 12.5e3],
  ['1575.42 MHz + 2 kHz', 'frequency', 1575.422e6],
  ['25 W', 'power', 25],
  ['500 mW', 'power', 0.5],
  ['1.5 kW', 'power', 1500],
  ['1/2 W', 'power', 0.5],
  ['30 dBm', 'power', 1],
  ['44 dBm', 'power', 25.1188643150958],
  ['14 dBW', 'power', 25.1188643150958],
  ['44 dBm - 3 dB', 'power', 12.5892541179417],
  ['25 W - 10 dB', 'power', 2.5],
  ['44', 'power', 25.1188643150958, 'dBm'],
  ['-107', 'level', -107],
  ['−107 dBm', 'level', -107],
  ['10 mW', 'level', 10],
  ['1 pW', 'level', -90],
  ['-20 dBW', 'level', 10],
  ['3 dB + 44 dBm', 'level', 47],
  ['45', 'angle', 45],
  ['45°', 'angle', 45],
  ['45 deg', 'angle', 45],
  ['1 rad', 'angle', 57.2957795130823],
  ['360/7', 'angle', 51.4285714285714],
  ['3', 'decibels', 3],
  ['3 dB', 'decibels', 3],
  ['2 * 1.5 dB + 0.4 dB', 'decibels', 3.4],
  ['44 dBm - 41 dBm', 'decibels', 3],
  ['-150', 'noise density', -150],
  ['−150 dBc/Hz', 'noise density', -150],
  ['-150 dbc / hz', 'noise density', -150],
  ['-150 dBc/Hz - 6 dB', 'noise density', -156],
  ['2.15 dBi', 'gain', 2.15],
  ['0 dBd', 'gain', 2.15],
  ['-3 dBi + 1 dB', 'gain', -2],
];

const REFUSED: readonly (readonly [text: string, kind: QuantityKind, part: string])[] = [
  ['', 'length', 'Write a length, such as'],
  [' \u00a0\t', 'frequency', 'Write a frequency, such as'],
  ['abc', 'length', '“abc” is not a number'],
  ['NaN', 'length', '“NaN” is not a number'],
  ['Infinity mm', 'length', 'not a number'],
  ['3 kg', 'length', '“kg” is not a unit known here'],
  ['25 W', 'frequency', 'A power does not belong here'],
  ['25 W', 'length', 'such as 310 mm'],
  ['155 MHz', 'power', 'A frequency does not belong here'],
  ['2 dB', 'gain', 'A ratio in decibels does not belong here'],
  ['25 MW', 'power', '“MW” is not a unit known here'],
  ['1 mHz', 'frequency', '“mHz” is not a unit known here'],
  ['-150 dBc', 'noise density', 'write dBc/Hz'],
  ['1e999', 'length', 'too large'],
  ['1e308 * 10', 'length', 'too large'],
  ['1e308 km', 'length', 'too large'],
  ['4000 dBm', 'power', 'too large'],
  ['1/0', 'length', 'divides by zero'],
  ['5 mm / (2 - 2)', 'length', 'divides by zero'],
  ['5 1/0 in', 'length', 'divides by zero'],
  ['5 ft 1/0 in', 'length', 'divides by zero'],
  ['9'.repeat(101), 'length', 'At most 100 characters'],
  ['('.repeat(21) + '1', 'length', 'At most 20 brackets'],
  ['(1', 'length', 'not closed'],
  ['1)', 'length', 'no opening one'],
  ['()', 'length', 'A number is missing'],
  ['1 +', 'length', 'missing at the end'],
  ['* 3', 'length', 'A number is missing before “*”'],
  ['mm', 'length', 'A number is missing before “mm”'],
  ['1 2', 'length', 'missing between “1” and “2”'],
  ['2 (3)', 'length', 'needs a sign'],
  ['1 mm mm', 'length', 'two units'],
  ['(1 mm) mm', 'length', 'two units'],
  ['2 mm * 3 mm', 'length', 'Only one part of a product'],
  ['6 mm / (3 mm)', 'length', 'Divide by a number without a unit'],
  ['1 + 2 in', 'length', 'the unit of every part'],
  ['5 ft 3', 'length', 'the unit of every part'],
  ['3 in 5 ft', 'length', 'the larger unit first'],
  ['5 ft 3 MHz', 'length', 'the larger unit first'],
  ['2 * 5 ft 3 in', 'length', 'into brackets'],
  [`5'-3"`, 'length', 'without a dash'],
  [`5'-3 1/2"`, 'length', 'without a dash'],
  ['5-1/2 in', 'length', 'Write 5 1/2 without a dash'],
  ['1,250 mm', 'length', 'Write 1.250 or 1250'],
  ['1,500 W', 'power', 'Write 1.500 or 1500'],
  ['1,575.42 MHz', 'frequency', 'groups the digits'],
  ['1.2.3', 'length', 'not a number'],
  ['44 dBm + 44 dBm', 'power', 'does not add'],
  ['2 * 44 dBm', 'power', 'In a product a level means nothing'],
  ['(44 dBm) * 2', 'power', 'A level cannot be multiplied'],
  ['25 W + 3 mm', 'power', 'cannot be added'],
  ['3 dB - 44 dBm', 'level', 'cannot be subtracted'],
  ['0 W', 'level', 'above 0 W'],
  ['-1 W', 'level', 'above 0 W'],
  ['<script>', 'length', '“<” has no meaning here'],
  ['2^3', 'length', '“^” has no meaning here'],
  ['a'.repeat(40), 'length', `“${'a'.repeat(16)}…”`],
];

describe('reading a quantity', () => {
  test.each(READ.map(([text, kind, value, unit]) => [text, kind, value, unit] as const))(
    '%j as %s is %d',
    (text, kind, value, unit) => {
      const reading = readQuantity(text, kind, unit);
      if (!reading.ok) throw new Error(reading.message);
      expect(Math.abs(reading.value - value)).toBeLessThanOrEqual(TWELVE_DIGITS * Math.abs(value));
    },
  );

  test.each(REFUSED)('%j as %s is refused: %s', (text, kind, part) => {
    const reading = readQuantity(text, kind);
    expect(reading.ok).toBe(false);
    if (reading.ok) return;
    expect(reading.message).toContain(part);
    expect(reading.message).toMatch(/Write .*, such as /);
  });

  test('a result carries twelve digits, without what binary arithmetic leaves behind them', () => {
    expect(readQuantity('0.1 + 0.2', 'length')).toEqual({ ok: true, value: 0.3 });
    expect(readQuantity('1 / 3', 'length')).toEqual({ ok: true, value: 0.333333333333 });
  });

  test('zero has no sign', () => {
    const reading = readQuantity('-0 mm', 'length');
    expect(reading.ok && Object.is(reading.value, 0)).toBe(true);
  });

  test('a default unit of another kind is a mistake of the caller', () => {
    expect(() => readQuantity('3', 'length', 'W')).toThrow(RangeError);
  });

  test('any text at all is answered with a finite number or a sentence', () => {
    const pieces = fc.constantFrom(
      ...'0123456789.,+-*/() \'"'.split(''),
      ...['ft', 'in', 'mm', 'dBm', 'dB', 'W', 'e9', '½', '−', 'dBc/Hz', 'kg', '\u0000', '😀'],
    );
    const kind = fc.constantFrom<QuantityKind>('length', 'frequency', 'power', 'level', 'angle', 'gain');
    const text = fc.oneof(
      fc.string({ maxLength: 120 }),
      fc.array(pieces, { maxLength: 40 }).map((all) => all.join('')),
    );
    fc.assert(
      fc.property(text, kind, (entry, asked) => {
        const reading = readQuantity(entry, asked);
        return reading.ok ? Number.isFinite(reading.value) : reading.message.length > 20;
      }),
      { seed: 17, numRuns: 3000 },
    );
  });

  test('arithmetic on lengths agrees with arithmetic on their numbers', () => {
    const number = fc.integer({ min: 1, max: 9999 });
    fc.assert(
      fc.property(number, number, number, (a, b, c) => {
        const reading = readQuantity(`(${a} mm + ${b} mm) * ${c} / 7 - ${b} mm`, 'length');
        const expected = (((a + b) * c) / 7 - b) / 1000;
        // the difference of two numbers as large as (a + b) c / 7 keeps twelve digits of the larger
        return reading.ok && Math.abs(reading.value - expected) <= TWELVE_DIGITS * ((a + b) * c);
      }),
      { seed: 18, numRuns: 500 },
    );
  });
});
