import type { CommentTarget } from '@/shared/api/comments';
import { assertNever } from '@/shared/errors';
import type { LayoutDocument } from '@/shared/layout/document';
import { sheetLength, type SheetUnit } from './revision-sheet-figures';

/** What a balloon points at: an antenna by its present label (or the one it had), a spot by its position. */
export function describeTarget(
  target: CommentTarget,
  document: LayoutDocument | null,
  unit: SheetUnit,
): string {
  switch (target.kind) {
    case 'antenna': {
      const antenna = document?.antennas[target.antennaId];
      if (antenna) return `${antenna.label} ${antenna.name}`;
      return document ? `${target.label}, removed since` : target.label;
    }
    case 'spot':
      return `Spot at x ${sheetLength(target.x, unit)}, y ${sheetLength(target.y, unit)} ${unit}`;
    default:
      return assertNever(target);
  }
}
