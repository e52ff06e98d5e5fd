import { render } from '@testing-library/react';
import { STATE_LOOKS, StateMark, type MarkedState } from '@/components/ui/state-mark';

const STATES = Object.keys(STATE_LOOKS) as MarkedState[];

/** What a mark draws, without its colours. */
function drawn(state: MarkedState): string {
  const { container, unmount } = render(<StateMark state={state} />);
  const svg = container.querySelector('svg');
  const shapes = [...(svg?.querySelectorAll('*') ?? [])].map((shape) => {
    const filled = (shape.getAttribute('fill') ?? 'none') === 'none' ? 'open' : 'filled';
    return [shape.tagName, shape.getAttribute('d'), shape.getAttribute('r'), filled].join(' ');
  });
  unmount();
  return shapes.join('; ');
}

describe('the mark of a state', () => {
  test('differs from every other in its shape, whatever the colours', () => {
    const shapes = STATES.map(drawn);
    expect(new Set(shapes).size).toBe(STATES.length);
    expect(shapes.every((shape) => shape !== '')).toBe(true);
  });

  test('is an open circle when clear, half filled when tight, filled when lacking', () => {
    expect(drawn('clear')).toMatch(/^circle {2}5\.4 open$/);
    expect(drawn('tight')).toMatch(/^circle {2}5\.4 open; path .* filled$/);
    expect(drawn('lacking')).toMatch(/^circle {2}5\.4 filled$/);
  });

  test('is silent: the word beside it is what is read', () => {
    for (const state of STATES) {
      const { container, unmount } = render(<StateMark state={state} />);
      expect(container.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
      unmount();
    }
  });
});
