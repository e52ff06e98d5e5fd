import type { RadioBand, RadioFigures } from './radio-figures';

/** Frequencies closer than this share of themselves are computed once: no isolation changes within it. */
export const SAME_FREQUENCY_SHARE = 0.005;

/** Low, middle and high of every band that the radio transmits on, Hz, ascending; none when it only receives. */
export function carrierFrequencies(radio: RadioFigures): number[] {
  return radio.receiveOnly || radio.power <= 0 ? [] : bandFrequencies(radio.transmitBands);
}

/** Low, middle and high of every band that the radio receives on, Hz, ascending. */
export function channelFrequencies(radio: RadioFigures): number[] {
  return bandFrequencies(radio.receiveBands);
}

/**
 * Groups frequencies, Hz, that differ by at most `SAME_FREQUENCY_SHARE` and gives the middle of each group,
 * ascending. Groups are cut from below, so that the answer depends on the set alone.
 */
export function groupFrequencies(frequencies: Iterable<number>): number[] {
  const sorted = [...frequencies].sort((a, b) => a - b);
  const middles: number[] = [];
  for (let first = 0; first < sorted.length;) {
    const least = sorted[first]!;
    let last = first;
    while (last + 1 < sorted.length && sorted[last + 1]! <= least * (1 + SAME_FREQUENCY_SHARE)) last += 1;
    middles.push((least + sorted[last]!) / 2);
    first = last + 1;
  }
  return middles;
}

/** Index of the group middle nearest to a frequency. @throws RangeError for no groups */
export function nearestFrequency(middles: readonly number[], frequency: number): number {
  if (middles.length === 0) throw new RangeError('no frequencies to choose from');
  let best = 0;
  for (let i = 1; i < middles.length; i += 1) {
    if (Math.abs(middles[i]! - frequency) < Math.abs(middles[best]! - frequency)) best = i;
  }
  return best;
}

function bandFrequencies(bands: readonly RadioBand[]): number[] {
  const all = bands.flatMap(({ from, to }) => [from, (from + to) / 2, to]);
  return [...new Set(all)].sort((a, b) => a - b);
}
