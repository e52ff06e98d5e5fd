import { createLiveSolver } from '@/shared/em/live/live-solver';
import { createOwnCurrentCache } from '@/shared/em/live/own-current-cache';
import type { Ground, Scene, Wire } from '@/shared/em/scene';
import { solveScene } from '@/shared/em/solve-scene';
import { dipole, isolationErrors, mixedBandScene, quantile, uprightWhip } from '../../support/whip-scenes';

const frequencies = [127e6, 156e6, 450e6, 868e6];
const cut = { elevationDeg: 10, stepDeg: 30 };

function expectSameAnswers(
  ground: Ground,
  wires: readonly Wire[],
  solver: ReturnType<typeof createLiveSolver>,
): void {
  const fresh = createLiveSolver({ ground, frequencies, wires });
  frequencies.forEach((_, f) => {
    for (const one of wires) {
      for (const other of wires) {
        if (one === other) continue;
        const difference = solver.isolationDb(f, one.id, other.id) - fresh.isolationDb(f, one.id, other.id);
        // The grid's first and later visits sum in another order; nothing else differs.
        expect(Math.abs(difference)).toBeLessThanOrEqual(1e-6);
      }
      const kept = solver.pattern(f, one.id, cut);
      const made = fresh.pattern(f, one.id, cut);
      kept.gainDbi.forEach((gain, i) => expect(Math.abs(gain - made.gainDbi[i]!)).toBeLessThanOrEqual(1e-5));
    }
  });
}

function moved(wires: readonly Wire[], id: string, dx: number, dy: number): Wire[] {
  return wires.map((wire) =>
    wire.id === id
      ? {
          ...wire,
          start: [wire.start[0] + dx, wire.start[1] + dy, wire.start[2]],
          end: [wire.end[0] + dx, wire.end[1] + dy, wire.end[2]],
        }
      : wire,
  );
}

const roof: Wire[] = [
  uprightWhip('a', [0, 0, 0], 0.46, 0.0015),
  uprightWhip('b', [0.6, 0, 0], 0.16, 0.0015),
  uprightWhip('c', [0.2, 0.7, 0], 0.9, 0.0015),
  uprightWhip('d', [1.3, 0.4, 0], 0.08, 0.001),
];

