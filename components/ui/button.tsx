import type { ReactNode } from 'react';
import { ActivityIndicator, Pressable, type PressableStateCallbackType, View } from 'react-native';
import { line, radius, space, target } from '../theme/tokens';
import type { ThemeColors } from '../theme/themes';
import { useTheme } from '../theme/use-theme';
import { focusRefused } from './focus-refused';
import { Icon, type IconName } from './icon';
import { Text, type TextTone } from './text';
import { webAttributes } from './web-attributes';

export type WebPressState = PressableStateCallbackType & { readonly hovered?: boolean };

type Look = {
  readonly fill: keyof ThemeColors | null;
  readonly hover: keyof ThemeColors;
  readonly edge: keyof ThemeColors | null;
  readonly tone: TextTone;
  readonly icon: keyof ThemeColors;
};

const LOOKS = {
  primary: { fill: 'action', hover: 'actionHover', edge: null, tone: 'onAction', icon: 'onAction' },
  plain: { fill: 'sheet', hover: 'hover', edge: 'edge', tone: 'ink', icon: 'ink' },
  quiet: { fill: null, hover: 'hover', edge: null, tone: 'action', icon: 'action' },
  danger: { fill: 'sheet', hover: 'hover', edge: 'lacking', tone: 'lacking', icon: 'lacking' },
} as const satisfies Record<string, Look>;

export type ButtonVariant = keyof typeof LOOKS;

type ButtonProps = {
  /** What it does: shown, and read out. */
  readonly label: string;
  readonly onPress?: () => void;
  readonly variant?: ButtonVariant;
  readonly icon?: IconName;
  /** Another text to show; the label is still what is read out. */
  readonly children?: ReactNode;
  readonly disabled?: boolean;
  /** Working on it: pressed again it does nothing. */
  readonly busy?: boolean;
  readonly wide?: boolean;
  readonly describedBy?: string;
  readonly expanded?: boolean;
  readonly testID?: string;
};

/** A button with a text. The primary one sends nothing while a field of its form or dialog holds a refused text. */
export function Button({
  label,
  onPress,
  variant = 'plain',
  icon,
  children,
  disabled = false,
  busy = false,
  wide = false,
  describedBy,
  expanded,
  testID,
}: ButtonProps) {
  const { color } = useTheme();
  const look: Look = LOOKS[variant];
  const still = disabled || busy;
  return (
    <Pressable
      role="button"
      aria-label={label}
      aria-busy={busy || undefined}
      aria-expanded={expanded}
      disabled={still}
      onPress={(event) => {
        if (variant === 'primary' && focusRefused(event.currentTarget)) return;
        onPress?.();
      }}
      testID={testID}
      {...webAttributes({ 'aria-describedby': describedBy })}
      style={({ pressed, hovered }: WebPressState) => ({
        minHeight: target.min,
        minWidth: target.min,
        flexDirection: 'row',
        alignItems: 'center',
        justifyContent: 'center',
        gap: space.s,
        paddingHorizontal: space.l,
        paddingVertical: space.xs,
        borderRadius: radius.m,
        borderWidth: line.hair,
        borderColor: look.edge ? color[disabled ? 'rule' : look.edge] : 'transparent',
        borderStyle: disabled ? 'dashed' : 'solid',
        backgroundColor: fillOf(look, color, disabled, !still && (pressed || hovered === true)),
        alignSelf: wide ? 'stretch' : 'auto',
        flexShrink: 1,
      })}
    >
      {busy ? (
        <ActivityIndicator size="small" color={color[look.icon]} aria-hidden />
      ) : icon ? (
        <Icon name={icon} tone={disabled ? 'inkSoft' : look.icon} />
      ) : null}
      <View style={{ flexShrink: 1 }}>
        <Text variant="strong" tone={disabled ? 'soft' : look.tone} align="center">
          {children ?? label}
        </Text>
      </View>
    </Pressable>
  );
}

function fillOf(look: Look, color: ThemeColors, disabled: boolean, under: boolean): string {
  if (disabled) return look.fill === null ? 'transparent' : color.ground;
  if (under) return color[look.hover];
  return look.fill === null ? 'transparent' : color[look.fill];
}
