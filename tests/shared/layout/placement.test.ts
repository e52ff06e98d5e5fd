import fc from 'fast-check';
import { polygonRectangle } from '@/shared/geometry/polygon';
import type { LayoutDocument } from '@/shared/layout/document';
import { misplacedAntennas, placementProblem, surfaceAt, verticalExtent } from '@/shared/layout/placement';
import { BARE_ROOF, idOf, whipAt } from './arbitrary-layout';

const PLINTH = {
  id: idOf('plinth'),
  name: 'Plinth',
  outline: polygonRectangle(0.5, -0.5, 1.5, 0.5),
  height: 2.8,
  conducting: false,
};
const HATCH = {
  id: idOf('hatch'),
  name: 'Hatch',
  outline: polygonRectangle(3, -0.5, 3.8, 0.5),
  reason: 'It opens here',
};
const RACK = {
  id: idOf('rack'),
  name: 'Roof rack',
  outline: polygonRectangle(2, -0.5, 2.8, 0.5),
  base: 0.2,
  height: 0.1,
  metal: true,
};

const DOCUMENT: LayoutDocument = {
  ...BARE_ROOF,
  surfaces: { ...BARE_ROOF.surfaces, [PLINTH.id]: PLINTH },
  keepOuts: { [HATCH.id]: HATCH },
  obstacles: { [RACK.id]: RACK },
};

/** Where something without a height of its own would stand. */
const spot = (x: number, y: number, mountHeight = 0) => ({ x, y, mountHeight });

describe('the surface under a point', () => {
  test('is the highest of those that hold it', () => {
    expect(surfaceAt(DOCUMENT, { x: 1, y: 0 })?.name).toBe('Plinth');
    expect(surfaceAt(DOCUMENT, { x: 2, y: 0 })?.name).toBe('Roof');
    expect(surfaceAt(DOCUMENT, { x: 5, y: 0 })).toBeNull();
  });

  test('reaches to its edge, and a thousandth of a millimetre beyond it does not', () => {
    expect(surfaceAt(DOCUMENT, { x: 4, y: 1 })?.name).toBe('Roof');
    expect(surfaceAt(DOCUMENT, { x: 4 + 1e-6, y: 0 })).toBeNull();
  });
});

describe('an antenna', () => {
  test('stands off the surface beside it', () => {
    expect(placementProblem(DOCUMENT, spot(-0.01, 0))).toEqual({
      code: 'off-surface',
      message: 'It would stand off the surface.',
      objectId: null,
    });
  });

  test('may not stand in a keep-out, and hears its reason', () => {
    expect(placementProblem(DOCUMENT, spot(3.4, 0))).toEqual({
      code: 'keep-out',
      message: 'It would stand in the keep-out “Hatch”: It opens here.',
      objectId: HATCH.id,
    });
  });

  test('may stand on the edge of a keep-out', () => {
    expect(placementProblem(DOCUMENT, spot(3, 0))).toBeNull();
    expect(placementProblem(DOCUMENT, spot(3 + 1e-6, 0))?.code).toBe('keep-out');
  });

  test('a keep-out holds at any height', () => {
    expect(placementProblem(DOCUMENT, spot(3.4, 0, 10))?.code).toBe('keep-out');
  });

  test.each([
    ['whose tip is below it', 0, 0.15, null],
    ['whose tip reaches into it', 0, 0.25, 'obstacle'],
    ['that passes through it', 0, 0.5, 'obstacle'],
    ['whose foot is in it', 0.25, 0.5, 'obstacle'],
    ['that stands on top of it', 0.3, 0.5, null],
  ])('under, in or over an obstacle: one %s', (_what, mountHeight, length, code) => {
    const whip = whipAt(2.4, 0);
    const element = { ...whip.part.elements[0]!, length };
    const antenna = { ...whip, mountHeight, part: { name: 'Whip', elements: [element] } };
    expect(placementProblem(DOCUMENT, antenna)?.code ?? null).toBe(code);
  });

  test('a dipole reaches half its length below its mount, a declared element nowhere', () => {
    const whip = whipAt(0, 0).part.elements[0]!;
    const offset = { x: 0, y: 0, z: 0.1 };
    const extent = (element: object) =>
      verticalExtent({
        ...spot(0, 0, 1),
        part: { name: 'Part', elements: [{ ...whip, offset, ...element } as typeof whip] },
      });
    expect(extent({ form: 'whip', length: 0.5 })).toEqual({ low: 1, high: 1.6 });
    expect(extent({ form: 'dipole', length: 0.5 }).low).toBeCloseTo(0.85, 12);
    expect(extent({ form: 'dipole', length: 0.5 }).high).toBeCloseTo(1.35, 12);
    expect(extent({ kind: 'declared' })).toEqual({ low: 1, high: 1.1 });
  });

  test('that the platform left behind is found, in the order of the labels', () => {
    const antennas = [
      whipAt(5, 0, { id: idOf('ten'), label: 'A10' }),
      whipAt(1, 0, { id: idOf('two'), label: 'A2' }),
      whipAt(3.4, 0, { id: idOf('three'), label: 'A3' }),
    ];
    const document = { ...DOCUMENT, antennas: Object.fromEntries(antennas.map((each) => [each.id, each])) };
    expect(misplacedAntennas(document).map(({ antenna, problem }) => [antenna.label, problem.code])).toEqual([
      ['A3', 'keep-out'],
      ['A10', 'off-surface'],
    ]);
  });

  test('is judged the same when platform and antenna move together', () => {
    const shift = fc.integer({ min: -50, max: 50 }).map((n) => n / 8);
    const place = fc.integer({ min: -160, max: 640 }).map((n) => n / 128);
    fc.assert(
      fc.property(place, place, shift, shift, (x, y, dx, dy) => {
        const moved = <T extends { readonly outline: readonly { x: number; y: number }[] }>(
          object: T,
        ): T => ({
          ...object,
          outline: object.outline.map((point) => ({ x: point.x + dx, y: point.y + dy })),
        });
        const map = <T extends { readonly outline: readonly { x: number; y: number }[] }>(
          all: Readonly<Record<string, T>>,
        ) => Object.fromEntries(Object.entries(all).map(([id, object]) => [id, moved(object)]));
        const document = {
          ...DOCUMENT,
          surfaces: map(DOCUMENT.surfaces),
          keepOuts: map(DOCUMENT.keepOuts),
          obstacles: map(DOCUMENT.obstacles),
        };
        const [here, there] = [
          placementProblem(DOCUMENT, { ...spot(x, y), part: whipAt(0, 0).part }),
          placementProblem(document, { ...spot(x + dx, y + dy), part: whipAt(0, 0).part }),
        ];
        return here?.code === there?.code;
      }),
      { seed: 51, numRuns: 1000 },
    );
  });
});
