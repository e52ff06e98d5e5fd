import { IDLE, type StateOf, type ToolContext, type ToolEvent, type ToolState } from './tool';

/** The next tap names the spot or the antenna of a comment; Escape gives it up. */
export function commenting(state: StateOf<'commenting'>, event: ToolEvent, context: ToolContext): ToolState {
  if (event.kind === 'cancel') return IDLE;
  if (event.kind === 'move') context.showCrosshair(context.toPlan(event.pointer.at));
  if (event.kind !== 'up') return state;
  context.commentAt(context.hit(event.pointer), context.toPlan(event.pointer.at));
  return IDLE;
}
