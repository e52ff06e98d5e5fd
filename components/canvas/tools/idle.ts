import type { StateOf, ToolContext, ToolEvent, ToolState } from './tool';

/** Nothing is held; a pointer that moves shows others where one looks. */
export function idle(state: StateOf<'idle'>, event: ToolEvent, context: ToolContext): ToolState {
  if (event.kind === 'down') {
    return { name: 'pointing', start: event.pointer, target: context.hit(event.pointer) };
  }
  if (event.kind === 'move') context.showCrosshair(context.toPlan(event.pointer.at));
  return state;
}
