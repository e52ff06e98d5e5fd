import { drawing } from '@/components/theme/drawing';
import type { Point } from '@/shared/layout/document';
import { boxAt, type ScreenBox } from './label-placement';
import { linesPath } from './paths';
import { textWidth } from './text-width';
import { toScreen, type ScreenPoint, type Viewport } from './viewport';

/** A dimension line of a workshop drawing: line, slanted ticks, extension lines, and its text over the middle. */
export type Dimension = {
  readonly key: string;
  readonly path: string;
  readonly text: string;
  readonly at: ScreenPoint;
  readonly upright: boolean;
  readonly box: ScreenBox;
};

/**
 * Dimension between two points of the plan, drawn `away` pixels beyond them along one axis of the plan (negative:
 * against the axis).
 */
export function dimensionAlong(
  view: Viewport,
  from: Point,
  to: Point,
  axis: 'x' | 'y',
  away: number,
  { key, text }: { readonly key: string; readonly text: string },
): Dimension {
  const step = toScreen(
    { ...view, originX: 0, originY: 0, scale: 1 },
    axis === 'x' ? { x: 1, y: 0 } : { x: 0, y: 1 },
  );
  const [a, b] = [toScreen(view, from), toScreen(view, to)];
  const shift = { x: step.x * away, y: step.y * away };
  const [start, end] = [
    { x: a.x + shift.x, y: a.y + shift.y },
    { x: b.x + shift.x, y: b.y + shift.y },
  ];
  const { tick, overshoot } = drawing.dimension;
  const over = { x: step.x * Math.sign(away) * overshoot, y: step.y * Math.sign(away) * overshoot };
  const ticks = [start, end].map(({ x, y }) => ({ x1: x - tick, y1: y + tick, x2: x + tick, y2: y - tick }));
  const extensions = [
    { x1: a.x + over.x, y1: a.y + over.y, x2: start.x + over.x, y2: start.y + over.y },
    { x1: b.x + over.x, y1: b.y + over.y, x2: end.x + over.x, y2: end.y + over.y },
  ];
  const upright = Math.abs(end.y - start.y) > Math.abs(end.x - start.x);
  const size = drawing.text.small;
  const offset = size * 0.5 + 4;
  const at = {
    x: (start.x + end.x) / 2 - (upright ? offset : 0),
    y: (start.y + end.y) / 2 - (upright ? 0 : offset),
  };
  const length = textWidth(text, size) + 4;
  return {
    key,
    path: linesPath([{ x1: start.x, y1: start.y, x2: end.x, y2: end.y }, ...ticks, ...extensions]),
    text,
    at,
    upright,
    box: upright ? boxAt(at, size + 2, length) : boxAt(at, length, size + 2),
  };
}
