import { Pressable, View } from 'react-native';
import { iconSize, line, radius, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { Icon } from './icon';
import { onSpace } from './on-space';
import { Text } from './text';
import { webAttributes } from './web-attributes';

type CheckboxProps = {
  readonly label: string;
  readonly checked: boolean;
  readonly onChange: (checked: boolean) => void;
  readonly hint?: string;
  readonly disabled?: boolean;
};

/** Yes or no. */
export function Checkbox({ label, checked, onChange, hint, disabled = false }: CheckboxProps) {
  const { color } = useTheme();
  return (
    <Pressable
      role="checkbox"
      aria-checked={checked}
      aria-label={hint ? `${label}. ${hint}` : label}
      disabled={disabled}
      onPress={() => onChange(!checked)}
      {...webAttributes({ onKeyDown: disabled ? undefined : onSpace(() => onChange(!checked)) })}
      style={({ pressed, hovered }: WebPressState) => ({
        minHeight: target.min,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
        paddingVertical: space.xs,
        backgroundColor: !disabled && (pressed || hovered === true) ? color.hover : 'transparent',
      })}
    >
      <View
        style={{
          width: iconSize.l,
          height: iconSize.l,
          borderWidth: line.hair,
          borderRadius: radius.s,
          borderColor: disabled ? color.rule : checked ? color.action : color.edge,
          backgroundColor: checked ? color.action : color.sheet,
          alignItems: 'center',
          justifyContent: 'center',
        }}
      >
        {checked ? <Icon name="check" size="s" tone="onAction" /> : null}
      </View>
      <View style={{ flexShrink: 1 }}>
        <Text tone={disabled ? 'soft' : 'ink'}>{label}</Text>
        {hint ? (
          <Text variant="small" tone="soft">
            {hint}
          </Text>
        ) : null}
      </View>
    </Pressable>
  );
}
