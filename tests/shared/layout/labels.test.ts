import { compareLabels, duplicateLabels, nextLabel } from '@/shared/layout/labels';
import { idOf, whipAt } from './arbitrary-layout';

function marked(...labels: readonly string[]) {
  const antennas = labels.map((label, index) => whipAt(1, 0, { id: idOf(`${label} ${index}`), label }));
  return { antennas: Object.fromEntries(antennas.map((antenna) => [antenna.id, antenna])) };
}

describe('marks on the drawing', () => {
  test('fill the first gap, and leave out what is spoken for', () => {
    expect(nextLabel(marked())).toBe('A1');
    expect(nextLabel(marked('A1', 'A3'))).toBe('A2');
    expect(nextLabel(marked('A1', 'A3'), ['A2'])).toBe('A4');
  });

  test('are in the order of their numbers', () => {
    const labels = ['A10', 'A2', 'A1'].map((label) => ({ label }));
    expect(labels.sort(compareLabels).map(({ label }) => label)).toEqual(['A1', 'A2', 'A10']);
  });

  test('that two people added at once are found', () => {
    expect(duplicateLabels(marked('A1', 'A2', 'A10', 'A2', 'A10', 'A2'))).toEqual(['A2', 'A10']);
    expect(duplicateLabels(marked('A1', 'A2'))).toEqual([]);
  });
});
