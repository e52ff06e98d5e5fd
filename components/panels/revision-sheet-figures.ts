import type { Preferences } from '@/components/theme/preferences';

export type SheetUnit = Preferences['lengthUnit'];

const MINUS = '\u2212';
const METRES_PER_INCH = 0.0254;

/**
 * A length as a tape measure reads it, without its unit (the head of the column names it): tenths of a millimetre
 * only where there are any, inches to hundredths.
 */
export function sheetLength(metres: number, unit: SheetUnit): string {
  if (unit === 'in') return signed((metres / METRES_PER_INCH).toFixed(2));
  const tenths = Math.round(metres * 10_000);
  return signed(tenths % 10 === 0 ? String(tenths / 10) : (tenths / 10).toFixed(1));
}

/** A bearing or a tilt in whole degrees, or in tenths where there are any. */
export function sheetAngle(degrees: number): string {
  return `${signed(String(Math.round(degrees * 10) / 10))}°`;
}

/** Decibels to the tenth, a margin with its sign. */
export function sheetDecibel(value: number | null, withSign = false): string {
  if (value === null) return '–';
  const text = value.toFixed(1);
  const isPositive = withSign && Number(text) > 0;
  return isPositive ? `+${text}` : signed(text);
}

/** A frequency in megahertz as a radio's list of channels writes it. */
export function sheetFrequency(hertz: number | null): string {
  if (hertz === null) return '–';
  return `${Number((hertz / 1e6).toFixed(3))} MHz`;
}

/** With the typographic minus, and no minus before zero. */
function signed(text: string): string {
  if (Number(text) === 0) return text.replace('-', '');
  return text.replace('-', MINUS);
}
