import { BOLTZMANN, REFERENCE_TEMPERATURE } from '../units/constants';

/** A power in dBm: 10 lg (P / 1 mW); minus infinity for none. `power` in W. */
export function levelOfPower(power: number): number {
  return 10 * Math.log10(power * 1e3);
}

/**
 * Noise of a receiver referred to its connector, dBm: N = k T0 B F.
 * @param bandwidth Hz
 * @param noiseFigureDb dB
 * @source Friis 1944; T0 = 290 K, so that k T0 is -173.98 dBm/Hz
 */
export function receiverNoiseDbm(bandwidth: number, noiseFigureDb: number): number {
  return levelOfPower(BOLTZMANN * REFERENCE_TEMPERATURE * bandwidth) + noiseFigureDb;
}
