import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { Menu } from '@/components/ui/menu';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

async function openMenu() {
  const [rename, copy, remove] = [jest.fn(), jest.fn(), jest.fn()];
  render(
    <Menu
      label="More about A1"
      items={[
        { label: 'Rename', onPress: rename },
        { label: 'Copy', onPress: copy, disabled: true },
        { label: 'Remove', onPress: remove, dangerous: true },
      ]}
    />,
  );
  const opener = screen.getByRole('button', { name: 'More about A1' });
  focusOn(opener);
  fireEvent.click(opener);
  await waitFor(() => expect(focused()).toBe('Rename'));
  return { opener, rename, copy, remove };
}

const focused = () => document.activeElement?.getAttribute('aria-label');

describe('a menu', () => {
  test('says that it is one, and whether it is open', async () => {
    const { opener } = await openMenu();
    expect(opener.getAttribute('aria-haspopup')).toBe('menu');
    expect(opener.getAttribute('aria-expanded')).toBe('true');
    expect(screen.getByRole('menu', { name: 'More about A1' })).toBeTruthy();
  });

  test('goes round with the arrows, and to its ends', async () => {
    await openMenu();
    pressKey('ArrowUp');
    expect(focused()).toBe('Remove');
    pressKey('ArrowDown');
    expect(focused()).toBe('Rename');
    pressKey('End');
    expect(focused()).toBe('Remove');
    pressKey('Home');
    expect(focused()).toBe('Rename');
  });

  test.each(['Enter', ' '])(
    'does with %j what has the focus, once, and gives the focus back',
    async (key) => {
      const { opener, remove } = await openMenu();
      pressKey('End');
      pressKey(key);
      expect(remove).toHaveBeenCalledTimes(1);
      expect(screen.queryByRole('menu')).toBeNull();
      expect(document.activeElement).toBe(opener);
    },
  );

  test('leaves alone what is disabled', async () => {
    const { copy } = await openMenu();
    pressKey('ArrowDown');
    pressKey('Enter');
    pressKey(' ');
    fireEvent.click(screen.getByRole('menuitem', { name: 'Copy' }));
    expect(copy).not.toHaveBeenCalled();
    expect(screen.getByRole('menu')).toBeTruthy();
  });

  test('closes on Escape and gives the focus back', async () => {
    const { opener, rename } = await openMenu();
    pressKey('Escape');
    expect(screen.queryByRole('menu')).toBeNull();
    expect(document.activeElement).toBe(opener);
    expect(rename).not.toHaveBeenCalled();
  });

  test('has no accessibility problem, closed and open', async () => {
    await openMenu();
    expect(await accessibilityProblems()).toEqual([]);
    pressKey('Escape');
    expect(await accessibilityProblems()).toEqual([]);
  });
});
