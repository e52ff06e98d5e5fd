import { polygonCentroid } from '@/shared/geometry/polygon';
import type { LayoutDocument } from '@/shared/layout/document';
import { applyOperation } from '@/shared/layout/operations';
import { misplacedAntennas } from '@/shared/layout/placement';
import { platformDimensions, resizePlatform } from '@/shared/layout/resize-platform';
import { buildPlatformDocument, STARTER_PLATFORMS, type Dimensions } from '@/shared/layout/starter-platforms';
import { idOf, operationOf, whipAt } from './arbitrary-layout';

function built(starterId: string, dimensions: Dimensions = {}): LayoutDocument {
  const result = buildPlatformDocument(starterId, dimensions);
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

/** The document after its changes of size, applied as one operation. */
function resized(document: LayoutDocument, dimensions: Dimensions): LayoutDocument {
  const changes = resizePlatform(document, dimensions);
  if (!changes.ok) throw new Error(changes.refusal.message);
  if (changes.value.length === 0) return document;
  const result = applyOperation(document, operationOf(...changes.value));
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

describe.each(STARTER_PLATFORMS.map((starter) => [starter.name, starter] as const))(
  'resizing %s',
  (_name, starter) => {
    const all = (end: 'least' | 'most' | 'initial') =>
      Object.fromEntries(starter.dimensions.map((each) => [each.key, each[end]]));

    test('gives what would have been drawn with those dimensions', () => {
      for (const dimensions of [all('least'), all('most')]) {
        expect(resized(built(starter.id), dimensions)).toEqual(built(starter.id, dimensions));
      }
    });

    test('and back gives what was there', () => {
      const document = built(starter.id);
      expect(resized(resized(document, all('most')), all('initial'))).toEqual(document);
    });

    test('by nothing changes nothing', () => {
      expect(resizePlatform(built(starter.id), {})).toEqual({ ok: true, value: [] });
    });

    test('reads every dimension back as it was typed', () => {
      expect(platformDimensions(built(starter.id, all('most')))).toEqual(all('most'));
    });
  },
);

describe('resizing a surveyed platform', () => {
  const document = built('van-roof');
  const { length } = document.platform;

  test('keeps the size of what was added by hand and moves it with its place', () => {
    const box = { id: idOf('box'), name: 'Tool box', base: 0, height: 0.2, metal: true };
    const outline = [
      { x: length / 2, y: 0 },
      { x: length / 2 + 0.2, y: 0 },
      { x: length / 2 + 0.2, y: 0.1 },
      { x: length / 2, y: 0.1 },
    ];
    const surveyed = { ...document, obstacles: { ...document.obstacles, [box.id]: { ...box, outline } } };
    const after = resized(surveyed, { length: length * 1.2 }).obstacles[box.id]?.outline ?? [];
    expect(after).toHaveLength(4);
    expect((after[1]?.x ?? 0) - (after[0]?.x ?? 0)).toBeCloseTo(0.2, 9);
    expect(polygonCentroid(after).x).toBeCloseTo(1.2 * (length / 2 + 0.1), 9);
  });

  test('leaves antennas where they were measured, and tells which stand in the air then', () => {
    const far = whipAt(length - 0.02, 0);
    const surveyed = { ...document, obstacles: {}, keepOuts: {}, antennas: { [far.id]: far } };
    expect(misplacedAntennas(surveyed)).toEqual([]);
    const after = resized(surveyed, { length: length * 0.8 });
    expect(after.antennas[far.id]).toEqual(far);
    expect(misplacedAntennas(after).map(({ antenna, problem }) => [antenna.label, problem.code])).toEqual([
      ['A1', 'off-surface'],
    ]);
  });

  test('refuses a dimension out of its range, with its path', () => {
    expect(resizePlatform(document, { length: 1000 })).toMatchObject({
      ok: false,
      refusal: { code: 'invalid', problems: [{ path: 'dimensions.length' }] },
    });
  });
});
