import { wireLength } from '../chain';
import type { Ground, Wire } from '../scene';

/**
 * A wire of the live solver and how often it changed: `place` counts every change, `kind` only those that ask
 * for other own-current functions, samples or loads.
 */
export type PlacedWire = { wire: Wire; place: number; kind: number };

/** Brings a placed wire to a new state; counts nothing when nothing changed. */
export function changePlaced(placed: PlacedWire, wire: Wire, ground: Ground): void {
  const old = placed.wire;
  if (old === wire) return;
  placed.wire = wire;
  if (!isSameKind(old, wire, ground)) {
    placed.kind += 1;
    placed.place += 1;
  } else if (!isSamePoint(old, wire)) {
    placed.place += 1;
  }
}

/**
 * What own-current functions depend on: in free space length, radius and feed, over the plane also height and
 * tilt. Rounded to nine digits, so that one whip carried about stays the same kind.
 */
export function kindKey(wire: Wire, ground: Ground, frequency: number): string {
  const length = wireLength(wire);
  const numbers = [frequency, length, wire.radius];
  if (ground === 'plane') numbers.push(wire.start[2], (wire.end[2] - wire.start[2]) / length);
  return `${ground} ${wire.feed} ${numbers.map((value) => (Math.abs(value) < 1e-12 ? 0 : value).toPrecision(9)).join(' ')}`;
}

/** 1 or -1 for a wire that runs straight up or down, 0 otherwise. */
export function verticalSense(wire: Wire): 1 | -1 | 0 {
  const dz = wire.end[2] - wire.start[2];
  const flat = Math.hypot(wire.end[0] - wire.start[0], wire.end[1] - wire.start[1]);
  if (flat > 1e-8 * Math.abs(dz)) return 0;
  return dz > 0 ? 1 : -1;
}

/** The wire's axis and, vertically, its place are the same: only x and y may differ. */
function isSameKind(a: Wire, b: Wire, ground: Ground): boolean {
  if (a.radius !== b.radius || a.feed !== b.feed) return false;
  if (a.load?.re !== b.load?.re || a.load?.im !== b.load?.im) return false;
  const length = wireLength(a);
  const close = (p: number, q: number) => Math.abs(p - q) <= 1e-9 * length;
  for (let axis = 0; axis < 3; axis += 1) {
    if (!close(a.end[axis]! - a.start[axis]!, b.end[axis]! - b.start[axis]!)) return false;
  }
  return close(a.start[2], b.start[2]) || (ground === 'none' && verticalSense(b) === 0);
}

function isSamePoint(a: Wire, b: Wire): boolean {
  return a.start.every((value, i) => value === b.start[i]) && a.end.every((value, i) => value === b.end[i]);
}
