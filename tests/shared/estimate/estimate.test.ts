import fc from 'fast-check';
import { solveScene } from '@/shared/em/solve-scene';
import { createEstimator } from '@/shared/estimate/estimate';
import type { Estimate } from '@/shared/estimate/estimate-result';
import { SceneBuilder } from '@/shared/estimate/scene-from-document';
import { DEMO_JOBS } from '@/shared/layout/demo/demo-jobs';
import type { LayoutDocument, PlacedAntenna, WireElement } from '@/shared/layout/document';

const van = DEMO_JOBS[0]!.platforms[0]!.layouts[0]!.document;
const ids = Object.values(van.antennas)
  .sort((a, b) => (a.label < b.label ? -1 : 1))
  .map(({ id }) => id);
const [a1, a2, a3] = ids as [string, string, string];
const wholeVan = createEstimator().estimate(van);

test('isolation is what the solver says between the antennas plus feeders and filters', () => {
  const { wires } = new SceneBuilder().build(van);
  const pair = pairOf(wholeVan, a2, a3);
  const noise = pair.mechanisms.find(({ mechanism }) => mechanism === 'transmitter noise')!;
  const [result] = solveScene({ ground: 'plane', frequencies: [noise.frequency], wires }, 'live').results;
  const port = (antennaId: string) => result!.ports.findIndex((id) => id.startsWith(antennaId));
  const between = result!.isolationDb[port(a3)]![port(a2)]!;
  const feeders = van.antennas[a2]!.feederLossDb + van.antennas[a3]!.feederLossDb;
  const filterOfA2 = 45;
  // 0.15 dB: the estimate solves once for frequencies within 0.25 % of each other, and the two stand close.
  expect(Math.abs(noise.isolationDb! - (between + feeders + filterOfA2))).toBeLessThan(0.15);
});

test('the mechanism with the least margin speaks for its pair', () => {
  for (const { mechanism, marginDb, mechanisms } of wholeVan.pairs) {
    if (marginDb === null) continue;
    const least = mechanisms.reduce((a, b) => (a.marginDb! < b.marginDb! ? a : b));
    expect([mechanism, marginDb]).toEqual([least.mechanism, least.marginDb]);
    for (const one of mechanisms) expect(one.marginDb).toBeCloseTo(one.isolationDb! - one.neededDb, 9);
  }
});

test('pairs come worst first and are counted by state', () => {
  const order = ['lacking', 'not held', 'tight', 'clear', 'never together'];
  const ranks = wholeVan.pairs.map(({ state }) => order.indexOf(state));
  expect(ranks).toEqual([...ranks].sort((a, b) => a - b));
  const total = Object.values(wholeVan.counts).reduce((sum, count) => sum + count, 0);
  expect(total).toBe(wholeVan.pairs.length);
});

test('an answer after many moves equals the answer of a new estimator', () => {
  const estimator = createEstimator();
  let document = van;
  for (let step = 0; step < 12; step += 1) {
    document = withAntenna(document, ids[step % 3]!, ({ x }) => ({ x: x + 0.011 * (step % 2 ? -1 : 2) }));
    estimator.estimate(document, { patternFor: [] });
  }
  document = withAntenna(document, a1, () => ({ feederLossDb: 3 }));
  const moved = estimator.estimate(document);
  const fresh = createEstimator().estimate(document);
  expect(moved.pairs.map(({ from, into, state }) => [from, into, state])).toEqual(
    fresh.pairs.map(({ from, into, state }) => [from, into, state]),
  );
  moved.pairs.forEach((pair, i) => expectClose(pair.marginDb, fresh.pairs[i]!.marginDb));
  for (const id of ids) {
    expectClose(moved.antennas[id]!.pattern?.rippleDb ?? null, fresh.antennas[id]!.pattern?.rippleDb ?? null);
  }
});

test('only the wanted patterns are computed', () => {
  const { antennas } = createEstimator().estimate(van, { patternFor: [a3] });
  const shown = Object.values(antennas).filter(({ pattern }) => pattern !== null);
  expect(shown.map(({ antennaId }) => antennaId)).toEqual([a3]);
});

