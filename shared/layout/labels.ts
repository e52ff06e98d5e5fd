import type { LayoutDocument } from './document';

/** Made once: `localeCompare` with options makes a new one for each comparison, which a frame of a drag feels. */
const BY_NUMBER = new Intl.Collator('en', { numeric: true });

/** The first free mark on the drawing: A1, A2 ...; gaps left by removed antennas are filled. */
export function nextLabel(
  document: Pick<LayoutDocument, 'antennas'>,
  reserved: readonly string[] = [],
): string {
  const taken = new Set([...Object.values(document.antennas).map((antenna) => antenna.label), ...reserved]);
  let number = 1;
  while (taken.has(`A${number}`)) number += 1;
  return `A${number}`;
}

/** Marks that more than one antenna bears: two people can add the same one at the same moment. */
export function duplicateLabels(document: Pick<LayoutDocument, 'antennas'>): string[] {
  const seen = new Set<string>();
  const twice = new Set<string>();
  for (const { label } of Object.values(document.antennas)) {
    if (seen.has(label)) twice.add(label);
    seen.add(label);
  }
  return [...twice].sort((a, b) => BY_NUMBER.compare(a, b));
}

/** Labels in the order of their numbers: A2 before A10. */
export function compareLabels(a: { readonly label: string }, b: { readonly label: string }): number {
  return BY_NUMBER.compare(a.label, b.label);
}
