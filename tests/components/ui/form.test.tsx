import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { powerEntry } from '@/components/panels/quantity-entries';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { QuantityField } from '@/components/ui/quantity-field';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

function Radio({
  onSend,
  onDiscard,
}: {
  readonly onSend: (power: number) => void;
  readonly onDiscard?: () => void;
}) {
  const [name, setName] = useState('');
  const [power, setPower] = useState(25);
  return (
    <Form label="Radio" onSubmit={() => onSend(power)}>
      <Field label="Name" value={name} onChange={setName} hint="As on the datasheet" required />
      <QuantityField
        label="Power"
        value={power}
        onCommit={setPower}
        read={powerEntry.read}
        format={powerEntry.format}
        hint={powerEntry.hint}
      />
      <Button label="Save" variant="primary" onPress={() => onSend(power)} />
      <Button label="Discard" onPress={onDiscard} />
    </Form>
  );
}

function openRadio() {
  const onSend = jest.fn();
  render(<Radio onSend={onSend} />);
  return { onSend, power: screen.getByLabelText<HTMLInputElement>('Power') };
}

describe('a form', () => {
  test('is sent by Enter in a field, with what was typed there', () => {
    const { onSend, power } = openRadio();
    focusOn(power);
    fireEvent.change(power, { target: { value: '44 dBm' } });
    pressKey('Enter');
    expect(onSend).toHaveBeenCalledTimes(1);
    expect(onSend.mock.calls[0]?.[0]).toBeCloseTo(25.1188643151, 9);
  });

  test('is not sent while a field holds what it refused: that field gets the focus', () => {
    const { onSend, power } = openRadio();
    focusOn(power);
    fireEvent.change(power, { target: { value: '25 MHz' } });
    fireEvent.blur(power);
    focusOn(screen.getByLabelText('Name'));
    fireEvent.submit(screen.getByRole('form', { name: 'Radio' }));
    expect(onSend).not.toHaveBeenCalled();
    expect(document.activeElement).toBe(power);
    expect(power.value).toBe('25 MHz');
  });

  test('is not sent by its primary button either; any other button works', () => {
    const [onSend, onDiscard] = [jest.fn(), jest.fn()];
    render(<Radio onSend={onSend} onDiscard={onDiscard} />);
    const power = screen.getByLabelText<HTMLInputElement>('Power');
    fireEvent.change(power, { target: { value: '25 MHz' } });
    fireEvent.blur(power);
    fireEvent.click(screen.getByRole('button', { name: 'Save' }));
    fireEvent.click(screen.getByRole('button', { name: 'Discard' }));
    expect([onSend.mock.calls.length, onDiscard.mock.calls.length]).toEqual([0, 1]);
    expect(document.activeElement).toBe(power);
    fireEvent.change(power, { target: { value: '30 W' } });
    fireEvent.blur(power);
    fireEvent.click(screen.getByRole('button', { name: 'Save' }));
    expect(onSend.mock.calls).toEqual([[30]]);
  });

  test('leaves the focus in the field on Enter', () => {
    const { power } = openRadio();
    focusOn(power);
    pressKey('Enter');
    expect(document.activeElement).toBe(power);
  });

  test('ties each field to its label and its hint', () => {
    openRadio();
    const name = screen.getByRole('textbox', { name: 'Name' });
    expect(name.getAttribute('aria-required')).toBe('true');
    expect(document.getElementById(name.getAttribute('aria-describedby') ?? '')?.textContent).toBe(
      'As on the datasheet',
    );
  });

  test('has no accessibility problem', async () => {
    openRadio();
    expect(await accessibilityProblems()).toEqual([]);
  });
});
