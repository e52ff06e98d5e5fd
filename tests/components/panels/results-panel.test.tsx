import { fireEvent, render, screen, within } from '@testing-library/react';
import { useState } from 'react';
import type { PairKey } from '@/components/panels/pair-list';
import { ResultHeadline } from '@/components/panels/result-headline';
import { ResultsPanel } from '@/components/panels/results-panel';
import type { Agreement } from '@/components/editor/editor-snapshot';
import { accessibilityProblems } from '@/tests/support/accessibility-problems';
import { buildEstimate, buildPair } from '@/tests/support/build-estimate';
import { vanRoof } from '@/tests/support/van-roof';

const document = vanRoof();
const [a1, a2, a3] = ['A1', 'A2', 'A3'].map(
  (label) => Object.values(document.antennas).find((antenna) => antenna.label === label)!.id,
) as [string, string, string];
const labelOf = (id: string) => document.antennas[id]?.label ?? '?';
const REASON = { code: 'near', message: 'They stand too close for this model.' };

const estimate = buildEstimate(
  [
    buildPair(a2, a3, 'lacking', -8.2),
    buildPair(a1, a2, 'not held', null, { reason: REASON }),
    buildPair(a3, a2, 'tight', 2.4),
    buildPair(a1, a3, 'clear', 21),
  ],
  { warnings: [{ code: 'same-mark', message: 'Two antennas are marked A4.' }] },
);

function Panel({
  antenna = null,
  agreement = { kind: 'confirmed', sequence: 7 },
}: {
  antenna?: string | null;
  agreement?: Agreement;
}) {
  const [pair, setPair] = useState<PairKey | null>(null);
  return (
    <>
      <ResultHeadline estimate={estimate} labelOf={labelOf} />
      <ResultsPanel
        document={document}
        estimate={estimate}
        agreement={agreement}
        labelOf={labelOf}
        chosenAntenna={antenna}
        chosenPair={pair}
        onChoosePair={setPair}
        rows={3}
      />
    </>
  );
}

const listed = () =>
  screen.getAllByRole('listitem').map((item) => within(item).getByRole('button').getAttribute('aria-label'));

describe('the results', () => {
  test('stand under the one sentence that matters', () => {
    render(<Panel />);
    expect(screen.getByRole('heading', { level: 2 }).textContent).toBe('A2 into A3 lacks 8 dB');
    expect(
      screen.getByText('1 lacking, 1 not held, 1 tight, 1 clear. Live estimate, infinite flat metal roof.'),
    ).toBeTruthy();
  });

  test('list the pairs worst first, each with its state in words', () => {
    render(<Panel />);
    expect(listed()).toEqual([
      'A2 into A3, lacking, −8 dB, 32 dB at 155.5 MHz, overload',
      `A1 into A2, not held, ${REASON.message}`,
      'A3 into A2, tight, +2 dB, 42 dB at 155.5 MHz, overload',
    ]);
    fireEvent.click(screen.getByRole('button', { name: '1 more pair' }));
    expect(listed()).toHaveLength(4);
  });

  test('show why a pair is not held in the place where its number would stand', () => {
    render(<Panel />);
    fireEvent.click(screen.getByRole('button', { name: /^A1 into A2/ }));
    expect(screen.getByText(`Not held: ${REASON.message}`)).toBeTruthy();
  });

  test('of a chosen antenna are its own pairs', () => {
    render(<Panel antenna={a1} />);
    expect(listed()).toEqual([expect.stringContaining('A1 into A2'), expect.stringContaining('A1 into A3')]);
    expect(screen.getByText('Pairs of A1, worst first')).toBeTruthy();
  });

  test('are all in one table, a press away; a row chosen there closes it and shows the pair', () => {
    render(<Panel />);
    fireEvent.click(screen.getByRole('button', { name: 'All as a table' }));
    const table = within(screen.getByRole('dialog')).getByRole('table', { name: 'All pairs, worst first' });
    expect(within(table).getAllByRole('row')).toHaveLength(5);
    const row = within(table).getByRole('row', { name: 'A1 into A3, clear' });
    expect(
      within(row)
        .getAllByRole('cell')
        .map(({ textContent }) => textContent),
    ).toEqual(['A1', 'A3', 'clear', '+21', '61.0', '40.0', '155.5 MHz', 'overload']);
    fireEvent.click(row);
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(screen.getByText('From A1 Whip A1 into A3 Whip A3')).toBeTruthy();
  });

  test.each<[Agreement, string]>([
    [{ kind: 'waiting' }, 'Computed here; the server has not confirmed this position yet.'],
    [{ kind: 'confirmed', sequence: 7 }, 'Confirmed by the server.'],
    [{ kind: 'differs', sequence: 7, message: 'The server says 3 dB less.' }, 'The server says 3 dB less.'],
  ])('say whether the server agrees: $kind', (agreement, text) => {
    render(<Panel agreement={agreement} />);
    expect(screen.getByText(text)).toBeTruthy();
  });

  test('carry the cautions of the estimate', () => {
    render(<Panel />);
    expect(screen.getByText('Two antennas are marked A4.')).toBeTruthy();
  });

  test('have no accessibility problem, as a list and as a table', async () => {
    render(<Panel />);
    expect(await accessibilityProblems()).toEqual([]);
    fireEvent.click(screen.getByRole('button', { name: 'All as a table' }));
    expect(await accessibilityProblems()).toEqual([]);
  });
});
