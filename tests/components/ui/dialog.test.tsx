import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { lengthEntry } from '@/components/panels/quantity-entries';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Dialog } from '@/components/ui/dialog';
import { QuantityField } from '@/components/ui/quantity-field';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

const length = lengthEntry('mm');

function Page() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button label="Resize" onPress={() => setOpen(true)} />
      <Button label="Something behind" />
      <Dialog
        open={open}
        title="Resize the platform"
        onClose={() => setOpen(false)}
        actions={<Button label="Apply" onPress={() => setOpen(false)} />}
      >
        <QuantityField
          label="Length"
          value={4}
          onCommit={() => undefined}
          read={length.read}
          format={length.format}
        />
      </Dialog>
    </>
  );
}

function openDialog() {
  render(<Page />);
  const opener = screen.getByRole('button', { name: 'Resize' });
  focusOn(opener);
  fireEvent.click(opener);
  return { opener, dialog: screen.getByRole('dialog') };
}

describe('a dialog', () => {
  test('has its title for a name, is modal, and takes the focus', () => {
    const { dialog } = openDialog();
    expect(screen.getByRole('dialog', { name: 'Resize the platform' })).toBe(dialog);
    expect(dialog.getAttribute('aria-modal')).toBe('true');
    expect(dialog.contains(document.activeElement)).toBe(true);
  });

  test('keeps the focus: what lies behind it cannot have it', () => {
    const { dialog } = openDialog();
    focusOn(screen.getByText('Something behind').closest<HTMLElement>('button, [role=button]')!);
    expect(dialog.contains(document.activeElement)).toBe(true);
  });

  test('gives the focus back to what opened it', () => {
    const { opener } = openDialog();
    fireEvent.click(screen.getByRole('button', { name: 'Apply' }));
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(document.activeElement).toBe(opener);
  });

  test('closes on Escape, from a button and from a field', () => {
    openDialog();
    pressKey('Escape');
    expect(screen.queryByRole('dialog')).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Resize' }));
    focusOn(screen.getByLabelText('Length'));
    pressKey('Escape');
    expect(screen.queryByRole('dialog')).toBeNull();
  });

  test('stays open when Escape takes back what was typed in a field', () => {
    openDialog();
    const field = screen.getByLabelText<HTMLInputElement>('Length');
    focusOn(field);
    fireEvent.change(field, { target: { value: '3 m' } });
    pressKey('Escape');
    expect(field.value).toBe('4000 mm');
    expect(screen.queryByRole('dialog')).not.toBeNull();
    pressKey('Escape');
    expect(screen.queryByRole('dialog')).toBeNull();
  });

  test('has no accessibility problem', async () => {
    openDialog();
    expect(await accessibilityProblems()).toEqual([]);
  });
});

describe('a question before something that is not easily taken back', () => {
  const ask = (props: { readonly busy?: boolean; readonly error?: string }) => {
    const [onConfirm, onClose] = [jest.fn(), jest.fn()];
    render(
      <ConfirmDialog
        open
        title="Remove the radio"
        text="Antennas that use it stand without one then."
        confirmLabel="Remove"
        onConfirm={onConfirm}
        onClose={onClose}
        dangerous
        {...props}
      />,
    );
    return { onConfirm, onClose };
  };

  test('names what it does on the button that does it', () => {
    const { onConfirm, onClose } = ask({});
    fireEvent.click(screen.getByRole('button', { name: 'Cancel' }));
    fireEvent.click(screen.getByRole('button', { name: 'Remove' }));
    expect([onClose.mock.calls.length, onConfirm.mock.calls.length]).toEqual([1, 1]);
  });

  test('shows why it was refused where the question stands', () => {
    ask({ error: 'This radio is in use at A1.' });
    expect(screen.getByRole('alert').textContent).toContain('This radio is in use at A1.');
  });

  test('is answered once: while it is busy the button does nothing', () => {
    const { onConfirm } = ask({ busy: true });
    fireEvent.click(screen.getByRole('button', { name: 'Remove' }));
    expect(onConfirm).not.toHaveBeenCalled();
  });
});
