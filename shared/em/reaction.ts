/**
 * The kernel: the reaction of sinusoidal currents on two straight filaments in any direction.
 *
 * On a filament along u with I'' = -k^2 I between its nodes, the field is a sum of spherical waves
 * G_i = e^{-jkR_i} / R_i that start at the nodes, weighted with the jumps W_i = I'(i+) - I'(i-):
 *
 *     E_u       = -j (eta / 4 pi k) sum_i W_i G_i
 *     rho E_rho = +j (eta / 4 pi k) sum_i W_i (u - u_i) G_i  -  (eta / 4 pi) [I e^{-jkR}] from start to end
 *
 * The last term is there only where the current does not vanish at an end of the filament and goes on in
 * another one (a whip's base and its image, later a junction); the end's charge belongs to both and cancels.
 * Currents are referred to their maxima (sin k s, not sin k s / sin k d): nothing divides by a sine.
 * @source Schelkunoff and Friis 1952; Jordan and Balmain 1968; Richmond 1974 (NASA CR-2399)
 */
import { gaussLegendre, type QuadratureRule } from '../numerics/gauss-legendre';
import type { Chain } from './chain';
import { freeSpaceImpedance } from './constants';

const fewPoints = gaussLegendre(4);
const manyPoints = gaussLegendre(8);

/** Below this share of the filament's remoteness a point counts as on its axis, where E_rho vanishes. */
const onAxisShare = 1e-16;

/** Intervals are not halved any further below this share of the segment; the integrand is bounded there. */
const smallestShare = 2 ** -40;

/**
 * What one test segment receives from each node wave of a source chain, both test currents at once.
 * Column i: integral of I_t (u . t - (u - u_i) beta) G_i, with beta = (rho . t) / rho^2; the two last columns are
 * the integrals of I_t beta e^{-jkR} for the chain's start and end.
 */
export type NodeReactions = {
  /** Test current sin k s, rising from the segment's start. */
  readonly risingRe: Float64Array;
  readonly risingIm: Float64Array;
  /** Test current sin k (d - s), falling toward the segment's end. */
  readonly fallingRe: Float64Array;
  readonly fallingIm: Float64Array;
};

/** Room for the reactions with a chain of that many segments. */
export function createNodeReactions(segments: number): NodeReactions {
  const columns = segments + 3;
  return {
    risingRe: new Float64Array(columns),
    risingIm: new Float64Array(columns),
    fallingRe: new Float64Array(columns),
    fallingIm: new Float64Array(columns),
  };
}

/**
 * Fills `out` for segment `index` of `test` in the field of `source`. `offset` is the distance, metres, by which
 * the test filament is shifted out of the plane of both: a wire's radius for its own field, 0 between wires.
 */
export function nodeReactions(
  k: number,
  source: Chain,
  test: Chain,
  index: number,
  offset: number,
  out: NodeReactions,
): void {
  out.risingRe.fill(0);
  out.risingIm.fill(0);
  out.fallingRe.fill(0);
  out.fallingIm.fill(0);
  const [ux, uy, uz] = source.direction;
  const [tx, ty, tz] = test.direction;
  const gamma = ux * tx + uy * ty + uz * tz;
  const crossSquared = (uy * tz - uz * ty) ** 2 + (uz * tx - ux * tz) ** 2 + (ux * ty - uy * tx) ** 2;
  // Directions known to 1e-8 rad: within that, filaments are parallel and have no radial part.
  const parallel = crossSquared < 1e-16;
  const d = test.step;
  const relX = test.origin[0] - source.origin[0] + index * d * tx;
  const relY = test.origin[1] - source.origin[1] + index * d * ty;
  const relZ = test.origin[2] - source.origin[2] + index * d * tz;
  const line: SourceLine = { k, source, test, parallel, gamma, relX, relY, relZ, offset };
  integrateInterval(line, 0, d, out);
}

/**
 * Adds to the block (source nodes by test nodes, row-major) `factor` times the impedances between the node
 * currents of two chains, Z = - integral of I_t (E . t) ds (Rumsey's reaction; Carter's induced EMF). Node
 * currents are peak-referred hats: sin k(d - |s - s_i|), half a hat at a chain's ends.
 */
