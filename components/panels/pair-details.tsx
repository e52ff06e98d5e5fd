import { View } from 'react-native';
import { marginText } from '@/components/canvas/margin-text';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { StateMark } from '@/components/ui/state-mark';
import { Heading, Text } from '@/components/ui/text';
import type { MechanismResult, PairResult } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';
import { frequencyText } from './estimate-words';
import { STATE_TONE } from './pair-list';

type PairDetailsProps = { readonly pair: PairResult; readonly document: LayoutDocument };

const MECHANISM_TITLES = {
  overload: 'Overload by the carrier',
  'transmitter noise': 'Transmitter noise',
} as const;

/** How a pair's margin comes about: both mechanisms with their own frequency, isolation and need. */
export function PairDetails({ pair, document }: PairDetailsProps) {
  const nameOf = (id: string) => {
    const antenna = document.antennas[id];
    return antenna ? `${antenna.label} ${antenna.name}` : 'an antenna that is gone';
  };
  const radioOf = (id: string) => document.radios[document.antennas[id]?.radioId ?? '']?.name ?? 'no radio';
  return (
    <View style={{ gap: space.s }}>
      <View style={{ flexDirection: 'row', gap: space.s, alignItems: 'center' }}>
        <StateMark state={pair.state} />
        <Heading level={3} style={{ flex: 1 }}>
          {`From ${nameOf(pair.from)} into ${nameOf(pair.into)}`}
        </Heading>
        <Text variant="smallStrong" tone={STATE_TONE[pair.state]}>
          {pair.state}
        </Text>
      </View>
      <Text variant="small" tone="soft">
        {`${radioOf(pair.from)} transmits, ${radioOf(pair.into)} receives.`}
      </Text>
      {pair.reason ? (
        <Text variant="small">
          {pair.state === 'never together'
            ? `Rule: ${pair.reason.message}`
            : `Not held: ${pair.reason.message}`}
        </Text>
      ) : null}
      {pair.mechanisms.map((mechanism) => (
        <Mechanism
          key={mechanism.mechanism}
          result={mechanism}
          decides={mechanism.mechanism === pair.mechanism}
        />
      ))}
    </View>
  );
}

type MechanismProps = { readonly result: MechanismResult; readonly decides: boolean };

function Mechanism({ result, decides }: MechanismProps) {
  const { color } = useTheme();
  const { isolationDb, neededDb, marginDb, reason } = result;
  const tone =
    marginDb === null || reason ? 'soft' : marginDb < 0 ? 'lacking' : marginDb < 6 ? 'tight' : 'ink';
  return (
    <View
      style={{
        borderTopWidth: line.hair,
        borderColor: color.rule,
        paddingTop: space.xs,
        gap: space.hair,
      }}
    >
      <Line
        label={`${MECHANISM_TITLES[result.mechanism]} at ${frequencyText(result.frequency)}`}
        value={decides ? 'decides' : ''}
        strong
      />
      <Line label="Isolation there" value={isolationDb === null ? 'not held' : decibels(isolationDb)} />
      <Line label="Needed" value={decibels(neededDb)} />
      <Line
        label="Margin"
        value={marginDb === null ? 'not held' : `${marginText(marginDb)} dB`}
        tone={tone}
        strong
      />
      {reason ? (
        <Text variant="small" tone="soft">
          {reason.message}
        </Text>
      ) : null}
    </View>
  );
}

type LineProps = {
  readonly label: string;
  readonly value: string;
  readonly tone?: 'ink' | 'soft' | 'lacking' | 'tight';
  readonly strong?: boolean;
};

function Line({ label, value, tone = 'ink', strong = false }: LineProps) {
  const variant = strong ? 'smallFiguresStrong' : 'smallFigures';
  return (
    <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: space.m }}>
      <Text variant={variant} tone={tone}>
        {label}
      </Text>
      <Text variant={variant} tone={tone} align="right">
        {value}
      </Text>
    </View>
  );
}

function decibels(value: number): string {
  const text = Math.abs(value).toFixed(1);
  return `${value < 0 ? '−' : ''}${text} dB`;
}
