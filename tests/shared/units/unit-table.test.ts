import { unit } from 'mathjs';
import {
  findUnit,
  fromUnit,
  kindOfUnit,
  levelOfPower,
  powerOfLevel,
  toUnit,
  UNIT_SYMBOLS,
  type UnitSymbol,
} from '@/shared/units/unit-table';

/** Both sides are products of exact factors; a few roundings of a double stay below this. */
const ROUNDING = 1e-14;

/** The stored unit of each linear kind, and our names that the reference library spells differently. */
const STORED: Readonly<Record<string, string>> = { length: 'm', frequency: 'Hz', power: 'W', angle: 'deg' };
const SPELLED: Readonly<Partial<Record<UnitSymbol, string>>> = {
  '°': 'deg',
  µm: 'um',
  µW: 'uW',
};

describe('the table of units', () => {
  const linear = UNIT_SYMBOLS.filter((symbol) => STORED[kindOfUnit(symbol)] !== undefined);

  test.each(linear)('%s is what the unit library says it is', (symbol) => {
    const stored = STORED[kindOfUnit(symbol)] ?? '';
    const reference = unit(1, SPELLED[symbol] ?? symbol).toNumber(stored);
    expect(Math.abs(fromUnit(1, symbol) / reference - 1)).toBeLessThan(ROUNDING);
  });

  test.each(UNIT_SYMBOLS)('%s is found by its own name, and converts there and back', (symbol) => {
    expect(findUnit(symbol)).toBe(symbol);
    expect(toUnit(fromUnit(7, symbol), symbol)).toBeCloseTo(7, 12);
  });

  test('a megawatt is not taken for a milliwatt', () => {
    expect(findUnit('MW')).toBeNull();
    expect(findUnit('mW')).toBe('mW');
  });

  test('one milliwatt is 0 dBm and one watt 30 dBm', () => {
    expect(levelOfPower(1e-3)).toBeCloseTo(0, 12);
    expect(levelOfPower(1)).toBe(30);
    expect(powerOfLevel(0)).toBeCloseTo(1e-3, 15);
    expect(fromUnit(0, 'dBW')).toBe(30);
  });
});
