import { IDLE, type StateOf, type ToolContext, type ToolEvent, type ToolState } from './tool';

/** How far a pointer may tremble before a tap becomes a movement, px. */
const SLACK = { touch: 8, pen: 5, mouse: 3 } as const;

/** A tap, or the beginning of dragging, panning or pinching. */
export function pointing(state: StateOf<'pointing'>, event: ToolEvent, context: ToolContext): ToolState {
  const { start, target } = state;
  if (event.kind === 'cancel') return IDLE;
  if (event.kind === 'down') return { name: 'pinching', one: start, other: event.pointer };
  if (event.pointer.id !== start.id) return state;
  if (event.kind === 'up') {
    context.choose(target);
    return IDLE;
  }
  const [dx, dy] = [event.pointer.at.x - start.at.x, event.pointer.at.y - start.at.y];
  if (Math.hypot(dx, dy) <= SLACK[start.kind]) return state;
  const takesUp = target.kind === 'antenna' && context.canEdit;
  if (takesUp && context.takeUp(target.id, context.toPlan(start.at))) {
    context.carryTo(context.toPlan(event.pointer.at));
    return { name: 'dragging', pointerId: start.id };
  }
  context.pan(dx, dy);
  return { name: 'panning', last: event.pointer };
}
