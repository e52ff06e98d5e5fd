import type { Point } from './point';

/** An upright rectangle by its corners, m. */
export type Box = {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
};

/**
 * Smallest box around some points.
 * @throws Error when there is no point: the box of nothing is a broken invariant.
 */
export function boxAround(points: readonly Point[]): Box {
  if (points.length === 0) throw new Error('no points to put a box around');
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { x, y } of points) {
    minX = Math.min(minX, x);
    minY = Math.min(minY, y);
    maxX = Math.max(maxX, x);
    maxY = Math.max(maxY, y);
  }
  return { minX, minY, maxX, maxY };
}

/** The smallest box that holds both. */
export function boxUnion(a: Box, b: Box): Box {
  return {
    minX: Math.min(a.minX, b.minX),
    minY: Math.min(a.minY, b.minY),
    maxX: Math.max(a.maxX, b.maxX),
    maxY: Math.max(a.maxY, b.maxY),
  };
}

/** The box with `margin` metres more on every side. */
export function boxExpand(box: Box, margin: number): Box {
  return {
    minX: box.minX - margin,
    minY: box.minY - margin,
    maxX: box.maxX + margin,
    maxY: box.maxY + margin,
  };
}

/** True when the point lies in the box or on its edge. */
export function boxContains(box: Box, { x, y }: Point): boolean {
  return box.minX <= x && x <= box.maxX && box.minY <= y && y <= box.maxY;
}

/** True when the boxes share at least one point. */
export function boxesMeet(a: Box, b: Box): boolean {
  return a.minX <= b.maxX && b.minX <= a.maxX && a.minY <= b.maxY && b.minY <= a.maxY;
}

/** Middle of the box. */
export function boxCentre(box: Box): Point {
  return { x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 };
}

/** Length along x and width along y, m. */
export function boxSize(box: Box): { readonly length: number; readonly width: number } {
  return { length: box.maxX - box.minX, width: box.maxY - box.minY };
}
