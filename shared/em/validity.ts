import { segmentDistance, wireLength } from './chain';
import { wavelength } from './constants';
import type { Ground, Method, ValidityEntry, Wire } from './scene';

/** Thin-wire limits, the same in every model. @source King 1956; Richmond 1974; common practice */
const greatestRadiusInWavelengths = 0.01;
const leastSlenderness = 20;
const leastPieceInRadii = 2.5;
const leastSpacingInRadii = 10;
/** From here on one assumed sinusoid is off by 3 dB or more against the solved current: k h / pi. */
const greatestPhaseOfOnePiece = 0.8;

/** What one wire by itself breaks at a frequency (hertz), its model's segments being `segmentLength` metres long. */
export function wireValidity(
  wire: Wire,
  frequency: number,
  method: Method,
  segmentLength: number,
): ValidityEntry[] {
  const entries: ValidityEntry[] = [];
  const add = (code: ValidityEntry['code'], message: string) =>
    entries.push({ wires: [wire.id], code, message });
  const length = wireLength(wire);
  const lambda = wavelength(frequency);
  if (wire.radius > greatestRadiusInWavelengths * lambda) {
    add('too-thick', `radius ${round(wire.radius / lambda)} wavelength, held up to 0.01 wavelength`);
  }
  if (length < leastSlenderness * 2 * wire.radius) {
    add('too-stout', `length ${round(length / (2 * wire.radius))} diameters, held from 20 diameters`);
  }
  if (segmentLength < leastPieceInRadii * wire.radius) {
    add('too-short-pieces', `pieces of ${round(segmentLength / wire.radius)} radii, held from 2.5 radii`);
  }
  if (method === 'emf') {
    const phase = (2 * segmentLength) / lambda;
    if (phase > greatestPhaseOfOnePiece) {
      add(
        'too-long-for-one-piece',
        `arm of ${round(segmentLength / lambda)} wavelength, one piece is held up to 0.4`,
      );
    }
  }
  return entries;
}

/** Why two wires' numbers are not held, whatever the frequency; null when their spacing suffices. */
export function pairValidity(one: Wire, other: Wire): ValidityEntry | null {
  const distance = segmentDistance(one.start, one.end, other.start, other.end);
  const radius = Math.max(one.radius, other.radius);
  if (distance <= one.radius + other.radius) {
    return { wires: [one.id, other.id], code: 'touching', message: 'the wires touch' };
  }
  if (distance < leastSpacingInRadii * radius) {
    const message = `axes ${round(distance / radius)} radii apart, held from 10 radii`;
    return { wires: [one.id, other.id], code: 'too-close', message };
  }
  return null;
}

/** All that a set of wires breaks at a frequency: each wire by itself, then the pairs. */
export function validityOf(
  wires: readonly Wire[],
  frequency: number,
  method: Method,
  segmentLength: (wire: Wire) => number,
): ValidityEntry[] {
  const entries = wires.flatMap((wire) => wireValidity(wire, frequency, method, segmentLength(wire)));
  wires.forEach((wire, i) => {
    for (const other of wires.slice(i + 1)) {
      const entry = pairValidity(wire, other);
      if (entry !== null) entries.push(entry);
    }
  });
  return entries;
}

/** Whether a wire stands on the plane with its start. */
export function standsOnPlane(wire: Wire, ground: Ground): boolean {
  return ground === 'plane' && isOnPlane(wire, wire.start[2]);
}

/** Whether a wire's end is joined to the plane. */
export function endsOnPlane(wire: Wire, ground: Ground): boolean {
  return ground === 'plane' && isOnPlane(wire, wire.end[2]);
}

/** Heights within a thousandth of the radius are on the plane: no tape measure tells them apart. */
function isOnPlane(wire: Wire, height: number): boolean {
  return Math.abs(height) <= 1e-3 * wire.radius;
}

function round(value: number): string {
  return value.toPrecision(2).replace(/\.0$/, '');
}
