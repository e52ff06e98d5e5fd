import { SPEED_OF_LIGHT } from '../units/constants';

/** A thin whip resonates somewhat shorter than a quarter of the free-space wave. @source common practice */
export const SHORTENING = 0.95;

/** Length of a quarter-wave whip, m, for a frequency in Hz: 0.95 c / (4 f). @source common practice */
export function quarterWaveLength(frequency: number): number {
  return (SHORTENING * SPEED_OF_LIGHT) / (4 * frequency);
}

/** Whole length of a half-wave dipole, m: two quarter waves. @source common practice */
export function halfWaveLength(frequency: number): number {
  return 2 * quarterWaveLength(frequency);
}
