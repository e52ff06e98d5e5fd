import { IDLE, type StateOf, type ToolContext, type ToolEvent, type ToolState } from './tool';

/** The drawing follows one pointer; a second finger makes it pinching. */
export function panning(state: StateOf<'panning'>, event: ToolEvent, context: ToolContext): ToolState {
  const { last } = state;
  if (event.kind === 'cancel') return IDLE;
  if (event.kind === 'down') return { name: 'pinching', one: last, other: event.pointer };
  if (event.pointer.id !== last.id) return state;
  context.pan(event.pointer.at.x - last.at.x, event.pointer.at.y - last.at.y);
  return event.kind === 'up' ? IDLE : { name: 'panning', last: event.pointer };
}
