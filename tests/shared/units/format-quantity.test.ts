import fc from 'fast-check';
import { formatQuantity, type ShownUnit } from '@/shared/units/format-quantity';
import { readQuantity } from '@/shared/units/read-quantity';
import type { QuantityKind } from '@/shared/units/unit-table';

const WRITTEN: readonly (readonly [value: number, kind: QuantityKind, text: string, unit?: ShownUnit])[] = [
  [0.31, 'length', '310 mm'],
  [0.31, 'length', '310 mm', 'mm'],
  [0.0015875, 'length', '1.59 mm', 'mm'],
  [0.3048, 'length', '12 in', 'in'],
  [0.31, 'length', '12.205 in', 'in'],
  [0.31, 'length', '0.31 m', 'm'],
  [-0.31, 'length', '−310 mm', 'mm'],
  [-1e-9, 'length', '0 mm', 'mm'],
  [1.6002, 'length', '5 ft 3 in', 'ft in'],
  [1.524, 'length', '5 ft', 'ft in'],
  [0.0762, 'length', '3 in', 'ft in'],
  [0, 'length', '0 in', 'ft in'],
  [-1.6002, 'length', '−5 ft 3 in', 'ft in'],
  [1.52399999, 'length', '5 ft', 'ft in'],
  [155.5e6, 'frequency', '155.5 MHz'],
  [1575.42e6, 'frequency', '1575.42 MHz'],
  [2.4e9, 'frequency', '2400 MHz'],
  [10.5e9, 'frequency', '10.5 GHz'],
  [12.5e3, 'frequency', '12.5 kHz'],
  [50, 'frequency', '50 Hz'],
  [0, 'frequency', '0 Hz'],
  [155.5e6, 'frequency', '0.1555 GHz', 'GHz'],
  [25, 'power', '25 W'],
  [0.5, 'power', '500 mW'],
  [1500, 'power', '1.5 kW'],
  [0, 'power', '0 W'],
  [25.1188643150958, 'power', '25.1189 W'],
  [25.1188643150958, 'power', '44 dBm', 'dBm'],
  [0, 'power', '0 W', 'dBm'],
  [-20, 'level', '−20 dBm'],
  [10, 'level', '10 mW', 'mW'],
  [45, 'angle', '45°'],
  [-0.004, 'angle', '0°'],
  [3.456, 'decibels', '3.46 dB'],
  [-150, 'noise density', '−150 dBc/Hz'],
  [2.15, 'gain', '2.15 dBi'],
  [2.15, 'gain', '0 dBd', 'dBd'],
];

/** Each kind over the sizes it is used in, and what the last digit written stands for there. */
const RANGES: readonly (readonly [QuantityKind, number, number, (value: number) => number, ShownUnit?])[] = [
  ['length', -1000, 1000, () => 1e-5, 'mm'],
  ['length', -1000, 1000, () => 1e-4, 'm'],
  ['length', -1000, 1000, () => 2.54e-5, 'in'],
  ['length', -1000, 1000, () => 2.54e-5, 'ft in'],
  ['frequency', 1e5, 1e11, (value) => 1e-8 * value],
  ['power', 1e-12, 1e4, (value) => 1e-5 * value],
  // a hundredth of a decibel is 0.23 per cent of a power
  ['power', 1e-12, 1e4, (value) => 2.4e-3 * value, 'dBm'],
  ['level', -200, 100, () => 0.01],
  ['angle', -360, 360, () => 0.01],
  ['decibels', -100, 300, () => 0.01],
  ['noise density', -250, 0, () => 0.01],
  ['gain', -50, 50, () => 0.01],
];

describe('writing a quantity', () => {
  test.each(WRITTEN.map(([value, kind, text, unit]) => [value, kind, text, unit] as const))(
    '%d as %s is written %j',
    (value, kind, text, unit) => {
      expect(formatQuantity(value, kind, unit)).toBe(text);
    },
  );

  test.each(RANGES.map(([kind, least, most, last, unit]) => [kind, least, most, last, unit] as const))(
    'what is written of a %s between %d and %d reads back',
    (kind, least, most, last, unit) => {
      fc.assert(
        fc.property(fc.double({ min: least, max: most, noNaN: true }), (value) => {
          const reading = readQuantity(formatQuantity(value, kind, unit), kind);
          // half of the last digit, and a hundredth of it for the binary fractions around the middle
          return reading.ok && Math.abs(reading.value - value) <= 0.51 * last(value);
        }),
        { seed: 19, numRuns: 400 },
      );
    },
  );

  test.each(RANGES.map(([kind, least, most, last, unit]) => [kind, least, most, last, unit] as const))(
    'what is written of a %s between %d and %d is written the same once read',
    (kind, least, most, _last, unit) => {
      fc.assert(
        fc.property(fc.double({ min: least, max: most, noNaN: true }), (value) => {
          const text = formatQuantity(value, kind, unit);
          const reading = readQuantity(text, kind);
          return reading.ok && formatQuantity(reading.value, kind, unit) === text;
        }),
        { seed: 20, numRuns: 400 },
      );
    },
  );

  test('a number that is not finite is never shown as one', () => {
    expect(() => formatQuantity(Number.NaN, 'length')).toThrow(RangeError);
    expect(() => formatQuantity(Number.POSITIVE_INFINITY, 'power')).toThrow(RangeError);
  });

  test('a unit of another kind is a mistake of the caller', () => {
    expect(() => formatQuantity(1, 'length', 'MHz')).toThrow(RangeError);
    expect(() => formatQuantity(1, 'power', 'ft in')).toThrow(RangeError);
  });
});
