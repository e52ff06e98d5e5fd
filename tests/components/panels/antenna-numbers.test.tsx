import { act, fireEvent, render, screen } from '@testing-library/react';
import { useSyncExternalStore } from 'react';
import { AntennaNumbers } from '@/components/panels/antenna-numbers';
import { CoordinatesTable } from '@/components/panels/coordinates-table';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';
import { TestEditor } from '@/tests/support/test-editor';

/** Renders a panel of an open layout, anew with every snapshot. */
async function openPanel(panel: (person: TestEditor) => React.ReactNode) {
  const person = await new TestEditor().open();
  function Panel() {
    useSyncExternalStore(
      (listener) => person.editor.subscribe(listener),
      () => person.editor.getSnapshot(),
    );
    return panel(person);
  }
  render(<Panel />);
  return person;
}

const openNumbers = (canEdit = true) =>
  openPanel((person) => (
    <AntennaNumbers
      editor={person.editor}
      document={person.document}
      antenna={person.antenna('A1')}
      unit="mm"
      canEdit={canEdit}
      onComment={null}
    />
  ));

async function type(person: TestEditor, label: string | RegExp, text: string) {
  const field = screen.getByLabelText<HTMLInputElement>(label);
  focusOn(field);
  fireEvent.change(field, { target: { value: text } });
  pressKey('Enter');
  await act(async () => void (await person.wait()));
  return field;
}

describe('the numbers of an antenna', () => {
  test('place it as it was typed', async () => {
    const person = await openNumbers();
    const field = await type(person, /^x,/, '2 ft');
    expect(person.antenna('A1').x).toBeCloseTo(0.6096, 12);
    expect(field.value).toBe('609.6 mm');
    expect(person.room.document.antennas[person.antenna('A1').id]?.x).toBeCloseTo(0.6096, 12);
  });

  test('refuse a position off the surface where it was typed, and keep it to be mended', async () => {
    const person = await openNumbers();
    const field = await type(person, /^x,/, '9 m');
    expect(person.antenna('A1').x).toBe(0.5);
    expect(field.value).toBe('9 m');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText('It would stand off the surface.')).toBeTruthy();
  });

  test('refuse a keep-out with its reason', async () => {
    const person = await openNumbers();
    await type(person, 'y, to the left', '0');
    await type(person, /^x,/, '3.4 m');
    expect(person.antenna('A1').x).toBe(0.5);
    expect(screen.getByText(/keep-out “Hatch”: The hatch opens here\./)).toBeTruthy();
  });

  test('turn a bearing into one turn', async () => {
    const person = await openNumbers();
    await type(person, 'Azimuth', '-90');
    expect(person.antenna('A1').azimuthDeg).toBe(270);
  });

  test.each([
    ['Tilt from upright', '91', 'From 0 (upright) to 90 degrees.'],
    ['Feeder loss', '-1 dB', 'From 0 to 100 dB.'],
    ['Mount height', '-5 mm', 'From 0 to 1000 m above the surface.'],
    ['Feeder loss', '3 W', /A power does not belong here/],
    ['Mark', '', 'A mark is needed, such as A4.'],
    ['Mark', 'A2', 'A2 stands on the plan already.'],
  ])('say in place why %s cannot be %j', async (label, text, message) => {
    const person = await openNumbers();
    const field = await type(person, label, text);
    expect(field.value).toBe(text);
    expect(screen.getByText(message)).toBeTruthy();
  });

  test('can be looked at but not changed by those who may not', async () => {
    await openNumbers(false);
    const field = screen.getByLabelText<HTMLInputElement>(/^x,/);
    expect(field.readOnly).toBe(true);
    expect(screen.queryByRole('button', { name: 'Remove A1' })).toBeNull();
  });

  test('have no accessibility problem', async () => {
    await openNumbers();
    expect(await accessibilityProblems()).toEqual([]);
  });
});

describe('the table of coordinates', () => {
  const openTable = () =>
    openPanel((person) => (
      <CoordinatesTable editor={person.editor} document={person.document} estimate={null} unit="in" canEdit />
    ));

  test('places any antenna from the keyboard', async () => {
    const person = await openTable();
    const field = await type(person, 'x of A2', '40');
    expect(person.antenna('A2').x).toBeCloseTo(1.016, 12);
    expect(field.value).toBe('40 in');
    expect(document.activeElement).toBe(field);
  });

  test('has a row for each antenna, in the order of the marks, each number with its own name', async () => {
    await openTable();
    const rows = screen.getAllByRole('row').slice(1);
    expect(rows.map((row) => row.textContent?.slice(0, 2))).toEqual(['A1', 'A2', 'A3']);
    expect(screen.getByLabelText('Mount height of A3')).toBeTruthy();
  });

  test('has no accessibility problem', async () => {
    await openTable();
    expect(await accessibilityProblems()).toEqual([]);
  });
});
