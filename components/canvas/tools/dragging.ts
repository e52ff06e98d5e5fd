import { IDLE, type StateOf, type ToolContext, type ToolEvent, type ToolState } from './tool';

/** Something is carried: it stands where it is let go, or goes back to where it came from. */
export function dragging(
  state: StateOf<'dragging' | 'placing'>,
  event: ToolEvent,
  context: ToolContext,
): ToolState {
  if (event.kind === 'cancel') {
    context.giveBack();
    return IDLE;
  }
  // further fingers rest on the glass; only the one that took it up moves it
  if (event.pointer.id !== state.pointerId || event.kind === 'down') return state;
  context.carryTo(context.toPlan(event.pointer.at));
  if (event.kind === 'move') return state;
  context.drop();
  return IDLE;
}
