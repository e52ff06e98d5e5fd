import fc from 'fast-check';
import type {
  AntennaPart,
  CollectionName,
  LayoutDocument,
  ObjectOf,
  PlacedAntenna,
  Point,
  Radio,
} from '@/shared/layout/document';
import { idFromName } from '@/shared/layout/named-id';
import type { Change, Operation } from '@/shared/layout/operation';
import { collectionOf } from '@/shared/layout/operations';
import { COLLECTION_NAMES } from '@/shared/layout/rules/document-rules';

/** Random documents that hold, and random operations on them, for the laws of `shared/layout`. */

/** An identifier that a test can name. */
export const idOf = (name: string) => idFromName(`test ${name}`);

const name = fc.constantFrom(
  'Mast',
  'Light bar',
  '<script>alert(1)</script>',
  'Träger ½',
  '天線',
  'a'.repeat(120),
);
const centimetres = (least: number, most: number) =>
  fc.integer({ min: least, max: most }).map((n) => n / 100);
const point: fc.Arbitrary<Point> = fc.record({ x: centimetres(0, 400), y: centimetres(-100, 100) });
const rectangle: fc.Arbitrary<Point[]> = fc
  .tuple(point, centimetres(1, 100), centimetres(1, 100))
  .map(([{ x, y }, length, width]) => [
    { x, y },
    { x: x + length, y },
    { x: x + length, y: y + width },
    { x, y: y + width },
  ]);
const band = fc
  .tuple(fc.integer({ min: 100, max: 6000 }), fc.integer({ min: 1, max: 100 }))
  .map(([from, width]) => ({ from: from * 1e6, to: (from + width) * 1e6 }));

const part: fc.Arbitrary<AntennaPart> = fc.record({
  name,
  elements: fc.oneof(
    fc
      .record({ form: fc.constantFrom('whip' as const, 'dipole'), length: centimetres(3, 150) })
      .map((wire) => [
        {
          id: idOf('element'),
          kind: 'wire' as const,
          radius: 0.001,
          quarterWaveAt: null,
          offset: ORIGIN,
          ...wire,
        },
      ]),
    band.map((range) => [
      {
        id: idOf('element'),
        kind: 'declared' as const,
        form: 'patch',
        gainDbi: 3,
        polarisation: 'circular' as const,
        band: range,
        offset: ORIGIN,
      },
    ]),
  ),
});

const ORIGIN = { x: 0, y: 0, z: 0 };

const radio: fc.Arbitrary<Omit<Radio, 'id'>> = fc.record({
  name,
  receiveOnly: fc.boolean(),
  transmitBands: fc.array(band, { maxLength: 2 }),
  receiveBands: fc.array(band, { maxLength: 2 }),
  power: fc.integer({ min: 0, max: 100 }),
  noiseDbcPerHz: fc.integer({ min: -180, max: -100 }),
  noiseFigureDb: fc.integer({ min: 0, max: 20 }),
  bandwidth: fc.integer({ min: 1000, max: 20_000_000 }),
  overloadDbm: fc.integer({ min: -60, max: 10 }),
  rejections: fc.array(
    band.map((range) => ({ ...range, rejectionDb: 40 })),
    { maxLength: 2 },
  ),
});

const antenna = fc.record({
  label: fc.integer({ min: 1, max: 99 }).map((number) => `A${number}`),
  name,
  part,
  x: centimetres(0, 400),
  y: centimetres(-100, 100),
  mountHeight: centimetres(0, 100),
  azimuthDeg: fc.integer({ min: -360, max: 360 }),
  tiltDeg: fc.integer({ min: 0, max: 90 }),
  feederLossDb: fc.integer({ min: 0, max: 30 }).map((n) => n / 10),
});

/** Values of an object of each collection, without what refers to another object. */
const BODIES: { readonly [C in CollectionName]: fc.Arbitrary<object> } = {
  surfaces: fc.record({ name, outline: rectangle, height: centimetres(0, 400), conducting: fc.boolean() }),
  obstacles: fc.record({
    name,
    outline: rectangle,
    base: centimetres(0, 30),
    height: centimetres(1, 60),
    metal: fc.boolean(),
  }),
  keepOuts: fc.record({ name, outline: rectangle, reason: name }),
  mountPoints: fc.record({ name, x: centimetres(0, 400), y: centimetres(-100, 100) }),
  cableEntries: fc.record({ name, x: centimetres(0, 400), y: centimetres(-100, 100) }),
  radios: radio,
  neverTogether: fc.record({ rule: name }),
  antennas: antenna,
};

/** What somebody means to do; which object and which radio it touches is chosen by number when it is done. */
export type Intent = {
  readonly do: 'add' | 'remove' | 'set' | 'set-platform';
  readonly collection: CollectionName;
  readonly which: number;
  readonly radios: readonly [number, number];
  readonly body: object;
  readonly fields: number;
};

const RADIO_CHOICES = 5;

const intent: fc.Arbitrary<Intent> = fc
  .tuple(
    fc.constantFrom('add' as const, 'set', 'set', 'set', 'remove', 'set-platform'),
    fc.constantFrom(...COLLECTION_NAMES, 'antennas' as const, 'antennas' as const),
    fc.nat({ max: 6 }),
    fc.tuple(fc.nat({ max: RADIO_CHOICES }), fc.nat({ max: RADIO_CHOICES })),
    fc.nat({ max: 0xffff }),
  )
  .chain(([action, collection, which, radios, fields]) =>
    BODIES[collection].map((body) => ({ do: action, collection, which, radios, body, fields })),
  );

