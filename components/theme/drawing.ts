/** Sizes of the drawing, px on the screen whatever the zoom. */
export const drawing = {
  /** Letters on the plan. */
  text: { small: 12, mark: 13, pill: 13 },
  stroke: { fine: 1, link: 1.5, urgent: 2, outline: 2.5, mark: 1.75, rose: 2 },
  dash: { centre: '14 4 3 4', hidden: '4 3', dotted: '1.5 4', alone: '3 3' },
  /** Hole-centre mark: circle, dot, and how far its cross reaches. */
  mark: { ring: 8, dot: 2.5, cross: 13, halo: 12 },
  pill: { height: 24, side: 9, state: 5, gap: 5 },
  balloon: { radius: 13, away: 44 },
  rose: { radius: 58 },
  dimension: { away: 30, tick: 5, overshoot: 6 },
  hatch: { spacing: 7 },
  crosshair: { reach: 14, hole: 4 },
  datum: { ring: 6, cross: 11 },
  point: { ring: 4 },
  /** Free space around a fitted drawing. */
  margin: { phone: 40, wide: 76 },
  /** A part of the canvas that the scale bar may take. */
  scaleBar: { room: 150, height: 36, tick: 5 },
} as const;
