import type { Point } from '@/shared/geometry/point';
import type { PointerKind, Target } from '../hit-test';
import type { ScreenPoint } from '../viewport';

/** A finger, pen or mouse on the canvas. */
export type Pointer = { readonly id: number; readonly kind: PointerKind; readonly at: ScreenPoint };

/** What the gesture surface tells the tool; moves come at most once per frame. */
export type ToolEvent =
  | { readonly kind: 'down' | 'move' | 'up'; readonly pointer: Pointer }
  /** Escape, a lost pointer, another window: whatever was going on is given up. */
  | { readonly kind: 'cancel' };

/** The tool in hand: one small state each, made the next one by an event. */
export type ToolState =
  | { readonly name: 'idle' }
  /** A pointer is down and has not moved yet. */
  | { readonly name: 'pointing'; readonly start: Pointer; readonly target: Target }
  /** An antenna of the plan is under the pointer. */
  | { readonly name: 'dragging'; readonly pointerId: number }
  /** A part from the shelf is under the pointer. */
  | { readonly name: 'placing'; readonly pointerId: number }
  /** The drawing follows one pointer. */
  | { readonly name: 'panning'; readonly last: Pointer }
  /** Two fingers hold the drawing. */
  | { readonly name: 'pinching'; readonly one: Pointer; readonly other: Pointer }
  /** The next tap names the spot or the antenna of a comment. */
  | { readonly name: 'commenting' };

export type ToolName = ToolState['name'];
export type StateOf<N extends ToolName> = Extract<ToolState, { name: N }>;

/** What a tool may do; the canvas and the editor stand behind it. */
export interface ToolContext {
  /** Whether antennas may be moved by this member now. */
  readonly canEdit: boolean;
  hit(pointer: Pointer): Target;
  toPlan(at: ScreenPoint): Point;
  pan(dx: number, dy: number): void;
  zoom(about: ScreenPoint, factor: number): void;
  /** A tap: chooses what was hit; the ground ends the choice. */
  choose(target: Target): void;
  /** False when the antenna cannot be taken up. */
  takeUp(antennaId: string, at: Point): boolean;
  carryTo(at: Point): void;
  drop(): void;
  giveBack(): void;
  /** A comment is wanted here. */
  commentAt(target: Target, at: Point): void;
  /** The crosshair that others see. */
  showCrosshair(at: Point): void;
}

export const IDLE: ToolState = { name: 'idle' };
