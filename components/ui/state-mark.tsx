import Svg, { Circle, Path } from 'react-native-svg';
import { View } from 'react-native';
import { iconSize, line, radius, space } from '../theme/tokens';
import type { ThemeColors } from '../theme/themes';
import { useTheme } from '../theme/use-theme';
import { Text } from './text';

/** Shape and colour of each state; the word stands beside it. */
export const STATE_LOOKS = {
  clear: { shape: 'open', tone: 'ink' },
  tight: { shape: 'half', tone: 'tight' },
  lacking: { shape: 'filled', tone: 'lacking' },
  'not held': { shape: 'diamond', tone: 'inkSoft' },
  'never together': { shape: 'bars', tone: 'inkSoft' },
} as const satisfies Record<string, { shape: string; tone: keyof ThemeColors }>;

export type MarkedState = keyof typeof STATE_LOOKS;

type StateMarkProps = { readonly state: MarkedState; readonly size?: keyof typeof iconSize };

/** Open, half-filled, filled circle; a diamond for *not held*, two bars for *never together*. */
export function StateMark({ state, size = 's' }: StateMarkProps) {
  const { color } = useTheme();
  const { shape, tone } = STATE_LOOKS[state];
  const ink = color[tone];
  const pixels = iconSize[size];
  return (
    <Svg width={pixels} height={pixels} viewBox="0 0 16 16" fill="none" aria-hidden style={{ flexShrink: 0 }}>
      {shape === 'diamond' ? (
        <Path
          d="M8 1.8 14.2 8 8 14.2 1.8 8z"
          stroke={ink}
          strokeWidth={line.mark}
          strokeDasharray="2.5 1.6"
        />
      ) : shape === 'bars' ? (
        <Path d="M5 2.5v11M11 2.5v11" stroke={ink} strokeWidth={line.bold} />
      ) : (
        <Circle
          cx={8}
          cy={8}
          r={5.4}
          stroke={ink}
          strokeWidth={line.mark}
          fill={shape === 'filled' ? ink : 'none'}
        />
      )}
      {shape === 'half' ? <Path d="M8 2.6a5.4 5.4 0 0 1 0 10.8z" fill={ink} /> : null}
    </Svg>
  );
}

type ChipProps = { readonly text: string; readonly tone?: 'ink' | 'soft' | 'action' | 'lacking' | 'tight' };

const CHIP_EDGES = {
  ink: 'ink',
  soft: 'edge',
  action: 'action',
  lacking: 'lacking',
  tight: 'tight',
} as const satisfies Record<string, keyof ThemeColors>;

/** A word in a thin frame: the state of a revision, a role. */
export function Chip({ text, tone = 'soft' }: ChipProps) {
  const { color } = useTheme();
  return (
    <View
      style={{
        alignSelf: 'flex-start',
        borderWidth: line.hair,
        borderColor: color[CHIP_EDGES[tone]],
        borderRadius: radius.s,
        paddingHorizontal: space.s,
        paddingVertical: line.hair,
      }}
    >
      <Text variant="smallFigures" tone={tone}>
        {text}
      </Text>
    </View>
  );
}
