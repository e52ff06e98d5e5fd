/** A frequency, Hz, in a sentence: 155.5 MHz, 1575.4 MHz. */
export function frequencyWords(frequency: number): string {
  return `${Number((frequency / 1e6).toFixed(1))} MHz`;
}

/** A length, m, in a sentence: 310 mm. */
export function lengthWords(length: number): string {
  return `${Math.round(length * 1000)} mm`;
}
