import { chainOfWire } from '../chain';
import { mutualBlock } from '../impedance-block';
import type { WireMesh } from '../mesh';
import type { Ground, Wire } from '../scene';
import type { OwnCurrents } from './own-currents';
import { coupleOnce, coupleVertical, evaluateCoupling, type VerticalCoupling } from './vertical-coupling';
import type { VerticalSamples } from './vertical-grid';
import { gridLevel, gridStep, sampleVertical } from './vertical-samples';

/** One wire as the couplings see it. */
export type CouplingSide = {
  wire: Wire;
  own: OwnCurrents;
  /** 1 up, -1 down, 0 in any other direction. */
  sense: 1 | -1 | 0;
  /** Samples by grid level; emptied when the kind changes. */
  readonly samples: Map<number, VerticalSamples>;
};

/** Impedances, ohm, of the functions of two wires: those of `first` by those of `second`, row-major. */
export type PairCoupling = {
  re: Float64Array;
  im: Float64Array;
  /** Coefficients by grid level, null after the first time there; emptied when one of the kinds changes. */
  readonly tables: Map<number, VerticalCoupling | null>;
};

/** Beyond so many grid points per wire the general quadrature is cheaper than the common grid. */
const mostGridPoints = 400;

/** Room for the coupling of two wires. */
export function createPairCoupling(first: CouplingSide, second: CouplingSide): PairCoupling {
  const size = first.own.count * second.own.count;
  return { re: new Float64Array(size), im: new Float64Array(size), tables: new Map() };
}

/** Computes the coupling for where the wires stand now; no allocation once a pair of vertical wires is warm. */
export function updatePairCoupling(
  ground: Ground,
  first: CouplingSide,
  second: CouplingSide,
  pair: PairCoupling,
): void {
  if (first.sense !== 0 && second.sense !== 0) {
    const dx = second.wire.start[0] - first.wire.start[0];
    const dy = second.wire.start[1] - first.wire.start[1];
    const distance = Math.sqrt(dx * dx + dy * dy);
    const lambda = (2 * Math.PI) / first.own.k;
    const level =
      distance > 0 ? gridLevel(lambda, distance, reachOf(ground, first.wire, second.wire)) : Infinity;
    if (Number.isFinite(level) && longest(first, second) <= mostGridPoints * gridStep(lambda, level)) {
      coupleVerticals(ground, first, second, pair, level, distance);
      return;
    }
  }
  couplePlacedWires(ground, first, second, pair);
}

/** A pair that comes back to the same grid is under the finger: from then on its coefficients pay. */
function coupleVerticals(
  ground: Ground,
  first: CouplingSide,
  second: CouplingSide,
  pair: PairCoupling,
  level: number,
  distance: number,
): void {
  const { k } = first.own;
  const table = pair.tables.get(level);
  if (table === undefined) {
    pair.tables.set(level, null);
    coupleOnce(k, ground, samplesOf(first, level), samplesOf(second, level), distance, pair.re, pair.im);
    return;
  }
  const kept = table ?? coupleVertical(k, ground, samplesOf(first, level), samplesOf(second, level));
  pair.tables.set(level, kept);
  evaluateCoupling(kept, distance, pair.re, pair.im);
}

/** A wire carried up and down in free space must not fill the memory with its heights. */
const mostSamplesKept = 32;

function samplesOf(side: CouplingSide, level: number): VerticalSamples {
  const kept = side.samples.get(level);
  if (kept !== undefined) return kept;
  const start = side.wire.start[2];
  const up = side.sense === -1 ? -1 : 1;
  const shared = side.own.samples;
  const key = `${start} ${up} ${level}`;
  const samples = shared.get(key) ?? sampleVertical(side.own, start, up, level);
  if (shared.size >= mostSamplesKept) shared.clear();
  shared.set(key, samples);
  side.samples.set(level, samples);
  return samples;
}

/** The greatest height difference, or with the plane height sum, between points of two vertical wires, metres. */
function reachOf(ground: Ground, a: Wire, b: Wire): number {
  const topA = Math.max(a.start[2], a.end[2]);
  const topB = Math.max(b.start[2], b.end[2]);
  if (ground === 'plane') return topA + topB;
  return Math.max(topA - Math.min(b.start[2], b.end[2]), topB - Math.min(a.start[2], a.end[2]));
}

function longest(first: CouplingSide, second: CouplingSide): number {
  const a = first.own.mesh.chain;
  const b = second.own.mesh.chain;
  return Math.max(a.step * a.segments, b.step * b.segments);
}

/** Wires in any direction: the kernel between all nodes, then reduced to the functions. */
function couplePlacedWires(
  ground: Ground,
  first: CouplingSide,
  second: CouplingSide,
  pair: PairCoupling,
): void {
  const block = mutualBlock(first.own.k, ground, placedMesh(first), placedMesh(second));
  const { count: m, functions: phi } = first.own;
  const { count: n, functions: psi } = second.own;
  pair.re.fill(0);
  pair.im.fill(0);
  for (let i = 0; i < block.rows; i += 1) {
    for (let b = 0; b < n; b += 1) {
      let re = 0;
      let im = 0;
      for (let j = 0; j < block.columns; j += 1) {
        re += block.re[i * block.columns + j]! * psi[j * n + b]!;
        im += block.im[i * block.columns + j]! * psi[j * n + b]!;
      }
      for (let a = 0; a < m; a += 1) {
        pair.re[a * n + b]! += phi[i * m + a]! * re;
        pair.im[a * n + b]! += phi[i * m + a]! * im;
      }
    }
  }
}

/** The functions belong to a kind; the mesh is laid where this wire stands. */
function placedMesh(side: CouplingSide): WireMesh {
  return { ...side.own.mesh, wire: side.wire, chain: chainOfWire(side.wire, side.own.mesh.chain.segments) };
}
