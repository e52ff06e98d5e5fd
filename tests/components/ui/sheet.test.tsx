import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Sheet, type SheetStop } from '@/components/ui/sheet';
import { Text } from '@/components/ui/text';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

function Results({ first = 'peek' }: { readonly first?: SheetStop }) {
  const [stop, setStop] = useState<SheetStop>(first);
  return (
    <Sheet label="Results" stop={stop} onStopChange={setStop} head={<Text>A2 into A3 lacks 8 dB</Text>}>
      <Button label="All pairs" />
    </Sheet>
  );
}

const handle = () => screen.getByRole('slider', { name: 'Height of Results' });
const stopNow = () => handle().getAttribute('aria-valuetext');

describe('a sheet', () => {
  test('is raised and lowered with the arrows, and stays within its stops', () => {
    render(<Results />);
    expect(handle().tabIndex).toBe(0);
    focusOn(handle());
    expect(pressKey('ArrowUp')).toBe(false);
    expect(stopNow()).toBe('half');
    pressKey('ArrowUp');
    pressKey('ArrowUp');
    expect(stopNow()).toBe('full');
    pressKey('ArrowDown');
    pressKey('ArrowDown');
    pressKey('ArrowDown');
    expect(stopNow()).toBe('peek');
    expect(handle().getAttribute('aria-valuenow')).toBe('0');
  });

  test('shows its head at every stop; what is below the edge is out of reach', () => {
    render(<Results />);
    expect(screen.getByRole('region', { name: 'Results' }).textContent).toContain('A2 into A3 lacks 8 dB');
    expect(screen.queryByRole('button', { name: 'All pairs' })).toBeNull();
    focusOn(handle());
    pressKey('ArrowUp');
    expect(screen.getByRole('button', { name: 'All pairs' })).toBeTruthy();
  });

  test('goes to the next stop with a press on its head, and from the highest to the lowest', () => {
    render(<Results />);
    fireEvent.click(handle());
    expect(stopNow()).toBe('half');
    fireEvent.click(screen.getByText('A2 into A3 lacks 8 dB'));
    expect(stopNow()).toBe('full');
    fireEvent.click(handle());
    expect(stopNow()).toBe('peek');
  });

  test('stays where it is when a button in its head is pressed', () => {
    const onPress = jest.fn();
    render(
      <Sheet
        label="Results"
        stop="peek"
        onStopChange={() => {
          throw new Error('the sheet moved');
        }}
        head={<Button label="Show the pair" onPress={onPress} />}
      >
        <Text>Below</Text>
      </Sheet>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Show the pair' }));
    expect(onPress).toHaveBeenCalledTimes(1);
  });

  test('has no accessibility problem at any stop', async () => {
    for (const first of ['peek', 'half', 'full'] as const) {
      const { unmount } = render(<Results first={first} />);
      expect(await accessibilityProblems()).toEqual([]);
      unmount();
    }
  });
});
