import { freeSpaceImpedance } from '../constants';
import type { Ground } from '../scene';
import type { VerticalSamples } from './vertical-samples';

/**
 * The coupling of two vertical wires as a function of their distance alone:
 * Z_mn(d) = j (eta / 4 pi) sum_q C_mn,q e^{-jkR_q} / R_q with R_q = sqrt(d^2 + u_q^2) over the few height
 * differences (and, with the plane, height sums) u_q that occur on the common grid.
 */
export type VerticalCoupling = {
  readonly k: number;
  /** Number of function pairs: those of the source wire by those of the receiving wire, row-major. */
  readonly size: number;
  /** u_q^2, square metres. */
  readonly heightsSquared: Float64Array;
  /** Function pairs by heights, row-major. */
  readonly coefficients: Float64Array;
  /** Room for the kernel at all heights. */
  readonly kernelRe: Float64Array;
  readonly kernelIm: Float64Array;
};

/** Gathers the coefficients C: what two wires' samples have in common at each height difference and sum. */
export function coupleVertical(
  k: number,
  ground: Ground,
  source: VerticalSamples,
  receiver: VerticalSamples,
): VerticalCoupling {
  const size = source.count * receiver.count;
  const reach = Math.max(
    Math.abs(receiver.first + receiver.points - source.first),
    Math.abs(source.first + source.points - receiver.first),
    ground === 'plane' ? Math.abs(source.first + source.points + receiver.first + receiver.points) : 0,
    ground === 'plane' ? Math.abs(source.first + receiver.first) : 0,
  );
  const dense = new Float64Array((reach + 1) * size);
  for (let a = 0; a < source.points; a += 1) {
    for (let b = 0; b < receiver.points; b += 1) {
      const difference = Math.abs(receiver.first + b - source.first - a);
      addProducts(source, a, receiver, b, dense, difference * size);
      if (ground === 'none') continue;
      addProducts(source, a, receiver, b, dense, Math.abs(receiver.first + b + source.first + a) * size);
    }
  }
  return compact(k, size, source.step, dense, reach + 1);
}

/** Writes the impedances, ohm, of the two wires' functions at a distance (metres) into re and im. */
export function evaluateCoupling(
  coupling: VerticalCoupling,
  distance: number,
  re: Float64Array,
  im: Float64Array,
): void {
  const { k, size, heightsSquared, coefficients, kernelRe, kernelIm } = coupling;
  const heights = heightsSquared.length;
  const distanceSquared = distance * distance;
  const scale = freeSpaceImpedance / (4 * Math.PI);
  for (let q = 0; q < heights; q += 1) {
    const r = Math.sqrt(distanceSquared + heightsSquared[q]!);
    kernelRe[q] = (scale / r) * Math.sin(k * r);
    kernelIm[q] = (scale / r) * Math.cos(k * r);
  }
  let e = 0;
  // Two function pairs at a time: each value of the kernel is read once for both.
  for (; e + 1 < size; e += 2) {
    let ar = 0;
    let ai = 0;
    let br = 0;
    let bi = 0;
    for (let q = 0, a = e * heights, b = a + heights; q < heights; q += 1, a += 1, b += 1) {
      const gr = kernelRe[q]!;
      const gi = kernelIm[q]!;
      const ca = coefficients[a]!;
      const cb = coefficients[b]!;
      ar += ca * gr;
      ai += ca * gi;
      br += cb * gr;
      bi += cb * gi;
    }
    re[e] = ar;
    im[e] = ai;
    re[e + 1] = br;
    im[e + 1] = bi;
  }
  if (e === size) return;
  let ar = 0;
  let ai = 0;
  for (let q = 0, a = e * heights; q < heights; q += 1, a += 1) {
    ar += coefficients[a]! * kernelRe[q]!;
    ai += coefficients[a]! * kernelIm[q]!;
  }
  re[e] = ar;
  im[e] = ai;
}

/**
 * The same impedances without gathering coefficients first: cheaper for a pair that does not go on moving.
 * The receiver sums over its points once for all functions of the source.
 */
export function coupleOnce(
  k: number,
  ground: Ground,
  source: VerticalSamples,
  receiver: VerticalSamples,
  distance: number,
  re: Float64Array,
  im: Float64Array,
): void {
  re.fill(0);
  im.fill(0);
  const lowest = receiver.first - source.first - source.points + 1;
  const differences = kernelAt(k, distance, source.step, lowest, source.points + receiver.points - 1);
  const sums =
    ground === 'plane'
      ? kernelAt(k, distance, source.step, receiver.first + source.first, source.points + receiver.points - 1)
      : null;
  const n = receiver.count;
  const totalRe = new Float64Array(n);
  const totalIm = new Float64Array(n);
  for (let a = 0; a < source.points; a += 1) {
    totalRe.fill(0);
    totalIm.fill(0);
    for (let b = 0; b < receiver.points; b += 1) {
      const difference = b - a + source.points - 1;
      let gr = differences.re[difference]!;
      let gi = differences.im[difference]!;
      if (sums !== null) {
        gr += sums.re[a + b]!;
        gi += sums.im[a + b]!;
      }
      for (let q = 0; q < n; q += 1) {
        const current = receiver.receivers[b * n + q]!;
        totalRe[q]! += current * gr;
        totalIm[q]! += current * gi;
      }
    }
    for (let m = 0; m < source.count; m += 1) {
      const weight = source.sources[a * source.count + m]!;
      for (let q = 0; q < n; q += 1) {
        re[m * n + q]! += weight * totalRe[q]!;
        im[m * n + q]! += weight * totalIm[q]!;
      }
    }
  }
}

/** j (eta / 4 pi) e^{-jkR} / R at the heights first, first + 1 ... of the grid. */
function kernelAt(
  k: number,
  distance: number,
  step: number,
  first: number,
  count: number,
): { re: Float64Array; im: Float64Array } {
  const re = new Float64Array(count);
  const im = new Float64Array(count);
  const scale = freeSpaceImpedance / (4 * Math.PI);
  for (let q = 0; q < count; q += 1) {
    const height = (first + q) * step;
    const r = Math.sqrt(distance * distance + height * height);
    re[q] = (scale / r) * Math.sin(k * r);
    im[q] = (scale / r) * Math.cos(k * r);
  }
  return { re, im };
}

function addProducts(
  source: VerticalSamples,
  a: number,
  receiver: VerticalSamples,
  b: number,
  dense: Float64Array,
  at: number,
): void {
  let next = at;
  for (let m = 0; m < source.count; m += 1) {
    const weight = source.sources[a * source.count + m]!;
    for (let n = 0; n < receiver.count; n += 1, next += 1) {
      dense[next]! += weight * receiver.receivers[b * receiver.count + n]!;
    }
  }
}

/** Leaves out the heights that never occur (between the differences and the sums of high-standing wires). */
function compact(
  k: number,
  size: number,
  step: number,
  dense: Float64Array,
  heights: number,
): VerticalCoupling {
  const used: number[] = [];
  for (let q = 0; q < heights; q += 1) {
    if (dense.subarray(q * size, (q + 1) * size).some((value) => value !== 0)) used.push(q);
  }
  const heightsSquared = Float64Array.from(used, (q) => (q * step) ** 2);
  const coefficients = new Float64Array(used.length * size);
  for (let e = 0; e < size; e += 1) {
    used.forEach((q, i) => (coefficients[e * used.length + i] = dense[q * size + e]!));
  }
  const room = () => new Float64Array(used.length);
  return { k, size, heightsSquared, coefficients, kernelRe: room(), kernelIm: room() };
}
