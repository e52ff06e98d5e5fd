import { boxAround } from '@/shared/geometry/box';
import { polygonContains, polygonIsSimple, polygonSignedArea } from '@/shared/geometry/polygon';
import { applyOperation } from '@/shared/layout/operations';
import { placementProblem } from '@/shared/layout/placement';
import {
  buildPlatformDocument,
  findStarterPlatform,
  STARTER_PLATFORMS,
  type StarterPlatform,
} from '@/shared/layout/starter-platforms';
import { upgradeDocument } from '@/shared/layout/upgrades';
import { operationOf, whipAt } from './arbitrary-layout';

/** Binary fractions of typed dimensions. */
const ROUNDING = 1e-9;

/** Higher than anything that a starter draws, m: a bracket on a parapet carries a pole. */
const ABOVE_ALL = 50;

function built(starter: StarterPlatform, dimensions: Readonly<Record<string, number>> = {}) {
  const result = buildPlatformDocument(starter.id, dimensions);
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

/** Every dimension at its least, at its most, and each at one end alone. */
function extremes({ dimensions }: StarterPlatform): Readonly<Record<string, number>>[] {
  const all = (end: 'least' | 'most') => Object.fromEntries(dimensions.map((each) => [each.key, each[end]]));
  return [
    {},
    all('least'),
    all('most'),
    ...dimensions.flatMap(({ key, least, most }) => [{ [key]: least }, { [key]: most }]),
  ];
}

test('the outlines that a survey needs are there', () => {
  expect(STARTER_PLATFORMS.map(({ kind }) => kind).sort()).toEqual([
    'handset',
    'handset',
    'rooftop',
    'rooftop',
    'vehicle',
    'vehicle',
    'vehicle',
  ]);
  expect(new Set(STARTER_PLATFORMS.map(({ id }) => id)).size).toBe(STARTER_PLATFORMS.length);
});

describe.each(STARTER_PLATFORMS.map((starter) => [starter.name, starter] as const))(
  '%s',
  (_name, starter) => {
    test('is a document that holds, at every extreme of its dimensions', () => {
      for (const dimensions of extremes(starter)) {
        const result = upgradeDocument(JSON.parse(JSON.stringify(built(starter, dimensions))));
        expect(result.ok ? [] : result.refusal.problems).toEqual([]);
      }
    });

    test('is as long and as wide as was typed, at every extreme', () => {
      for (const dimensions of extremes(starter)) {
        const { platform } = built(starter, dimensions);
        const box = boxAround(platform.outline);
        expect(Math.abs(box.maxX - box.minX - platform.length)).toBeLessThan(ROUNDING);
        expect(Math.abs(box.maxY - box.minY - platform.width)).toBeLessThan(ROUNDING);
      }
    });

    test('has outlines that a saw could follow, anticlockwise, on the platform', () => {
      for (const dimensions of extremes(starter)) {
        const document = built(starter, dimensions);
        const { platform, surfaces, obstacles, keepOuts } = document;
        const all = [...Object.values(surfaces), ...Object.values(obstacles), ...Object.values(keepOuts)];
        const box = boxAround(platform.outline);
        for (const { name, outline } of [platform, ...all]) {
          expect([name, polygonIsSimple(outline)]).toEqual([name, true]);
          expect([name, polygonSignedArea(outline) > 0]).toEqual([name, true]);
        }
        for (const { name, outline } of Object.values(surfaces)) {
          const around = boxAround(outline);
          const inside =
            around.minX >= box.minX - ROUNDING &&
            around.maxX <= box.maxX + ROUNDING &&
            around.minY >= box.minY - ROUNDING &&
            around.maxY <= box.maxY + ROUNDING;
          expect([name, inside]).toEqual([name, true]);
        }
        for (const { name, x, y } of [
          ...Object.values(document.mountPoints),
          ...Object.values(document.cableEntries),
        ]) {
          expect([name, polygonContains(platform.outline, { x, y })]).toEqual([name, true]);
        }
      }
    });

    test('has mount points that an antenna may use, at the latest above what stands there', () => {
      const document = built(starter);
      const refused = Object.values(document.mountPoints).flatMap(({ name, x, y }) => {
        const problem = placementProblem(document, { x, y, mountHeight: ABOVE_ALL });
        return problem ? [`${name}: ${problem.message}`] : [];
      });
      expect(refused).toEqual([]);
    });

    test('has room for an antenna, at every extreme', () => {
      for (const dimensions of extremes(starter)) {
        const document = built(starter, dimensions);
        const box = boxAround(document.platform.outline);
        const steps = Array.from({ length: 21 }, (_, index) => index / 20);
        const accepted = steps.some((along) =>
          steps.some((across) => {
            const x = box.minX + along * (box.maxX - box.minX);
            const y = box.minY + across * (box.maxY - box.minY);
            const operation = operationOf({ kind: 'add', collection: 'antennas', value: whipAt(x, y) });
            return applyOperation(document, operation).ok;
          }),
        );
        expect([dimensions, accepted]).toEqual([dimensions, true]);
      }
    });

    test('is the same document whenever it is built', () => {
      expect(built(starter)).toEqual(built(starter));
    });

    test('refuses what it cannot be, with the dimension', () => {
      const [first] = starter.dimensions;
      if (!first) throw new Error('a starter without dimensions');
      const refused = (value: number) =>
        buildPlatformDocument(starter.id, { [first.key]: value }) as { refusal: { problems: unknown } };
      const path = `dimensions.${first.key}`;
      expect(refused(first.most * 2).refusal.problems).toEqual([
        { path, message: `is more than ${first.most} m` },
      ]);
      expect(refused(0).refusal.problems).toEqual([{ path, message: `is less than ${first.least} m` }]);
      expect(refused(Number.NaN).refusal.problems).toEqual([{ path, message: 'is not a finite number' }]);
    });
  },
);

test('a starter or a dimension that nobody knows is refused', () => {
  expect(findStarterPlatform('submarine')).toBeNull();
  expect(buildPlatformDocument('submarine')).toMatchObject({
    ok: false,
    refusal: { code: 'invalid', problems: [{ path: 'starter' }] },
  });
  expect(buildPlatformDocument('van-roof', { wingspan: 3 })).toMatchObject({
    ok: false,
    refusal: { problems: [{ path: 'dimensions.wingspan', message: 'is not a dimension of this outline' }] },
  });
});
