import fc from 'fast-check';
import { pointDistance } from '@/shared/geometry/point';
import {
  IDENTITY,
  transformApply,
  transformCompose,
  transformInvert,
  transformRotate,
  transformScale,
  transformTranslate,
  type Transform,
} from '@/shared/geometry/transform';

const number = fc.integer({ min: -100, max: 100 });
const point = fc.record({ x: number, y: number });
const turning: fc.Arbitrary<Transform> = fc
  .tuple(number, number, fc.integer({ min: 1, max: 20 }), fc.integer({ min: -360, max: 360 }))
  .map(([x, y, scale, angle]) =>
    transformCompose(
      transformTranslate(x, y),
      transformCompose(transformScale(scale, -scale), transformRotate(angle)),
    ),
  );

/** Products of a few numbers up to 1e4 in double precision. */
const ROUNDING = 1e-8;

describe('a map of the plane', () => {
  test('moves, stretches and turns', () => {
    expect(transformApply(IDENTITY, { x: 3, y: 4 })).toEqual({ x: 3, y: 4 });
    expect(transformApply(transformTranslate(1, -2), { x: 3, y: 4 })).toEqual({ x: 4, y: 2 });
    expect(transformApply(transformScale(2, -1), { x: 3, y: 4 })).toEqual({ x: 6, y: -4 });
    const turned = transformApply(transformRotate(90), { x: 3, y: 0 });
    expect(turned.x).toBeCloseTo(0, 12);
    expect(turned.y).toBeCloseTo(3, 12);
  });

  test('after another is one map', () => {
    fc.assert(
      fc.property(turning, turning, point, (second, first, p) => {
        const both = transformApply(transformCompose(second, first), p);
        return pointDistance(both, transformApply(second, transformApply(first, p))) < ROUNDING;
      }),
      { seed: 11, numRuns: 300 },
    );
  });

  test('is undone by its inverse', () => {
    fc.assert(
      fc.property(
        turning,
        point,
        (map, p) => pointDistance(transformApply(transformInvert(map), transformApply(map, p)), p) < ROUNDING,
      ),
      { seed: 12, numRuns: 300 },
    );
  });

  test('that flattens the plane has no inverse', () => {
    expect(() => transformInvert(transformScale(1, 0))).toThrow('flattens the plane');
  });
});
