import { useEffect, useId, useState, type ReactElement } from 'react';
import { Modal, Pressable, View } from 'react-native';
import { line, measure, radius, space, target } from '../theme/tokens';
import { useSizeClass } from '../theme/use-size-class';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { Icon, type IconName } from './icon';
import { IconButton } from './icon-button';
import { onSpace } from './on-space';
import { Text } from './text';
import { webAttributes } from './web-attributes';

export type MenuItem = {
  readonly label: string;
  readonly icon?: IconName;
  readonly onPress: () => void;
  readonly dangerous?: boolean;
  readonly disabled?: boolean;
};

type MenuProps = {
  /** What the menu is about. */
  readonly label: string;
  readonly items: readonly MenuItem[];
  readonly icon?: IconName;
  /** Another thing to press; it must call `open` and show `expanded`. */
  readonly trigger?: (open: () => void, expanded: boolean) => ReactElement;
};

type Place = { readonly top: number; readonly right: number };

/** A few things to do, behind one button: by it, or from below on a phone. */
export function Menu({ label, items, icon = 'more', trigger }: MenuProps) {
  const { color } = useTheme();
  const phone = useSizeClass() === 'phone';
  const menuId = useId();
  const [anchor, setAnchor] = useState<View | null>(null);
  const [place, setPlace] = useState<Place | null>(null);

  const open = () => {
    anchor?.measureInWindow((x, y, width, height) => {
      const roomBelow = globalThis.innerHeight - y - height;
      const needed = items.length * target.min + space.l;
      setPlace({
        top: roomBelow > needed ? y + height + space.xs : Math.max(space.s, y - needed),
        right: Math.max(space.s, globalThis.innerWidth - x - width),
      });
    });
  };
  const close = () => setPlace(null);
  const choose = (item: MenuItem) => {
    if (item.disabled) return;
    close();
    item.onPress();
  };

  useEffect(() => {
    if (!place) return;
    document.getElementById(`${menuId}-0`)?.focus();
  }, [place, menuId]);

  const focusItem = (index: number) => {
    document.getElementById(`${menuId}-${(index + items.length) % items.length}`)?.focus();
  };

  return (
    <View ref={setAnchor} collapsable={false}>
      {trigger ? (
        trigger(open, place !== null)
      ) : (
        <IconButton label={label} icon={icon} popup="menu" expanded={place !== null} onPress={open} />
      )}
      {place ? (
        <Modal visible transparent animationType="none" onRequestClose={close} aria-label={label}>
          <Pressable
            aria-hidden
            onPress={close}
            {...webAttributes({ tabIndex: -1 })}
            style={{
              position: 'absolute',
              inset: space.none,
              cursor: 'auto',
              backgroundColor: phone ? color.scrim : 'transparent',
            }}
          />
          <View
            role="menu"
            aria-label={label}
            style={[
              {
                position: 'absolute',
                minWidth: measure.menu,
                paddingVertical: space.xs,
                backgroundColor: color.sheet,
                borderWidth: line.hair,
                borderColor: color.edge,
                borderRadius: radius.m,
              },
              phone
                ? { left: space.none, right: space.none, bottom: space.none, paddingBottom: space.l }
                : { top: place.top, right: place.right },
            ]}
          >
            {items.map((item, index) => (
              <Pressable
                key={item.label}
                id={`${menuId}-${index}`}
                role="menuitem"
                aria-label={item.label}
                disabled={item.disabled}
                onPress={() => choose(item)}
                {...webAttributes({
                  tabIndex: index === 0 ? 0 : -1,
                  onKeyDown: onSpace(
                    () => choose(item),
                    (event) => {
                      const to = KEYS[event.key]?.(index, items.length);
                      if (to === undefined) return;
                      event.preventDefault();
                      focusItem(to);
                    },
                  ),
                })}
                style={({ pressed, hovered }: WebPressState) => ({
                  minHeight: target.min,
                  flexDirection: 'row',
                  alignItems: 'center',
                  gap: space.m,
                  paddingHorizontal: space.l,
                  backgroundColor:
                    !item.disabled && (pressed || hovered === true) ? color.hover : 'transparent',
                })}
              >
                {item.icon ? (
                  <Icon
                    name={item.icon}
                    tone={item.disabled ? 'edge' : item.dangerous ? 'lacking' : 'inkSoft'}
                  />
                ) : null}
                <Text tone={item.disabled ? 'soft' : item.dangerous ? 'lacking' : 'ink'}>{item.label}</Text>
              </Pressable>
            ))}
          </View>
        </Modal>
      ) : null}
    </View>
  );
}

const KEYS: Readonly<Record<string, (index: number, count: number) => number>> = {
  ArrowDown: (index) => index + 1,
  ArrowUp: (index) => index - 1,
  Home: () => 0,
  End: (_, count) => count - 1,
};
