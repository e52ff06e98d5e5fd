import { useId } from 'react';
import { Pressable, View } from 'react-native';
import { line, radius, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { onSpace } from './on-space';
import { Text } from './text';
import { webAttributes } from './web-attributes';

type ChoiceProps<T extends string> = {
  readonly label: string;
  readonly value: T;
  readonly options: readonly { readonly value: T; readonly label: string }[];
  readonly onChange: (value: T) => void;
  readonly labelHidden?: boolean;
  readonly disabled?: boolean;
};

/** One of a few, side by side. */
export function Choice<T extends string>({
  label,
  value,
  options,
  onChange,
  labelHidden = false,
  disabled = false,
}: ChoiceProps<T>) {
  const { color } = useTheme();
  const labelId = useId();
  const move = (step: number) => {
    const at = options.findIndex((option) => option.value === value);
    const next = options[(at + step + options.length) % options.length];
    if (!next) return;
    onChange(next.value);
    document.getElementById(`${labelId}-${next.value}`)?.focus();
  };
  return (
    <View style={{ gap: space.xs }}>
      {labelHidden ? null : (
        <Text variant="smallStrong" id={labelId}>
          {label}
        </Text>
      )}
      <View
        role="radiogroup"
        aria-label={labelHidden ? label : undefined}
        aria-labelledby={labelHidden ? undefined : labelId}
        style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.xs }}
      >
        {options.map((option) => {
          const chosen = option.value === value;
          return (
            <Pressable
              key={option.value}
              id={`${labelId}-${option.value}`}
              role="radio"
              aria-checked={chosen}
              aria-label={option.label}
              disabled={disabled}
              onPress={() => onChange(option.value)}
              {...webAttributes({
                tabIndex: chosen && !disabled ? 0 : -1,
                onKeyDown: disabled
                  ? undefined
                  : onSpace(
                      () => onChange(option.value),
                      (event) => {
                        const step = ARROWS[event.key];
                        if (step === undefined) return;
                        event.preventDefault();
                        move(step);
                      },
                    ),
              })}
              style={({ pressed, hovered }: WebPressState) => ({
                minHeight: target.min,
                minWidth: target.min,
                flexDirection: 'row',
                gap: space.s,
                alignItems: 'center',
                justifyContent: 'center',
                paddingHorizontal: space.m,
                borderRadius: radius.m,
                borderWidth: chosen ? line.bold : line.hair,
                borderColor: chosen ? color.action : color.edge,
                backgroundColor:
                  !disabled && (pressed || hovered === true)
                    ? color.hover
                    : chosen
                      ? color.chosen
                      : color.sheet,
              })}
            >
              <Text variant={chosen ? 'strong' : 'body'} tone={chosen ? 'action' : disabled ? 'soft' : 'ink'}>
                {option.label}
              </Text>
            </Pressable>
          );
        })}
      </View>
    </View>
  );
}

const ARROWS: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };
