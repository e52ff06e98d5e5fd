export type LengthUnit = 'mm' | 'in';

/** Metres in one unit of the display. */
export const UNIT_LENGTH: Readonly<Record<LengthUnit, number>> = { mm: 1e-3, in: 0.0254 };

const STEPS: Readonly<Record<LengthUnit, readonly number[]>> = {
  mm: [1, 2, 5],
  in: [1, 2, 5],
};

/** Longest round length (1, 2 or 5 times a power of ten in the unit) that is not longer than `most` metres. */
export function roundLengthBelow(most: number, unit: LengthUnit): number {
  const inUnit = most / UNIT_LENGTH[unit];
  const decade = 10 ** Math.floor(Math.log10(inUnit));
  // 1e-9: a length that is round already must not fall to the step below by rounding
  const step = [...STEPS[unit]].reverse().find((value) => value * decade <= inUnit * (1 + 1e-9)) ?? 1;
  return step * decade * UNIT_LENGTH[unit];
}

/** Length that the scale bar stands for: the longest round one that fits into `room` pixels. */
export function scaleBarLength(scale: number, room: number, unit: LengthUnit): number {
  return roundLengthBelow(room / scale, unit);
}

/** Spacing of the grid's fine lines: the round length whose lines are nearest to, and at least, 22 px apart. */
export function gridSpacing(scale: number, unit: LengthUnit): number {
  const least = 22 / scale;
  let spacing = roundLengthBelow(least, unit);
  while (spacing < least * (1 - 1e-9)) spacing = nextRound(spacing, unit);
  return spacing;
}

function nextRound(length: number, unit: LengthUnit): number {
  const inUnit = length / UNIT_LENGTH[unit];
  const decade = 10 ** Math.floor(Math.log10(inUnit * (1 + 1e-9)));
  const digit = Math.round(inUnit / decade);
  const next = digit < 2 ? 2 : digit < 5 ? 5 : 10;
  return next * decade * UNIT_LENGTH[unit];
}
