import type { Scene, Vector3, Wire } from '@/shared/em/scene';

/** Ten bands from 122 MHz to 2.45 GHz, Hz: low, middle and high of each. */
export const tenBands: readonly (readonly [number, number, number])[] = [
  [118e6, 127e6, 136e6],
  [148e6, 156e6, 164e6],
  [380e6, 390e6, 400e6],
  [430e6, 450e6, 470e6],
  [703e6, 725e6, 748e6],
  [832e6, 868e6, 915e6],
  [1559e6, 1575.42e6, 1610e6],
  [1710e6, 1785e6, 1880e6],
  [1920e6, 2050e6, 2170e6],
  [2400e6, 2442e6, 2484e6],
];

/** Evenly spread numbers in [0, 1) from a seed. @source Steele, Lea and Flood 2014, SplitMix; 32-bit variant */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let z = state;
    z = Math.imul(z ^ (z >>> 16), 0x21f0aaad);
    z = Math.imul(z ^ (z >>> 15), 0x735a2d97);
    return ((z ^ (z >>> 15)) >>> 0) / 2 ** 32;
  };
}

/** Whips of 0.03 to 1.2 m, upright on the plane, at least `spacing` metres apart on a roof of that size. */
export function randomWhips(
  seed: number,
  count: number,
  roof: readonly [number, number],
  spacing = 0.15,
): Wire[] {
  const random = seededRandom(seed);
  const wires: Wire[] = [];
  while (wires.length < count) {
    const x = roof[0] * random();
    const y = roof[1] * random();
    if (wires.some(({ start }) => Math.hypot(start[0] - x, start[1] - y) < spacing)) continue;
    const length = 0.03 * 40 ** random();
    const radius = Math.min(0.0015, length / 80);
    wires.push(uprightWhip(`w${wires.length}`, [x, y, 0], length, radius));
  }
  return wires;
}

/** A whip that stands upright at its start. */
export function uprightWhip(id: string, start: Vector3, length: number, radius: number): Wire {
  return { id, start, end: [start[0], start[1], start[2] + length], radius, feed: 'start' };
}

/** A dipole by its centre and direction (unit vector). */
export function dipole(
  id: string,
  centre: Vector3,
  length: number,
  direction: Vector3,
  radius: number,
): Wire {
  const half = direction.map((u) => (u * length) / 2);
  return {
    id,
    start: [centre[0] - half[0]!, centre[1] - half[1]!, centre[2] - half[2]!],
    end: [centre[0] + half[0]!, centre[1] + half[1]!, centre[2] + half[2]!],
    radius,
    feed: 'centre',
  };
}

/** Absolute differences of isolation, dB, between two answers of one scene, where the second is above -80 dB. */
export function isolationErrors(
  one: { readonly results: readonly { readonly isolationDb: readonly (readonly (number | null)[])[] }[] },
  other: typeof one,
): number[] {
  return one.results.flatMap((result, f) =>
    result.isolationDb.flatMap((row, i) =>
      row.flatMap((value, j) => {
        const reference = other.results[f]!.isolationDb[i]![j]!;
        return j < i && value !== null && reference < 80 ? [Math.abs(value - reference)] : [];
      }),
    ),
  );
}

/** The smallest value that at least `share` of the values do not exceed. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)] ?? NaN;
}

/** A mixed-band layout: whips on the plane and one of the ten bands' middles per wire. */
export function mixedBandScene(seed: number, count: number): Scene {
  const random = seededRandom(seed ^ 0x5eed);
  const frequencies = Array.from({ length: 4 }, () => tenBands[Math.floor(random() * tenBands.length)]![1]);
  return { ground: 'plane', frequencies, wires: randomWhips(seed, count, [3.2, 1.5]) };
}