test('a pattern has its deepest bearing clockwise from the forward axis', () => {
  const { pattern } = wholeVan.antennas[a3]!;
  const { gainDbi, aloneDbi, stepDeg, deepestAzimuthDeg } = pattern!;
  const depth = gainDbi.map((gain, i) => gain - aloneDbi[i]!);
  const deepest = depth.indexOf(Math.min(...depth)) * stepDeg;
  expect((deepest + deepestAzimuthDeg) % 360).toBe(0);
});

test('less power never makes a margin worse', () => {
  const radioId = van.antennas[a2]!.radioId!;
  const quieter = { ...van, radios: { ...van.radios, [radioId]: { ...van.radios[radioId]!, power: 5 } } };
  const { pairs } = createEstimator().estimate(quieter);
  for (const { from, into, marginDb } of pairs) {
    const before = pairOf(wholeVan, from, into).marginDb;
    if (marginDb !== null) expect(marginDb).toBeGreaterThanOrEqual(before! - 1e-9);
  }
});

test('antennas that are known by their datasheet only are not held, and say so', () => {
  const declared = Object.values(van.antennas).find(({ name }) => name === 'Navigation')!;
  const pairs = wholeVan.pairs.filter(({ into }) => into === declared.id);
  expect(pairs.map(({ state }) => state)).toEqual(pairs.map(() => 'not held'));
  expect(pairs[0]!.reason).toMatchObject({ code: 'not-computed' });
  expect(wholeVan.antennas[declared.id]).toMatchObject({ pattern: null, worstMarginDb: null });
});

test.each([
  ['raised above its surface', 'raised-whip', { mountHeight: 0.3 }],
  ['beside the roof', 'off-surface', { x: 9 }],
  ['lying down', 'geometry', { tiltDeg: 90 }],
])('a whip %s is not held', (_, code, fields) => {
  const { pairs } = createEstimator().estimate(withAntenna(van, a3, () => fields));
  const own = pairs.filter((pair) => pair.from === a3 || pair.into === a3);
  for (const { state, reason } of own) expect([state, reason!.code]).toEqual(['not held', expect.anything()]);
  expect(own.some(({ reason }) => reason!.code === code)).toBe(true);
  expect(pairs.some(({ state }) => state !== 'not held')).toBe(true);
});

test('of two antennas at one spot neither is held, the others still are', () => {
  const { x, y } = van.antennas[a3]!;
  const { pairs } = createEstimator().estimate(withAntenna(van, a2, () => ({ x, y })));
  expect(pairOf({ pairs }, a2, a3).reason!.code).toBe('touching');
  expect(pairOf({ pairs }, a1, a3).state).toBe('not held');
  const judged = pairs.filter(({ marginDb }) => marginDb !== null);
  expect(judged.length).toBeGreaterThan(0);
});

test('antennas on surfaces of different heights are not one plane', () => {
  const outline = [
    { x: 1.4, y: -0.05 },
    { x: 1.6, y: -0.05 },
    { x: 1.6, y: 0.1 },
    { x: 1.4, y: 0.1 },
  ];
  const roof = Object.values(van.surfaces)[0]!;
  const step = { ...roof, id: 'step', name: 'Step', outline, height: roof.height + 0.4 };
  const { pairs } = createEstimator().estimate({ ...van, surfaces: { ...van.surfaces, step } });
  expect(pairOf({ pairs }, a1, a3).reason).toMatchObject({ code: 'different-heights' });
  expect(pairOf({ pairs }, a1, a3).reason!.message).toContain('400 mm');
});

test('a wire of more than thirty wavelengths is left out there, and elsewhere computed', () => {
  const long = withElement(van, a1, { length: 6, radius: 0.002 });
  const { pairs } = createEstimator().estimate(long, { patternFor: [] });
  const lan = Object.values(van.antennas).find(({ name }) => name === '2.4 GHz')!;
  expect(pairOf({ pairs }, a1, lan.id).mechanisms.map(({ reason }) => reason?.code)).toContain('too-long');
  expect(pairOf({ pairs }, a1, a3).marginDb).not.toBeNull();
});

