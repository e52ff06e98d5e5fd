import { pointAdd, pointDistance, pointSubtract, type Point } from './point';
import { segmentNearestPoint, segmentsMeet, type Segment } from './segment';

/** A closed outline of at least three points; the last joins the first. */
export type Polygon = readonly Point[];

/** Points nearer to an edge than this count as on it: a thousandth of a micrometre, far below any tape measure. */
export const EDGE_TOLERANCE = 1e-9;

/** The edges of an outline in its order, the closing one last. */
export function polygonEdges(outline: Polygon): Segment[] {
  return outline.map((start, index) => ({ start, end: pointAt(outline, index + 1) }));
}

/**
 * Area with its sign, m2: positive when the outline runs anticlockwise. Sum of cross products over two, seen from
 * the first corner: from a datum far away the area of something small would drown in rounding.
 */
export function polygonSignedArea(outline: Polygon): number {
  const origin = pointAt(outline, 0);
  let sum = 0;
  outline.forEach((corner, index) => {
    const [a, b] = [pointSubtract(corner, origin), pointSubtract(pointAt(outline, index + 1), origin)];
    sum += a.x * b.y - b.x * a.y;
  });
  return sum / 2;
}

/** Area, m2. */
export function polygonArea(outline: Polygon): number {
  return Math.abs(polygonSignedArea(outline));
}

/** Centre of area; the mean of the corners when the outline has no area. */
export function polygonCentroid(outline: Polygon): Point {
  const area = polygonSignedArea(outline);
  const origin = pointAt(outline, 0);
  let [x, y, meanX, meanY] = [0, 0, 0, 0];
  outline.forEach((corner, index) => {
    const [a, b] = [pointSubtract(corner, origin), pointSubtract(pointAt(outline, index + 1), origin)];
    const cross = a.x * b.y - b.x * a.y;
    x += (a.x + b.x) * cross;
    y += (a.y + b.y) * cross;
    meanX += a.x / outline.length;
    meanY += a.y / outline.length;
  });
  const centre = Math.abs(area) < 1e-15 ? { x: meanX, y: meanY } : { x: x / (6 * area), y: y / (6 * area) };
  return pointAdd(origin, centre);
}

/** True when the point lies inside or on the edge (within `EDGE_TOLERANCE`). Even-odd rule. */
export function polygonContains(outline: Polygon, point: Point): boolean {
  return crosses(outline, point) || polygonDistance(outline, point) <= EDGE_TOLERANCE;
}

/** True when the point lies inside and not on the edge. */
export function polygonContainsStrictly(outline: Polygon, point: Point): boolean {
  return crosses(outline, point) && polygonDistance(outline, point) > EDGE_TOLERANCE;
}

/** The point of the outline's edge that is nearest to `point`, with its edge and distance in metres. */
export function polygonNearestEdge(
  outline: Polygon,
  point: Point,
): { readonly point: Point; readonly edge: number; readonly distance: number } {
  let best = { point: pointAt(outline, 0), edge: 0, distance: Infinity };
  outline.forEach((start, edge) => {
    const candidate = segmentNearestPoint({ start, end: pointAt(outline, edge + 1) }, point);
    const distance = pointDistance(candidate, point);
    if (distance < best.distance) best = { point: candidate, edge, distance };
  });
  return best;
}

/** Distance from a point to the nearest edge, m; positive inside as well as outside. */
export function polygonDistance(outline: Polygon, point: Point): number {
  return polygonNearestEdge(outline, point).distance;
}

/**
 * Distances from an inside point to the edge along the four axes, m: how a workshop drawing gives a position.
 * Null where the ray meets no edge.
 */
export function polygonAxisDistances(
  outline: Polygon,
  point: Point,
): {
  readonly ahead: number | null;
  readonly behind: number | null;
  readonly left: number | null;
  readonly right: number | null;
} {
  const along = rayCrossings(outline, point, false);
  const across = rayCrossings(outline, point, true);
  return { ahead: along.after, behind: along.before, left: across.after, right: across.before };
}

/** True when no two edges that are not neighbours touch: an outline that a saw could follow. */
export function polygonIsSimple(outline: Polygon): boolean {
  const edges = polygonEdges(outline);
  return edges.every((a, i) =>
    edges.every((b, j) => {
      const apart = Math.abs(i - j);
      if (j <= i || apart === 1 || apart === edges.length - 1) return true;
      return !segmentsMeet(a, b);
    }),
  );
}

/**
 * The outline moved outward by `distance` metres (inward when negative), corners mitred.
 * Meant for convex or gently concave outlines; a distance larger than the outline's waist folds it over.
 */
export function polygonOffset(outline: Polygon, distance: number): Point[] {
  const outward = polygonSignedArea(outline) >= 0 ? 1 : -1;
  return outline.map((corner, index) => {
    const before = pointAt(outline, index - 1);
    const after = pointAt(outline, index + 1);
    const n1 = edgeNormal(before, corner, outward);
    const n2 = edgeNormal(corner, after, outward);
    const scale = 1 + n1.x * n2.x + n1.y * n2.y;
    // Edges that double back on themselves have no mitre; the corner follows the first of them.
    if (scale < 1e-9) return { x: corner.x + n1.x * distance, y: corner.y + n1.y * distance };
    return {
      x: corner.x + ((n1.x + n2.x) / scale) * distance,
      y: corner.y + ((n1.y + n2.y) / scale) * distance,
    };
  });
}

/** A rectangle from opposite corners, anticlockwise. */
export function polygonRectangle(minX: number, minY: number, maxX: number, maxY: number): Point[] {
  return [
    { x: minX, y: minY },
    { x: maxX, y: minY },
    { x: maxX, y: maxY },
    { x: minX, y: maxY },
  ];
}

/** A regular outline of `corners` points around a circle, anticlockwise, first corner on +x. */
export function polygonRegular(centre: Point, radius: number, corners: number): Point[] {
  return Array.from({ length: corners }, (_, index) => {
    const angle = (2 * Math.PI * index) / corners;
    return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) };
  });
}

function crosses(outline: Polygon, { x, y }: Point): boolean {
  let inside = false;
  outline.forEach((a, index) => {
    const b = pointAt(outline, index + 1);
    if (a.y > y !== b.y > y && x < a.x + ((y - a.y) / (b.y - a.y)) * (b.x - a.x)) inside = !inside;
  });
  return inside;
}

function rayCrossings(
  outline: Polygon,
  point: Point,
  across: boolean,
): { before: number | null; after: number | null } {
  let [before, after]: [number | null, number | null] = [null, null];
  outline.forEach((start, index) => {
    const end = pointAt(outline, index + 1);
    const [s, e, p] = across ? [swap(start), swap(end), swap(point)] : [start, end, point];
    if (s.y > p.y === e.y > p.y) return;
    const distance = s.x + ((p.y - s.y) / (e.y - s.y)) * (e.x - s.x) - p.x;
    if (distance >= 0) after = after === null ? distance : Math.min(after, distance);
    if (distance <= 0) before = before === null ? -distance : Math.min(before, -distance);
  });
  return { before, after };
}

function swap({ x, y }: Point): Point {
  return { x: y, y: x };
}

function edgeNormal(a: Point, b: Point, outward: number): Point {
  const length = pointDistance(a, b) || 1;
  return { x: (outward * (b.y - a.y)) / length, y: (-outward * (b.x - a.x)) / length };
}

function pointAt(outline: Polygon, index: number): Point {
  const point = outline[(index + outline.length) % outline.length];
  if (!point) throw new Error('an outline needs points');
  return point;
}
