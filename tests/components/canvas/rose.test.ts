import { roseShapes } from '@/components/canvas/rose';
import type { PatternResult } from '@/shared/estimate/estimate-result';

const MIDDLE = { x: 200, y: 300 };
const RADIUS = 60;

/** A pattern of four bearings: forward, left, backward, right. */
function pattern(
  gainDbi: readonly number[],
  aloneDbi: readonly number[],
  deepestAzimuthDeg = 0,
): PatternResult {
  return {
    frequency: 155e6,
    elevationDeg: 0,
    stepDeg: 90,
    gainDbi,
    aloneDbi,
    rippleDb: 0,
    deepestAzimuthDeg,
    reason: null,
  };
}

/** The points of a path, from the middle: to the screen's right, and up. */
function points(path: string): { right: number; up: number }[] {
  return path
    .replace(/[MZ]/g, '')
    .split('L')
    .map((pair) => pair.split(' ').map(Number) as [number, number])
    .map(([x, y]) => ({ right: x - MIDDLE.x, up: MIDDLE.y - y }));
}

describe('the rose of an antenna', () => {
  test('is linear in field strength: 6 dB less than alone is half the radius', () => {
    const half = 20 * Math.log10(0.5);
    const rose = roseShapes(pattern([half, half, half, half], [0, 0, 0, 0]), MIDDLE, RADIUS, 'right');
    for (const { right, up } of points(rose.pattern)) expect(Math.hypot(right, up)).toBeCloseTo(30, 0);
    for (const { right, up } of points(rose.alone)) expect(Math.hypot(right, up)).toBeCloseTo(60, 0);
    expect(rose.rings.map(({ value, radius }) => [value, radius])).toEqual([
      [0.5, 30],
      [1, 60],
    ]);
  });

  test('turns with the drawing: left of forward is up when forward points right', () => {
    const toLeft = pattern([-40, 0, -40, -40], [0, 0, 0, 0]);
    const [, lying] = points(roseShapes(toLeft, MIDDLE, RADIUS, 'right').pattern);
    expect(lying).toEqual({ right: 0, up: 60 });
    const [, upright] = points(roseShapes(toLeft, MIDDLE, RADIUS, 'up').pattern);
    expect(upright).toEqual({ right: -60, up: 0 });
  });

  test('marks its deepest bearing outside the outer ring, clockwise from forward', () => {
    const rose = roseShapes(pattern([0, 0, 0, -20], [0, 0, 0, 0], 90), MIDDLE, RADIUS, 'right');
    const [tip] = points(rose.deepest);
    // 90 degrees clockwise of forward is to the right of the platform: down on the screen
    expect(tip).toEqual({ right: 0, up: -63 });
  });

  test('takes more rings when neighbours make the field stronger than alone', () => {
    const stronger = 20 * Math.log10(1.4);
    const rose = roseShapes(pattern([stronger, 0, 0, 0], [0, 0, 0, 0]), MIDDLE, RADIUS, 'right');
    expect(rose.rings.map(({ value }) => value)).toEqual([0.5, 1, 1.5]);
    expect(rose.rings.at(-1)?.radius).toBe(RADIUS);
  });

  test('ends at four times the field alone', () => {
    const rose = roseShapes(pattern([90, 0, 0, 0], [0, 0, 0, 0]), MIDDLE, RADIUS, 'right');
    const [forward] = points(rose.pattern);
    expect(forward).toEqual({ right: 60, up: 0 });
    expect(rose.rings.at(-1)?.value).toBe(4);
  });
});
