import type { ScreenPoint } from '../viewport';
import { IDLE, type StateOf, type ToolContext, type ToolEvent, type ToolState } from './tool';

/** The plan under each finger stays under it, as far as scale and position alone can do that. */
export function pinching(state: StateOf<'pinching'>, event: ToolEvent, context: ToolContext): ToolState {
  const { one, other } = state;
  if (event.kind === 'cancel') return IDLE;
  const { pointer } = event;
  if (event.kind === 'down' || (pointer.id !== one.id && pointer.id !== other.id)) return state;
  if (event.kind === 'up') return { name: 'panning', last: pointer.id === one.id ? other : one };
  const next = pointer.id === one.id ? { one: pointer, other } : { one, other: pointer };
  const before = middleOf(one.at, other.at);
  const after = middleOf(next.one.at, next.other.at);
  context.pan(after.x - before.x, after.y - before.y);
  context.zoom(after, distanceOf(next.one.at, next.other.at) / distanceOf(one.at, other.at));
  return { name: 'pinching', ...next };
}

function middleOf(one: ScreenPoint, other: ScreenPoint): ScreenPoint {
  return { x: (one.x + other.x) / 2, y: (one.y + other.y) / 2 };
}

/** At least a pixel: two fingers on one spot must not zoom to nothing. */
function distanceOf(one: ScreenPoint, other: ScreenPoint): number {
  return Math.max(1, Math.hypot(one.x - other.x, one.y - other.y));
}
