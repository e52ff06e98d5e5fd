import { PanResponder, type GestureResponderHandlers } from 'react-native';
import { space } from '../theme/tokens';

/** Where a sheet can rest. */
export type SheetStop = 'peek' | 'half' | 'full';

/** The stops from the lowest to the highest. */
export const SHEET_STOPS: readonly SheetStop[] = ['peek', 'half', 'full'];

/** A flick faster than this (px per ms) goes to the next stop whatever the distance. */
const FLICK = 0.4;

type Followed = {
  readonly stop: SheetStop;
  readonly heights: Readonly<Record<SheetStop, number>>;
  readonly onStopChange: (stop: SheetStop) => void;
};

/** A finger or a mouse on the head of a sheet: it follows while it is pulled, and goes to a stop when let go. */
export class SheetDrag {
  readonly handlers: GestureResponderHandlers;
  private followed: Followed | null = null;
  private pulled = false;

  constructor(private readonly onPull: (height: number | null) => void) {
    this.handlers = PanResponder.create({
      onStartShouldSetPanResponderCapture: () => {
        this.pulled = false;
        return false;
      },
      onMoveShouldSetPanResponder: (_, { dy }) => Math.abs(dy) > space.xs,
      onPanResponderMove: (_, { dy }) => this.pull(dy),
      onPanResponderRelease: (_, { dy, vy }) => this.letGo(dy, vy),
      onPanResponderTerminate: () => this.onPull(null),
    }).panHandlers;
  }

  /** What the sheet is now. */
  follow(followed: Followed): void {
    this.followed = followed;
  }

  /** A press on the head: the next stop, from the highest back to the lowest. The end of a pull is no press. */
  press(): void {
    if (this.pulled) {
      this.pulled = false;
      return;
    }
    if (!this.followed) return;
    const { stop, onStopChange } = this.followed;
    onStopChange(SHEET_STOPS[SHEET_STOPS.indexOf(stop) + 1] ?? 'peek');
  }

  private pull(dy: number): void {
    if (!this.followed) return;
    const { heights, stop } = this.followed;
    this.pulled = true;
    this.onPull(Math.min(heights.full, Math.max(heights.peek, heights[stop] - dy)));
  }

  private letGo(dy: number, vy: number): void {
    this.onPull(null);
    if (!this.followed) return;
    const { heights, stop, onStopChange } = this.followed;
    const next = SHEET_STOPS[SHEET_STOPS.indexOf(stop) + (vy < 0 ? 1 : -1)];
    onStopChange((Math.abs(vy) > FLICK ? next : undefined) ?? nearestStop(heights[stop] - dy, heights));
  }
}

function nearestStop(height: number, heights: Readonly<Record<SheetStop, number>>): SheetStop {
  return SHEET_STOPS.reduce((best, candidate) =>
    Math.abs(heights[candidate] - height) < Math.abs(heights[best] - height) ? candidate : best,
  );
}
