import { gridStep, keyCommand, keyMove } from '@/components/editor/key-commands';
import { vanRoof } from '@/tests/support/van-roof';

test.each([
  [{ key: 'ArrowLeft' }, { kind: 'move', right: -1, up: 0, steps: 1 }],
  [
    { key: 'ArrowUp', shift: true },
    { kind: 'move', right: 0, up: 1, steps: 10 },
  ],
  [{ key: 'Delete' }, { kind: 'remove' }],
  [{ key: 'Backspace' }, { kind: 'remove' }],
  [{ key: 'Escape' }, { kind: 'cancel' }],
  [{ key: 'Enter' }, { kind: 'edit-numbers' }],
  [{ key: 'z', control: true }, { kind: 'undo' }],
  [{ key: 'Z', meta: true, shift: true }, { kind: 'redo' }],
  [{ key: 'y', control: true }, { kind: 'redo' }],
  [{ key: 'ArrowLeft', alt: true }, null],
  [{ key: 'ArrowLeft', control: true }, null],
  [{ key: 'a' }, null],
  [{ key: 'toString' }, null],
])('%j asks for %j', (press, command) => {
  expect(keyCommand(press)).toEqual(command);
});

const up = { kind: 'move', right: 0, up: 1, steps: 1 } as const;
const right = { kind: 'move', right: 1, up: 0, steps: 10 } as const;

test('arrows move as the drawing lies: with forward up, up is +x and right is -y', () => {
  expect(keyMove(up, 0.01, 'up')).toEqual({ dx: 0.01, dy: 0 });
  expect(keyMove(right, 0.01, 'up')).toEqual({ dx: 0, dy: -0.1 });
});

test('with forward to the right, right is +x and up is +y', () => {
  expect(keyMove(right, 0.01, 'right')).toEqual({ dx: 0.1, dy: 0 });
  expect(keyMove(up, 0.01, 'right')).toEqual({ dx: 0, dy: 0.01 });
});

test('the grid follows the platform: a centimetre on a vehicle, a millimetre on a board', () => {
  const { platform } = vanRoof();
  expect(gridStep({ platform })).toBe(0.01);
  expect(gridStep({ platform: { ...platform, kind: 'handset' } })).toBe(0.001);
});
