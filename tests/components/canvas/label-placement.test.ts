import fc from 'fast-check';
import {
  alongLine,
  besideMark,
  boxAt,
  boxesOverlap,
  clipLine,
  placeLabels,
  segmentMeetsBox,
  type ScreenBox,
} from '@/components/canvas/label-placement';

const BOUNDS: ScreenBox = { left: 0, top: 0, width: 390, height: 500 };
const mark = fc.record({ x: fc.integer({ min: 0, max: 390 }), y: fc.integer({ min: 0, max: 500 }) });

function within(box: ScreenBox, bounds: ScreenBox): boolean {
  return (
    box.left >= bounds.left &&
    box.top >= bounds.top &&
    box.left + box.width <= bounds.left + bounds.width &&
    box.top + box.height <= bounds.top + bounds.height
  );
}

describe('labels on the plan', () => {
  test('never overlap each other or what is blocked, and stay within the drawing', () => {
    fc.assert(
      fc.property(
        fc.array(mark, { minLength: 1, maxLength: 20 }),
        fc.array(mark, { maxLength: 4 }),
        (marks, obstacles) => {
          const blocked = obstacles.map((at) => boxAt(at, 60, 40));
          const requests = marks.map((at, index) => ({
            id: String(index),
            candidates: besideMark(at, 10, 50, 18),
          }));
          const placed = placeLabels(requests, { blocked, avoided: [], lines: [], bounds: BOUNDS });
          const boxes = [...placed.values()].map(({ box }) => box);
          return boxes.every(
            (box, index) =>
              within(box, BOUNDS) &&
              [...blocked, ...boxes.slice(index + 1)].every((other) => !boxesOverlap(box, other, 0)),
          );
        },
      ),
      { seed: 1, numRuns: 200 },
    );
  });

  test('take the best place that is free', () => {
    const candidates = [boxAt({ x: 100, y: 100 }, 40, 20), boxAt({ x: 200, y: 100 }, 40, 20)];
    const nothing = { blocked: [], avoided: [], lines: [], bounds: BOUNDS };
    expect(placeLabels([{ id: 'a', candidates }], nothing).get('a')?.index).toBe(0);
    const blocked = [boxAt({ x: 100, y: 100 }, 5, 5)];
    expect(placeLabels([{ id: 'a', candidates }], { ...nothing, blocked }).get('a')?.index).toBe(1);
    const lines = [{ x1: 0, y1: 100, x2: 150, y2: 100 }];
    expect(placeLabels([{ id: 'a', candidates }], { ...nothing, lines }).get('a')?.index).toBe(1);
  });

  test('stay where they stood while that place is free', () => {
    const candidates = [boxAt({ x: 100, y: 100 }, 40, 20), boxAt({ x: 200, y: 100 }, 40, 20)];
    const around = { blocked: [], avoided: [], lines: [], bounds: BOUNDS };
    const previous = new Map([['a', 1]]);
    expect(placeLabels([{ id: 'a', candidates }], { ...around, previous }).get('a')?.index).toBe(1);
    const blocked = [boxAt({ x: 200, y: 100 }, 5, 5)];
    expect(placeLabels([{ id: 'a', candidates }], { ...around, blocked, previous }).get('a')?.index).toBe(0);
  });

  test('without a free place are left out rather than written over something', () => {
    const candidates = [boxAt({ x: 100, y: 100 }, 40, 20)];
    const placed = placeLabels([{ id: 'a', candidates }], {
      blocked: [BOUNDS],
      avoided: [],
      lines: [],
      bounds: BOUNDS,
    });
    expect(placed.size).toBe(0);
  });

  test('along a line are offered near its middle first', () => {
    const [first] = alongLine({ x1: 0, y1: 0, x2: 100, y2: 0 }, 20, 10);
    expect(first).toEqual({ left: expect.closeTo(45, 9), top: -5, width: 20, height: 10 });
  });
});

describe('a line and a box', () => {
  const box: ScreenBox = { left: 10, top: 10, width: 20, height: 20 };

  test.each([
    ['through it', { x1: 0, y1: 20, x2: 40, y2: 20 }, { x1: 10, y1: 20, x2: 30, y2: 20 }],
    ['from inside', { x1: 20, y1: 20, x2: 20, y2: 100 }, { x1: 20, y1: 20, x2: 20, y2: 30 }],
    ['wholly inside', { x1: 12, y1: 12, x2: 28, y2: 28 }, { x1: 12, y1: 12, x2: 28, y2: 28 }],
    ['past its corner', { x1: 0, y1: 12, x2: 12, y2: 0 }, null],
    ['beside it', { x1: 0, y1: 5, x2: 40, y2: 5 }, null],
    ['that ends before it', { x1: 0, y1: 20, x2: 9, y2: 20 }, null],
  ])('%s', (_what, line, inside) => {
    expect(clipLine(line, box)).toEqual(inside);
    expect(segmentMeetsBox(line, box)).toBe(inside !== null);
  });
});
