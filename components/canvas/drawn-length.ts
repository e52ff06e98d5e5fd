import { UNIT_LENGTH, type LengthUnit } from './round-length';

/** A length as a workshop drawing writes it: whole millimetres without their unit, inches with a tenth and `in`. */
export function drawnLength(metres: number, unit: LengthUnit): string {
  const value = metres / UNIT_LENGTH[unit];
  if (unit === 'in') return `${signed(value, 1)} in`;
  const tenths = Math.abs(value) < 100 && Math.abs(value - Math.round(value)) >= 0.05;
  return signed(value, tenths ? 1 : 0);
}

/** A length with its unit, for sentences and readouts. */
export function readLength(metres: number, unit: LengthUnit): string {
  return unit === 'in' ? drawnLength(metres, unit) : `${drawnLength(metres, unit)} mm`;
}

function signed(value: number, digits: number): string {
  const text = Math.abs(value).toFixed(digits);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
}
