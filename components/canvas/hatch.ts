import type { ScreenPoint } from './viewport';

export type ScreenLine = {
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
};

/**
 * Hatch lines at 45 degrees inside a polygon on the screen, by even-odd crossings; lines stand `spacing` px apart
 * and are tied to `anchor`, so that they travel with the drawing.
 */
export function hatchLines(
  polygon: readonly ScreenPoint[],
  spacing: number,
  anchor: ScreenPoint,
): readonly ScreenLine[] {
  const across = (point: ScreenPoint) => (point.x + point.y) / Math.SQRT2;
  const along = (point: ScreenPoint) => (point.x - point.y) / Math.SQRT2;
  const offset = across(anchor);
  const levels = polygon.map(across);
  const first = Math.ceil((Math.min(...levels) - offset) / spacing);
  const last = Math.floor((Math.max(...levels) - offset) / spacing);
  const lines: ScreenLine[] = [];
  for (let index = first; index <= last; index++) {
    const level = offset + index * spacing;
    const crossings: number[] = [];
    polygon.forEach((start, i) => {
      const end = polygon[(i + 1) % polygon.length] ?? start;
      const [a, b] = [across(start), across(end)];
      if (a <= level === b <= level) return;
      crossings.push(along(start) + ((level - a) / (b - a)) * (along(end) - along(start)));
    });
    crossings.sort((one, other) => one - other);
    for (let i = 0; i + 1 < crossings.length; i += 2) {
      lines.push(segmentAt(level, crossings[i] ?? 0, crossings[i + 1] ?? 0));
    }
  }
  return lines;
}

function segmentAt(across: number, from: number, to: number): ScreenLine {
  return {
    x1: (across + from) / Math.SQRT2,
    y1: (across - from) / Math.SQRT2,
    x2: (across + to) / Math.SQRT2,
    y2: (across - to) / Math.SQRT2,
  };
}
