import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { decibelEntry, frequencyEntry, lengthEntry } from '@/components/panels/quantity-entries';
import { QuantityField } from '@/components/ui/quantity-field';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

const length = lengthEntry('mm');

function Width({ first = 1.25, commits, step }: { first?: number | null; commits: number[]; step?: number }) {
  const [value, setValue] = useState<number | null>(first);
  return (
    <QuantityField
      label="Width"
      value={value}
      onCommit={(next) => {
        commits.push(next);
        setValue(next);
      }}
      read={length.read}
      format={length.format}
      hint={length.hint}
      step={step}
    />
  );
}

function openWidth(props: { first?: number | null; step?: number } = {}) {
  const commits: number[] = [];
  render(<Width commits={commits} {...props} />);
  const field = screen.getByLabelText<HTMLInputElement>('Width');
  focusOn(field);
  return { commits, field, type: (value: string) => fireEvent.change(field, { target: { value } }) };
}

/** What a screen reader reads after the label. */
function description(field: HTMLElement): string {
  const ids = field.getAttribute('aria-describedby')?.split(' ') ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent ?? `nothing is called ${id}`).join(' | ');
}

describe('a field for a quantity', () => {
  test('shows the value with its unit', () => {
    expect(openWidth().field.value).toBe('1250 mm');
  });

  test('takes any unit on Enter and shows what was understood in its own', () => {
    const { commits, field, type } = openWidth();
    type('5 ft 3 in');
    expect(description(field)).toContain('= 1600.2 mm');
    expect(commits).toEqual([]);
    pressKey('Enter');
    expect(commits).toEqual([1.6002]);
    expect(field.value).toBe('1600.2 mm');
  });

  test('takes an entry when the field is left', () => {
    const { commits, field, type } = openWidth();
    type('300 + 12');
    fireEvent.blur(field);
    expect(commits).toEqual([0.312]);
  });

  test('keeps a refused text and says beside it what is expected', () => {
    const { commits, field, type } = openWidth();
    type('3 kg');
    pressKey('Enter');
    expect(commits).toEqual([]);
    expect(field.value).toBe('3 kg');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(description(field)).toContain('“kg” is not a unit known here. Write a length, such as 310 mm');
    fireEvent.blur(field);
    expect(field.value).toBe('3 kg');
  });

  test('takes the message back once the text is mended', () => {
    const { commits, field, type } = openWidth();
    type('3 kg');
    pressKey('Enter');
    type('3 km');
    expect(field.getAttribute('aria-invalid')).toBeNull();
    pressKey('Enter');
    expect(commits).toEqual([3000]);
  });

  test('gives the value back on Escape', () => {
    const { commits, field, type } = openWidth();
    type('nonsense');
    pressKey('Enter');
    pressKey('Escape');
    expect(field.value).toBe('1250 mm');
    expect(field.getAttribute('aria-invalid')).toBeNull();
    expect(commits).toEqual([]);
  });

  test('says nothing to anybody when the text is what stood there', () => {
    const { commits, field, type } = openWidth();
    type('1250 mm ');
    pressKey('Enter');
    fireEvent.blur(field);
    expect(commits).toEqual([]);
  });

  test('moves by a step with the arrows, by ten with Shift, and not while something is typed', () => {
    const { commits, field, type } = openWidth({ step: 0.01 });
    pressKey('ArrowUp');
    pressKey('ArrowDown', { shiftKey: true });
    expect(commits).toEqual([1.26, 1.16]);
    type('7');
    pressKey('ArrowUp');
    expect(commits).toHaveLength(2);
    expect(field.value).toBe('7');
  });

  test('holds a step to the bounds of what is typed, and says so in place', () => {
    const onCommit = jest.fn();
    render(
      <QuantityField
        label="Loss"
        value={0.05}
        onCommit={onCommit}
        read={(text) => {
          const reading = decibelEntry.read(text);
          return reading.ok && reading.value < 0 ? { ok: false, message: 'From 0 dB.' } : reading;
        }}
        format={decibelEntry.format}
        step={0.1}
      />,
    );
    const field = screen.getByLabelText<HTMLInputElement>('Loss');
    focusOn(field);
    pressKey('ArrowDown');
    expect(onCommit).not.toHaveBeenCalled();
    expect([field.value, description(field)]).toEqual(['−0.05 dB', 'From 0 dB.']);
    pressKey('Escape');
    expect(field.value).toBe('0.05 dB');
  });

  test('an empty field asks for an example, an untouched empty one for nothing', () => {
    const { field, type } = openWidth({ first: null });
    fireEvent.blur(field);
    expect(field.getAttribute('aria-invalid')).toBeNull();
    type('1');
    type('   x');
    fireEvent.blur(field);
    expect(description(field)).toContain('Write a length');
  });

  test('a value that changes elsewhere leaves what is being typed, and replaces what was refused', () => {
    const shown = (value: number) => (
      <QuantityField
        label="Carrier"
        value={value}
        onCommit={() => undefined}
        read={frequencyEntry.read}
        format={frequencyEntry.format}
      />
    );
    const { rerender } = render(shown(155.5e6));
    const field = screen.getByLabelText<HTMLInputElement>('Carrier');
    fireEvent.change(field, { target: { value: '160' } });
    rerender(shown(156e6));
    expect(field.value).toBe('160');
    fireEvent.change(field, { target: { value: '160 W' } });
    fireEvent.blur(field);
    rerender(shown(156e6));
    expect(field.value).toBe('160 W');
    rerender(shown(157e6));
    expect(field.value).toBe('157 MHz');
    expect(field.getAttribute('aria-invalid')).toBeNull();
  });

  test('has no accessibility problem, at rest and refused', async () => {
    const { type } = openWidth();
    expect(await accessibilityProblems()).toEqual([]);
    type('3 kg');
    pressKey('Enter');
    expect(await accessibilityProblems()).toEqual([]);
  });
});
