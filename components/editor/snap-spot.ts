import { boxAround } from '@/shared/geometry/box';
import { pointDistance } from '@/shared/geometry/point';
import type { LayoutDocument, Point } from '@/shared/layout/document';
import type { Guide } from './editor-snapshot';
import { gridStep } from './key-commands';

export type SnapOptions = {
  /** How near a line must be to draw the antenna to it, m. */
  readonly tolerance?: number;
  /** False: the position is the pointer's, to the nanometre. */
  readonly snap?: boolean;
};

/** A position after snapping and the lines it snapped to. */
export type SnappedSpot = { readonly point: Point; readonly guides: readonly Guide[] };

/** A line that a coordinate can snap to; `at` is where its guide is drawn from. */
type Line = { readonly value: number; readonly kind: Guide['kind']; readonly at: Point };

/**
 * Draws a position to what is near: a mount point first, then per axis the row of another antenna or the platform's
 * centre line, otherwise the grid. Held antennas do not count.
 */
export function snapSpot(
  document: LayoutDocument,
  wanted: Point,
  heldIds: readonly string[],
  { tolerance, snap = true }: SnapOptions,
): SnappedSpot {
  if (!snap) return { point: wanted, guides: [] };
  const step = gridStep(document);
  const reach = tolerance ?? step;
  const mountPoint = nearest(Object.values(document.mountPoints), wanted, reach);
  if (mountPoint) {
    const point = { x: mountPoint.x, y: mountPoint.y };
    return { point, guides: [{ kind: 'mount-point', from: point, to: point }] };
  }
  const others = Object.values(document.antennas).filter(({ id }) => !heldIds.includes(id));
  const box = boxAround(document.platform.outline);
  const centre = { x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 };
  const along = nearestLine(others.map(rowAlong), wanted.x, reach);
  const across =
    nearestLine([{ value: centre.y, kind: 'centre-line', at: centre }], wanted.y, reach) ??
    nearestLine(others.map(rowAcross), wanted.y, reach);
  const point = {
    x: along?.value ?? roundTo(wanted.x, step),
    y: across?.value ?? roundTo(wanted.y, step),
  };
  const guides: Guide[] = [];
  if (along) guides.push({ kind: along.kind, from: along.at, to: point });
  if (across?.kind === 'centre-line') {
    guides.push({ kind: across.kind, from: { x: box.minX, y: centre.y }, to: { x: box.maxX, y: centre.y } });
  } else if (across) guides.push({ kind: across.kind, from: across.at, to: point });
  return { point, guides };
}

/** A coordinate on the nearest grid line, without the dust of floating point. */
export function roundTo(value: number, step: number): number {
  const rounded = Math.round(Math.round(value / step) * step * 1e9) / 1e9;
  return rounded === 0 ? 0 : rounded;
}

function rowAlong({ x, y }: Point): Line {
  return { value: x, kind: 'antenna', at: { x, y } };
}

function rowAcross({ x, y }: Point): Line {
  return { value: y, kind: 'antenna', at: { x, y } };
}

function nearest<T extends Point>(points: readonly T[], wanted: Point, reach: number): T | null {
  let best: T | null = null;
  for (const point of points) {
    const distance = pointDistance(point, wanted);
    if (distance <= reach && (!best || distance < pointDistance(best, wanted))) best = point;
  }
  return best;
}

function nearestLine(lines: readonly Line[], value: number, reach: number): Line | null {
  let best: Line | null = null;
  for (const line of lines) {
    const distance = Math.abs(line.value - value);
    if (distance <= reach && (!best || distance < Math.abs(best.value - value))) best = line;
  }
  return best;
}
