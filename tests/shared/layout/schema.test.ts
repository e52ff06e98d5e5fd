import fc from 'fast-check';
import { LIMITS } from '@/shared/layout/limits';
import {
  antennaPartSchema,
  layoutDocumentCodec,
  layoutDocumentSchema,
  operationSchema,
  radioSchema,
} from '@/shared/layout/schema';
import {
  BARE_ROOF,
  idOf,
  operationFor,
  operationOf,
  plainRadio,
  someDocument,
  someIntents,
  whipAt,
} from './arbitrary-layout';

/** Paths and messages of what a schema finds wrong. */
function issuesOf(result: {
  success: boolean;
  error?: { issues: { path: PropertyKey[]; message: string }[] };
}) {
  return (result.error?.issues ?? []).map(({ path, message }) => [path.join('.'), message]);
}

/** So many objects by their identifiers. */
function many<T>(count: number, build: (id: string) => T): Record<string, T> {
  const ids = Array.from({ length: count }, (_, index) => idOf(`many ${index}`));
  return Object.fromEntries(ids.map((id) => [id, build(id)]));
}

describe('the schema of a document', () => {
  test('takes every document that holds, as it is', () => {
    fc.assert(
      fc.property(someDocument, (document) => {
        const result = layoutDocumentSchema.safeParse(document);
        return result.success && result.data === document;
      }),
      { seed: 61, numRuns: 150 },
    );
  });

  test('a document comes back from its stored text as it was', () => {
    fc.assert(
      fc.property(someDocument, (document) => {
        expect(layoutDocumentCodec.decode(layoutDocumentCodec.encode(document))).toEqual(document);
      }),
      { seed: 62, numRuns: 100 },
    );
  });

  test('stored text that is no document is refused, not read', () => {
    expect(layoutDocumentCodec.safeDecode('{').success).toBe(false);
    expect(layoutDocumentCodec.safeDecode('[]').success).toBe(false);
    expect(layoutDocumentCodec.safeDecode('null').success).toBe(false);
  });

  test.each<[string, unknown, string, string]>([
    ['an unknown key', { ...BARE_ROOF, colour: 'red' }, 'colour', 'is not a field we know'],
    ['a missing collection', { ...BARE_ROOF, antennas: undefined }, 'antennas', 'is missing'],
    ['a list for a collection', { ...BARE_ROOF, antennas: [] }, 'antennas', 'is not an object'],
    [
      'a platform of no kind',
      { ...BARE_ROOF, platform: { ...BARE_ROOF.platform, kind: 'boat' } },
      'platform.kind',
      'is none of vehicle, rooftop, handset',
    ],
    [
      'a platform of no length',
      { ...BARE_ROOF, platform: { ...BARE_ROOF.platform, length: 0 } },
      'platform.length',
      'must be more than zero',
    ],
    [
      'an outline on one line',
      {
        ...BARE_ROOF,
        platform: {
          ...BARE_ROOF.platform,
          outline: [
            { x: 0, y: 0 },
            { x: 1, y: 1 },
            { x: 2, y: 2 },
          ],
        },
      },
      'platform.outline',
      'encloses no area',
    ],
    [
      'an antenna under another identifier',
      { ...BARE_ROOF, antennas: { [idOf('other')]: whipAt(1, 0) } },
      `antennas.${idOf('other')}`,
      'is filed under another identifier',
    ],
    [
      'a reference that points nowhere',
      { ...BARE_ROOF, antennas: { [idOf('whip')]: whipAt(1, 0, { radioId: idOf('nobody') }) } },
      `antennas.${idOf('whip')}.radioId`,
      'names a radio that does not exist',
    ],
  ])('refuses %s with its path', (_what, document, path, message) => {
    expect(issuesOf(layoutDocumentSchema.safeParse(document))).toContainEqual([path, message]);
  });

  test('refuses more antennas than a layout may hold', () => {
    const whips = many(LIMITS.antennas + 1, (id) => whipAt(1, 0, { id }));
    expect(issuesOf(layoutDocumentSchema.safeParse({ ...BARE_ROOF, antennas: whips }))).toEqual([
      ['antennas', 'holds more than 64'],
    ]);
  });

  test('refuses a document of more than a megabyte that keeps every other limit', () => {
    const longName = '天'.repeat(LIMITS.nameLength);
    const outline = BARE_ROOF.platform.outline;
    const declared = (id: string) => ({
      id,
      kind: 'declared' as const,
      form: longName,
      gainDbi: 0,
      polarisation: 'vertical' as const,
      band: { from: 1e8, to: 2e8 },
      offset: { x: 0, y: 0, z: 0 },
    });
    const part = { name: longName, elements: Object.values(many(LIMITS.elementsPerPart, declared)) };
    const large = {
      ...BARE_ROOF,
      antennas: many(LIMITS.antennas, (id) => whipAt(1, 0, { id, name: longName, part })),
      keepOuts: many(LIMITS.keepOuts, (id) => ({ id, name: longName, outline, reason: longName })),
      obstacles: many(LIMITS.obstacles, (id) => ({
        id,
        name: longName,
        outline,
        base: 0,
        height: 1,
        metal: true,
      })),
      mountPoints: many(LIMITS.mountPoints, (id) => ({ id, name: longName, x: 0, y: 0 })),
      radios: many(LIMITS.radios, (id) => ({ ...plainRadio('radio'), id, name: longName })),
    };
    expect(issuesOf(layoutDocumentSchema.safeParse(large))).toEqual([['', 'is larger than 1 MB']]);
  });

  test('survives anything that JSON can hold', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        layoutDocumentSchema.safeParse(value);
        operationSchema.safeParse(value);
        return true;
      }),
      { seed: 63, numRuns: 300 },
    );
  });
});

