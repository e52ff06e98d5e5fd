import { View } from 'react-native';
import { space } from '@/components/theme/tokens';
import { StateMark } from '@/components/ui/state-mark';
import { Heading, Text } from '@/components/ui/text';
import type { Estimate } from '@/shared/estimate/estimate-result';
import { countsLine, headlineOf, pairBasis, type LabelOf } from './estimate-words';
import { STATE_TONE } from './pair-list';

type ResultHeadlineProps = {
  readonly estimate: Estimate | null;
  readonly labelOf: LabelOf;
  /** In the peek of a phone's sheet: the worst pair's basis instead of all counts. */
  readonly brief?: boolean;
};

/** The one sentence that matters, with its mark; below it what the rest comes to and on which model. */
export function ResultHeadline({ estimate, labelOf, brief = false }: ResultHeadlineProps) {
  const { state, sentence, pair } = headlineOf(estimate, labelOf);
  const below = estimate === null ? '' : brief && pair ? pairBasis(pair) : countsLine(estimate);
  return (
    <View style={{ flexDirection: 'row', gap: space.m, alignItems: 'flex-start' }}>
      {state ? (
        <View style={{ paddingTop: space.xs }}>
          <StateMark state={state} size="m" />
        </View>
      ) : null}
      <View style={{ flex: 1, gap: space.hair }}>
        <Heading level={2} tone={state ? STATE_TONE[state] : 'soft'}>
          {sentence}
        </Heading>
        {below ? (
          <Text variant="smallFigures" tone="soft" numberOfLines={brief ? 1 : undefined}>
            {below}
          </Text>
        ) : null}
      </View>
    </View>
  );
}
