import { gaussLegendre } from '../../numerics/gauss-legendre';
import type { OwnCurrents } from './own-currents';
import type { VerticalSamples } from './vertical-grid';

/** Points of an interpolation. */
const stencil = 8;
/** Grid steps per wavelength of the kernel along the wire, and per distance, that keep it within 1e-3. */
const stepsPerWavelength = 5.5;
const stepsPerDistance = 2.5;

/** Fourteen segments per wavelength: two points integrate their sinusoids to 1e-5. */
const segmentRule = gaussLegendre(2);

/**
 * Level of the grid for two wires at a distance whose heights differ (or add up) by at most `reach` metres: the
 * step is a wavelength halved `level` times. Along the wire the kernel's phase runs at most with k reach / R:
 * far wires see each other broadside and need few points.
 */
export function gridLevel(wavelength: number, distance: number, reach: number): number {
  let level = Math.ceil(Math.log2((wavelength * stepsPerDistance) / distance));
  // A coarse grid's stencils reach beyond the wires themselves, where the phase runs faster.
  while (!isFineEnough(wavelength, distance, reach, gridStep(wavelength, level))) level += 1;
  return level;
}

function isFineEnough(wavelength: number, distance: number, reach: number, step: number): boolean {
  const height = reach + (stencil / 2) * step;
  return step * stepsPerWavelength * height <= wavelength * Math.hypot(distance, height);
}

/** The grid's step at a level, metres. */
export function gridStep(wavelength: number, level: number): number {
  return wavelength / 2 ** level;
}

/**
 * Samples a vertical wire's functions on the grid of that level. `start` is the height of its start, metres;
 * `up` is 1 when the wire runs upward from there, -1 when downward.
 */
export function sampleVertical(own: OwnCurrents, start: number, up: 1 | -1, level: number): VerticalSamples {
  const { chain } = own.mesh;
  const k = own.k;
  const step = gridStep((2 * Math.PI) / k, level);
  const rise = up * chain.step;
  const top = start + rise * chain.segments;
  const first = Math.floor(Math.min(start, top) / step) - stencil / 2 + 1;
  const points = Math.floor(Math.max(start, top) / step) + stencil / 2 - first + 1;
  const sources = new Float64Array(points * own.count);
  const receivers = new Float64Array(points * own.count);
  const { count, functions } = own;
  const c = Math.cos(k * chain.step);
  const weights = new Float64Array(stencil);
  for (let i = 0; i <= chain.segments; i += 1) {
    const from = lagrange((start + i * rise) / step, weights) - first;
    const ends = (i > 0 ? 1 : 0) + (i < chain.segments ? 1 : 0);
    for (let m = 0; m < count; m += 1) {
      let jump = -ends * c * functions[i * count + m]!;
      if (i > 0) jump += functions[(i - 1) * count + m]!;
      if (i < chain.segments) jump += functions[(i + 1) * count + m]!;
      for (let g = 0; g < stencil; g += 1) sources[m * points + from + g]! += up * jump * weights[g]!;
    }
  }
  for (let p = 0; p < chain.segments; p += 1) {
    for (let q = 0; q < segmentRule.nodes.length; q += 1) {
      const s = chain.step * segmentRule.nodes[q]!;
      const weight = up * chain.step * segmentRule.weights[q]!;
      const from = lagrange((start + p * rise + up * s) / step, weights) - first;
      const falling = weight * Math.sin(k * (chain.step - s));
      const rising = weight * Math.sin(k * s);
      for (let m = 0; m < count; m += 1) {
        const current = falling * functions[p * count + m]! + rising * functions[(p + 1) * count + m]!;
        for (let g = 0; g < stencil; g += 1) receivers[m * points + from + g]! += current * weights[g]!;
      }
    }
  }
  return { step, first, points, count, sources, receivers };
}

/** Lagrange weights of the grid points around position x (in steps); gives the index of the first of them. */
function lagrange(x: number, weights: Float64Array): number {
  const from = Math.floor(x) - stencil / 2 + 1;
  const t = x - from;
  for (let a = 0; a < stencil; a += 1) {
    let weight = 1;
    for (let b = 0; b < stencil; b += 1) if (b !== a) weight *= (t - b) / (a - b);
    weights[a] = weight;
  }
  return from;
}
