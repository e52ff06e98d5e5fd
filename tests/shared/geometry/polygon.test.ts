import fc from 'fast-check';
import { pointDistance, type Point } from '@/shared/geometry/point';
import {
  EDGE_TOLERANCE,
  polygonArea,
  polygonAxisDistances,
  polygonCentroid,
  polygonContains,
  polygonContainsStrictly,
  polygonDistance,
  polygonEdges,
  polygonIsSimple,
  polygonNearestEdge,
  polygonOffset,
  polygonRectangle,
  polygonRegular,
  polygonSignedArea,
} from '@/shared/geometry/polygon';

const SQUARE = polygonRectangle(0, 0, 2, 1);
/** An L: a rectangle of 3 by 3 without its upper right 2 by 2. */
const ELL: Point[] = [
  { x: 0, y: 0 },
  { x: 3, y: 0 },
  { x: 3, y: 1 },
  { x: 1, y: 1 },
  { x: 1, y: 3 },
  { x: 0, y: 3 },
];
const BOW: Point[] = [
  { x: 0, y: 0 },
  { x: 2, y: 2 },
  { x: 2, y: 0 },
  { x: 0, y: 2 },
];

// Eighths: sums and products of a few of them are exact in binary.
const eighths = fc.integer({ min: -80, max: 80 }).map((n) => n / 8);
const point = fc.record({ x: eighths, y: eighths });
const triangle = fc.tuple(point, point, point);

function moved(outline: readonly Point[], dx: number, dy: number): Point[] {
  return outline.map(({ x, y }) => ({ x: x + dx, y: y + dy }));
}

describe('the area of an outline', () => {
  test('is that of the figure, positive when it runs anticlockwise', () => {
    expect(polygonSignedArea(SQUARE)).toBe(2);
    expect(polygonSignedArea([...SQUARE].reverse())).toBe(-2);
    expect(polygonArea([...ELL].reverse())).toBe(5);
  });

  test('of a regular outline is n r² sin(2π/n) / 2', () => {
    for (const corners of [3, 4, 6, 100]) {
      const expected = (corners * 0.25 * Math.sin((2 * Math.PI) / corners)) / 2;
      // a sum of a hundred products in double precision
      expect(
        Math.abs(polygonSignedArea(polygonRegular({ x: 3, y: -2 }, 0.5, corners)) - expected),
      ).toBeLessThan(1e-13);
    }
  });

  test('does not depend on where the figure lies: a millimetre at the far end of a site', () => {
    const small = polygonRectangle(0, 0, 1e-3, 1e-3);
    const far = moved(small, 1000, -1000);
    // The corners themselves are rounded there by 1e-13 m, 1e-10 of the side.
    expect(Math.abs(polygonArea(far) / 1e-6 - 1)).toBeLessThan(1e-9);
    expect(pointDistance(polygonCentroid(far), { x: 1000.0005, y: -999.9995 })).toBeLessThan(1e-9);
  });
});

describe('the centre of an outline', () => {
  test('of an L lies towards its corner', () => {
    // the 3 by 1 foot (area 3, centre 1.5 | 0.5) and the 1 by 2 stem (area 2, centre 0.5 | 2)
    const centre = polygonCentroid(ELL);
    expect(centre.x).toBeCloseTo(1.1, 12);
    expect(centre.y).toBeCloseTo(1.1, 12);
  });

  test('of a triangle is the mean of its corners, also of a flat one', () => {
    fc.assert(
      fc.property(triangle, ([a, b, c]) => {
        const centre = polygonCentroid([a, b, c]);
        const mean = { x: (a.x + b.x + c.x) / 3, y: (a.y + b.y + c.y) / 3 };
        return pointDistance(centre, mean) < 1e-10;
      }),
      { seed: 1, numRuns: 500 },
    );
  });
});