/** What several changes of one operation mean to do. */
export const someIntents: fc.Arbitrary<readonly Intent[]> = fc.array(intent, { minLength: 1, maxLength: 4 });

/** A document that holds: its references point somewhere; its antennas may stand anywhere. */
export const someDocument: fc.Arbitrary<LayoutDocument> = fc
  .array(intent, { maxLength: 25 })
  .map((intents) => {
    let document = BARE_ROOF;
    for (const each of intents) {
      if (each.do === 'remove' || each.do === 'set-platform') continue;
      const value = objectOf(document, each, idOf(`${each.collection} ${each.which}`));
      if (value) {
        const collection = { ...collectionOf(document, each.collection), [value.id]: value };
        document = { ...document, [each.collection]: collection };
      }
    }
    return document;
  });

const OUTLINE = [
  { x: 0, y: -1 },
  { x: 4, y: -1 },
  { x: 4, y: 1 },
  { x: 0, y: 1 },
];

/** A roof of 4 m by 2 m with nothing on it. */
export const BARE_ROOF: LayoutDocument = {
  version: 1,
  platform: {
    kind: 'vehicle',
    name: 'Van',
    starter: 'van-roof',
    length: 4,
    width: 2,
    height: 2.5,
    outline: OUTLINE,
    datum: 'Rear edge, middle',
    forwardAxis: 'forward',
  },
  surfaces: {
    [idOf('roof')]: { id: idOf('roof'), name: 'Roof', outline: OUTLINE, height: 2.5, conducting: true },
  },
  obstacles: {},
  keepOuts: {},
  mountPoints: {},
  cableEntries: {},
  radios: {},
  neverTogether: {},
  antennas: {},
};

/** The operation that does what was meant, as far as the document has something to do it to. */
export function operationFor(
  document: LayoutDocument,
  intents: readonly Intent[],
  name = 'operation',
): Operation {
  const changes = intents.flatMap((each, index) => changeFor(document, each, `${name} ${index}`));
  return { id: idOf(name), version: 1, changes };
}

/** An operation of changes that a test writes by hand. */
export function operationOf(...changes: readonly Change[]): Operation {
  return { id: idOf('operation'), version: 1, changes };
}

/** A whip of half a metre on the bare roof. */
export function whipAt(x: number, y: number, overrides: Partial<PlacedAntenna> = {}): PlacedAntenna {
  const wire = {
    kind: 'wire' as const,
    form: 'whip' as const,
    length: 0.5,
    radius: 0.001,
    quarterWaveAt: null,
  };
  return {
    id: idOf('whip'),
    label: 'A1',
    name: 'Whip',
    part: { name: 'Whip', elements: [{ id: idOf('element'), ...wire, offset: ORIGIN }] },
    x,
    y,
    mountHeight: 0,
    azimuthDeg: 0,
    tiltDeg: 0,
    radioId: null,
    feederLossDb: 0,
    ...overrides,
  };
}

/** A radio of no bands, for references. */
export function plainRadio(name: string): Radio {
  return {
    id: idOf(name),
    name,
    receiveOnly: false,
    transmitBands: [],
    receiveBands: [],
    power: 25,
    noiseDbcPerHz: -150,
    noiseFigureDb: 6,
    bandwidth: 12_500,
    overloadDbm: -20,
    rejections: [],
  };
}

/** Freezes a value all the way down: whoever changes it throws. */
export function deepFreeze<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    Object.values(value).forEach(deepFreeze);
  }
  return value;
}

function changeFor(document: LayoutDocument, wanted: Intent, name: string): Change[] {
  const { collection } = wanted;
  if (wanted.do === 'set-platform') {
    return [{ kind: 'set-platform', fields: { height: 1 + wanted.which, name: `Van ${wanted.which}` } }];
  }
  if (wanted.do === 'add') {
    const value = objectOf(document, wanted, idOf(`added ${collection} ${name}`));
    return value ? [{ kind: 'add', collection, value }] : [];
  }
  const ids = Object.keys(collectionOf(document, collection));
  const id = ids[wanted.which % Math.max(1, ids.length)] ?? idOf('nobody');
  if (wanted.do === 'remove') return [{ kind: 'remove', collection, id }];
  const value = objectOf(document, wanted, id);
  if (!value) return [];
  const fields = Object.entries(value).filter(
    ([field], index) => field !== 'id' && (wanted.fields >> index) & 1,
  );
  return fields.length > 0 ? [{ kind: 'set', collection, id, fields: Object.fromEntries(fields) }] : [];
}

/** An object with its references filled in, or null where the document has nothing to refer to. */
function objectOf(document: LayoutDocument, wanted: Intent, id: string): ObjectOf<CollectionName> | null {
  const radioIds = Object.keys(document.radios);
  const [one, other] = wanted.radios.map((number) => radioIds[number % RADIO_CHOICES]);
  // The body was made for this collection: BODIES ties the two.
  const value = { id, ...wanted.body } as ObjectOf<CollectionName>;
  switch (wanted.collection) {
    case 'antennas':
      return { ...value, radioId: one ?? null } as PlacedAntenna;
    case 'neverTogether':
      return one && other && one !== other
        ? ({ ...value, radioIds: [one, other] } as ObjectOf<'neverTogether'>)
        : null;
    default:
      return value;
  }
}
