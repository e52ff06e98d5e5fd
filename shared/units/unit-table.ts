import { INCH } from './constants';

/** What a number can be a measure of; the names stand in messages as they are. */
export type QuantityKind =
  'length' | 'frequency' | 'power' | 'level' | 'angle' | 'decibels' | 'noise density' | 'gain';

type Unit = {
  readonly kind: QuantityKind;
  /** Stored value of one unit: SI, degrees for angles, dBm, dBc/Hz, dBi and dB as they are. */
  readonly factor: number;
  /** Added after the factor; not zero between units of one decibel scale only. */
  readonly offset?: number;
  /** Other ways people write it. Upper and lower case count: a careless `MW` must not become `mW`. */
  readonly also?: readonly string[];
};

/** dBm of one dBW: 10 lg(1 W / 1 mW); exact. */
const DBM_OF_DBW = 30;

/**
 * Gain of a half-wave dipole over an isotropic antenna, dB: 10 lg 1.643.
 * @source Kraus, Antennas (1950): directivity of the thin half-wave dipole, 1.64 (value from memory)
 */
const DBI_OF_DBD = 2.15;

const UNITS = {
  m: { kind: 'length', factor: 1, also: ['metre', 'metres', 'meter', 'meters'] },
  mm: {
    kind: 'length',
    factor: 1e-3,
    also: ['MM', 'millimetre', 'millimetres', 'millimeter', 'millimeters'],
  },
  cm: {
    kind: 'length',
    factor: 1e-2,
    also: ['CM', 'centimetre', 'centimetres', 'centimeter', 'centimeters'],
  },
  km: { kind: 'length', factor: 1e3 },
  µm: { kind: 'length', factor: 1e-6, also: ['um', 'μm'] },
  in: { kind: 'length', factor: INCH, also: ['IN', 'inch', 'inches', '"', '″', '”', "''", '′′', '’’'] },
  ft: { kind: 'length', factor: 12 * INCH, also: ['FT', 'foot', 'feet', "'", '′', '’'] },
  yd: { kind: 'length', factor: 36 * INCH, also: ['yard', 'yards'] },
  Hz: { kind: 'frequency', factor: 1, also: ['hz', 'HZ'] },
  kHz: { kind: 'frequency', factor: 1e3, also: ['khz', 'KHz', 'KHZ', 'Khz'] },
  MHz: { kind: 'frequency', factor: 1e6, also: ['Mhz', 'MHZ', 'mhz'] },
  GHz: { kind: 'frequency', factor: 1e9, also: ['Ghz', 'GHZ', 'ghz'] },
  W: { kind: 'power', factor: 1, also: ['w', 'watt', 'watts', 'Watt', 'Watts'] },
  mW: { kind: 'power', factor: 1e-3, also: ['mw'] },
  µW: { kind: 'power', factor: 1e-6, also: ['uW', 'μW'] },
  nW: { kind: 'power', factor: 1e-9 },
  pW: { kind: 'power', factor: 1e-12 },
  kW: { kind: 'power', factor: 1e3, also: ['kw', 'KW'] },
  dBm: { kind: 'level', factor: 1, also: ['dbm', 'DBM', 'dBM', 'dBmW'] },
  dBW: { kind: 'level', factor: 1, offset: DBM_OF_DBW, also: ['dbw', 'DBW', 'dBw'] },
  '°': { kind: 'angle', factor: 1, also: ['º', 'deg', 'degree', 'degrees'] },
  rad: { kind: 'angle', factor: 180 / Math.PI, also: ['radian', 'radians'] },
  dB: { kind: 'decibels', factor: 1, also: ['db', 'DB'] },
  'dBc/Hz': { kind: 'noise density', factor: 1 },
  dBi: { kind: 'gain', factor: 1, also: ['dbi', 'DBI', 'dBI'] },
  dBd: { kind: 'gain', factor: 1, offset: DBI_OF_DBD, also: ['dbd', 'DBD', 'dBD'] },
} as const satisfies Record<string, Unit>;

/** A unit by the way it is shown. */
export type UnitSymbol = keyof typeof UNITS;

const SYMBOLS: ReadonlyMap<string, UnitSymbol> = new Map(
  (Object.entries(UNITS) as [UnitSymbol, Unit][]).flatMap(([symbol, { also = [] }]) =>
    [symbol, ...also].map((written) => [written, symbol] as const),
  ),
);

/** All units, each by the way it is shown. */
export const UNIT_SYMBOLS = Object.keys(UNITS) as readonly UnitSymbol[];

/** The unit that was written, or null when there is none of that name. */
export function findUnit(written: string): UnitSymbol | null {
  return SYMBOLS.get(written) ?? null;
}

/** What a unit measures. */
export function kindOfUnit(symbol: UnitSymbol): QuantityKind {
  return UNITS[symbol].kind;
}

/** A number of units as it is stored: factor n + offset. */
export function fromUnit(number: number, symbol: UnitSymbol): number {
  const unit: Unit = UNITS[symbol];
  return number * unit.factor + (unit.offset ?? 0);
}

/** How many units a stored value is; the inverse of `fromUnit`. */
export function toUnit(stored: number, symbol: UnitSymbol): number {
  const unit: Unit = UNITS[symbol];
  return (stored - (unit.offset ?? 0)) / unit.factor;
}

/** A power in W as a level in dBm: 10 lg(P / 1 mW). */
export function levelOfPower(power: number): number {
  return 10 * Math.log10(power) + DBM_OF_DBW;
}

/** A level in dBm as a power in W: 10^((L - 30) / 10). */
export function powerOfLevel(level: number): number {
  return 10 ** ((level - DBM_OF_DBW) / 10);
}
