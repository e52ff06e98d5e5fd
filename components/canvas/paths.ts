import type { ScreenLine } from './hatch';
import type { ScreenBox } from './label-placement';
import type { ScreenPoint } from './viewport';

/** Path of a closed outline. */
export function outlinePath(points: readonly ScreenPoint[]): string {
  return points.length === 0 ? '' : `M${points.map(pair).join('L')}Z`;
}

/** Path of separate lines. */
export function linesPath(lines: readonly ScreenLine[]): string {
  return lines.map(({ x1, y1, x2, y2 }) => `M${tenth(x1)} ${tenth(y1)}L${tenth(x2)} ${tenth(y2)}`).join('');
}

/** Path of a full circle. */
export function circlePath({ x, y }: ScreenPoint, radius: number): string {
  const r = tenth(radius);
  return `M${tenth(x - radius)} ${tenth(y)}a${r} ${r} 0 1 0 ${tenth(2 * radius)} 0a${r} ${r} 0 1 0 ${tenth(-2 * radius)} 0Z`;
}

/** Path of the right half of a circle's disc. */
export function halfDiscPath({ x, y }: ScreenPoint, radius: number): string {
  const r = tenth(radius);
  return `M${tenth(x)} ${tenth(y - radius)}a${r} ${r} 0 0 1 0 ${tenth(2 * radius)}Z`;
}

/** Path of a box with round ends. */
export function pillPath({ left, top, width, height }: ScreenBox): string {
  const r = tenth(height / 2);
  const run = tenth(width - height);
  return (
    `M${tenth(left + height / 2)} ${tenth(top)}h${run}a${r} ${r} 0 0 1 0 ${tenth(height)}` +
    `h${-run}a${r} ${r} 0 0 1 0 ${tenth(-height)}Z`
  );
}

/** Path of a box. */
export function boxPath({ left, top, width, height }: ScreenBox): string {
  return `M${tenth(left)} ${tenth(top)}h${tenth(width)}v${tenth(height)}h${tenth(-width)}Z`;
}

/** Path of a drawing's hole-centre cross: four strokes that leave the hole free. */
export function crossPath({ x, y }: ScreenPoint, from: number, to: number): string {
  return linesPath([
    { x1: x - to, y1: y, x2: x - from, y2: y },
    { x1: x + from, y1: y, x2: x + to, y2: y },
    { x1: x, y1: y - to, x2: x, y2: y - from },
    { x1: x, y1: y + from, x2: x, y2: y + to },
  ]);
}

/** Rounds to a tenth of a pixel: shorter paths, nothing visible lost. */
export function tenth(value: number): number {
  return Math.round(value * 10) / 10;
}

function pair({ x, y }: ScreenPoint): string {
  return `${tenth(x)} ${tenth(y)}`;
}
