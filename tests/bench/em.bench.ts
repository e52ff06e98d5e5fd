import { complex, lusolve, matrix } from 'mathjs';
import { waveNumber } from '@/shared/em/constants';
import { mutualBlock } from '@/shared/em/impedance-block';
import { createLiveSolver, type LiveSolver } from '@/shared/em/live/live-solver';
import {
  createOwnCurrentCache,
  ownCurrentsOf,
  type OwnCurrentCache,
} from '@/shared/em/live/own-current-cache';
import { findOwnCurrents } from '@/shared/em/live/own-currents';
import { meshOfOnePiece } from '@/shared/em/mesh';
import type { Wire } from '@/shared/em/scene';
import { solveScene } from '@/shared/em/solve-scene';
import { complexSolve } from '@/shared/numerics/complex-lu';
import { createComplexMatrix } from '@/shared/numerics/complex-matrix';
import {
  isolationErrors,
  mixedBandScene,
  quantile,
  randomWhips,
  seededRandom,
  tenBands,
  uprightWhip,
} from '../support/whip-scenes';
import type { Figure } from './figure';

/** The seeded scene of all figures: 16 (or 32) whips of 0.03 to 1.2 m on a van's roof, ten bands. */
const roof = [3.2, 1.5] as const;
const sceneSeed = 11;
/** Seeds of the accuracy figures; no setting was tuned on them. */
const errorSeeds = Array.from({ length: 24 }, (_, i) => 1001 + i);
const cut = { elevationDeg: 0, stepDeg: 5 };

/** Low, middle and high of each band. */
function thirtyFrequencies(): number[] {
  return tenBands.flatMap((band) => [...band]);
}

/** Sixteen radios with low, middle and high of both directions: six frequencies each, on the ten bands in turn. */
function ninetySixFrequencies(): number[] {
  return Array.from({ length: 16 }, (_, radio) => {
    const [low, , high] = tenBands[radio % tenBands.length]!;
    const shift = radio < tenBands.length ? 0 : 0.5;
    return Array.from({ length: 6 }, (__, i) => low + ((high - low) * (i + shift)) / 6);
  }).flat();
}

/**
 * Milliseconds per frame: every whip in turn is carried 4 mm a frame; a frame is the update, the isolation of all
 * ordered pairs at all frequencies and the pattern of every whip at one of them. The mean over the whips of the
 * median over their frames.
 */
function frameTime(frequencies: readonly number[]): number {
  const wires = randomWhips(sceneSeed, 16, roof);
  const solver = createLiveSolver({ ground: 'plane', frequencies, wires });
  const medians = wires.map((wire, w) => {
    const times: number[] = [];
    for (let frame = 1; frame <= 15; frame += 1) {
      const moved = wires.map((other, i) => (i === w ? carried(wire, 0.004 * frame) : other));
      const start = performance.now();
      askAll(solver, moved, frequencies.length);
      times.push(performance.now() - start);
    }
    return quantile(times.slice(3), 0.5);
  });
  return medians.reduce((sum, value) => sum + value, 0) / medians.length;
}

function carried(wire: Wire, by: number): Wire {
  const [x, y, z] = wire.start;
  return { ...wire, start: [x + by, y + by / 2, z], end: [x + by, y + by / 2, wire.end[2]] };
}

function askAll(solver: LiveSolver, wires: readonly Wire[], frequencies: number): void {
  solver.update(wires);
  for (let f = 0; f < frequencies; f += 1) {
    for (const into of wires) {
      for (const from of wires) if (into !== from) solver.isolationDb(f, into.id, from.id);
    }
  }
  wires.forEach((wire, w) => solver.pattern((w * 2) % frequencies, wire.id, cut));
}

/** Milliseconds from nothing but prepared functions to all isolations; the median of five. */
function fullTime(count: number): number {
  const frequencies = thirtyFrequencies();
  const wires = randomWhips(sceneSeed, count, roof);
  const cache = preparedCache(wires, frequencies);
  const times = Array.from({ length: 5 }, () => {
    const start = performance.now();
    const solver = createLiveSolver({ ground: 'plane', frequencies, wires, cache });
    frequencies.forEach((_, f) => solver.isolationDb(f, wires[0]!.id, wires[1]!.id));
    return performance.now() - start;
  });
  return quantile(times, 0.5);
}

function preparedCache(wires: readonly Wire[], frequencies: readonly number[]): OwnCurrentCache {
  const cache = createOwnCurrentCache();
  for (const wire of wires) for (const f of frequencies) ownCurrentsOf(cache, 'plane', f, wire);
  return cache;
}

function liveErrors(): number[] {
  return errorSeeds.flatMap((seed) => {
    const scene = mixedBandScene(seed, 3 + (seed % 6));
    return isolationErrors(solveScene(scene, 'live'), solveScene(scene, 'moment'));
  });
}

/** The network step, 16 ports: mathjs complex matrices over ours, same numbers, same run. */
function mathjsRatio(): number {
  const n = 16;
  const random = seededRandom(3);
  const a = createComplexMatrix(n, n);
  for (let i = 0; i < n * n; i += 1) {
    a.re[i] = random() - 0.5 + (i % (n + 1) === 0 ? 4 : 0);
    a.im[i] = random() - 0.5;
  }
  const b = createComplexMatrix(n, 1);
  b.re.fill(1);
  const rows = Array.from({ length: n }, (_, i) =>
    Array.from({ length: n }, (__, j) => complex(a.re[i * n + j]!, a.im[i * n + j]!)),
  );
  const theirs = matrix(rows);
  const right = matrix(Array.from({ length: n }, () => complex(1, 0)));
  const slow = timeOf(() => lusolve(theirs, right), 100);
  const fast = timeOf(() => complexSolve(a, b), 5_000);
  return slow / fast;
}

/** Milliseconds per call, after as many calls to warm up. */
function timeOf(work: () => unknown, calls: number): number {
  for (let i = 0; i < calls; i += 1) work();
  const start = performance.now();
  for (let i = 0; i < calls; i += 1) work();
  return (performance.now() - start) / calls;
}

function pairTime(): number {
  const k = waveNumber(155e6);
  const one = meshOfOnePiece(uprightWhip('a', [0, 0, 0], 0.46, 0.0015), 'plane');
  const other = meshOfOnePiece(uprightWhip('b', [0.7, 0.2, 0], 0.16, 0.0015), 'plane');
  return 1e6 * timeOf(() => mutualBlock(k, 'plane', one, other), 20_000);
}

function prepareTime(): number {
  const whip = uprightWhip('w', [0, 0, 0], 0.46, 0.0015);
  return timeOf(() => thirtyFrequencies().map((f) => findOwnCurrents('plane', f, whip)), 3);
}

function figure(name: string, unit: string, value: () => number): Figure {
  return { name, unit, group: 'em', measure: async () => value() };
}

export const figures: Figure[] = [
  figure('em.emf.pair', 'ns', pairTime),
  figure('em.live.prepare', 'ms', prepareTime),
  figure('em.live.frame.16x30', 'ms', () => frameTime(thirtyFrequencies())),
  figure('em.live.frame.16x96', 'ms', () => frameTime(ninetySixFrequencies())),
  figure('em.live.full.16x30', 'ms', () => fullTime(16)),
  figure('em.live.full.32x30', 'ms', () => fullTime(32)),
  figure('em.live.error.p95', 'dB', () => quantile(liveErrors(), 0.95)),
  figure('em.live.error.worst', 'dB', () => Math.max(...liveErrors())),
  figure('em.mathjs.ratio', 'x', mathjsRatio),
];
