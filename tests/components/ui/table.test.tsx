import { render, screen, within } from '@testing-library/react';
import { Table, type Column } from '@/components/ui/table';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { focusOn, pressKey } from '@/tests/support/press-key';

type Pair = { readonly id: string; readonly from: string; readonly margin: string };

const PAIRS: readonly Pair[] = [
  { id: '1', from: 'A1', margin: '−8' },
  { id: '2', from: 'A2', margin: '12' },
];
const COLUMNS: readonly Column<Pair>[] = [
  { key: 'from', title: 'From', cell: ({ from }) => from },
  { key: 'margin', title: 'Margin, dB', align: 'right', cell: ({ margin }) => margin },
];

describe('a table', () => {
  test('is one to a screen reader: its name, its columns, its rows and their cells', () => {
    render(<Table label="All pairs" columns={COLUMNS} rows={PAIRS} rowKey={({ id }) => id} />);
    const table = screen.getByRole('table', { name: 'All pairs' });
    expect(
      within(table)
        .getAllByRole('columnheader')
        .map(({ textContent }) => textContent),
    ).toEqual(['From', 'Margin, dB']);
    const [, first, second] = within(table).getAllByRole('row');
    const cells = (row: HTMLElement | undefined) =>
      within(row!)
        .getAllByRole('cell')
        .map(({ textContent }) => textContent);
    expect(cells(first)).toEqual(['A1', '−8']);
    expect(cells(second)).toEqual(['A2', '12']);
  });

  test('whose rows open something is used from the keyboard: Enter and Space, once each', () => {
    const onRowPress = jest.fn();
    render(
      <Table
        label="All pairs"
        columns={COLUMNS}
        rows={PAIRS}
        rowKey={({ id }) => id}
        rowLabel={({ from, margin }) => `${from}, margin ${margin} dB`}
        onRowPress={onRowPress}
        isChosen={({ id }) => id === '2'}
      />,
    );
    const row = screen.getByRole('row', { name: 'A1, margin −8 dB' });
    expect(row.tabIndex).toBe(0);
    focusOn(row);
    pressKey('Enter');
    expect(onRowPress.mock.calls).toEqual([[PAIRS[0]]]);
    expect(pressKey(' ')).toBe(false);
    expect(onRowPress).toHaveBeenCalledTimes(2);
    expect(screen.getByRole('row', { selected: true }).getAttribute('aria-label')).toBe('A2, margin 12 dB');
  });

  test('that is wider than its place can be scrolled with the keys', () => {
    render(<Table label="All pairs" columns={COLUMNS} rows={PAIRS} rowKey={({ id }) => id} minWidth={600} />);
    const group = screen.getByRole('group', { name: 'All pairs' });
    expect(group.tabIndex).toBe(0);
    expect(within(group).getByRole('table')).toBeTruthy();
  });

  test('has no accessibility problem', async () => {
    render(
      <Table
        label="All pairs"
        columns={COLUMNS}
        rows={PAIRS}
        rowKey={({ id }) => id}
        onRowPress={() => undefined}
      />,
    );
    expect(await accessibilityProblems()).toEqual([]);
  });
});