test('an empty roof has an estimate with nothing in it', () => {
  const { pairs, counts, warnings } = createEstimator().estimate({ ...van, antennas: {} });
  expect(pairs).toEqual([]);
  expect(Object.values(counts)).toEqual([0, 0, 0, 0, 0]);
  expect(warnings.map(({ code }) => code)).toEqual(['obstacle-not-modelled']);
});

test('the whole layout carried aside keeps its numbers', () => {
  const by = { x: 0.4, y: -0.2 };
  const shift = (points: readonly { x: number; y: number }[]) =>
    points.map(({ x, y }) => ({ x: x + by.x, y: y + by.y }));
  let carried: LayoutDocument = {
    ...van,
    surfaces: Object.fromEntries(
      Object.entries(van.surfaces).map(([id, one]) => [id, { ...one, outline: shift(one.outline) }]),
    ),
  };
  for (const id of ids) carried = withAntenna(carried, id, ({ x, y }) => ({ x: x + by.x, y: y + by.y }));
  const { pairs } = createEstimator().estimate(carried, { patternFor: [] });
  pairs.forEach((pair, i) => expectClose(pair.marginDb, wholeVan.pairs[i]!.marginDb));
});

test('whatever stands wherever, there is an answer of finite numbers', () => {
  const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
  const change = fc.record({
    antenna: fc.constantFrom(...ids.filter((id) => van.antennas[id]!.part.elements[0]!.kind === 'wire')),
    place: fc.record({
      x: number(-1, 4),
      y: number(-1, 1),
      mountHeight: fc.constantFrom(0, 0, 1e-9, 0.5),
      azimuthDeg: number(0, 360),
      tiltDeg: fc.constantFrom(0, 0, 1e-7, 30, 89.9, 90, 180),
    }),
    element: fc.record({
      form: fc.constantFrom('whip' as const, 'dipole' as const),
      length: fc.constantFrom(0.002, 0.05, 0.46, 1.2),
      radius: fc.constantFrom(1e-6, 0.0005, 0.02),
    }),
  });
  fc.assert(
    fc.property(fc.array(change, { minLength: 1, maxLength: 4 }), (changes) => {
      let document = van;
      for (const { antenna, place, element } of changes) {
        document = withElement(
          withAntenna(document, antenna, () => place),
          antenna,
          element,
        );
      }
      const estimate = createEstimator().estimate(document);
      const numbers = [
        ...estimate.pairs.flatMap(({ marginDb, isolationDb }) => [marginDb ?? 0, isolationDb ?? 0]),
        ...Object.values(estimate.antennas).flatMap(({ pattern }) => pattern?.gainDbi ?? []),
      ];
      expect(numbers.filter((value) => !Number.isFinite(value))).toEqual([]);
    }),
    { seed: 5, numRuns: 12 },
  );
});

function pairOf(estimate: Pick<Estimate, 'pairs'>, from: string, into: string) {
  return estimate.pairs.find((pair) => pair.from === from && pair.into === into)!;
}

function withAntenna(
  document: LayoutDocument,
  id: string,
  change: (antenna: PlacedAntenna) => Partial<PlacedAntenna>,
): LayoutDocument {
  const antenna = document.antennas[id]!;
  return { ...document, antennas: { ...document.antennas, [id]: { ...antenna, ...change(antenna) } } };
}

function withElement(document: LayoutDocument, id: string, fields: Partial<WireElement>): LayoutDocument {
  return withAntenna(document, id, ({ part }) => ({
    part: { ...part, elements: [{ ...(part.elements[0] as WireElement), ...fields }] },
  }));
}

/** Rounding aside (1e-9 dB): the order of elimination depends on what moved last. */
function expectClose(value: number | null, other: number | null): void {
  expect(value === null).toBe(other === null);
  if (value !== null) expect(Math.abs(value - other!)).toBeLessThan(1e-9);
}
