import type { LengthUnit } from '@/components/canvas/round-length';
import type { QuantityReading } from '@/components/ui/quantity-field';
import { formatQuantity, type ShownUnit } from '@/shared/units/format-quantity';
import { readQuantity } from '@/shared/units/read-quantity';
import type { QuantityKind, UnitSymbol } from '@/shared/units/unit-table';

/** How a field reads what is typed, shows what is stored, and says what it takes. */
export type Entry = {
  /** To the stored number: m, Hz, W, dBm, degrees, dB, dBc/Hz or dBi. */
  readonly read: (text: string) => QuantityReading;
  readonly format: (value: number) => string;
  readonly hint: string;
};

const LENGTHS: Readonly<Record<LengthUnit, Entry>> = {
  mm: entry('length', 'mm', 'Millimetres, or with its unit: 0.31 m, 12 in.', 'mm'),
  in: entry('length', 'in', 'Inches, or with its unit: 5 ft 3 in, 310 mm.', 'in'),
};

/** A length; a bare number is in the unit that lengths are shown in. */
export function lengthEntry(unit: LengthUnit): Entry {
  return LENGTHS[unit];
}

/** A frequency; a bare number is in megahertz. */
export const frequencyEntry = entry('frequency', 'MHz', 'Megahertz, or with its unit: 2.4 GHz.');

/** A receiver's bandwidth; a bare number is in kilohertz. */
export const bandwidthEntry = entry('frequency', 'kHz', 'Kilohertz, or with its unit: 5 MHz.');

/** A transmitter's power; a bare number is in watts. */
export const powerEntry = entry('power', 'W', 'Watts, or with its unit: 500 mW, 44 dBm.');

/** A level at a connector; a bare number is in dBm. */
export const levelEntry = entry('level', 'dBm', 'dBm, or with its unit: 10 mW.');

/** Broadband noise of a transmitter against its carrier in 1 Hz; negative. */
export const noiseEntry = entry('noise density', 'dBc/Hz', 'dBc/Hz, below the carrier: −150.');

/** A gain over an isotropic antenna; a bare number is in dBi. */
export const gainEntry = entry('gain', 'dBi', 'dBi, or with its unit: 0 dBd.');

/** Losses, rejections and noise figures. */
export const decibelEntry = entry('decibels', 'dB', 'Decibels: 3 dB.');

/** Bearings and tilts. */
export const angleEntry = entry('angle', '°', 'Degrees: 45.');

function entry(kind: QuantityKind, bareUnit: UnitSymbol, hint: string, shown?: ShownUnit): Entry {
  return {
    read: (text) => readQuantity(text, kind, bareUnit),
    format: (value) => formatQuantity(value, kind, shown),
    hint,
  };
}
