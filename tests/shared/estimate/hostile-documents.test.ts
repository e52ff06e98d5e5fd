import fc from 'fast-check';
import { createEstimator } from '@/shared/estimate/estimate';
import { idFromName } from '@/shared/layout/named-id';
import type { LayoutDocument, WireElement } from '@/shared/layout/document';
import { layoutDocumentSchema } from '@/shared/layout/schema';
import { BARE_ROOF, plainRadio, someDocument, whipAt } from '../layout/arbitrary-layout';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** Values at and near the ends of what the schema accepts. */
const wire = fc
  .record({
    form: fc.constantFrom('whip' as const, 'dipole' as const),
    length: fc.constantFrom(1e-9, 1e-3, 0.46, 100),
    stoutness: fc.constantFrom(1e-9, 0.001, 0.2),
    offset: fc.record({ x: number(-2, 2), y: number(-2, 2), z: number(-2, 2) }),
  })
  .map(({ stoutness, ...rest }) => ({ ...rest, radius: Math.min(1, stoutness * rest.length) }));
const placed = fc.record({
  x: fc.constantFrom(0, 1, 1 + 1e-12, 3, 1000, -1000),
  y: fc.constantFrom(0, 1e-12, 0.9, -1000),
  mountHeight: fc.constantFrom(0, 1e-9, 0.5, 1000),
  azimuthDeg: fc.constantFrom(0, 90, 359.999),
  tiltDeg: fc.constantFrom(0, 1e-9, 45, 90),
  wires: fc.array(wire, { minLength: 1, maxLength: 3 }),
});
const radioFields = fc.record({
  power: fc.constantFrom(0, 1e-300, 25, 1e6),
  bandwidth: fc.constantFrom(1, 1e10),
  overloadDbm: fc.constantFrom(-150, 60),
  noiseDbcPerHz: fc.constantFrom(-250, 0),
  transmitBands: fc.constantFrom(
    [{ from: 1e5, to: 1e5 + 1 }],
    [{ from: 155e6, to: 156e6 }],
    [{ from: 1e5, to: 1e11 }],
  ),
});

test('documents of every kind have an estimate, and what is not held says why', () => {
  const seen = new Set<string>();
  fc.assert(
    fc.property(someDocument, (document) => expectSound(withRadios(document), seen)),
    { seed: 11, numRuns: 60 },
  );
  expect([...seen]).toContain('not held');
});

test('values at the ends of what is accepted have an estimate, and what is not held says why', () => {
  const seen = new Set<string>();
  fc.assert(
    fc.property(fc.array(placed, { minLength: 2, maxLength: 4 }), radioFields, (all, fields) =>
      expectSound(hostileDocument(all, fields), seen),
    ),
    { seed: 13, numRuns: 100 },
  );
  expect([...seen]).toEqual(expect.arrayContaining(['judged', 'not held']));
});

type Placed = typeof placed extends fc.Arbitrary<infer T> ? T : never;
type Fields = typeof radioFields extends fc.Arbitrary<infer T> ? T : never;

function hostileDocument(all: readonly Placed[], fields: Fields): LayoutDocument {
  const radios: LayoutDocument['radios'][string][] = [];
  const antennas = all.map(({ wires, ...place }, index) => {
    const radio = { ...plainRadio(`hostile ${index}`), ...fields, receiveBands: fields.transmitBands };
    radios.push(radio);
    const elements = wires.map((each, n): WireElement => ({
      ...each,
      id: idFromName(`hostile ${index} ${n}`),
      kind: 'wire',
      quarterWaveAt: null,
    }));
    const id = idFromName(`hostile antenna ${index}`);
    return whipAt(0, 0, { ...place, id, radioId: radio.id, part: { name: 'Hostile', elements } });
  });
  const byId = <T extends { readonly id: string }>(objects: readonly T[]) =>
    Object.fromEntries(objects.map((object) => [object.id, object]));
  return { ...BARE_ROOF, radios: byId(radios), antennas: byId(antennas) };
}

/** The same document, each antenna with a radio of its own in both directions; two of three stand upright on their surface. */
function withRadios(document: LayoutDocument): LayoutDocument {
  const radios = { ...document.radios };
  const antennas = Object.values(document.antennas).map((antenna, index) => {
    const bands = [{ from: (150 + 90 * index) * 1e6, to: (155 + 90 * index) * 1e6 }];
    const radio = { ...plainRadio(`own ${index}`), transmitBands: bands, receiveBands: bands };
    radios[radio.id] = radio;
    const upright = index % 3 < 2 ? { mountHeight: 0, tiltDeg: 0 } : {};
    return [antenna.id, { ...antenna, ...upright, radioId: radio.id }] as const;
  });
  return { ...document, radios, antennas: Object.fromEntries(antennas) };
}

/** The schema accepts it; every number is finite; a pair has a margin or the reason why not. */
function expectSound(document: LayoutDocument, seen: Set<string>): void {
  expect(layoutDocumentSchema.safeParse(document).error?.issues ?? []).toEqual([]);
  const { pairs, antennas } = createEstimator().estimate(document);
  for (const { state, marginDb, isolationDb, neededDb, reason } of pairs) {
    const isJudged = state !== 'not held' && state !== 'never together';
    seen.add(isJudged ? 'judged' : state);
    expect([marginDb !== null, reason === null]).toEqual([isJudged, isJudged]);
    for (const value of [marginDb, isolationDb, neededDb]) expect(Number.isFinite(value ?? 0)).toBe(true);
  }
  for (const { pattern } of Object.values(antennas)) {
    if (pattern === null) continue;
    const { gainDbi, aloneDbi, rippleDb, deepestAzimuthDeg } = pattern;
    const shown = [...gainDbi, ...aloneDbi, rippleDb, deepestAzimuthDeg];
    expect(shown.filter((value) => !Number.isFinite(value))).toEqual([]);
  }
}
