import { pointDistance, type Point } from './point';

/** A straight piece of line between two points. */
export type Segment = { readonly start: Point; readonly end: Point };

/** The point of a segment that is nearest to `point`; the start of a segment without length. */
export function segmentNearestPoint({ start, end }: Segment, point: Point): Point {
  const dx = end.x - start.x;
  const dy = end.y - start.y;
  const squared = dx * dx + dy * dy;
  if (squared === 0) return start;
  const along = ((point.x - start.x) * dx + (point.y - start.y) * dy) / squared;
  const t = Math.min(1, Math.max(0, along));
  return { x: start.x + t * dx, y: start.y + t * dy };
}

/** Distance from a point to a segment, m. */
export function segmentDistance(segment: Segment, point: Point): number {
  return pointDistance(segmentNearestPoint(segment, point), point);
}

/** True when two segments share at least one point (ends count). */
export function segmentsMeet(a: Segment, b: Segment): boolean {
  const d1 = turn(b.start, b.end, a.start);
  const d2 = turn(b.start, b.end, a.end);
  const d3 = turn(a.start, a.end, b.start);
  const d4 = turn(a.start, a.end, b.end);
  if (d1 * d2 < 0 && d3 * d4 < 0) return true;
  return (
    (d1 === 0 && within(b, a.start)) ||
    (d2 === 0 && within(b, a.end)) ||
    (d3 === 0 && within(a, b.start)) ||
    (d4 === 0 && within(a, b.end))
  );
}

/** Sign of the area that a, b, c turn around: positive when they turn left. */
function turn(a: Point, b: Point, c: Point): number {
  return Math.sign((b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x));
}

function within({ start, end }: Segment, p: Point): boolean {
  return (
    Math.min(start.x, end.x) <= p.x &&
    p.x <= Math.max(start.x, end.x) &&
    Math.min(start.y, end.y) <= p.y &&
    p.y <= Math.max(start.y, end.y)
  );
}
