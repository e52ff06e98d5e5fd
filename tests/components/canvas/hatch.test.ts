import fc from 'fast-check';
import { hatchLines } from '@/components/canvas/hatch';
import { polygonContains } from '@/shared/geometry/polygon';

const SPACING = 8;
const ORIGIN = { x: 0, y: 0 };
const L_SHAPE = [
  { x: 0, y: 0 },
  { x: 90, y: 0 },
  { x: 90, y: 30 },
  { x: 30, y: 30 },
  { x: 30, y: 90 },
  { x: 0, y: 90 },
];

describe('a hatch', () => {
  test('stays within its outline, also in a notch', () => {
    const lines = hatchLines(L_SHAPE, SPACING, ORIGIN);
    expect(lines.length).toBeGreaterThan(10);
    for (const { x1, y1, x2, y2 } of lines) {
      const middle = { x: (x1 + x2) / 2, y: (y1 + y2) / 2 };
      expect([middle, polygonContains(L_SHAPE, middle)]).toEqual([middle, true]);
    }
  });

  test('runs at 45 degrees with its lines evenly apart', () => {
    const levels = hatchLines(L_SHAPE.slice(0, 3), SPACING, ORIGIN).map(({ x1, y1, x2, y2 }) => {
      expect(x1 + y1).toBeCloseTo(x2 + y2, 9);
      return (x1 + y1) / Math.SQRT2;
    });
    levels.forEach((level) => expect(level / SPACING).toBeCloseTo(Math.round(level / SPACING), 9));
  });

  test('travels with the drawing', () => {
    fc.assert(
      fc.property(fc.integer({ min: -50, max: 50 }), fc.integer({ min: -50, max: 50 }), (dx, dy) => {
        const moved = L_SHAPE.map(({ x, y }) => ({ x: x + dx, y: y + dy }));
        const before = hatchLines(L_SHAPE, SPACING, ORIGIN);
        const after = hatchLines(moved, SPACING, { x: dx, y: dy });
        const near = (a: number, b: number) => Math.abs(a - b) < 1e-6;
        return (
          // a line through a corner may be lost to rounding, never more than one at each end
          Math.abs(before.length - after.length) <= 2 &&
          after.every((line) =>
            before.some(
              ({ x1, y1, x2, y2 }) =>
                near(line.x1 - dx, x1) &&
                near(line.y1 - dy, y1) &&
                near(line.x2 - dx, x2) &&
                near(line.y2 - dy, y2),
            ),
          )
        );
      }),
      { seed: 1, numRuns: 100 },
    );
  });
});
