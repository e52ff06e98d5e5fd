import type { Complex, Pattern, PatternRequest } from './scene';

/** Gains below this are told as this, dBi: a null's depth is not a planning figure. */
const leastGainDbi = -60;

/** Differences closer than this are the same, dB. */
const sameWithinDb = 1e-9;

/** Azimuths 0, step, 2 step ... below 360 degrees. @throws RangeError for a step that is not in (0, 360] */
export function azimuthsOf(request: PatternRequest): number[] {
  const { stepDeg } = request;
  if (!(stepDeg > 0 && stepDeg <= 360)) throw new RangeError(`no azimuth step of ${stepDeg} degrees`);
  // A step such as 360/7 must not bring 360 back as a last bearing.
  const count = Math.ceil(360 / stepDeg - 1e-9);
  return Array.from({ length: count }, (_, i) => i * stepDeg);
}

/**
 * Power accepted by a port driven by 1 V in series with its load: (Re Y - Re g |Y|^2) / 2, watt.
 * What the loads of other ports absorb counts as accepted.
 */
export function acceptedPower(loadedAdmittance: Complex, load: Complex): number {
  const { re, im } = loadedAdmittance;
  return (re - load.re * (re * re + im * im)) / 2;
}

/** 10 lg (4 pi U / P), dBi, at least -60. */
export function gainDbi(intensity: number, power: number): number {
  const gain = (4 * Math.PI * intensity) / power;
  if (!(power > 0)) return NaN;
  return gain > 0 ? Math.max(leastGainDbi, 10 * Math.log10(gain)) : leastGainDbi;
}

/** The cut in place against the cut alone. Arrays of equal length over `azimuthDeg`. */
export function comparePatterns(
  azimuthDeg: readonly number[],
  inPlaceDbi: readonly number[],
  aloneDbi: readonly number[],
): Pattern {
  let least = Infinity;
  let most = -Infinity;
  let deepest = NaN;
  azimuthDeg.forEach((azimuth, i) => {
    const difference = inPlaceDbi[i]! - aloneDbi[i]!;
    // Bearings that are equal but for rounding: the first one speaks.
    if (!(difference >= least - sameWithinDb)) {
      least = difference;
      deepest = azimuth;
    }
    most = Math.max(most, difference);
  });
  return {
    azimuthDeg,
    gainDbi: inPlaceDbi,
    aloneDbi,
    rippleDb: most - least,
    deepestBearingDeg: deepest,
  };
}
