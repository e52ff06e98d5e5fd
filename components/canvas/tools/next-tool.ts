import { assertNever } from '@/shared/errors';
import { commenting } from './commenting';
import { dragging } from './dragging';
import { idle } from './idle';
import { panning } from './panning';
import { pinching } from './pinching';
import { pointing } from './pointing';
import type { ToolContext, ToolEvent, ToolState } from './tool';

/** The tool that an event makes of the one in hand. */
export function nextTool(state: ToolState, event: ToolEvent, context: ToolContext): ToolState {
  switch (state.name) {
    case 'idle':
      return idle(state, event, context);
    case 'pointing':
      return pointing(state, event, context);
    case 'dragging':
    case 'placing':
      return dragging(state, event, context);
    case 'panning':
      return panning(state, event, context);
    case 'pinching':
      return pinching(state, event, context);
    case 'commenting':
      return commenting(state, event, context);
    default:
      return assertNever(state);
  }
}

/** Cursor over the canvas while a tool is in hand. */
export function cursorOf(state: ToolState): 'default' | 'pointer' | 'grab' | 'grabbing' | 'crosshair' {
  switch (state.name) {
    case 'idle':
      return 'default';
    case 'pointing':
      return state.target.kind === 'ground' ? 'grab' : 'pointer';
    case 'dragging':
    case 'placing':
    case 'panning':
    case 'pinching':
      return 'grabbing';
    case 'commenting':
      return 'crosshair';
    default:
      return assertNever(state);
  }
}
