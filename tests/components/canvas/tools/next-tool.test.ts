import type { Target } from '@/components/canvas/hit-test';
import { cursorOf, nextTool } from '@/components/canvas/tools/next-tool';
import {
  IDLE,
  type Pointer,
  type ToolContext,
  type ToolEvent,
  type ToolState,
} from '@/components/canvas/tools/tool';

/** A canvas that writes down what a tool does; the plan has a metre for each 100 px. */
function canvas(target: Target, options: { canEdit?: boolean; takeUp?: boolean } = {}) {
  const done: string[] = [];
  const at = ({ x, y }: { x: number; y: number }) => `${x.toFixed(2)} ${y.toFixed(2)}`;
  const context: ToolContext = {
    canEdit: options.canEdit ?? true,
    hit: () => target,
    toPlan: ({ x, y }) => ({ x: x / 100, y: y / 100 }),
    pan: (dx, dy) => void done.push(`pan ${dx} ${dy}`),
    zoom: (about, factor) => void done.push(`zoom ${at(about)} ${factor}`),
    choose: ({ kind }) => void done.push(`choose ${kind}`),
    takeUp: (id) => {
      done.push(`take up ${id}`);
      return options.takeUp ?? true;
    },
    carryTo: (point) => void done.push(`carry ${at(point)}`),
    drop: () => void done.push('drop'),
    giveBack: () => void done.push('give back'),
    commentAt: ({ kind }, point) => void done.push(`comment ${kind} ${at(point)}`),
    showCrosshair: (point) => void done.push(`crosshair ${at(point)}`),
  };
  return {
    done,
    after: (events: readonly ToolEvent[], from: ToolState = IDLE) =>
      events.reduce((state, event) => nextTool(state, event, context), from),
  };
}

const finger = (id: number, x: number, y: number): Pointer => ({ id, kind: 'touch', at: { x, y } });
const event = (kind: 'down' | 'move' | 'up', id: number, x: number, y: number): ToolEvent => ({
  kind,
  pointer: finger(id, x, y),
});
const CANCEL: ToolEvent = { kind: 'cancel' };
const ANTENNA: Target = { kind: 'antenna', id: 'A1' };
const GROUND: Target = { kind: 'ground' };

describe('a finger on the plan', () => {
  test('that taps chooses, however it trembles', () => {
    const { after, done } = canvas(ANTENNA);
    expect(after([event('down', 1, 100, 100), event('move', 1, 106, 104), event('up', 1, 106, 104)])).toEqual(
      IDLE,
    );
    expect(done).toEqual(['choose antenna']);
  });

  test('that pulls an antenna carries it and puts it down', () => {
    const { after, done } = canvas(ANTENNA);
    const state = after([event('down', 1, 100, 100), event('move', 1, 120, 100)]);
    expect(state).toEqual({ name: 'dragging', pointerId: 1 });
    expect(after([event('move', 1, 150, 110), event('up', 1, 160, 110)], state)).toEqual(IDLE);
    expect(done).toEqual(['take up A1', 'carry 1.20 1.00', 'carry 1.50 1.10', 'carry 1.60 1.10', 'drop']);
  });

  test('that pulls the ground moves the drawing, all the way from where it went down', () => {
    const { after, done } = canvas(GROUND);
    after([
      event('down', 1, 100, 100),
      event('move', 1, 110, 100),
      event('move', 1, 115, 95),
      event('up', 1, 115, 95),
    ]);
    expect(done).toEqual(['pan 10 0', 'pan 5 -5', 'pan 0 0']);
  });

  test('that pulls an antenna it may not move, or cannot take up, moves the drawing', () => {
    const reader = canvas(ANTENNA, { canEdit: false });
    reader.after([event('down', 1, 100, 100), event('move', 1, 110, 100)]);
    expect(reader.done).toEqual(['pan 10 0']);
    const late = canvas(ANTENNA, { takeUp: false });
    late.after([event('down', 1, 100, 100), event('move', 1, 110, 100)]);
    expect(late.done).toEqual(['take up A1', 'pan 10 0']);
  });

  test('gives an antenna back when the gesture is lost', () => {
    const { after, done } = canvas(ANTENNA);
    expect(after([event('down', 1, 100, 100), event('move', 1, 120, 100), CANCEL])).toEqual(IDLE);
    expect(done.at(-1)).toBe('give back');
  });

  test('carries on while others rest on the glass', () => {
    const { after, done } = canvas(ANTENNA, {});
    const events = [
      event('down', 1, 100, 100),
      event('move', 1, 120, 100),
      event('down', 2, 5, 5),
      event('move', 2, 9, 9),
      event('up', 2, 9, 9),
    ];
    expect(after(events)).toEqual({ name: 'dragging', pointerId: 1 });
    expect(done).toHaveLength(2);
  });
});

describe('two fingers', () => {
  test('zoom by how their distance grows, about their middle', () => {
    const { after, done } = canvas(GROUND);
    const state = after([event('down', 1, 100, 100), event('down', 2, 200, 100), event('move', 2, 300, 100)]);
    expect(state.name).toBe('pinching');
    expect(done).toEqual(['pan 50 0', 'zoom 200.00 100.00 2']);
  });

  test('on one spot zoom to something finite', () => {
    const { after, done } = canvas(GROUND);
    after([event('down', 1, 100, 100), event('down', 2, 100, 100), event('move', 2, 101, 100)]);
    expect(done.at(-1)).toBe('zoom 100.50 100.00 1');
  });

  test('become one again that moves the drawing without a jump', () => {
    const { after, done } = canvas(GROUND);
    const state = after([event('down', 1, 100, 100), event('down', 2, 200, 100), event('up', 1, 100, 100)]);
    expect(state).toEqual({ name: 'panning', last: finger(2, 200, 100) });
    after([event('move', 2, 210, 100)], state);
    expect(done).toEqual(['pan 10 0']);
  });
});

describe('a comment', () => {
  test('is put where the next tap goes', () => {
    const { after, done } = canvas(ANTENNA);
    expect(after([event('down', 1, 50, 60), event('up', 1, 50, 60)], { name: 'commenting' })).toEqual(IDLE);
    expect(done).toEqual(['comment antenna 0.50 0.60']);
  });

  test('is given up with Escape', () => {
    const { after, done } = canvas(GROUND);
    expect(after([CANCEL], { name: 'commenting' })).toEqual(IDLE);
    expect(done).toEqual([]);
  });
});

test('the cursor says what a press would do', () => {
  expect(cursorOf(IDLE)).toBe('default');
  expect(cursorOf({ name: 'pointing', start: finger(1, 0, 0), target: ANTENNA })).toBe('pointer');
  expect(cursorOf({ name: 'pointing', start: finger(1, 0, 0), target: GROUND })).toBe('grab');
  expect(cursorOf({ name: 'dragging', pointerId: 1 })).toBe('grabbing');
  expect(cursorOf({ name: 'commenting' })).toBe('crosshair');
});
