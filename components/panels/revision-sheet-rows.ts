import type { LayoutDocument } from '@/shared/layout/document';

/** A line of the table of positions, SI; measured from the datum. */
export type PositionRow = {
  readonly id: string;
  readonly label: string;
  readonly name: string;
  readonly part: string;
  readonly x: number;
  readonly y: number;
  readonly mountHeight: number;
  readonly azimuthDeg: number;
  readonly tiltDeg: number;
  /** Name of the radio; null when none is connected. */
  readonly radio: string | null;
};

/** Two radios that are never together, and the rule that sees to it. */
export type NeverTogetherRow = {
  readonly id: string;
  readonly radios: readonly [string, string];
  readonly antennas: readonly string[];
  readonly rule: string;
};

/** The antennas of a document as lines of the table, A2 before A10. */
export function positionRows(document: LayoutDocument): readonly PositionRow[] {
  return Object.values(document.antennas)
    .map((antenna) => ({
      id: antenna.id,
      label: antenna.label,
      name: antenna.name,
      part: antenna.part.name,
      x: antenna.x,
      y: antenna.y,
      mountHeight: antenna.mountHeight,
      azimuthDeg: antenna.azimuthDeg,
      tiltDeg: antenna.tiltDeg,
      radio: antenna.radioId === null ? null : (document.radios[antenna.radioId]?.name ?? null),
    }))
    .sort((a, b) => compareLabels(a.label, b.label));
}

/** The pairs of radios of a document that are never together, with the antennas that they feed. */
export function neverTogetherRows(document: LayoutDocument): readonly NeverTogetherRow[] {
  const rows = positionRows(document);
  return Object.values(document.neverTogether).map((pair) => {
    const [first, second] = pair.radioIds;
    return {
      id: pair.id,
      radios: [document.radios[first]?.name ?? first, document.radios[second]?.name ?? second],
      antennas: rows
        .filter((row) => pair.radioIds.some((id) => document.antennas[row.id]?.radioId === id))
        .map((row) => row.label),
      rule: pair.rule,
    };
  });
}

/** Label of an antenna by its identifier; the identifier itself when the document has no such antenna. */
export function labelOf(document: LayoutDocument, antennaId: string): string {
  return document.antennas[antennaId]?.label ?? antennaId;
}

/** Orders labels as people count: A2 before A10. */
export function compareLabels(a: string, b: string): number {
  return a.localeCompare(b, 'en', { numeric: true });
}
