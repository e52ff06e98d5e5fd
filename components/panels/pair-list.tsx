import { memo } from 'react';
import { Pressable, View } from 'react-native';
import { line, space, target } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import type { WebPressState } from '@/components/ui/button';
import { StateMark } from '@/components/ui/state-mark';
import { Text, type TextTone } from '@/components/ui/text';
import type { PairResult, PairState } from '@/shared/estimate/estimate-result';
import { pairBasis, pairMargin, type LabelOf } from './estimate-words';

type PairListProps = {
  readonly pairs: readonly PairResult[];
  readonly labelOf: LabelOf;
  readonly chosen: PairKey | null;
  readonly onChoose: (pair: PairKey) => void;
};

/** A pair by its two antennas. */
export type PairKey = { readonly from: string; readonly into: string };

/** Tone of a state's words; shape and word say the same. */
export const STATE_TONE = {
  clear: 'ink',
  tight: 'tight',
  lacking: 'lacking',
  'not held': 'soft',
  'never together': 'soft',
} as const satisfies Record<PairState, TextTone>;

/** Pairs one below the other, in the order they come. */
export function PairList({ pairs, labelOf, chosen, onChoose }: PairListProps) {
  return (
    <View role="list">
      {pairs.map((pair) => (
        <PairRow
          key={`${pair.from} ${pair.into}`}
          from={pair.from}
          into={pair.into}
          names={`${labelOf(pair.from)} into ${labelOf(pair.into)}`}
          state={pair.state}
          margin={pairMargin(pair)}
          basis={pairBasis(pair)}
          chosen={chosen?.from === pair.from && chosen.into === pair.into}
          onChoose={onChoose}
        />
      ))}
    </View>
  );
}

type PairRowProps = PairKey & {
  readonly names: string;
  readonly state: PairState;
  readonly margin: string;
  readonly basis: string;
  readonly chosen: boolean;
  readonly onChoose: (pair: PairKey) => void;
};

const PairRow = memo(function PairRow({
  from,
  into,
  names,
  state,
  margin,
  basis,
  chosen,
  onChoose,
}: PairRowProps) {
  const { color } = useTheme();
  const unnumbered = state === 'not held' || state === 'never together';
  return (
    <View role="listitem">
      <Pressable
        role="button"
        aria-label={`${names}, ${state}, ${unnumbered ? basis : `${margin} dB, ${basis}`}`}
        aria-expanded={chosen}
        onPress={() => onChoose({ from, into })}
        style={({ pressed, hovered }: WebPressState) => ({
          minHeight: target.min,
          flexDirection: 'row',
          alignItems: 'center',
          gap: space.s,
          paddingVertical: space.xs,
          borderBottomWidth: line.hair,
          borderColor: color.rule,
          backgroundColor: pressed || hovered === true ? color.hover : chosen ? color.chosen : 'transparent',
        })}
      >
        <StateMark state={state} />
        <Text variant="smallFiguresStrong" style={{ width: 76 }}>
          {names}
        </Text>
        {unnumbered ? (
          <>
            <Text variant="smallFiguresStrong" tone="soft">
              {state}
            </Text>
            <Text
              variant="smallFigures"
              tone="soft"
              align="right"
              numberOfLines={1}
              style={{ flex: 1, minWidth: space.none }}
            >
              {basis}
            </Text>
          </>
        ) : (
          <>
            <Text variant="figuresStrong" tone={STATE_TONE[state]} align="right" style={{ width: 36 }}>
              {margin}
            </Text>
            <Text variant="smallFigures" tone="soft" align="right" style={{ flex: 1 }}>
              {basis}
            </Text>
          </>
        )}
      </Pressable>
    </View>
  );
});
