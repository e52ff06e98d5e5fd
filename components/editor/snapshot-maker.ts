import type { LayoutDocument } from '@/shared/layout/document';
import type { EditorEstimator } from './editor-estimator';
import type { Agreement, EditorSnapshot, OthersNudge } from './editor-snapshot';
import { compareEstimates } from './compare-estimates';
import { paintGesture, paintPlaces, type ActiveGesture } from './gesture';
import { LiveEstimate } from './live-estimate';

/** What the editor knows; `painted`, `estimate` and `agreement` follow from it. */
export type SnapshotParts = Omit<
  EditorSnapshot,
  'painted' | 'estimate' | 'agreement' | 'gesture' | 'nudges' | 'canUndo' | 'canRedo'
> & {
  readonly gesture: ActiveGesture | null;
  readonly nudges: readonly OthersNudge[];
  readonly canUndo: boolean;
  readonly canRedo: boolean;
};

/** Makes snapshots; a part that did not change keeps its identity, so that only what changed is painted anew. */
export class SnapshotMaker {
  private readonly live: LiveEstimate;
  private last: EditorSnapshot | null = null;

  constructor(estimator: EditorEstimator) {
    this.live = new LiveEstimate(estimator);
  }

  make(parts: SnapshotParts): EditorSnapshot {
    const { document, gesture } = parts;
    const nudges = this.sameNudges(parts.nudges);
    const painted = document && this.samePainted(document, paint(document, nudges, gesture));
    const patternFor = [...new Set([...(gesture ? [gesture.shown.id] : []), ...parts.selection])];
    const estimate = painted && this.live.for(painted, patternFor);
    const isSettled = painted === document && parts.pendingCount === 0;
    const agreement: Agreement = isSettled
      ? compareEstimates(estimate, parts.serverEstimate, parts.sequence)
      : { kind: 'waiting' };
    this.last = {
      ...parts,
      painted,
      estimate,
      nudges,
      gesture: gesture && gesture.shown,
      agreement: this.sameAgreement(agreement),
    };
    return this.last;
  }

  private samePainted(document: LayoutDocument, painted: LayoutDocument): LayoutDocument {
    const last = this.last?.painted;
    if (!last || painted === document || this.last?.document !== document) return painted;
    const ids = Object.keys(painted.antennas);
    const isSame =
      ids.length === Object.keys(last.antennas).length &&
      ids.every((id) => {
        const [before, now] = [last.antennas[id], painted.antennas[id]];
        return (
          before === now ||
          (before && now && before.x === now.x && before.y === now.y && before.id === now.id)
        );
      });
    return isSame ? last : painted;
  }

  private sameNudges(nudges: readonly OthersNudge[]): readonly OthersNudge[] {
    const last = this.last?.nudges;
    return last && last.length === 0 && nudges.length === 0 ? last : nudges;
  }

  private sameAgreement(agreement: Agreement): Agreement {
    const last = this.last?.agreement;
    if (!last || last.kind !== agreement.kind) return agreement;
    if (last.kind === 'waiting' || agreement.kind === 'waiting') return last;
    return last.sequence === agreement.sequence ? last : agreement;
  }
}

/** The document with what is under others' fingers, and on top of it what is under mine. */
function paint(
  document: LayoutDocument,
  nudges: readonly OthersNudge[],
  gesture: ActiveGesture | null,
): LayoutDocument {
  const held = gesture?.shown.ids ?? [];
  const places = Object.fromEntries(
    nudges
      .filter(({ antennaId, inDocument }) => inDocument && !held.includes(antennaId))
      .map(({ antennaId, x, y }) => [antennaId, { x, y }]),
  );
  const nudged = paintPlaces(document, places);
  return gesture ? paintGesture(nudged, gesture) : nudged;
}