describe('the schema of an operation', () => {
  test('takes every operation by its form and alters nothing in it', () => {
    fc.assert(
      fc.property(someDocument, someIntents, (document, intents) => {
        const operation = operationFor(document, intents);
        const result = operationSchema.safeParse(operation);
        return operation.changes.length === 0 ? !result.success : result.success && result.data === operation;
      }),
      { seed: 64, numRuns: 200 },
    );
  });

  test.each<[string, unknown, string]>([
    ['an unknown key', { ...operationOf(), author: 'me' }, 'author'],
    ['an identifier of another form', { ...operationOf(), id: '1' }, 'id'],
    ['an unknown kind of change', { ...operationOf(), changes: [{ kind: 'swap' }] }, 'changes.0.kind'],
    [
      'an unknown collection',
      { ...operationOf(), changes: [{ kind: 'remove', collection: 'people', id: idOf('x') }] },
      'changes.0.collection',
    ],
    [
      'a prototype for a collection',
      { ...operationOf(), changes: [{ kind: 'remove', collection: '__proto__', id: idOf('x') }] },
      'changes.0.collection',
    ],
    [
      'an added object with a wrong field',
      {
        ...operationOf(),
        changes: [{ kind: 'add', collection: 'antennas', value: { ...whipAt(1, 0), tiltDeg: 91 } }],
      },
      'changes.0.value.tiltDeg',
    ],
  ])('refuses %s with its path', (_what, operation, path) => {
    expect(issuesOf(operationSchema.safeParse(operation)).map(([where]) => where)).toContain(path);
  });
});

describe('the schemas of the shelf', () => {
  test('trim a name and keep what stands in it as text', () => {
    const { id: _id, ...radio } = plainRadio('one');
    const shelf = radioSchema.omit({ id: true });
    expect(shelf.parse({ ...radio, name: '  <b>Marine</b> ' }).name).toBe('<b>Marine</b>');
    expect(antennaPartSchema.parse({ ...whipAt(0, 0).part, name: ' Whip\t' }).name).toBe('Whip');
  });

  test.each<[string, object, string, string]>([
    ['a negative power', { power: -1 }, 'power', 'is less than 0 W'],
    ['an infinite bandwidth', { bandwidth: Infinity }, 'bandwidth', 'is not a finite number'],
    ['noise above the carrier', { noiseDbcPerHz: 3 }, 'noiseDbcPerHz', 'is more than 0 dBc/Hz'],
    [
      'a band upside down',
      { transmitBands: [{ from: 2e8, to: 1e8 }] },
      'transmitBands.0.to',
      'must be above the lower end of the band',
    ],
    ['a name of nothing', { name: '  ' }, 'name', 'is empty'],
  ])('refuse a radio with %s', (_what, fields, path, message) => {
    expect(issuesOf(radioSchema.safeParse({ ...plainRadio('one'), ...fields }))).toContainEqual([
      path,
      message,
    ]);
  });

  test('refuse a wire thicker than long, and an element named twice', () => {
    const element = whipAt(0, 0).part.elements[0]!;
    expect(
      issuesOf(antennaPartSchema.safeParse({ name: 'x', elements: [{ ...element, length: 0.001 }] })),
    ).toContainEqual(['elements.0.radius', 'is too large for the length']);
    expect(issuesOf(antennaPartSchema.safeParse({ name: 'x', elements: [element, element] }))).toContainEqual(
      ['elements', 'names an element twice'],
    );
  });
});
