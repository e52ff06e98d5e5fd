/** Physical constants, SI, each with its source. */

/** Speed of light in vacuum, m/s; exact. @source SI Brochure, 9th edition (2019) */
export const SPEED_OF_LIGHT = 299_792_458;

/** Boltzmann constant, J/K; exact. @source SI Brochure, 9th edition (2019) */
export const BOLTZMANN = 1.380_649e-23;

/** Reference temperature of noise figures, K. @source IEEE definition of noise figure, 290 K */
export const REFERENCE_TEMPERATURE = 290;

/** Metres in an inch; exact. @source International yard and pound agreement (1959) */
export const INCH = 0.0254;

/** Wavelength in vacuum, m, of a frequency in Hz: c / f. */
export function wavelength(frequency: number): number {
  return SPEED_OF_LIGHT / frequency;
}
