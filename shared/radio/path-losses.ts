import type { RadioFigures } from './radio-figures';

/** Rejection, dB, of the filter in a radio's line at a frequency (Hz): the greatest of the bands that hold it, else 0. */
export function filterRejectionDb(radio: RadioFigures, frequency: number): number {
  let most = 0;
  for (const { from, to, rejectionDb } of radio.rejections) {
    if (frequency >= from && frequency <= to) most = Math.max(most, rejectionDb);
  }
  return most;
}

/**
 * What lies between two connectors besides the antennas, dB, each loss counted once: both feeders and both
 * filters at that frequency (Hz).
 */
export function pathLossesDb(
  from: RadioFigures,
  into: RadioFigures,
  feederLossesDb: number,
  frequency: number,
): number {
  return feederLossesDb + filterRejectionDb(from, frequency) + filterRejectionDb(into, frequency);
}