describe('live solver', () => {
  it('stays within 0.5 dB at the 95th percentile and 1.5 dB at worst of the moment method', () => {
    const errors = [1, 2, 3, 4, 5, 6].flatMap((seed) => {
      const scene = mixedBandScene(seed, 2 + seed);
      return isolationErrors(solveScene(scene, 'live'), solveScene(scene, 'moment'));
    });
    expect(errors.length).toBeGreaterThan(150);
    expect(quantile(errors, 0.95)).toBeLessThanOrEqual(0.5);
    expect(Math.max(...errors)).toBeLessThanOrEqual(1.5);
  });

  const close = [0.016, 0.05].map((d): [string, Scene['ground'], Wire[]] => [
    `whips ${d} m apart`,
    'plane',
    [
      uprightWhip('a', [0, 0, 0], 0.46, 0.0015),
      uprightWhip('b', [d, 0, 0], 0.46, 0.0015),
      uprightWhip('c', [0.4, 0.3, 0], 0.16, 0.0015),
    ],
  ]);
  it.each<[string, Scene['ground'], Wire[]]>([
    ...close,
    [
      'elevated dipoles',
      'plane',
      [
        dipole('a', [0, 0, 1.2], 0.9, [0, 0, 1], 0.002),
        dipole('b', [0.5, 0, 1.5], 0.3, [0, 0, 1], 0.002),
        dipole('c', [0, 0.6, 2], 0.3, [0, 0, 1], 0.002),
      ],
    ],
    [
      'horizontal dipoles beside a whip',
      'plane',
      [
        dipole('a', [0, 0, 0.5], 0.9, [1, 0, 0], 0.002),
        dipole('b', [0.5, 0.3, 0.5], 0.3, [0, 1, 0], 0.002),
        uprightWhip('w', [1, 1, 0], 0.46, 0.0015),
      ],
    ],
    [
      'tilted whips and a slanted dipole',
      'plane',
      [
        { ...uprightWhip('a', [0, 0, 0], 0.4, 0.0015), end: [0.2, 0.1, 0.4] },
        { ...uprightWhip('b', [0.3, 0, 0], 0.3, 0.0015), end: [0.3, 0.2, 0.3] },
        dipole('c', [0.6, 0.5, 0.6], 0.3, [0.6, 0, 0.8], 0.002),
      ],
    ],
    [
      'skew dipoles and a pole in free space',
      'none',
      [
        dipole('a', [0, 0, 0], 0.9, [0, 0, 1], 0.002),
        dipole('b', [0.5, 0.3, 0.5], 0.3, [0, 1, 0], 0.002),
        { ...dipole('p', [0.3, -0.4, 0.6], 1.4, [0, 0, 1], 0.005), feed: 'none' },
      ],
    ],
  ])('follows the moment method for %s', (_, ground, wires) => {
    const scene: Scene = { ground, frequencies, wires, pattern: cut };
    const live = solveScene(scene, 'live');
    const moment = solveScene(scene, 'moment');
    expect(Math.max(0, ...isolationErrors(live, moment))).toBeLessThanOrEqual(0.5);
    moment.results.forEach((result, f) => {
      for (const id of result.ports) {
        const { gainDbi, aloneDbi } = result.patterns[id]!;
        const peak = Math.max(...aloneDbi);
        gainDbi.forEach((gain, i) => {
          if (aloneDbi[i]! < peak - 20) return;
          expect(Math.abs(gain - live.results[f]!.patterns[id]!.gainDbi[i]!)).toBeLessThanOrEqual(0.5);
        });
      }
    });
  });

  it('answers after moves as a new solver does, whichever antenna is carried about', () => {
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires: roof });
    let wires = roof;
    for (const [id, dx, dy] of [
      ['b', 0.05, 0.02],
      ['b', 0.05, 0.02],
      ['b', -0.3, 0.1],
      ['c', 0.4, 0],
      ['a', -0.1, -0.1],
      ['b', 0.01, 0],
    ] as const) {
      wires = moved(wires, id, dx, dy);
      solver.update(wires);
      solver.isolationDb(0, 'a', 'b');
    }
    expectSameAnswers('plane', wires, solver);
  });

  it('answers as a new solver does after a length, a tilt, a load and two moves at once', () => {
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires: roof });
    solver.isolationDb(1, 'a', 'b');
    const changed: Wire[] = moved(moved(roof, 'a', 0.1, 0), 'd', 0, 0.2).map((wire) => {
      if (wire.id === 'b') return { ...wire, end: [wire.end[0], wire.end[1], 0.3] };
      if (wire.id === 'c') return { ...wire, end: [0.5, 0.7, 0.7], load: { re: 75, im: 10 } };
      return wire;
    });
    solver.update(changed);
    expectSameAnswers('plane', changed, solver);
  });

  it('answers as a new solver does after wires came, went and changed places in the list', () => {
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires: roof });
    solver.isolationDb(2, 'a', 'b');
    const pole: Wire = { ...uprightWhip('pole', [0.9, 0.9, 0], 1.1, 0.01), feed: 'none' };
    solver.update([...roof, pole]);
    solver.isolationDb(2, 'a', 'b');
    const wires = [roof[2]!, roof[0]!, uprightWhip('e', [1, -0.4, 0], 0.3, 0.0015), roof[3]!];
    solver.update(wires);
    expectSameAnswers('plane', wires, solver);
  });

  it('has one wire and no wire', () => {
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires: [] });
    expect(solver.validity(0)).toEqual([]);
    solver.update([roof[0]!]);
    const alone = solver.impedanceAlone(1, 'a');
    const inPlace = solver.impedanceInPlace(1, 'a');
    expect(Math.hypot(alone.re - inPlace.re, alone.im - inPlace.im)).toBeLessThanOrEqual(1e-9);
    expect(solver.pattern(1, 'a', cut).rippleDb).toBeLessThanOrEqual(1e-9);
  });

  it('solves a kind once for all solvers that share a cache', () => {
    const cache = createOwnCurrentCache();
    createLiveSolver({ ground: 'plane', frequencies, wires: roof, cache }).isolationDb(0, 'a', 'b');
    const kinds = cache.functions.size;
    createLiveSolver({ ground: 'plane', frequencies, wires: moved(roof, 'a', 0.3, 0.1), cache }).isolationDb(
      0,
      'a',
      'b',
    );
    expect(cache.functions.size).toBe(kinds);
  });

  it('keeps its numbers finite while antennas are carried across each other, and says not held', () => {
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires: roof });
    for (const dx of [0.59, 0.599, 0.6]) {
      solver.update(moved(roof, 'a', dx, 0));
      expect(Number.isFinite(solver.isolationDb(1, 'a', 'b'))).toBe(true);
    }
    expect(solver.pairNotHeld(1, 'a', 'b')?.code).toBe('touching');
    expect(solver.pairNotHeld(1, 'c', 'd')).toBeNull();
    expect(solver.validity(1).map((entry) => entry.code)).toContain('touching');
  });

  it('refuses questions about wires, ports and frequencies that are not there', () => {
    const wires: Wire[] = [roof[0]!, { ...roof[1]!, feed: 'none' }];
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires });
    expect(() => solver.isolationDb(0, 'a', 'x')).toThrow(RangeError);
    expect(() => solver.isolationDb(0, 'a', 'b')).toThrow(RangeError);
    expect(() => solver.isolationDb(9, 'a', 'a')).toThrow(RangeError);
    expect(() => createLiveSolver({ ground: 'plane', frequencies, wires: [roof[0]!, roof[0]!] })).toThrow(
      RangeError,
    );
  });
});
