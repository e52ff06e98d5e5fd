import type { EditorTransport } from '../api/live-transport';
import type { NudgeMessage } from '@/shared/api/live';
import type { Point } from '@/shared/layout/document';
import type { EditorClock } from './editor-clock';

/** Crosshairs go out at most this often, ms. */
const PRESENCE_SPACING = 50;
/** A finger that rests repeats where it is, so that nobody takes its nudge for a forgotten one, ms. */
const HEARTBEAT = 1500;
/** The others' screens take so many at once; more than these move along unseen until the drop. */
const MOST_NUDGED = 16;

/** What the others see of me while it happens: crosshair, selection, and what is under my finger. */
export class OutgoingPresence {
  private cursor: Point | null = null;
  private selection: readonly string[] = [];
  private waiting: (() => void) | null = null;
  private isChanged = false;
  private heartbeat: (() => void) | null = null;

  constructor(
    private readonly layoutId: string,
    private readonly transport: EditorTransport,
    private readonly clock: EditorClock,
  ) {}

  pointAt(cursor: Point | null): void {
    this.cursor = cursor && { x: cursor.x, y: cursor.y };
    this.sendSoon();
  }

  select(selection: readonly string[]): void {
    this.selection = selection.slice(0, MOST_NUDGED);
    this.sendSoon();
  }

  /** Says it all again: the server has forgotten it with the old line. */
  repeat(): void {
    this.sendSoon();
  }

  nudge(antennas: NudgeMessage['antennas']): void {
    this.heartbeat?.();
    const message = { layoutId: this.layoutId, antennas: antennas.slice(0, MOST_NUDGED), done: false };
    this.transport.nudge(message);
    this.heartbeat = this.clock.after(HEARTBEAT, () => this.nudge(antennas));
  }

  /** Ends the gesture: with the places where the antennas were dropped, or with none when it was called off. */
  endNudge(antennas: NudgeMessage['antennas']): void {
    this.heartbeat?.();
    this.heartbeat = null;
    this.transport.nudge({
      layoutId: this.layoutId,
      antennas: antennas.slice(0, MOST_NUDGED),
      done: true,
    });
  }

  stop(): void {
    this.heartbeat?.();
    this.heartbeat = null;
    this.waiting?.();
    this.waiting = null;
  }

  private sendSoon(): void {
    this.isChanged = true;
    if (this.waiting) return;
    this.send();
    this.waiting = this.clock.after(PRESENCE_SPACING, () => {
      this.waiting = null;
      if (this.isChanged) this.sendSoon();
    });
  }

  private send(): void {
    this.isChanged = false;
    this.transport.presence({ layoutId: this.layoutId, cursor: this.cursor, selection: [...this.selection] });
  }
}
