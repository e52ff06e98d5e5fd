import {
  fromUnit,
  kindOfUnit,
  levelOfPower,
  powerOfLevel,
  type QuantityKind,
  type UnitSymbol,
} from './unit-table';

/** A number with what it measures; null while no unit was written. */
export type Measure = { readonly kind: QuantityKind | null; readonly number: number };

/** A measure, or the sentence that says why there is none. */
export type Measured = Measure | string;

/** Kinds whose decibels refer to something: they take decibels, but two of them do not add. */
const REFERRED: ReadonlySet<QuantityKind | null> = new Set(['level', 'gain', 'noise density']);

const TOO_LARGE = 'That comes to a number too large to mean anything.';

/** A bare number given its unit. */
export function withUnit(bare: Measure, unit: UnitSymbol): Measured {
  return finite({ kind: kindOfUnit(unit), number: fromUnit(bare.number, unit) });
}

/** a + b, or a - b with `sign` -1: like with like, and decibels on powers, levels, gains and noise. */
export function plus(a: Measure, b: Measure, sign: 1 | -1): Measured {
  if (a.kind === b.kind) {
    if (!REFERRED.has(a.kind)) return finite({ kind: a.kind, number: a.number + sign * b.number });
    if (sign < 0) return finite({ kind: 'decibels', number: a.number - b.number });
    return `In decibels ${named(a.kind)} does not add to another.`;
  }
  if (a.kind === null || b.kind === null) return 'Write the unit of every part.';
  if (b.kind === 'decibels') {
    if (REFERRED.has(a.kind)) return finite({ kind: a.kind, number: a.number + sign * b.number });
    if (a.kind === 'power')
      return finite({ kind: 'power', number: a.number * 10 ** ((sign * b.number) / 10) });
  }
  if (a.kind === 'decibels' && sign > 0) return plus(b, a, 1);
  return `${capital(named(a.kind))} and ${named(b.kind)} cannot be ${sign > 0 ? 'added' : 'subtracted'}.`;
}

/** a b or a / b, where at least the factor or the divisor is a bare number. */
export function times(a: Measure, b: Measure, sign: '*' | '/'): Measured {
  if (sign === '/') {
    if (b.kind !== null) return 'Divide by a number without a unit.';
    if (b.number === 0) return 'That divides by zero.';
  } else if (a.kind !== null && b.kind !== null) {
    return 'Multiply by a number without a unit.';
  }
  const kind = a.kind ?? b.kind;
  if (isReferred(kind)) return `${capital(named(kind))} cannot be multiplied or divided.`;
  return finite({ kind, number: sign === '/' ? a.number / b.number : a.number * b.number });
}

/** Whether decibels of this kind refer to something, so that a product of them means nothing. */
export function isReferred(kind: QuantityKind | null): boolean {
  return REFERRED.has(kind);
}

/** The number of a measure as the asked kind; powers and levels stand for each other. */
export function numberAs(measure: Measure, kind: QuantityKind): number | string {
  if (measure.kind === kind) return measure.number;
  if (kind === 'power' && measure.kind === 'level') return finiteNumber(powerOfLevel(measure.number));
  if (kind === 'level' && measure.kind === 'power') {
    return measure.number > 0 ? levelOfPower(measure.number) : 'A level in dBm needs a power above 0 W.';
  }
  return `${capital(named(measure.kind))} does not belong here.`;
}

/** A kind with its article, as sentences name it. */
export function named(kind: QuantityKind | null): string {
  switch (kind) {
    case null:
      return 'a number without a unit';
    case 'angle':
      return 'an angle';
    case 'decibels':
      return 'a ratio in decibels';
    case 'noise density':
      return 'a noise density';
    default:
      return `a ${kind}`;
  }
}

function finite(measure: Measure): Measured {
  return Number.isFinite(measure.number) ? measure : TOO_LARGE;
}

function finiteNumber(number: number): number | string {
  return Number.isFinite(number) ? number : TOO_LARGE;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
