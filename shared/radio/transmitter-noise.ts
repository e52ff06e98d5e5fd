import { levelOfPower, receiverNoiseDbm } from './levels';
import type { RadioFigures } from './radio-figures';

/** Interference over the receiver's own noise that is permitted, dB: a rise of the noise by 0.97 dB. */
export const PERMITTED_INTERFERENCE_DB = -6;

/**
 * Isolation, dB, between the two connectors that keeps From's broadband noise in Into's bandwidth at the
 * permitted share of Into's own noise: needed = P + N_dBc/Hz + 10 lg B - (k T0 B F + I/N). Holds at every channel
 * of Into.
 * @source noise: Friis 1944; I/N = -6 dB is a rise of 10 lg (1 + 10^-0.6) = 0.97 dB
 */
export function transmitterNoiseNeedDb(from: RadioFigures, into: RadioFigures): number {
  const arriving = levelOfPower(from.power) + from.noiseDbcPerHz + 10 * Math.log10(into.bandwidth);
  return arriving - (receiverNoiseDbm(into.bandwidth, into.noiseFigureDb) + PERMITTED_INTERFERENCE_DB);
}
