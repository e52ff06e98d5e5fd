import { useState } from 'react';
import { View } from 'react-native';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { Heading, Text } from '@/components/ui/text';
import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';
import type { Agreement } from '@/components/editor/editor-snapshot';
import { worstPair, type LabelOf } from './estimate-words';
import { PairDetails } from './pair-details';
import { PairList, type PairKey } from './pair-list';
import { PairsTable } from './pairs-table';

type ResultsPanelProps = {
  readonly document: LayoutDocument;
  readonly estimate: Estimate;
  readonly agreement: Agreement;
  readonly labelOf: LabelOf;
  /** The chosen antenna: its pairs come first into view. */
  readonly chosenAntenna: string | null;
  readonly chosenPair: PairKey | null;
  readonly onChoosePair: (pair: PairKey | null) => void;
  readonly rows: number;
};

/** Pairs worst first, the details of one, and the way to all of them as a table. */
export function ResultsPanel({
  document,
  estimate,
  agreement,
  labelOf,
  chosenAntenna,
  chosenPair,
  onChoosePair,
  rows,
}: ResultsPanelProps) {
  const { color } = useTheme();
  const [asTable, setAsTable] = useState(false);
  const [whole, setWhole] = useState(false);
  const own = chosenAntenna === null ? estimate.pairs : pairsOf(estimate, chosenAntenna);
  const shown = whole ? own : own.slice(0, rows);
  const detailed =
    findPair(estimate, chosenPair) ??
    own.find(({ state }) => state !== 'not held') ??
    own[0] ??
    worstPair(estimate);
  const title =
    chosenAntenna === null ? 'Pairs, worst first' : `Pairs of ${labelOf(chosenAntenna)}, worst first`;
  return (
    <View style={{ gap: space.m }}>
      <View>
        <View
          style={{
            flexDirection: 'row',
            alignItems: 'center',
            justifyContent: 'space-between',
            borderBottomWidth: line.hair,
            borderColor: color.rule,
          }}
        >
          <Heading level={3} tone="soft">
            {title}
          </Heading>
          <View style={{ marginRight: -space.l }}>
            <Button label="All as a table" variant="quiet" onPress={() => setAsTable(true)} />
          </View>
        </View>
        {own.length === 0 ? (
          <Text variant="small" tone="soft" style={{ paddingVertical: space.m }}>
            No pairs yet: two antennas with radios, of which one transmits, make a pair.
          </Text>
        ) : (
          <PairList pairs={shown} labelOf={labelOf} chosen={chosenPair} onChoose={onChoosePair} />
        )}
        {own.length > rows ? (
          <Button
            label={
              whole
                ? 'Fewer pairs'
                : own.length === rows + 1
                  ? '1 more pair'
                  : `${own.length - rows} more pairs`
            }
            variant="quiet"
            onPress={() => setWhole(!whole)}
          />
        ) : null}
      </View>
      {detailed ? <PairDetails pair={detailed} document={document} /> : null}
      <AgreementLine agreement={agreement} />
      {estimate.warnings.map((warning) => (
        <Notice key={`${warning.code} ${warning.message}`} kind="caution" text={warning.message} />
      ))}
      <Dialog open={asTable} title="All pairs, worst first" large onClose={() => setAsTable(false)}>
        <PairsTable
          pairs={estimate.pairs}
          labelOf={labelOf}
          chosen={chosenPair}
          onChoose={(pair) => {
            onChoosePair({ from: pair.from, into: pair.into });
            setAsTable(false);
          }}
        />
      </Dialog>
    </View>
  );
}

function AgreementLine({ agreement }: { readonly agreement: Agreement }) {
  switch (agreement.kind) {
    case 'waiting':
      return (
        <Text variant="caption" tone="soft">
          Computed here; the server has not confirmed this position yet.
        </Text>
      );
    case 'confirmed':
      return (
        <Text variant="caption" tone="soft">
          Confirmed by the server.
        </Text>
      );
    case 'differs':
      return <Notice kind="caution" text={agreement.message} />;
  }
}

function pairsOf(estimate: Estimate, antennaId: string) {
  return estimate.pairs.filter(({ from, into }) => from === antennaId || into === antennaId);
}

function findPair(estimate: Estimate, key: PairKey | null) {
  if (key === null) return undefined;
  return estimate.pairs.find(({ from, into }) => from === key.from && into === key.into);
}
