import { freeSpaceImpedance } from '../constants';
import type { Ground } from '../scene';
import type { VerticalSamples } from './vertical-grid';

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
  const heights = reach + 1;
  const dense = new Float64Array(heights * size);
  for (let m = 0, e = 0; m < source.count; m += 1) {
    for (let n = 0; n < receiver.count; n += 1, e += 1) {
      for (let a = 0; a < source.points; a += 1) {
        const weight = source.sources[m * source.points + a]!;
        const to = e * heights;
        const from = n * receiver.points;
        const height = source.first + a;
        for (let b = 0; b < receiver.points; b += 1) {
          const product = weight * receiver.receivers[from + b]!;
          dense[to + Math.abs(receiver.first + b - height)]! += product;
          if (ground === 'plane') dense[to + Math.abs(receiver.first + b + height)]! += product;
        }
      }
    }
  }
  return compact(k, size, source.step, dense, heights);
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
  const { points } = receiver;
  const lowest = receiver.first - source.first - source.points + 1;
  const differences = kernelAt(k, distance, source.step, lowest, source.points + points - 1);
  const sums =
    ground === 'plane'
      ? kernelAt(k, distance, source.step, receiver.first + source.first, source.points + points - 1)
      : null;
  const rowRe = new Float64Array(points);
  const rowIm = new Float64Array(points);
  const fieldRe = new Float64Array(receiver.count * source.points);
  const fieldIm = new Float64Array(receiver.count * source.points);
  for (let a = 0; a < source.points; a += 1) {
    for (let b = 0; b < points; b += 1) {
      const difference = b - a + source.points - 1;
      rowRe[b] = differences.re[difference]! + (sums === null ? 0 : sums.re[a + b]!);
      rowIm[b] = differences.im[difference]! + (sums === null ? 0 : sums.im[a + b]!);
    }
    for (let n = 0; n < receiver.count; n += 2) {
      // Two functions at a time; of an odd number the last is paired with itself.
      const other = Math.min(n + 1, receiver.count - 1);
      let oneRe = 0;
      let oneIm = 0;
      let otherRe = 0;
      let otherIm = 0;
      for (let b = 0, p = n * points, q = other * points; b < points; b += 1, p += 1, q += 1) {
        const gr = rowRe[b]!;
        const gi = rowIm[b]!;
        const current = receiver.receivers[p]!;
        const next = receiver.receivers[q]!;
        oneRe += current * gr;
        oneIm += current * gi;
        otherRe += next * gr;
        otherIm += next * gi;
      }
      fieldRe[n * source.points + a] = oneRe;
      fieldIm[n * source.points + a] = oneIm;
      fieldRe[other * source.points + a] = otherRe;
      fieldIm[other * source.points + a] = otherIm;
    }
  }
  for (let m = 0, e = 0; m < source.count; m += 1) {
    for (let n = 0; n < receiver.count; n += 1, e += 1) {
      let sumRe = 0;
      let sumIm = 0;
      for (
        let a = 0, w = m * source.points, f = n * source.points;
        a < source.points;
        a += 1, w += 1, f += 1
      ) {
        sumRe += source.sources[w]! * fieldRe[f]!;
        sumIm += source.sources[w]! * fieldIm[f]!;
      }
      re[e] = sumRe;
      im[e] = sumIm;
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
    let occurs = false;
    for (let e = 0; e < size && !occurs; e += 1) occurs = dense[e * heights + q] !== 0;
    if (occurs) used.push(q);
  }
  const heightsSquared = Float64Array.from(used, (q) => (q * step) ** 2);
  const coefficients = new Float64Array(used.length * size);
  for (let e = 0; e < size; e += 1) {
    for (let i = 0; i < used.length; i += 1)
      coefficients[e * used.length + i] = dense[e * heights + used[i]!]!;
  }
  const room = () => new Float64Array(used.length);
  return { k, size, heightsSquared, coefficients, kernelRe: room(), kernelIm: room() };
}
