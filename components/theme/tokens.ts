/** Every size of the interface; themes.ts holds every colour. Nothing outside this folder writes a raw one. */

/** Gaps and paddings. */
export const space = { none: 0, hair: 2, xs: 4, s: 8, m: 12, l: 16, xl: 24, xxl: 32, xxxl: 56 } as const;

/** Widths of drawn lines. */
export const line = { none: 0, hair: 1, bold: 2, mark: 1.75 } as const;

export const radius = { none: 0, s: 2, m: 4, l: 14, pill: 999 } as const;

/** Smallest side of anything that is pressed. */
export const target = { min: 44, large: 52 } as const;

export const iconSize = { s: 16, m: 20, l: 24, xl: 40 } as const;

/** Letter sizes with the line heights that belong to them. */
export const letter = {
  caption: { fontSize: 12.5, lineHeight: 17 },
  small: { fontSize: 14, lineHeight: 19 },
  body: { fontSize: 16, lineHeight: 23 },
  title: { fontSize: 19, lineHeight: 25 },
  heading: { fontSize: 25, lineHeight: 31 },
  display: { fontSize: 34, lineHeight: 40 },
} as const;

/** Width from which a window counts as a tablet, and as a desktop. */
export const breakpoint = { tablet: 720, desktop: 1200 } as const;

/** Widths and heights of larger pieces. */
export const measure = {
  header: 56,
  bottomBar: 64,
  field: 120,
  dialog: 480,
  form: 560,
  text: 640,
  page: 1080,
  shelf: 248,
  panel: 340,
  menu: 220,
  preview: 132,
  note: 96,
  sheetPeek: 168,
} as const;

/** Order of things that lie over one another. */
export const layer = { base: 0, raised: 1, bar: 10, sheet: 20, menu: 30, skip: 100 } as const;

/** How long a motion takes, ms; none at all where the system asks for reduced motion. */
export const duration = { quick: 120, sheet: 200 } as const;
