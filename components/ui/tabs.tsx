import { useId, type ReactNode } from 'react';
import { Pressable, View } from 'react-native';
import { line, measure, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { Text } from './text';
import { webAttributes } from './web-attributes';

export type Tab<K extends string> = { readonly key: K; readonly label: string; readonly count?: number };

type TabsProps<K extends string> = {
  readonly label: string;
  readonly tabs: readonly Tab<K>[];
  readonly active: K;
  readonly onChange: (key: K) => void;
  /** Along the lower edge of a phone: equal widths, the line above. */
  readonly bottom?: boolean;
  /** Given: the panel of the active tab is rendered below and tied to it. */
  readonly children?: ReactNode;
};

/** Several views in one place. */
export function Tabs<K extends string>({
  label,
  tabs,
  active,
  onChange,
  bottom = false,
  children,
}: TabsProps<K>) {
  const { color } = useTheme();
  const id = useId();
  const move = (to: number) => {
    const tab = tabs[(to + tabs.length) % tabs.length];
    if (!tab) return;
    onChange(tab.key);
    document.getElementById(`${id}-${tab.key}`)?.focus();
  };
  const list = (
    <View
      role="tablist"
      aria-label={label}
      style={{
        flexDirection: 'row',
        gap: bottom ? space.none : tabs.length > 3 ? space.xs : space.l,
        backgroundColor: color.sheet,
        borderColor: color.rule,
        ...(bottom
          ? { borderTopWidth: line.hair, minHeight: measure.bottomBar }
          : { borderBottomWidth: line.hair }),
      }}
    >
      {tabs.map((tab, index) => {
        const chosen = tab.key === active;
        return (
          <Pressable
            key={tab.key}
            id={`${id}-${tab.key}`}
            role="tab"
            aria-selected={chosen}
            aria-label={tab.count === undefined ? tab.label : `${tab.label}, ${tab.count}`}
            onPress={() => onChange(tab.key)}
            {...webAttributes({
              tabIndex: chosen ? 0 : -1,
              'aria-controls': children === undefined ? undefined : `${id}-panel`,
              onKeyDown: (event) => {
                const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
                if (step === 0) return;
                event.preventDefault();
                move(index + step);
              },
            })}
            style={({ pressed, hovered }: WebPressState) => ({
              minHeight: target.min,
              minWidth: target.min,
              flex: bottom ? 1 : undefined,
              alignItems: 'center',
              justifyContent: 'center',
              paddingHorizontal: bottom ? space.none : space.xs,
              borderColor: chosen ? color.action : 'transparent',
              ...(bottom ? { borderTopWidth: line.bold } : { borderBottomWidth: line.bold }),
              backgroundColor: pressed || hovered === true ? color.hover : 'transparent',
            })}
          >
            <Text variant={chosen ? 'smallFiguresStrong' : 'smallFigures'} tone={chosen ? 'action' : 'ink'}>
              {tab.count === undefined ? tab.label : `${tab.label} ${tab.count}`}
            </Text>
          </Pressable>
        );
      })}
    </View>
  );
  if (children === undefined) return list;
  return (
    <>
      {list}
      <View
        role="tabpanel"
        id={`${id}-panel`}
        {...webAttributes({ 'aria-labelledby': `${id}-${active}` })}
        style={{ flex: 1 }}
      >
        {children}
      </View>
    </>
  );
}
