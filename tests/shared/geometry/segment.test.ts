import fc from 'fast-check';
import { pointDistance, type Point } from '@/shared/geometry/point';
import { segmentDistance, segmentNearestPoint, segmentsMeet, type Segment } from '@/shared/geometry/segment';

const segment = (x1: number, y1: number, x2: number, y2: number): Segment => ({
  start: { x: x1, y: y1 },
  end: { x: x2, y: y2 },
});

const eighths = fc.integer({ min: -80, max: 80 }).map((n) => n / 8);
const somePoint: fc.Arbitrary<Point> = fc.record({ x: eighths, y: eighths });
const someSegment: fc.Arbitrary<Segment> = fc.record({ start: somePoint, end: somePoint });

describe('the nearest point of a segment', () => {
  test.each<[string, Point, Point]>([
    ['beside it', { x: 1, y: 3 }, { x: 1, y: 0 }],
    ['before its start', { x: -2, y: 1 }, { x: 0, y: 0 }],
    ['behind its end', { x: 9, y: -1 }, { x: 4, y: 0 }],
    ['on it', { x: 3, y: 0 }, { x: 3, y: 0 }],
  ])('to a point %s', (_where, point, nearest) => {
    expect(segmentNearestPoint(segment(0, 0, 4, 0), point)).toEqual(nearest);
  });

  test('of one without length is where it is', () => {
    expect(segmentDistance(segment(1, 1, 1, 1), { x: 4, y: 5 })).toBe(5);
  });

  test('is nearer than any other point of it', () => {
    fc.assert(
      fc.property(someSegment, somePoint, fc.integer({ min: 0, max: 64 }), (line, point, part) => {
        const on = {
          x: line.start.x + ((line.end.x - line.start.x) * part) / 64,
          y: line.start.y + ((line.end.y - line.start.y) * part) / 64,
        };
        return segmentDistance(line, point) <= pointDistance(on, point) + 1e-12;
      }),
      { seed: 5, numRuns: 1000 },
    );
  });
});

describe('two segments', () => {
  test.each<[string, Segment, Segment, boolean]>([
    ['that cross', segment(0, 0, 2, 2), segment(0, 2, 2, 0), true],
    ['that share an end', segment(0, 0, 2, 2), segment(2, 2, 5, 0), true],
    ['of which one ends on the other', segment(0, 0, 4, 0), segment(2, 0, 2, 3), true],
    ['on one line that overlap', segment(0, 0, 3, 0), segment(2, 0, 5, 0), true],
    ['of which one lies in the other', segment(0, 0, 9, 0), segment(2, 0, 5, 0), true],
    ['on one line apart', segment(0, 0, 1, 0), segment(2, 0, 5, 0), false],
    ['that are parallel', segment(0, 0, 4, 0), segment(0, 1, 4, 1), false],
    ['whose lines cross beyond them', segment(0, 0, 1, 1), segment(4, 0, 3, 1), false],
    ['that are one point on the other', segment(0, 0, 4, 0), segment(1, 0, 1, 0), true],
    ['that are two points apart', segment(0, 0, 0, 0), segment(1, 0, 1, 0), false],
  ])('%s', (_what, a, b, meet) => {
    expect(segmentsMeet(a, b)).toBe(meet);
  });

  test('meet whichever is named first and whichever way they run', () => {
    const turned = ({ start, end }: Segment): Segment => ({ start: end, end: start });
    fc.assert(
      fc.property(someSegment, someSegment, (a, b) => {
        const meet = segmentsMeet(a, b);
        return (
          meet === segmentsMeet(b, a) &&
          meet === segmentsMeet(turned(a), b) &&
          meet === segmentsMeet(a, turned(b))
        );
      }),
      { seed: 6, numRuns: 2000 },
    );
  });
});
