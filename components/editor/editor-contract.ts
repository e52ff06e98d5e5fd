import type { EditorTransport } from '../api/live-transport';
import type { PendingStore } from '../api/offline-pending-store';
import type { Layout } from '@/shared/api/layouts';
import type { Result } from '@/shared/errors';
import type { Point } from '@/shared/layout/document';
import type { Change } from '@/shared/layout/operation';
import type { EditorClock } from './editor-clock';
import type { EditorEstimator } from './editor-estimator';
import type { EditorSnapshot, ShelfPart } from './editor-snapshot';

export type LayoutEditorOptions = {
  readonly layoutId: string;
  readonly me: { readonly memberId: string; readonly name: string };
  readonly transport: EditorTransport;
  readonly estimator: EditorEstimator;
  /** Null: pending operations do not survive a reload. */
  readonly store?: PendingStore | null;
  /** The layout as fetched by HTTP, to show something before the line stands. */
  readonly layout?: Layout | null;
  readonly clock?: EditorClock;
};

/** How a drag is to snap: `tolerance` in metres (pixels over scale), `off` while a modifier key is held. */
export type DragOptions = { readonly tolerance?: number; readonly snap?: boolean };

/** An open layout: what is shown of it, and everything a member can do to it. Free of React. */
export interface LayoutEditor {
  /** The present snapshot; the same object until something changed. */
  getSnapshot(): EditorSnapshot;
  /** Calls after every change; returns how to stop. Fits `useSyncExternalStore`. */
  subscribe(listener: () => void): () => void;
  /** Calls only when the selected part of the snapshot changed (by `Object.is` or `isSame`). */
  subscribeTo<T>(
    select: (snapshot: EditorSnapshot) => T,
    listener: (value: T) => void,
    isSame?: (a: T, b: T) => boolean,
  ): () => void;

  /** Loads what waits on this device, connects and joins. */
  start(): void;
  /** Ends a burst of keys, leaves and disconnects; what is pending stays on the device. */
  stop(): void;
  /** Tries the line again at once (after signing in again, or when the member asks). */
  reconnect(): void;

  /**
   * Makes the changes, whole or not at all: shown at once, one undo entry. A refusal is also a notice, unless
   * `isQuiet` (a form that says it at its field).
   */
  commit(changes: readonly Change[], options?: { readonly isQuiet?: boolean }): Result<void>;
  undo(): void;
  redo(): void;

  select(antennaIds: readonly string[]): void;
  /** Removes the selected antennas in one operation. */
  removeSelected(): Result<void>;

  /** Takes an antenna (with the others selected, when it is selected) or a part from the shelf under the finger. */
  beginDrag(what: string | ShelfPart, pointer: Point): boolean;
  /**
   * Moves what is under the finger: snapped position, reason of refusal, distances and estimate are in the snapshot
   * when it returns. Call it once per frame.
   */
  dragTo(pointer: Point, options?: DragOptions): void;
  /** Lets go: commits, or returns the antenna and says why it may not stand there. */
  drop(): Result<void>;
  /** Lets go without a change. */
  cancel(): void;
  /** Puts a part at the first free place and selects it (the way without a pointer). */
  place(part: ShelfPart): Result<string>;
  /** Moves the selected antennas by an offset in metres; a burst of moves becomes one operation when it rests. */
  moveSelected(dx: number, dy: number): Result<void>;
  /** Ends a burst of keys now. */
  settle(): Result<void>;

  /** Tells the others where my crosshair is; null when the pointer left the plan. */
  pointAt(cursor: Point | null): void;
  dismissNotice(noticeId: number): void;
  /** Makes the changes of a notice once more and dismisses it. */
  retryNotice(noticeId: number): Result<void>;
}
