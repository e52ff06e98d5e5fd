/** A position on a plan, metres: x forward, y left. */
export type Point = { readonly x: number; readonly y: number };

/** Sum of two points taken as vectors, m. */
export function pointAdd(a: Point, b: Point): Point {
  return { x: a.x + b.x, y: a.y + b.y };
}

/** Vector from `b` to `a`, m. */
export function pointSubtract(a: Point, b: Point): Point {
  return { x: a.x - b.x, y: a.y - b.y };
}

/** Straight distance between two points, m. */
export function pointDistance(a: Point, b: Point): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

/** Bearing from one point to another, degrees clockwise from +x in 0 ... 360, as a compass reads. */
export function pointBearingDeg(from: Point, to: Point): number {
  const anticlockwise = (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI;
  return bearingNormalise(-anticlockwise);
}

/** The same bearing in 0 <= bearing < 360 degrees, never negative zero. */
export function bearingNormalise(bearingDeg: number): number {
  const turned = bearingDeg % 360;
  const positive = turned < 0 ? turned + 360 : turned;
  return positive >= 360 || positive === 0 ? 0 : positive;
}
