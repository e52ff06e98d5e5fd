import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Choice } from '@/components/ui/choice';
import { IconButton } from '@/components/ui/icon-button';
import { Tabs } from '@/components/ui/tabs';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

describe('a button', () => {
  test('is pressed with Enter and with Space, once each', () => {
    const onPress = jest.fn();
    render(<Button label="Save" onPress={onPress} />);
    focusOn(screen.getByRole('button', { name: 'Save' }));
    pressKey('Enter');
    pressKey(' ');
    expect(onPress).toHaveBeenCalledTimes(2);
  });

  test('does nothing while it is busy, and says so', async () => {
    const onPress = jest.fn();
    render(<Button label="Save" onPress={onPress} busy />);
    const button = screen.getByRole('button', { name: 'Save' });
    fireEvent.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(button.getAttribute('aria-busy')).toBe('true');
    expect(button.getAttribute('aria-disabled')).toBe('true');
    expect(await accessibilityProblems()).toEqual([]);
  });

  test('that is only an icon has a name', async () => {
    render(<IconButton label="Zoom in" icon="add" />);
    expect(screen.getByRole('button', { name: 'Zoom in' })).toBeTruthy();
    expect(await accessibilityProblems()).toEqual([]);
  });
});

describe('a checkbox', () => {
  function Metal() {
    const [checked, setChecked] = useState(false);
    return <Checkbox label="Metal" hint="It reflects" checked={checked} onChange={setChecked} />;
  }

  test('is turned with Space, and the page does not scroll', () => {
    render(<Metal />);
    const box = screen.getByRole('checkbox');
    focusOn(box);
    expect(pressKey(' ')).toBe(false);
    expect(box.getAttribute('aria-checked')).toBe('true');
    pressKey(' ');
    expect(box.getAttribute('aria-checked')).toBe('false');
  });

  test('that is disabled stays as it is', () => {
    const onChange = jest.fn();
    render(<Checkbox label="Metal" checked onChange={onChange} disabled />);
    focusOn(screen.getByRole('checkbox'));
    pressKey(' ');
    fireEvent.click(screen.getByRole('checkbox'));
    expect(onChange).not.toHaveBeenCalled();
  });

  test('has no accessibility problem', async () => {
    render(<Metal />);
    expect(await accessibilityProblems()).toEqual([]);
  });
});

describe('a choice', () => {
  const options = [
    { value: 'whip', label: 'Whip' },
    { value: 'dipole', label: 'Dipole' },
    { value: 'patch', label: 'Patch' },
  ] as const;

  function Form() {
    const [value, setValue] = useState<'whip' | 'dipole' | 'patch'>('whip');
    return <Choice label="Form" value={value} options={options} onChange={setValue} />;
  }

  const chosen = () =>
    screen
      .getAllByRole('radio')
      .filter((radio) => radio.getAttribute('aria-checked') === 'true')
      .map((radio) => radio.getAttribute('aria-label'));

  test('is one stop of the tab key, on what is chosen', () => {
    render(<Form />);
    expect(screen.getAllByRole('radio').map((radio) => radio.tabIndex)).toEqual([0, -1, -1]);
  });

  test('goes round with the arrows, the focus with it', () => {
    render(<Form />);
    focusOn(screen.getByRole('radio', { name: 'Whip' }));
    pressKey('ArrowRight');
    expect(chosen()).toEqual(['Dipole']);
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Dipole');
    pressKey('ArrowUp');
    pressKey('ArrowLeft');
    expect(chosen()).toEqual(['Patch']);
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Patch');
  });

  test('is made with Space', () => {
    render(<Form />);
    focusOn(screen.getByRole('radio', { name: 'Patch' }));
    expect(pressKey(' ')).toBe(false);
    expect(chosen()).toEqual(['Patch']);
  });

  test('has no accessibility problem', async () => {
    render(<Form />);
    expect(await accessibilityProblems()).toEqual([]);
  });
});

describe('tabs', () => {
  function Views() {
    const [active, setActive] = useState<'pairs' | 'pattern' | 'comments'>('pairs');
    return (
      <Tabs
        label="Results"
        tabs={[
          { key: 'pairs', label: 'Pairs', count: 12 },
          { key: 'pattern', label: 'Pattern' },
          { key: 'comments', label: 'Comments' },
        ]}
        active={active}
        onChange={setActive}
      >
        <p>{`Now ${active}`}</p>
      </Tabs>
    );
  }

  test('go round with the arrows, the panel with them', () => {
    render(<Views />);
    focusOn(screen.getByRole('tab', { name: 'Pairs, 12' }));
    pressKey('ArrowLeft');
    expect(screen.getByRole('tabpanel', { name: 'Comments' }).textContent).toBe('Now comments');
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Comments');
    pressKey('ArrowRight');
    expect(screen.getByRole('tab', { selected: true }).getAttribute('aria-label')).toBe('Pairs, 12');
  });

  test('are one stop of the tab key', () => {
    render(<Views />);
    expect(screen.getAllByRole('tab').map((tab) => tab.tabIndex)).toEqual([0, -1, -1]);
  });

  test('have no accessibility problem', async () => {
    render(<Views />);
    expect(await accessibilityProblems()).toEqual([]);
  });
});
