import fc from 'fast-check';
import { segmentDistance } from '@/shared/em/chain';
import type { FrequencyResult, Ground, Method, Scene, Vector3, Wire } from '@/shared/em/scene';
import { solveScene } from '@/shared/em/solve-scene';

const frequencies = [300e6];
const methods: Method[] = ['emf', 'moment', 'live'];

const place = fc.double({ min: -1, max: 1, noNaN: true });
const axis = fc.tuple(place, place, place).filter((v) => Math.hypot(...v) > 0.2);
const load = fc.record({
  re: fc.double({ min: 5, max: 200, noNaN: true }),
  im: fc.double({ min: -100, max: 100, noNaN: true }),
});

/** Three wires in any direction above the plane or in free space, one of them perhaps without a port. */
const scenes = fc
  .record({
    ground: fc.constantFrom<Ground>('none', 'plane'),
    wires: fc.array(
      fc.record({
        at: fc.tuple(place, place, place),
        axis,
        length: fc.double({ min: 0.1, max: 0.7, noNaN: true }),
        load,
      }),
      { minLength: 3, maxLength: 3 },
    ),
    parasitic: fc.boolean(),
  })
  .map(({ ground, wires, parasitic }): Scene => ({
    ground,
    frequencies,
    wires: wires.map(({ at, axis: [x, y, z], length, load: closing }, i): Wire => {
      const scale = length / Math.hypot(x, y, z);
      const start: Vector3 = [at[0], at[1], at[2] + 2];
      const end: Vector3 = [start[0] + x * scale, start[1] + y * scale, start[2] + z * scale];
      const wire = { id: `w${i}`, start, end, radius: 0.001 };
      return parasitic && i === 2 ? { ...wire, feed: 'none' } : { ...wire, feed: 'centre', load: closing };
    }),
  }))
  .filter(({ wires }) =>
    wires.every((a, i) =>
      wires.slice(i + 1).every((b) => segmentDistance(a.start, a.end, b.start, b.end) > 0.05),
    ),
  );

function solve(scene: Scene, method: Method): FrequencyResult {
  return solveScene(scene, method).results[0]!;
}

function mapped(scene: Scene, map: (p: Vector3) => Vector3): Scene {
  return {
    ...scene,
    wires: scene.wires.map((wire) => ({ ...wire, start: map(wire.start), end: map(wire.end) })),
  };
}

/** The greatest |S x| / |x|, by power iteration on S^H S. */
function largestSingularValue(s: FrequencyResult['s']): number {
  let x = s.map((_, i) => ({ re: 1 + i, im: 0.3 * i }));
  let size = 0;
  for (let step = 0; step < 200; step += 1) {
    const y = s.map((row) => sum(row, x));
    const z = s.map((_, j) =>
      sum(
        s.map((row) => ({ re: row[j]!.re, im: -row[j]!.im })),
        y,
      ),
    );
    const norm = Math.hypot(...z.flatMap(({ re, im }) => [re, im]));
    size = Math.sqrt(norm);
    x = z.map(({ re, im }) => ({ re: re / norm, im: im / norm }));
  }
  return size;
}

type Value = { readonly re: number; readonly im: number };

function sum(row: readonly Value[], x: readonly Value[]): Value {
  return row.reduce<Value>(
    (total, a, i) => ({
      re: total.re + a.re * x[i]!.re - a.im * x[i]!.im,
      im: total.im + a.re * x[i]!.im + a.im * x[i]!.re,
    }),
    { re: 0, im: 0 },
  );
}

function expectSameIsolation(one: FrequencyResult, other: FrequencyResult, withinDb: number): void {
  one.isolationDb.forEach((row, i) =>
    row.forEach((value, j) => {
      if (value !== null && value < 100)
        expect(Math.abs(value - other.isolationDb[i]![j]!)).toBeLessThanOrEqual(withinDb);
    }),
  );
}

const runs = { seed: 7, numRuns: 12 };

describe.each(methods)('laws of %s', (method) => {
  it('is reciprocal', () => {
    fc.assert(
      fc.property(scenes, (scene) => {
        const { z } = solve(scene, method);
        z.forEach((row, i) =>
          row.forEach((value, j) => {
            const back = z[j]![i]!;
            const size = Math.sqrt(
              Math.hypot(z[i]![i]!.re, z[i]![i]!.im) * Math.hypot(z[j]![j]!.re, z[j]![j]!.im),
            );
            expect(Math.hypot(value.re - back.re, value.im - back.im)).toBeLessThanOrEqual(1e-9 * size);
          }),
        );
      }),
      runs,
    );
  });

  it('makes no power: no singular value of S exceeds one', () => {
    fc.assert(
      fc.property(scenes, (scene) => {
        // Lossless wires radiate; what quadrature adds to a passive network stays below 1e-6.
        expect(largestSingularValue(solve(scene, method).s)).toBeLessThanOrEqual(1 + 1e-6);
      }),
      runs,
    );
  });

  it('does not depend on where the scene lies and how it is turned about the vertical', () => {
    fc.assert(
      fc.property(
        scenes,
        place,
        place,
        fc.double({ min: 0, max: 6.28, noNaN: true }),
        (scene, dx, dy, angle) => {
          const [c, s] = [Math.cos(angle), Math.sin(angle)];
          const turned = mapped(scene, ([x, y, z]) => [dx + c * x - s * y, dy + s * x + c * y, z]);
          expectSameIsolation(solve(scene, method), solve(turned, method), 1e-4);
        },
      ),
      runs,
    );
  });

  it('does not depend on the order of the wires', () => {
    fc.assert(
      fc.property(scenes, (scene) => {
        const reversed = solve({ ...scene, wires: [...scene.wires].reverse() }, method);
        const result = solve(scene, method);
        const n = result.ports.length;
        expect([...reversed.ports].reverse()).toEqual(result.ports);
        const back = reversed.isolationDb.map((_, i) =>
          reversed.isolationDb[n - 1 - i]!.map((__, j) => reversed.isolationDb[n - 1 - i]![n - 1 - j]!),
        );
        expectSameIsolation(result, { ...reversed, isolationDb: back }, 1e-4);
      }),
      runs,
    );
  });
});
