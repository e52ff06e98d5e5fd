/** Speed of light in vacuum, m/s (exact). @source SI definition of the metre */
export const speedOfLight = 299_792_458;

/** Impedance of free space, ohm: mu0 c. @source CODATA 2018 adjustment, 376.730 313 668 ohm */
export const freeSpaceImpedance = 376.730313668;

/** k = 2 pi f / c, radians per metre, of a frequency in hertz. */
export function waveNumber(frequency: number): number {
  return (2 * Math.PI * frequency) / speedOfLight;
}

/** lambda = c / f, metres, of a frequency in hertz. */
export function wavelength(frequency: number): number {
  return speedOfLight / frequency;
}