export function addChainBlock(
  k: number,
  source: Chain,
  test: Chain,
  offset: number,
  factor: number,
  blockRe: Float64Array,
  blockIm: Float64Array,
): void {
  const waves = createNodeReactions(source.segments);
  const columns = test.segments + 1;
  for (let p = 0; p < test.segments; p += 1) {
    nodeReactions(k, source, test, p, offset, waves);
    addHats(k, source, waves.fallingRe, waves.fallingIm, 0, factor, blockRe, blockIm, p, columns);
    addEnds(k, source, waves.fallingRe, waves.fallingIm, factor, blockRe, blockIm, p, columns);
    addHats(k, source, waves.risingRe, waves.risingIm, 0, factor, blockRe, blockIm, p + 1, columns);
    addEnds(k, source, waves.risingRe, waves.risingIm, factor, blockRe, blockIm, p + 1, columns);
  }
}

/**
 * Adds the same for a chain in its own field, or in that of a parallel chain of the same step and length: the
 * node waves then depend on the difference of the indices alone (`extended` begins `segments` nodes before
 * `source`) or, for a chain and its upright image, on their sum, so one test segment serves for all.
 */
export function addParallelBlock(
  k: number,
  source: Chain,
  test: Chain,
  dependsOn: 'difference' | 'sum',
  offset: number,
  factor: number,
  blockRe: Float64Array,
  blockIm: Float64Array,
): void {
  const n = source.segments;
  const [x, y, z] = source.origin;
  const [ux, uy, uz] = source.direction;
  const back = dependsOn === 'difference' ? n * source.step : 0;
  const extended: Chain = {
    ...source,
    origin: [x - back * ux, y - back * uy, z - back * uz],
    segments: 2 * n,
  };
  const waves = createNodeReactions(2 * n);
  nodeReactions(k, extended, test, 0, offset, waves);
  for (let p = 0; p < n; p += 1) {
    const from = dependsOn === 'difference' ? n - p : p;
    addHats(k, source, waves.fallingRe, waves.fallingIm, from, factor, blockRe, blockIm, p, n + 1);
    addHats(k, source, waves.risingRe, waves.risingIm, from, factor, blockRe, blockIm, p + 1, n + 1);
  }
}

/**
 * Turns node waves (starting at column `from`) into the impedances of the chain's hats against one test current
 * and adds them to a column of the block: jumps 1, -2 cos kd, 1 (at an end -cos kd, 1), times j eta / 4 pi.
 */
function addHats(
  k: number,
  source: Chain,
  waveRe: Float64Array,
  waveIm: Float64Array,
  from: number,
  factor: number,
  blockRe: Float64Array,
  blockIm: Float64Array,
  column: number,
  columns: number,
): void {
  const n = source.segments;
  const c = Math.cos(k * source.step);
  const scale = (factor * freeSpaceImpedance) / (4 * Math.PI);
  for (let i = 0; i <= n; i += 1) {
    const at = from + i;
    const inner = i > 0 && i < n;
    const self = inner ? -2 * c : -c;
    let re = self * waveRe[at]!;
    let im = self * waveIm[at]!;
    if (i > 0) {
      re += waveRe[at - 1]!;
      im += waveIm[at - 1]!;
    }
    if (i < n) {
      re += waveRe[at + 1]!;
      im += waveIm[at + 1]!;
    }
    blockRe[i * columns + column]! -= scale * im;
    blockIm[i * columns + column]! += scale * re;
  }
}

/** Adds what a current that goes on beyond the chain's start or end leaves of its radial field. */
function addEnds(
  k: number,
  source: Chain,
  waveRe: Float64Array,
  waveIm: Float64Array,
  factor: number,
  blockRe: Float64Array,
  blockIm: Float64Array,
  column: number,
  columns: number,
): void {
  const n = source.segments;
  const scale = (factor * freeSpaceImpedance * Math.sin(k * source.step)) / (4 * Math.PI);
  blockRe[column]! -= scale * waveRe[n + 1]!;
  blockIm[column]! -= scale * waveIm[n + 1]!;
  blockRe[n * columns + column]! += scale * waveRe[n + 2]!;
  blockIm[n * columns + column]! += scale * waveIm[n + 2]!;
}

