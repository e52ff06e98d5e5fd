import type { PatternResult } from '@/shared/estimate/estimate-result';
import { screenAngle, type ScreenPoint, type Turn } from './viewport';

/** What a rose draws: radii are shares of the outermost ring, linear in field strength. */
export type Rose = {
  /** Field of the pattern by bearing, relative to the strongest of the antenna alone. */
  readonly pattern: string;
  readonly alone: string;
  /** Rings with their value and radius in px. */
  readonly rings: readonly { readonly value: number; readonly radius: number }[];
  /** Tip of the ink mark at the deepest bearing, outside the outer ring. */
  readonly deepest: string;
};

/** Outermost ring that is ever drawn: four times the field alone is 12 dB over it. */
const MOST = 4;

/**
 * Shapes of a rose around a point: field strength E/E0 = 10^((g - g0)/20), g0 the largest gain of the antenna
 * alone, on linear rings; a triangle marks the deepest bearing.
 */
export function roseShapes(pattern: PatternResult, middle: ScreenPoint, radius: number, turn: Turn): Rose {
  const reference = Math.max(...pattern.aloneDbi);
  const field = (gain: number) => Math.min(MOST, 10 ** ((gain - reference) / 20));
  const largest = Math.max(1, ...pattern.gainDbi.map(field));
  const outer = largest <= 1.02 ? 1 : Math.ceil(largest * 2 - 0.04) / 2;
  const step = outer > 2 ? 1 : 0.5;
  const rings: { value: number; radius: number }[] = [];
  for (let value = step; value <= outer + 1e-9; value += step) {
    rings.push({ value, radius: (radius * value) / outer });
  }
  const trace = (gains: readonly number[]) =>
    `M${gains
      .map((gain, index) => {
        const r = (radius * field(gain)) / outer;
        // bearings of the pattern run anticlockwise from forward, those of the screen clockwise
        const angle = screenAngle(turn, -index * pattern.stepDeg);
        return `${round(middle.x + r * Math.cos(angle))} ${round(middle.y + r * Math.sin(angle))}`;
      })
      .join('L')}Z`;
  return {
    pattern: trace(pattern.gainDbi),
    alone: trace(pattern.aloneDbi),
    rings,
    deepest: triangle(middle, radius, screenAngle(turn, pattern.deepestAzimuthDeg)),
  };
}

function triangle(middle: ScreenPoint, radius: number, angle: number): string {
  const corner = (distance: number, aside: number) =>
    `${round(middle.x + distance * Math.cos(angle) - aside * Math.sin(angle))} ${round(
      middle.y + distance * Math.sin(angle) + aside * Math.cos(angle),
    )}`;
  return `M${corner(radius + 3, 0)}L${corner(radius + 12, 5)}L${corner(radius + 12, -5)}Z`;
}

function round(value: number): number {
  return Math.round(value * 10) / 10;
}
