import { QuantityParser } from './parse-quantity';
import { numberAs, withUnit } from './quantity-arithmetic';
import { quantityTokens } from './quantity-tokens';
import { kindOfUnit, type QuantityKind, type UnitSymbol } from './unit-table';

/** What an entry reads as: the number as it is stored, or what is wrong with it and what is expected. */
export type QuantityReading =
  { readonly ok: true; readonly value: number } | { readonly ok: false; readonly message: string };

/** Characters of an entry; more is pasted by mistake. */
const MOST_CHARACTERS = 100;

/** Digits that a result is rounded to: what arithmetic in binary leaves behind them is not meant. */
const DIGITS = 12;

const STORED: Readonly<Record<QuantityKind, UnitSymbol>> = {
  length: 'm',
  frequency: 'Hz',
  power: 'W',
  level: 'dBm',
  angle: '°',
  decibels: 'dB',
  'noise density': 'dBc/Hz',
  gain: 'dBi',
};

const EXPECTED: Readonly<Record<QuantityKind, string>> = {
  length: 'Write a length, such as 310 mm, 0.31 m, 12 in or 5 ft 3 in.',
  frequency: 'Write a frequency, such as 155.5 MHz or 2.4 GHz.',
  power: 'Write a power, such as 25 W, 500 mW or 44 dBm.',
  level: 'Write a level, such as −20 dBm or 10 mW.',
  angle: 'Write an angle, such as 45 or 45°.',
  decibels: 'Write decibels, such as 3 dB.',
  'noise density': 'Write a noise density, such as −150 dBc/Hz.',
  gain: 'Write a gain, such as 2.15 dBi.',
};

/**
 * Reads a number as people write it: with a unit, a decimal comma, feet and inches, fractions, brackets and + - * /.
 * A number without a unit takes `defaultUnit`. The value is in m, Hz, W, dBm, degrees, dB, dBc/Hz or dBi by `kind`,
 * rounded to twelve digits. Nothing is evaluated: a small grammar of our own reads the text.
 *
 * @throws RangeError when `defaultUnit` does not measure `kind` (powers and levels stand for each other).
 */
export function readQuantity(
  text: string,
  kind: QuantityKind,
  defaultUnit: UnitSymbol = STORED[kind],
): QuantityReading {
  checkUnit(kind, defaultUnit);
  const refuse = (problem: string): QuantityReading => ({
    ok: false,
    message: problem === '' ? EXPECTED[kind] : `${problem} ${EXPECTED[kind]}`,
  });
  // The bound comes before anything looks at the text.
  if (text.length > MOST_CHARACTERS) return refuse(`At most ${MOST_CHARACTERS} characters.`);
  if (text.trim() === '') return refuse('');
  const pieces = quantityTokens(text);
  if (!pieces.ok) return refuse(pieces.message);
  const parsed = new QuantityParser(pieces.tokens, kind).parse();
  if (typeof parsed === 'string') return refuse(parsed);
  const measure = parsed.kind === null ? withUnit(parsed, defaultUnit) : parsed;
  if (typeof measure === 'string') return refuse(measure);
  const number = numberAs(measure, kind);
  return typeof number === 'string' ? refuse(number) : { ok: true, value: rounded(number) };
}

/**
 * Holds a unit against a kind.
 *
 * @throws RangeError when the unit measures something else (powers and levels stand for each other).
 */
export function checkUnit(kind: QuantityKind, unit: UnitSymbol): void {
  const measures = kindOfUnit(unit);
  const related = (kind === 'power' && measures === 'level') || (kind === 'level' && measures === 'power');
  if (measures !== kind && !related) throw new RangeError(`${unit} is no unit of ${kind}`);
}

/** To twelve digits, and never a negative zero. */
function rounded(number: number): number {
  return Number(number.toPrecision(DIGITS)) + 0;
}
