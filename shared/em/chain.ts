import type { Vector3, Wire } from './scene';

/**
 * A straight filament cut into equal segments. Between neighbouring nodes the current is sinusoidal, so the
 * filament is described by its node currents; node i lies at origin + i * step * direction, i = 0 ... segments.
 */
export type Chain = {
  readonly origin: Vector3;
  /** Unit vector; the positive sense of the current. */
  readonly direction: Vector3;
  /** Length of a segment, metres. */
  readonly step: number;
  readonly segments: number;
};

/** A wire's axis cut into equal segments. @throws RangeError for a wire without length */
export function chainOfWire(wire: Wire, segments: number): Chain {
  const length = wireLength(wire);
  if (!(length > 0)) throw new RangeError(`wire ${wire.id} has no length`);
  const [x, y, z] = vectorBetween(wire.start, wire.end);
  return {
    origin: wire.start,
    direction: [x / length, y / length, z / length],
    step: length / segments,
    segments,
  };
}

/**
 * The mirror image below the plane z = 0. The image of a current is the *negative* of the mirrored current:
 * upright currents keep their sense, horizontal ones turn round. @source Jordan and Balmain 1968, image theory
 */
export function chainMirrored(chain: Chain): Chain {
  const [x, y, z] = chain.origin;
  const [ux, uy, uz] = chain.direction;
  return { ...chain, origin: [x, y, -z], direction: [ux, uy, -uz] };
}

/** Length of a wire, metres. */
export function wireLength(wire: Wire): number {
  return Math.hypot(...vectorBetween(wire.start, wire.end));
}

/** to - from. */
export function vectorBetween(from: Vector3, to: Vector3): Vector3 {
  return [to[0] - from[0], to[1] - from[1], to[2] - from[2]];
}

/** The least distance between two segments of line, metres. @source Ericson 2004, section 5.1.9 */
export function segmentDistance(p1: Vector3, q1: Vector3, p2: Vector3, q2: Vector3): number {
  const d1 = vectorBetween(p1, q1);
  const d2 = vectorBetween(p2, q2);
  const r = vectorBetween(p2, p1);
  const a = dot(d1, d1);
  const e = dot(d2, d2);
  const f = dot(d2, r);
  const c = dot(d1, r);
  const b = dot(d1, d2);
  const denominator = a * e - b * b;
  // Parallel lines: any point of the first serves as a start.
  let s = denominator > 1e-14 * a * e ? clampToUnit((b * f - c * e) / denominator) : 0;
  let t = e > 0 ? (b * s + f) / e : 0;
  if (t < 0 || t > 1) {
    t = clampToUnit(t);
    s = a > 0 ? clampToUnit((b * t - c) / a) : 0;
  }
  return Math.hypot(r[0] + s * d1[0] - t * d2[0], r[1] + s * d1[1] - t * d2[1], r[2] + s * d1[2] - t * d2[2]);
}

/** Scalar product. */
export function dot(a: Vector3, b: Vector3): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

function clampToUnit(value: number): number {
  return value < 0 ? 0 : value > 1 ? 1 : value;
}
