import { checkUnit } from './read-quantity';
import {
  levelOfPower,
  powerOfLevel,
  kindOfUnit,
  toUnit,
  type QuantityKind,
  type UnitSymbol,
} from './unit-table';

/** A unit to write in; `ft in` writes both, as in 5 ft 3 in. */
export type ShownUnit = UnitSymbol | 'ft in';

/** Decimals that a tape measure, a signal generator or a power meter can still tell apart. */
const DECIMALS: Readonly<Partial<Record<UnitSymbol, number>>> = {
  m: 4,
  mm: 2,
  cm: 3,
  km: 6,
  in: 3,
  ft: 4,
  yd: 4,
  '°': 2,
  rad: 5,
};

/** Decibels are never known to more than a hundredth. */
const DECIBEL_DECIMALS = 2;

/** Digits of what has no fixed decimals: powers and frequencies over many decades. */
const DIGITS: Readonly<Partial<Record<QuantityKind, number>>> = { power: 6, frequency: 9 };

/** Units by size, the largest first: the first that leaves at least one in front of the point is taken. */
const LADDERS: Readonly<Partial<Record<QuantityKind, readonly UnitSymbol[]>>> = {
  power: ['kW', 'W', 'mW', 'µW', 'nW', 'pW'],
  frequency: ['GHz', 'MHz', 'kHz', 'Hz'],
};

/** Bands are spoken of in megahertz up to here: 1575.42 MHz, but 10.5 GHz. */
const LEAST_IN_GIGAHERTZ = 1e10;

const USUAL: Readonly<Record<QuantityKind, UnitSymbol>> = {
  length: 'mm',
  frequency: 'Hz',
  power: 'W',
  level: 'dBm',
  angle: '°',
  decibels: 'dB',
  'noise density': 'dBc/Hz',
  gain: 'dBi',
};

/**
 * Writes a stored number (m, Hz, W, dBm, degrees, dB, dBc/Hz, dBi) with its unit, without needless digits:
 * `310 mm`, `155.5 MHz`, `−150 dBc/Hz`. `readQuantity` reads it back, within half of the last digit written. Without
 * a unit it takes the one that suits the size.
 *
 * @throws RangeError when the value is not finite, or the unit does not measure the kind.
 */
export function formatQuantity(value: number, kind: QuantityKind, unit?: ShownUnit): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be written as ${kind}`);
  if (unit === 'ft in') {
    if (kind !== 'length') throw new RangeError(`ft in is no unit of ${kind}`);
    return feetAndInches(value);
  }
  const shown = unit ?? suitableUnit(value, kind);
  checkUnit(kind, shown);
  const number = toUnit(storedFor(value, kind, shown), shown);
  // No watts have no level, and a level beyond measure has no watts: what is stored is shown instead.
  if (!Number.isFinite(number)) return formatQuantity(value, kind);
  return `${trimmed(number, shown)}${shown === '°' ? '' : ' '}${shown}`;
}

function suitableUnit(value: number, kind: QuantityKind): UnitSymbol {
  const size = Math.abs(value);
  if (size === 0) return USUAL[kind];
  const ladder = LADDERS[kind] ?? [USUAL[kind]];
  const found = ladder.find((unit) =>
    unit === 'GHz' ? size >= LEAST_IN_GIGAHERTZ : toUnit(size, unit) >= 1,
  );
  return found ?? ladder[ladder.length - 1] ?? USUAL[kind];
}

/** A power as a level where it is to be shown as one, and the other way round. */
function storedFor(value: number, kind: QuantityKind, unit: UnitSymbol): number {
  const shown = kindOfUnit(unit);
  if (kind === 'power' && shown === 'level') return levelOfPower(value);
  if (kind === 'level' && shown === 'power') return powerOfLevel(value);
  return value;
}

function trimmed(number: number, unit: UnitSymbol): string {
  const digits = DIGITS[kindOfUnit(unit)];
  const rounded =
    digits === undefined
      ? Number(number.toFixed(DECIMALS[unit] ?? DECIBEL_DECIMALS))
      : Number(number.toPrecision(digits));
  return signed(rounded);
}

/** 5 ft 3 in; the inches carry what is rounded, so that 12 in never stand beside the feet. */
function feetAndInches(metres: number): string {
  const inches = Number(Math.abs(toUnit(metres, 'in')).toFixed(DECIMALS.in));
  const feet = Math.floor(inches / 12);
  const rest = Number((inches - 12 * feet).toFixed(DECIMALS.in));
  const text = [feet > 0 ? `${feet} ft` : '', rest > 0 || feet === 0 ? `${signed(rest)} in` : ''];
  return `${metres < 0 && inches > 0 ? '−' : ''}${text.filter((part) => part !== '').join(' ')}`;
}

function signed(number: number): string {
  return number < 0 ? `−${-number}` : String(number + 0);
}
