import { View } from 'react-native';
import { space } from '@/components/theme/tokens';
import { StateMark } from '@/components/ui/state-mark';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import type { PairResult } from '@/shared/estimate/estimate-result';
import { frequencyText, MECHANISM_WORDS, pairMargin, type LabelOf } from './estimate-words';
import { STATE_TONE, type PairKey } from './pair-list';

type PairsTableProps = {
  readonly pairs: readonly PairResult[];
  readonly labelOf: LabelOf;
  readonly chosen: PairKey | null;
  readonly onChoose: (pair: PairKey) => void;
};

const MIN_WIDTH = 640;

/** Every ordered pair with its numbers, worst first. */
export function PairsTable({ pairs, labelOf, chosen, onChoose }: PairsTableProps) {
  const columns: readonly Column<PairResult>[] = [
    { key: 'from', title: 'From', flex: 1, cell: (pair) => labelOf(pair.from) },
    { key: 'into', title: 'Into', flex: 1, cell: (pair) => labelOf(pair.into) },
    {
      key: 'state',
      title: 'State',
      flex: 2,
      cell: (pair) => (
        <View style={{ flexDirection: 'row', gap: space.s, alignItems: 'center' }}>
          <StateMark state={pair.state} />
          <Text variant="figures" tone={STATE_TONE[pair.state]}>
            {pair.state}
          </Text>
        </View>
      ),
    },
    { key: 'margin', title: 'Margin, dB', flex: 1, align: 'right', cell: pairMargin },
    {
      key: 'isolation',
      title: 'Isolation, dB',
      flex: 1,
      align: 'right',
      cell: (pair) => tenths(pair.isolationDb),
    },
    { key: 'needed', title: 'Needed, dB', flex: 1, align: 'right', cell: (pair) => tenths(pair.neededDb) },
    {
      key: 'at',
      title: 'At',
      flex: 1.4,
      align: 'right',
      cell: (pair) => (pair.frequency === null ? '–' : frequencyText(pair.frequency)),
    },
    {
      key: 'by',
      title: 'By',
      flex: 1.2,
      cell: (pair) => (pair.mechanism === null ? '–' : MECHANISM_WORDS[pair.mechanism]),
    },
  ];
  return (
    <Table
      label="All pairs, worst first"
      columns={columns}
      rows={pairs}
      rowKey={(pair) => `${pair.from} ${pair.into}`}
      rowLabel={(pair) => `${labelOf(pair.from)} into ${labelOf(pair.into)}, ${pair.state}`}
      onRowPress={onChoose}
      isChosen={(pair) => pair.from === chosen?.from && pair.into === chosen.into}
      minWidth={MIN_WIDTH}
    />
  );
}

function tenths(value: number | null): string {
  if (value === null) return '–';
  return `${value < 0 ? '−' : ''}${Math.abs(value).toFixed(1)}`;
}
