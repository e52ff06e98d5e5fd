/** Mean advance of Barlow Semi Condensed in ems, by kind of character; digits are tabular. */
const ADVANCE = { digit: 0.55, upper: 0.6, lower: 0.5, wide: 0.78, narrow: 0.26, space: 0.22, other: 0.5 };
/** Bold type runs wider. */
const BOLD = 1.05;

/** Width of a text on the plan, px; an upper estimate, so that boxes made from it never cut the text. */
export function textWidth(text: string, size: number, bold = false): number {
  let ems = 0;
  for (const character of text) ems += advanceOf(character);
  return ems * size * (bold ? BOLD : 1);
}

/** Cuts a text so that it fits, with an ellipsis where something was cut off. */
export function fitText(text: string, size: number, room: number): string {
  if (textWidth(text, size) <= room) return text;
  let kept = text;
  while (kept.length > 1 && textWidth(`${kept}…`, size) > room) kept = kept.slice(0, -1);
  return `${kept.trimEnd()}…`;
}

function advanceOf(character: string): number {
  if (character === ' ') return ADVANCE.space;
  if (/[0-9]/.test(character)) return ADVANCE.digit;
  if (/[ijlI.,:;'|!()]/.test(character)) return ADVANCE.narrow;
  if (/[mwMW@…]/.test(character)) return ADVANCE.wide;
  if (/[A-ZÄÖÜ+−]/.test(character)) return ADVANCE.upper;
  if (/[a-zäöüß]/.test(character)) return ADVANCE.lower;
  return ADVANCE.other;
}
