import fc from 'fast-check';
import {
  betterTurn,
  fitBox,
  panBy,
  scaleRange,
  screenAngle,
  toPlan,
  toScreen,
  zoomAbout,
  type Turn,
  type Viewport,
} from '@/components/canvas/viewport';

const turn = fc.constantFrom<Turn>('right', 'up');
const pixel = fc.integer({ min: -2000, max: 2000 });
const metres = fc.integer({ min: -1000, max: 1000 }).map((n) => n / 100);
const view: fc.Arbitrary<Viewport> = fc.record({
  scale: fc.integer({ min: 1, max: 5000 }),
  originX: pixel,
  originY: pixel,
  turn,
});
const place = fc.record({ x: metres, y: metres });
const NO_INSETS = { top: 0, right: 0, bottom: 0, left: 0 };

describe('the view of a plan', () => {
  test('puts forward where it is said to point, and left of it to the left', () => {
    const at = { scale: 100, originX: 50, originY: 60 };
    expect(toScreen({ ...at, turn: 'right' }, { x: 1, y: 0.5 })).toEqual({ x: 150, y: 10 });
    expect(toScreen({ ...at, turn: 'up' }, { x: 1, y: 0.5 })).toEqual({ x: 0, y: -40 });
  });

  test('goes from the plan to the screen and back', () => {
    fc.assert(
      fc.property(view, place, (v, point) => {
        const back = toPlan(v, toScreen(v, point));
        // pixels up to 1e5 hold 1e-11; the smallest scale is a pixel a metre
        return Math.hypot(back.x - point.x, back.y - point.y) < 1e-9;
      }),
      { seed: 1, numRuns: 500 },
    );
  });

  test('points a bearing where a step along it goes', () => {
    fc.assert(
      fc.property(turn, fc.integer({ min: 0, max: 359 }), (way, bearing) => {
        const radians = (bearing * Math.PI) / 180;
        // clockwise from forward: the platform's left is negative
        const step = { x: Math.cos(radians), y: -Math.sin(radians) };
        const drawn = toScreen({ scale: 1, originX: 0, originY: 0, turn: way }, step);
        const angle = screenAngle(way, bearing);
        return Math.hypot(drawn.x - Math.cos(angle), drawn.y - Math.sin(angle)) < 1e-12;
      }),
      { seed: 2, numRuns: 300 },
    );
  });

  test('keeps what is under the fingers there while it is zoomed', () => {
    const range = { least: 1, most: 10_000 };
    fc.assert(
      fc.property(view, place, fc.double({ min: 0.2, max: 5, noNaN: true }), (v, point, factor) => {
        const about = toScreen(v, point);
        const after = toScreen(zoomAbout(v, about, factor, range), point);
        return Math.hypot(after.x - about.x, after.y - about.y) < 1e-6;
      }),
      { seed: 3, numRuns: 300 },
    );
  });

  test('zooms no farther than its range', () => {
    const v: Viewport = { scale: 100, originX: 0, originY: 0, turn: 'right' };
    const range = { least: 50, most: 400 };
    expect(zoomAbout(v, { x: 0, y: 0 }, 100, range).scale).toBe(400);
    expect(zoomAbout(v, { x: 0, y: 0 }, 0.001, range).scale).toBe(50);
    expect(panBy(v, 3, -4)).toEqual({ ...v, originX: 3, originY: -4 });
  });

  test('fitted shows the whole platform between the insets, whichever way it lies', () => {
    const size = { width: 390, height: 844 };
    const insets = { top: 60, right: 20, bottom: 180, left: 20 };
    fc.assert(
      fc.property(
        turn,
        place,
        fc.integer({ min: 1, max: 60 }),
        fc.integer({ min: 1, max: 60 }),
        (way, at, long, wide) => {
          const box = { minX: at.x, minY: at.y, maxX: at.x + long / 4, maxY: at.y + wide / 4 };
          const fitted = fitBox(box, size, insets, way);
          const corners = [
            { x: box.minX, y: box.minY },
            { x: box.maxX, y: box.maxY },
          ].map((corner) => toScreen(fitted, corner));
          return corners.every(
            ({ x, y }) => x >= 20 - 1e-6 && x <= 370 + 1e-6 && y >= 60 - 1e-6 && y <= 664 + 1e-6,
          );
        },
      ),
      { seed: 4, numRuns: 300 },
    );
  });

  test('stands a long platform up on a phone and lays it down on a desktop', () => {
    const van = { minX: 0, minY: -1, maxX: 5, maxY: 1 };
    expect(betterTurn(van, { width: 390, height: 844 }, NO_INSETS)).toBe('up');
    expect(betterTurn(van, { width: 1440, height: 900 }, NO_INSETS)).toBe('right');
    expect(betterTurn({ ...van, maxX: 2 }, { width: 500, height: 500 }, NO_INSETS)).toBe('right');
  });

  test('of a board can be zoomed until a tenth of a millimetre is seen', () => {
    const board = { minX: 0, minY: 0, maxX: 0.15, maxY: 0.072 };
    expect(scaleRange(board, { width: 390, height: 844 }, NO_INSETS).most).toBeGreaterThan(10_000);
  });
});