/** Everything that stays the same along one test segment. */
type SourceLine = {
  readonly k: number;
  readonly source: Chain;
  readonly test: Chain;
  readonly parallel: boolean;
  readonly gamma: number;
  readonly relX: number;
  readonly relY: number;
  readonly relZ: number;
  readonly offset: number;
};

/**
 * Gauss-Legendre on [s0, s1], halved until the singularity nearest to its middle is at least its length away:
 * eight points are then good to 1e-9, four from four lengths on.
 */
function integrateInterval(line: SourceLine, s0: number, s1: number, out: NodeReactions): void {
  const length = s1 - s0;
  const remoteness = distanceToSingularity(line, (s0 + s1) / 2);
  const phase = line.k * length;
  if (remoteness >= 4 * length && phase <= 0.7) addPoints(line, s0, length, fewPoints, out);
  else if ((remoteness >= length && phase <= 1.6) || length < smallestShare * line.test.step) {
    addPoints(line, s0, length, manyPoints, out);
  } else {
    const middle = (s0 + s1) / 2;
    integrateInterval(line, s0, middle, out);
    integrateInterval(line, middle, s1, out);
  }
}

/** Parallel filaments feel only the nodes of the source, others its whole axis. */
function distanceToSingularity(line: SourceLine, s: number): number {
  const { source, test } = line;
  const [ux, uy, uz] = source.direction;
  const px = line.relX + s * test.direction[0];
  const py = line.relY + s * test.direction[1];
  const pz = line.relZ + s * test.direction[2];
  const along = px * ux + py * uy + pz * uz;
  const rx = px - along * ux;
  const ry = py - along * uy;
  const rz = pz - along * uz;
  const length = source.step * source.segments;
  const node = Math.min(source.segments, Math.max(0, Math.round(along / source.step))) * source.step;
  const beyond = along < 0 ? along : along > length ? along - length : 0;
  const axial = line.parallel ? along - node : beyond;
  return Math.sqrt(rx * rx + ry * ry + rz * rz + line.offset * line.offset + axial * axial);
}

function addPoints(
  line: SourceLine,
  s0: number,
  length: number,
  rule: QuadratureRule,
  out: NodeReactions,
): void {
  const { k, source, test, gamma, parallel } = line;
  const { risingRe, risingIm, fallingRe, fallingIm } = out;
  const [ux, uy, uz] = source.direction;
  const [tx, ty, tz] = test.direction;
  const step = source.step;
  const n = source.segments;
  const d = test.step;
  const offsetSquared = line.offset * line.offset;
  for (let q = 0; q < rule.nodes.length; q += 1) {
    const s = s0 + length * rule.nodes[q]!;
    const weight = length * rule.weights[q]!;
    const rising = weight * Math.sin(k * s);
    const falling = weight * Math.sin(k * (d - s));
    const px = line.relX + s * tx;
    const py = line.relY + s * ty;
    const pz = line.relZ + s * tz;
    const along = px * ux + py * uy + pz * uz;
    const rx = px - along * ux;
    const ry = py - along * uy;
    const rz = pz - along * uz;
    const rhoSquared = rx * rx + ry * ry + rz * rz + offsetSquared;
    const onAxis = rhoSquared < onAxisShare * (along * along + step * step);
    const beta = parallel || onAxis ? 0 : (rx * tx + ry * ty + rz * tz) / rhoSquared;
    for (let i = 0; i <= n; i += 1) {
      const axial = along - i * step;
      const distance = Math.sqrt(rhoSquared + axial * axial);
      const size = (gamma - axial * beta) / distance;
      const re = size * Math.cos(k * distance);
      const im = -size * Math.sin(k * distance);
      risingRe[i]! += rising * re;
      risingIm[i]! += rising * im;
      fallingRe[i]! += falling * re;
      fallingIm[i]! += falling * im;
    }
    if (beta === 0) continue;
    for (let end = 0; end <= 1; end += 1) {
      const axial = along - end * n * step;
      const distance = Math.sqrt(rhoSquared + axial * axial);
      const re = beta * Math.cos(k * distance);
      const im = -beta * Math.sin(k * distance);
      risingRe[n + 1 + end]! += rising * re;
      risingIm[n + 1 + end]! += rising * im;
      fallingRe[n + 1 + end]! += falling * re;
      fallingIm[n + 1 + end]! += falling * im;
    }
  }
}
