import { Pressable } from 'react-native';
import { line, radius, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { Icon, type IconName } from './icon';
import { webAttributes } from './web-attributes';

type IconButtonProps = {
  /** What it does: read out, and shown when the pointer rests on it. */
  readonly label: string;
  readonly icon: IconName;
  readonly onPress?: () => void;
  readonly disabled?: boolean;
  readonly framed?: boolean;
  readonly pressed?: boolean;
  readonly expanded?: boolean;
  readonly popup?: 'menu' | 'dialog';
  readonly testID?: string;
};

/** A button that is only an icon. */
export function IconButton({
  label,
  icon,
  onPress,
  disabled = false,
  framed = false,
  pressed: chosen,
  expanded,
  popup,
  testID,
}: IconButtonProps) {
  const { color } = useTheme();
  return (
    <Pressable
      role="button"
      aria-label={label}
      aria-expanded={expanded}
      disabled={disabled}
      onPress={onPress}
      testID={testID}
      {...webAttributes({ 'aria-haspopup': popup, 'aria-pressed': chosen, dataSet: { tip: label } })}
      style={({ pressed, hovered }: WebPressState) => ({
        width: target.min,
        height: target.min,
        alignItems: 'center',
        justifyContent: 'center',
        borderRadius: radius.m,
        borderWidth: line.hair,
        borderColor: framed ? color[disabled ? 'rule' : 'edge'] : 'transparent',
        backgroundColor:
          !disabled && (pressed || hovered === true)
            ? color.hover
            : chosen
              ? color.chosen
              : framed
                ? color.sheet
                : 'transparent',
      })}
    >
      <Icon name={icon} tone={disabled ? 'edge' : 'ink'} />
    </Pressable>
  );
}
