import { accept, refuse, type Result } from '@/shared/errors';
import type { LayoutDocument, Point } from '@/shared/layout/document';
import type { Change } from '@/shared/layout/operation';
import type { EditorClock } from './editor-clock';
import type { ShelfPart } from './editor-snapshot';
import {
  gestureChanges,
  heldPlaces,
  holdAntennas,
  holdPart,
  moveTo,
  placeAt,
  tidy,
  type ActiveGesture,
} from './gesture';
import type { OutgoingPresence } from './outgoing-presence';
import type { SnapOptions } from './snap-spot';

/** A burst of arrow keys is over when none came for this long, ms. */
const KEYS_REST = 600;

export type FingerOptions = {
  readonly clock: EditorClock;
  readonly outgoing: OutgoingPresence;
  readonly document: () => LayoutDocument | null;
  readonly reservedLabels: () => readonly string[];
  /** Makes the changes of a finished gesture. */
  readonly commit: (changes: readonly Change[]) => Result<void>;
  /** A burst of keys ended by itself. */
  readonly onRest: () => void;
};

/** What is held at the moment, by a finger or by keys; one gesture becomes at most one operation. */
export class Finger {
  gesture: ActiveGesture | null = null;
  private rest: (() => void) | null = null;

  constructor(private readonly options: FingerOptions) {}

  hold(what: string | ShelfPart, selection: readonly string[], pointer: Point): boolean {
    const document = this.options.document();
    if (!document) return false;
    if (typeof what === 'string') {
      const along = selection.includes(what) ? selection : [];
      this.gesture = holdAntennas(document, 'drag', what, along, pointer);
    } else {
      this.gesture = holdPart(document, what, pointer, this.options.reservedLabels());
    }
    return this.gesture !== null;
  }

  moveTo(pointer: Point, snap: SnapOptions): void {
    const document = this.options.document();
    if (!this.gesture || !document || this.gesture.shown.kind === 'keys') return;
    const before = this.gesture.shown.point;
    this.gesture = moveTo(document, this.gesture, pointer, snap);
    const { x, y } = this.gesture.shown.point;
    if (x !== before.x || y !== before.y) this.tellOthers();
  }

  /** Moves by keys: begins a burst or goes on with it. A step onto a forbidden place is not taken. */
  step(ids: readonly string[], dx: number, dy: number): Result<void> {
    const document = this.options.document();
    const [id] = ids;
    if (!document || id === undefined) return accept(undefined);
    const held = this.gesture ?? holdAntennas(document, 'keys', id, ids, { x: 0, y: 0 });
    if (!held || held.shown.kind !== 'keys') return accept(undefined);
    const { x, y } = held.shown.point;
    const next = placeAt(document, held, { x: tidy(x + dx), y: tidy(y + dy) });
    if (next.shown.problem) {
      if (this.gesture) this.restLater();
      return refuse(
        'not-placeable',
        `${next.shown.label} cannot be moved there. ${next.shown.problem.message}`,
      );
    }
    this.gesture = next;
    this.tellOthers();
    this.restLater();
    return accept(undefined);
  }

  /** Lets go: the changes are made, or refused with the reason and everything returns to where it stood. */
  release(): Result<void> {
    const { gesture } = this;
    const document = this.options.document();
    this.end();
    if (!gesture || !document) return accept(undefined);
    const { problem, label, kind, point } = gesture.shown;
    if (kind === 'place' && !gesture.hasMoved) {
      this.options.outgoing.endNudge([]);
      return accept(undefined);
    }
    if (problem) {
      this.options.outgoing.endNudge([]);
      const message = `${label} cannot stand there. ${problem.message}`;
      return refuse('not-placeable', message, [{ path: 'x', message: problem.message }]);
    }
    const changes = gestureChanges(document, gesture);
    if (changes.length === 0) {
      if (gesture.hasMoved) this.options.outgoing.endNudge([]);
      return accept(undefined);
    }
    const result = this.options.commit(changes);
    // The others keep the dropped place on screen until the operation is with them.
    const places = kind === 'place' ? { [gesture.shown.id]: point } : heldPlaces(gesture);
    this.options.outgoing.endNudge(result.ok ? nudged(places) : []);
    return result;
  }

  cancel(): void {
    if (!this.gesture) return;
    if (this.gesture.hasMoved) this.options.outgoing.endNudge([]);
    this.end();
  }

  /** The document changed under the finger. Returns the label of a held antenna that is gone; then the gesture ends. */
  follow(document: LayoutDocument): string | null {
    const { gesture } = this;
    if (!gesture) return null;
    if (!gesture.fresh) {
      if (!Object.hasOwn(document.antennas, gesture.shown.id)) {
        this.cancel();
        return gesture.shown.label;
      }
      const starts = Object.fromEntries(
        Object.entries(gesture.starts).filter(([id]) => Object.hasOwn(document.antennas, id)),
      );
      this.gesture = { ...gesture, starts, shown: { ...gesture.shown, ids: Object.keys(starts) } };
    }
    this.gesture = placeAt(document, this.gesture ?? gesture, gesture.shown.point, gesture.shown.guides);
    return null;
  }

  private tellOthers(): void {
    if (!this.gesture) return;
    const { shown, fresh } = this.gesture;
    if (!fresh) this.options.outgoing.nudge(nudged(heldPlaces(this.gesture)));
    else
      this.options.outgoing.nudge([{ id: shown.id, x: shown.point.x, y: shown.point.y, label: shown.label }]);
  }

  private restLater(): void {
    this.rest?.();
    this.rest = this.options.clock.after(KEYS_REST, () => {
      this.rest = null;
      this.options.onRest();
    });
  }

  private end(): void {
    this.rest?.();
    this.rest = null;
    this.gesture = null;
  }
}

function nudged(places: Readonly<Record<string, Point>>): { id: string; x: number; y: number }[] {
  return Object.entries(places).map(([id, { x, y }]) => ({ id, x, y }));
}