describe('a point in an outline', () => {
  test.each<[string, number, number, boolean, boolean]>([
    ['inside', 0.5, 2, true, true],
    ['in the notch', 2, 2, false, false],
    ['outside', -1, 0.5, false, false],
    ['on an edge', 0, 1.5, true, false],
    ['on a corner', 3, 1, true, false],
    ['on the inner corner', 1, 1, true, false],
    ['beyond an edge by less than the tolerance', -EDGE_TOLERANCE / 2, 1.5, true, false],
    ['beyond an edge by a micrometre', -1e-6, 1.5, false, false],
    ['level with a corner, outside', 4, 1, false, false],
    ['level with a corner, inside', 0.5, 1, true, true],
  ])('%s (%d | %d)', (_where, x, y, contained, strictly) => {
    expect(polygonContains(ELL, { x, y })).toBe(contained);
    expect(polygonContainsStrictly(ELL, { x, y })).toBe(strictly);
    const backwards = [...ELL].reverse();
    expect(polygonContains(backwards, { x, y })).toBe(contained);
    expect(polygonContainsStrictly(backwards, { x, y })).toBe(strictly);
  });

  test('of a triangle is one on the same side of all three edges', () => {
    const side = (a: Point, b: Point, p: Point) => (b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x);
    fc.assert(
      fc.property(triangle, point, ([a, b, c], p) => {
        if (side(a, b, c) === 0) return true;
        const sides = [side(a, b, p), side(b, c, p), side(c, a, p)];
        const inside = sides.every((value) => value > 0) || sides.every((value) => value < 0);
        return polygonContainsStrictly([a, b, c], p) === inside;
      }),
      { seed: 2, numRuns: 2000 },
    );
  });
});

describe('the distance to the edge', () => {
  test('is to the nearest point of the nearest edge', () => {
    expect(polygonNearestEdge(SQUARE, { x: 0.5, y: 0.2 })).toEqual({
      point: { x: 0.5, y: 0 },
      edge: 0,
      distance: 0.2,
    });
    expect(polygonDistance(SQUARE, { x: 5, y: 5 })).toBe(5);
  });

  test('of a point on an edge is nothing', () => {
    fc.assert(
      fc.property(triangle, fc.nat({ max: 2 }), fc.integer({ min: 0, max: 8 }), (corners, edge, part) => {
        const { start, end } = polygonEdges(corners)[edge]!;
        const on = {
          x: start.x + ((end.x - start.x) * part) / 8,
          y: start.y + ((end.y - start.y) * part) / 8,
        };
        return polygonDistance(corners, on) < 1e-12;
      }),
      { seed: 3, numRuns: 500 },
    );
  });

  test('along the axes ends at the first edge that is met', () => {
    expect(polygonAxisDistances(ELL, { x: 0.25, y: 0.5 })).toEqual({
      ahead: 2.75,
      behind: 0.25,
      left: 2.5,
      right: 0.5,
    });
    expect(polygonAxisDistances(ELL, { x: 0.5, y: 2 })).toEqual({
      ahead: 0.5,
      behind: 0.5,
      left: 1,
      right: 2,
    });
    expect(polygonAxisDistances(SQUARE, { x: 5, y: 5 })).toEqual({
      ahead: null,
      behind: null,
      left: null,
      right: null,
    });
  });
});

describe('an outline that a saw could follow', () => {
  test('does not cross or touch itself', () => {
    expect(polygonIsSimple(ELL)).toBe(true);
    expect(polygonIsSimple(BOW)).toBe(false);
    expect(polygonIsSimple([...ELL.slice(0, 3), { x: 0, y: 2 }, ...ELL.slice(4)])).toBe(false);
    expect(polygonIsSimple(polygonRegular({ x: 0, y: 0 }, 1, 40))).toBe(true);
  });
});

describe('an outline moved outward', () => {
  test('grows a rectangle on every side, whichever way it runs', () => {
    expect(polygonOffset(SQUARE, 0.5)).toEqual(polygonRectangle(-0.5, -0.5, 2.5, 1.5));
    expect(polygonArea(polygonOffset([...SQUARE].reverse(), 0.5))).toBe(6);
    expect(polygonOffset(SQUARE, -0.25)).toEqual(polygonRectangle(0.25, 0.25, 1.75, 0.75));
  });

  test('keeps its distance from the edges of a concave one', () => {
    expect(polygonOffset(ELL, 0.25)[3]).toEqual({ x: 1.25, y: 1.25 });
  });

  test('keeps every edge at that distance', () => {
    fc.assert(
      fc.property(fc.integer({ min: 3, max: 24 }), fc.integer({ min: 1, max: 40 }), (corners, tenths) => {
        const outline = polygonRegular({ x: 1, y: -2 }, 2, corners);
        const offset = polygonOffset(outline, tenths / 10);
        return polygonEdges(offset).every(({ start, end }) => {
          const middle = { x: (start.x + end.x) / 2, y: (start.y + end.y) / 2 };
          return Math.abs(polygonDistance(outline, middle) - tenths / 10) < 1e-9;
        });
      }),
      { seed: 4, numRuns: 200 },
    );
  });
});
