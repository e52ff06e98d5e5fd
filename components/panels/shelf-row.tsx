import { useEffect, useRef } from 'react';
import { Pressable, View } from 'react-native';
import type { PointerSource } from '@/components/canvas/gesture-surface';
import type { ShelfPart } from '@/components/editor/editor-snapshot';
import { line, space, target } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import type { WebPressState } from '@/components/ui/button';
import { Icon } from '@/components/ui/icon';
import { Text } from '@/components/ui/text';
import { webStyle } from '@/components/ui/web-attributes';
import type { AntennaPart } from '@/shared/layout/document';
import { frequencyText } from './estimate-words';

type ShelfRowProps = {
  readonly part: AntennaPart;
  readonly disabled: boolean;
  readonly onPull: (part: ShelfPart, pointer: PointerSource) => void;
  readonly onPlace: (part: ShelfPart) => void;
};

/** How far a part must be pulled before it comes along, px. */
const PULL = 6;

/**
 * A part of the shelf. The mark at its left is the grip: it can be pulled in any direction with a finger, while the
 * rest of the row still scrolls the shelf.
 */
export function ShelfRow({ part, disabled, onPull, onPlace }: ShelfRowProps) {
  const { color } = useTheme();
  const row = useRef<View>(null);
  const pulled = useRef(false);
  const shelfPart: ShelfPart = { name: part.name, part };
  const latest = useRef({ onPull, shelfPart, disabled });
  useEffect(() => {
    latest.current = { onPull, shelfPart, disabled };
  });

  useEffect(() => {
    const element = row.current as unknown as HTMLElement | null;
    if (!element) return;
    return watchPull(element, (pointer) => {
      if (latest.current.disabled) return;
      pulled.current = true;
      latest.current.onPull(latest.current.shelfPart, pointer);
    });
  }, []);

  const place = () => {
    // the release that ends a pull is not a press
    if (pulled.current) pulled.current = false;
    else onPlace(shelfPart);
  };
  return (
    <View role="listitem" ref={row} style={webStyle({ touchAction: 'pan-y' })}>
      <Pressable
        role="button"
        aria-label={`Place ${part.name}, ${describePart(part)}`}
        disabled={disabled}
        onPressIn={() => {
          pulled.current = false;
        }}
        onPress={place}
        style={({ pressed, hovered }: WebPressState) => [
          webStyle({ cursor: disabled ? 'default' : 'grab' }),
          {
            minHeight: target.min,
            flexDirection: 'row',
            alignItems: 'center',
            borderBottomWidth: line.hair,
            borderColor: color.rule,
            userSelect: 'none',
            backgroundColor: !disabled && (pressed || hovered === true) ? color.hover : 'transparent',
          },
        ]}
      >
        <View
          style={[
            webStyle({ touchAction: 'none' }),
            {
              width: target.min,
              height: target.min,
              marginLeft: -space.m,
              alignItems: 'center',
              justifyContent: 'center',
            },
          ]}
        >
          <Icon name="antenna" tone={disabled ? 'inkSoft' : 'ink'} />
        </View>
        <View style={{ flex: 1, minWidth: space.none }}>
          <Text variant="smallFigures" numberOfLines={1}>
            {part.name}
          </Text>
          <Text variant="caption" tone="soft" numberOfLines={1}>
            {describePart(part)}
          </Text>
        </View>
      </Pressable>
    </View>
  );
}

/** A part in a few words: frequency, number of elements, or that it is not computed yet. */
export function describePart({ elements }: AntennaPart): string {
  const first = elements[0];
  if (!first) return 'no element';
  if (elements.length > 1) return `${elements.length} elements`;
  if (first.kind === 'declared')
    return `${frequencyText((first.band.from + first.band.to) / 2)}, not computed yet`;
  if (first.quarterWaveAt !== null) return frequencyText(first.quarterWaveAt);
  return `${Math.round(first.length * 1000)} mm`;
}

/** Calls once when a pointer that went down on the element has moved away from where it did. */
function watchPull(element: HTMLElement, onPull: (pointer: PointerSource) => void): () => void {
  let start: { id: number; x: number; y: number } | null = null;
  const down = (event: PointerEvent) => {
    if (event.button === 0) start = { id: event.pointerId, x: event.clientX, y: event.clientY };
  };
  const move = (event: PointerEvent) => {
    if (!start || event.pointerId !== start.id) return;
    if (Math.hypot(event.clientX - start.x, event.clientY - start.y) < PULL) return;
    start = null;
    onPull(event);
  };
  const end = (event: PointerEvent) => {
    if (event.pointerId === start?.id) start = null;
  };
  element.addEventListener('pointerdown', down);
  window.addEventListener('pointermove', move);
  window.addEventListener('pointerup', end);
  window.addEventListener('pointercancel', end);
  return () => {
    element.removeEventListener('pointerdown', down);
    window.removeEventListener('pointermove', move);
    window.removeEventListener('pointerup', end);
    window.removeEventListener('pointercancel', end);
  };
}
