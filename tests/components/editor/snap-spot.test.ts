import fc from 'fast-check';
import { snapSpot } from '@/components/editor/snap-spot';
import { vanRoof } from '@/tests/support/van-roof';

const van = vanRoof();
const a1 = Object.values(van.antennas).find(({ label }) => label === 'A1');

test('a position away from everything lies on the grid', () => {
  expect(snapSpot(van, { x: 1.0137, y: 0.5683 }, [], { tolerance: 0.02 })).toEqual({
    point: { x: 1.01, y: 0.57 },
    guides: [],
  });
});

test('a mount point wins over grid and rows and is met exactly, off the grid as it is', () => {
  const { point, guides } = snapSpot(van, { x: 2.5, y: 0.8 }, [], { tolerance: 0.03 });
  expect(point).toEqual({ x: 2.513, y: 0.807 });
  expect(guides.map(({ kind }) => kind)).toEqual(['mount-point']);
});

test('the centre line and the row of another antenna draw one axis each', () => {
  const { point, guides } = snapSpot(van, { x: 0.515, y: 0.014 }, [], { tolerance: 0.02 });
  expect(point).toEqual({ x: 0.5, y: 0 });
  expect(guides.map(({ kind }) => kind)).toEqual(['antenna', 'centre-line']);
});

test('the held antenna does not snap to itself', () => {
  const { guides } = snapSpot(van, { x: 0.505, y: 0.6 }, [a1?.id ?? ''], { tolerance: 0.02 });
  expect(guides).toEqual([]);
});

test('without snapping the position is the pointer’s', () => {
  const wanted = { x: 0.50123, y: -0.29877 };
  expect(snapSpot(van, wanted, [], { snap: false })).toEqual({ point: wanted, guides: [] });
});

test('snapping never moves a position further than the tolerance or half a grid step along an axis', () => {
  const coordinate = fc.double({ min: -2, max: 5, noNaN: true });
  fc.assert(
    fc.property(coordinate, coordinate, fc.double({ min: 0, max: 0.2, noNaN: true }), (x, y, tolerance) => {
      const { point } = snapSpot(van, { x, y }, [], { tolerance });
      // A nanometre for the tidying of coordinates.
      const most = Math.max(tolerance, 0.005) + 1e-9;
      expect(Math.abs(point.x - x)).toBeLessThanOrEqual(most);
      expect(Math.abs(point.y - y)).toBeLessThanOrEqual(most);
    }),
    { seed: 20_310_306, numRuns: 300 },
  );
});
