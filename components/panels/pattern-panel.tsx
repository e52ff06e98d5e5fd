import { View } from 'react-native';
import Svg from 'react-native-svg';
import { RoseLayer } from '@/components/canvas/rose-layer';
import type { Turn } from '@/components/canvas/viewport';
import { space } from '@/components/theme/tokens';
import { Heading, Text } from '@/components/ui/text';
import type { AntennaResult } from '@/shared/estimate/estimate-result';
import type { PlacedAntenna } from '@/shared/layout/document';
import { frequencyText } from './estimate-words';

type PatternPanelProps = {
  /** The chosen antenna; null without a choice. */
  readonly antenna: PlacedAntenna | null;
  readonly result: AntennaResult | null;
  readonly forwardAxis: string;
  readonly turn: Turn;
};

const SIDE = 148;

/** Pattern of the chosen antenna among its neighbours, against its own alone. */
export function PatternPanel({ antenna, result, forwardAxis, turn }: PatternPanelProps) {
  if (!antenna) {
    return (
      <View style={{ gap: space.xs }}>
        <Heading level={3}>Pattern</Heading>
        <Text variant="small" tone="soft">
          Choose an antenna to see what its neighbours make of its pattern.
        </Text>
      </View>
    );
  }
  const pattern = result?.pattern ?? null;
  if (!pattern) {
    return (
      <View style={{ gap: space.xs }}>
        <Heading level={3}>{`Pattern of ${antenna.label} ${antenna.name}`}</Heading>
        <Text variant="small" tone="soft">
          {result?.reason?.message ?? 'Not computed: give it a radio first.'}
        </Text>
      </View>
    );
  }
  const middle = { x: SIDE / 2, y: SIDE / 2 };
  return (
    <View style={{ flexDirection: 'row', gap: space.m, alignItems: 'center' }}>
      <Svg width={SIDE} height={SIDE} aria-hidden>
        <RoseLayer pattern={pattern} middle={middle} radius={SIDE / 2 - 14} turn={turn} />
      </Svg>
      <View style={{ flex: 1, gap: space.hair }}>
        <Heading level={3}>{`${antenna.label} at ${frequencyText(pattern.frequency)}`}</Heading>
        <Text variant="smallFigures">{`ripple ${pattern.rippleDb.toFixed(1)} dB by neighbours`}</Text>
        <Text variant="smallFigures">
          {`deepest at ${String(Math.round(pattern.deepestAzimuthDeg)).padStart(3, '0')}° from ${forwardAxis}`}
        </Text>
        <Text variant="smallFigures" tone="soft">
          {`dashed: alone. Field, linear, at ${pattern.elevationDeg}° elevation; by neighbours only, roof shape not included.`}
        </Text>
        {pattern.reason ? <Text variant="smallFigures">{`Not held: ${pattern.reason.message}`}</Text> : null}
      </View>
    </View>
  );
}
