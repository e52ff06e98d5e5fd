import fc from 'fast-check';
import {
  boxAround,
  boxCentre,
  boxContains,
  boxesMeet,
  boxExpand,
  boxSize,
  boxUnion,
} from '@/shared/geometry/box';

const number = fc.integer({ min: -100, max: 100 });
const points = fc.array(fc.record({ x: number, y: number }), { minLength: 1, maxLength: 8 });

describe('a box', () => {
  test('around points holds them all and touches four sides', () => {
    fc.assert(
      fc.property(points, (all) => {
        const box = boxAround(all);
        expect(all.every((point) => boxContains(box, point))).toBe(true);
        expect(all.some(({ x }) => x === box.minX) && all.some(({ x }) => x === box.maxX)).toBe(true);
        expect(all.some(({ y }) => y === box.minY) && all.some(({ y }) => y === box.maxY)).toBe(true);
      }),
      { seed: 7, numRuns: 200 },
    );
  });

  test('around nothing is a broken invariant', () => {
    expect(() => boxAround([])).toThrow('no points');
  });

  test('of two is the box of their points together', () => {
    fc.assert(
      fc.property(points, points, (a, b) => {
        expect(boxUnion(boxAround(a), boxAround(b))).toEqual(boxAround([...a, ...b]));
      }),
      { seed: 8, numRuns: 200 },
    );
  });

  test('meets another when they share a point, the edge included', () => {
    const unit = { minX: 0, minY: 0, maxX: 1, maxY: 1 };
    expect(boxesMeet(unit, { minX: 1, minY: 1, maxX: 2, maxY: 2 })).toBe(true);
    expect(boxesMeet(unit, { minX: 1.001, minY: 0, maxX: 2, maxY: 2 })).toBe(false);
    expect(boxesMeet(unit, { minX: 0.2, minY: -5, maxX: 0.3, maxY: 5 })).toBe(true);
  });

  test('has a centre and a size, and grows on every side', () => {
    const box = { minX: -1, minY: 2, maxX: 3, maxY: 4 };
    expect(boxCentre(box)).toEqual({ x: 1, y: 3 });
    expect(boxSize(box)).toEqual({ length: 4, width: 2 });
    expect(boxExpand(box, 0.5)).toEqual({ minX: -1.5, minY: 1.5, maxX: 3.5, maxY: 4.5 });
  });
});
