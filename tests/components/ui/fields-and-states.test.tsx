import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { SearchField } from '@/components/ui/search-field';
import { SelectField } from '@/components/ui/select-field';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

test('a select field is the browser\u2019s own, with its label, its hint and its error', async () => {
  const onChange = jest.fn();
  const options = [
    { value: 'none', label: 'No radio yet' },
    { value: 'one', label: 'Marine VHF' },
  ] as const;
  render(
    <SelectField
      label="Radio"
      value="none"
      options={options}
      onChange={onChange}
      hint="It forms pairs"
      error="Choose one."
    />,
  );
  const select = screen.getByRole('combobox', { name: 'Radio' });
  fireEvent.change(select, { target: { value: 'one' } });
  expect(onChange).toHaveBeenCalledWith('one');
  expect(select.getAttribute('aria-invalid')).toBe('true');
  const described = select.getAttribute('aria-describedby')?.split(' ') ?? [];
  expect(described.map((id) => document.getElementById(id)?.textContent)).toEqual([
    'It forms pairs',
    'Choose one.',
  ]);
  expect(await accessibilityProblems()).toEqual([]);
});

test('a search field is emptied with Escape, and only an empty one lets Escape through', () => {
  function Search() {
    const [text, setText] = useState('whip');
    return <SearchField label="Find a part" value={text} onChange={setText} />;
  }
  render(<Search />);
  const field = screen.getByRole<HTMLInputElement>('searchbox', { name: 'Find a part' });
  focusOn(field);
  expect(pressKey('Escape')).toBe(false);
  expect(field.value).toBe('');
  expect(pressKey('Escape')).toBe(true);
});

test('loading, empty and failed states say what they are, and what can be done', async () => {
  const onRetry = jest.fn();
  render(
    <main>
      <LoadingState label="Fetching the shelf" />
      <EmptyState title="No jobs yet" text="A job is one piece of work for one customer." />
      <ErrorState title="The shelf did not arrive" text="There is no connection." onRetry={onRetry} />
    </main>,
  );
  expect(screen.getByRole('status').textContent).toContain('Fetching the shelf');
  expect(screen.getByRole('heading', { name: 'No jobs yet' })).toBeTruthy();
  expect(screen.getByRole('alert').textContent).toContain('There is no connection.');
  fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
  expect(onRetry).toHaveBeenCalledTimes(1);
  expect(await accessibilityProblems()).toEqual([]);
});

test('a notice of an error is announced at once, any other in its turn', () => {
  render(
    <>
      <Notice kind="error" text="It was not saved." />
      <Notice kind="offline" text="Shown from what was kept." />
    </>,
  );
  expect(screen.getByRole('alert').textContent).toContain('It was not saved.');
  expect(screen.getByRole('status').textContent).toContain('Shown from what was kept.');
});
