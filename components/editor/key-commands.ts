import type { LayoutDocument } from '@/shared/layout/document';

/** A key as it was pressed; modifiers by name. */
export type KeyPress = {
  readonly key: string;
  readonly shift?: boolean;
  readonly control?: boolean;
  readonly meta?: boolean;
  readonly alt?: boolean;
};

/** What a key asks for on the plan. Directions are those of the screen; `steps` counts grid steps. */
export type KeyCommand =
  | { readonly kind: 'move'; readonly right: number; readonly up: number; readonly steps: number }
  | { readonly kind: 'remove' }
  | { readonly kind: 'cancel' }
  | { readonly kind: 'edit-numbers' }
  | { readonly kind: 'undo' }
  | { readonly kind: 'redo' };

const ARROWS: Readonly<Record<string, { right: number; up: number }>> = {
  ArrowLeft: { right: -1, up: 0 },
  ArrowRight: { right: 1, up: 0 },
  ArrowUp: { right: 0, up: 1 },
  ArrowDown: { right: 0, up: -1 },
};

/** Shift takes ten steps at once. */
const SHIFT_STEPS = 10;

/** Grid of the plan by platform, m: what a tape measure, or on a board a calliper, can hold. */
const GRID_STEPS = { vehicle: 0.01, rooftop: 0.05, handset: 0.001 } as const;

/** Distance between grid lines that positions snap to and arrow keys move by, m. */
export function gridStep(document: Pick<LayoutDocument, 'platform'>): number {
  return GRID_STEPS[document.platform.kind];
}

/** The command of a key on the plan, or null when it has none there. Ctrl and the Mac's command key are the same. */
export function keyCommand(press: KeyPress): KeyCommand | null {
  const letter = press.key.toLowerCase();
  if (press.control || press.meta) {
    if (letter === 'z') return { kind: press.shift ? 'redo' : 'undo' };
    return letter === 'y' ? { kind: 'redo' } : null;
  }
  if (press.alt) return null;
  const arrow = Object.hasOwn(ARROWS, press.key) ? ARROWS[press.key] : undefined;
  if (arrow) return { kind: 'move', ...arrow, steps: press.shift ? SHIFT_STEPS : 1 };
  switch (press.key) {
    case 'Delete':
    case 'Backspace':
      return { kind: 'remove' };
    case 'Escape':
      return { kind: 'cancel' };
    case 'Enter':
      return { kind: 'edit-numbers' };
    default:
      return null;
  }
}

/**
 * The move of a command in metres of the plan. `forward` says where the x axis points on the screen: `up` on an
 * upright drawing, `right` on one that lies.
 */
export function keyMove(
  command: KeyCommand & { readonly kind: 'move' },
  step: number,
  forward: 'up' | 'right',
): { readonly dx: number; readonly dy: number } {
  const right = command.right * command.steps * step;
  const up = command.up * command.steps * step;
  // y points to the left of forward: to the left of the screen when forward is up, upward when forward is right.
  return forward === 'up' ? { dx: up, dy: noMinusZero(-right) } : { dx: right, dy: up };
}

function noMinusZero(value: number): number {
  return value === 0 ? 0 : value;
}
