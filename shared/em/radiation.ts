import { gaussLegendre } from '../numerics/gauss-legendre';
import { chainMirrored, type Chain } from './chain';
import { freeSpaceImpedance } from './constants';
import type { Complex, Ground, Vector3 } from './scene';

/** Peak-referred node currents on a chain, ampere: hats sin k(d - |s - s_i|), half a hat at the ends. */
export type ChainCurrent = { readonly chain: Chain; readonly re: Float64Array; readonly im: Float64Array };

/** Exact to rounding for arms up to a wavelength. */
const armRule = gaussLegendre(16);

/**
 * Radiation intensity, watt per steradian, of the currents in the direction of the unit vector, both
 * polarisations: U = (eta k^2 / 32 pi^2) |N - (N . r) r|^2 with N the integral of I e^{jk r . r'} over all wires
 * and their images. @source Balanis 2016, section 12.2
 */
export function radiationIntensity(
  k: number,
  ground: Ground,
  currents: readonly ChainCurrent[],
  direction: Vector3,
): number {
  const n = new Float64Array(6);
  for (const current of currents) addRadiationVector(k, ground, current, direction, n);
  const { theta, phi } = transverseParts(n, direction);
  return intensityOf(k, theta.re ** 2 + theta.im ** 2 + phi.re ** 2 + phi.im ** 2);
}

/** Adds a chain's radiation vector, its image's included, to n (x, y, z; real and imaginary in turn). */
export function addRadiationVector(
  k: number,
  ground: Ground,
  current: ChainCurrent,
  direction: Vector3,
  n: Float64Array,
): void {
  addRadiation(k, current.chain, current, 1, direction, n);
  if (ground === 'plane') addRadiation(k, chainMirrored(current.chain), current, -1, direction, n);
}

/** The parts of a radiation vector across the direction: along falling elevation and along rising azimuth. */
export function transverseParts(n: Float64Array, direction: Vector3): { theta: Complex; phi: Complex } {
  const [rx, ry, rz] = direction;
  const flat = Math.hypot(rx, ry);
  // Straight up, azimuth is anything: x serves.
  const c = flat > 0 ? rx / flat : 1;
  const s = flat > 0 ? ry / flat : 0;
  const part = (at: number) => ({
    theta: rz * (c * n[at]! + s * n[2 + at]!) - flat * n[4 + at]!,
    phi: c * n[2 + at]! - s * n[at]!,
  });
  const re = part(0);
  const im = part(1);
  return { theta: { re: re.theta, im: im.theta }, phi: { re: re.phi, im: im.phi } };
}

/** Unit vector toward an azimuth (from +x toward +y) and elevation, degrees. */
export function directionOf(azimuthDeg: number, elevationDeg: number): Vector3 {
  const azimuth = (azimuthDeg * Math.PI) / 180;
  const elevation = (elevationDeg * Math.PI) / 180;
  const flat = Math.cos(elevation);
  return [flat * Math.cos(azimuth), flat * Math.sin(azimuth), Math.sin(elevation)];
}

/** U, watt per steradian, of |N|^2 across the direction, square ampere metres. */
export function intensityOf(k: number, squaredAcross: number): number {
  return (freeSpaceImpedance * k * k * squaredAcross) / (32 * Math.PI ** 2);
}

/** Adds `factor` times the chain's radiation vector to n. */
function addRadiation(
  k: number,
  chain: Chain,
  current: { readonly re: Float64Array; readonly im: Float64Array },
  factor: number,
  direction: Vector3,
  n: Float64Array,
): void {
  const [ux, uy, uz] = chain.direction;
  const [rx, ry, rz] = direction;
  const kappa = k * (ux * rx + uy * ry + uz * rz);
  const arm = armIntegral(k, kappa, chain.step);
  const base = k * (chain.origin[0] * rx + chain.origin[1] * ry + chain.origin[2] * rz);
  let sumRe = 0;
  let sumIm = 0;
  for (let i = 0; i <= chain.segments; i += 1) {
    // The arm after the node, and before it with the conjugate phase.
    const hatRe = (i < chain.segments ? arm.re : 0) + (i > 0 ? arm.re : 0);
    const hatIm = (i < chain.segments ? arm.im : 0) - (i > 0 ? arm.im : 0);
    const c = Math.cos(base + kappa * i * chain.step);
    const s = Math.sin(base + kappa * i * chain.step);
    const waveRe = hatRe * c - hatIm * s;
    const waveIm = hatRe * s + hatIm * c;
    sumRe += current.re[i]! * waveRe - current.im[i]! * waveIm;
    sumIm += current.re[i]! * waveIm + current.im[i]! * waveRe;
  }
  n[0]! += factor * ux * sumRe;
  n[1]! += factor * ux * sumIm;
  n[2]! += factor * uy * sumRe;
  n[3]! += factor * uy * sumIm;
  n[4]! += factor * uz * sumRe;
  n[5]! += factor * uz * sumIm;
}

/** Integral of sin k(d - s) e^{j kappa s} over 0 ... d; by quadrature, the closed form fails end-on. */
function armIntegral(k: number, kappa: number, d: number): { re: number; im: number } {
  let re = 0;
  let im = 0;
  for (let q = 0; q < armRule.nodes.length; q += 1) {
    const s = d * armRule.nodes[q]!;
    const value = d * armRule.weights[q]! * Math.sin(k * (d - s));
    re += value * Math.cos(kappa * s);
    im += value * Math.sin(kappa * s);
  }
  return { re, im };
}
