import fc from 'fast-check';
import {
  bearingNormalise,
  pointAdd,
  pointBearingDeg,
  pointDistance,
  pointSubtract,
} from '@/shared/geometry/point';

describe('points', () => {
  test('add and subtract as vectors', () => {
    expect(pointAdd({ x: 1, y: 2 }, { x: 3, y: -4 })).toEqual({ x: 4, y: -2 });
    expect(pointSubtract({ x: 1, y: 2 }, { x: 3, y: -4 })).toEqual({ x: -2, y: 6 });
    expect(pointDistance({ x: 1, y: 1 }, { x: 4, y: 5 })).toBe(5);
  });
});

describe('a bearing', () => {
  test.each([
    ['forward', 1, 0, 0],
    ['to the right', 0, -1, 90],
    ['backward', -1, 0, 180],
    ['to the left', 0, 1, 270],
    ['forward and right', 1, -1, 45],
  ])('%s (%d | %d) is %d degrees', (_where, x, y, bearing) => {
    expect(pointBearingDeg({ x: 5, y: 5 }, { x: 5 + x, y: 5 + y })).toBeCloseTo(bearing, 10);
  });

  test('is brought into one turn, and is never a negative zero', () => {
    expect([0, 360, -360, 720, -90, 450].map(bearingNormalise)).toEqual([0, 0, 0, 0, 270, 90]);
    expect(Object.is(bearingNormalise(-360), 0)).toBe(true);
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), (bearing) => {
        const turned = bearingNormalise(bearing);
        return turned >= 0 && turned < 360 && bearingNormalise(turned) === turned;
      }),
      { seed: 9, numRuns: 500 },
    );
  });

  test('back is the opposite', () => {
    const number = fc.integer({ min: -100, max: 100 });
    fc.assert(
      fc.property(number, number, (x, y) => {
        if (x === 0 && y === 0) return true;
        const [there, back] = [
          pointBearingDeg({ x: 0, y: 0 }, { x, y }),
          pointBearingDeg({ x, y }, { x: 0, y: 0 }),
        ];
        return Math.abs(Math.abs(there - back) - 180) < 1e-10;
      }),
      { seed: 10, numRuns: 300 },
    );
  });
});
