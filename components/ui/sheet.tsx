import { useEffect, useMemo, useState, type ReactNode } from 'react';
import { ScrollView, useWindowDimensions, View } from 'react-native';
import { duration, layer, line, measure, radius, space, target } from '../theme/tokens';
import { useReducedMotion } from '../theme/use-media';
import { useTheme } from '../theme/use-theme';
import { SHEET_STOPS, SheetDrag, type SheetStop } from './sheet-drag';
import { webAttributes, webStyle } from './web-attributes';

export type { SheetStop };

const HALF_SHARE = 0.5;
const FULL_SHARE = 0.88;
type SheetProps = {
  readonly label: string;
  readonly stop: SheetStop;
  readonly onStopChange: (stop: SheetStop) => void;
  /** Stays in view at every stop. */
  readonly head: ReactNode;
  readonly children: ReactNode;
  /** Height that is left free below it, for a bottom bar. */
  readonly bottom?: number;
  /** Height of the peek, from the head's own. */
  readonly peek?: number;
};

/**
 * A sheet from below that shares the screen with what it is about: peek, half, full. Pulled by its head, pressed there
 * (the next stop), or moved with the arrow keys on its handle.
 */
export function Sheet({
  label,
  stop,
  onStopChange,
  head,
  children,
  bottom = space.none,
  peek = measure.sheetPeek,
}: SheetProps) {
  const { color } = useTheme();
  const still = useReducedMotion();
  const { height: windowHeight } = useWindowDimensions();
  const [pulled, setPulled] = useState<number | null>(null);
  const heights = useMemo(() => {
    const room = windowHeight - bottom;
    return { peek, half: Math.max(peek, room * HALF_SHARE), full: room * FULL_SHARE };
  }, [windowHeight, bottom, peek]);

  const [drag] = useState(() => new SheetDrag(setPulled));
  useEffect(() => drag.follow({ stop, heights, onStopChange }));

  const index = SHEET_STOPS.indexOf(stop);
  const go = (to: number) => {
    const next = SHEET_STOPS[to];
    if (next) onStopChange(next);
  };

  return (
    <View
      role="region"
      aria-label={label}
      style={[
        pulled === null && !still ? webStyle({ transition: `height ${duration.sheet}ms` }) : null,
        {
          position: 'absolute',
          left: space.none,
          right: space.none,
          bottom,
          zIndex: layer.sheet,
          height: pulled ?? heights[stop],
          backgroundColor: color.sheet,
          borderTopWidth: line.hair,
          borderColor: color.edge,
          borderTopLeftRadius: radius.l,
          borderTopRightRadius: radius.l,
          overflow: 'hidden',
        },
      ]}
    >
      <View
        {...drag.handlers}
        {...webAttributes({ onClick: () => drag.press() })}
        style={[webStyle({ touchAction: 'none' }), { userSelect: 'none' }]}
      >
        <View
          role="slider"
          aria-label={`Height of ${label}`}
          {...webAttributes({
            tabIndex: 0,
            'aria-orientation': 'vertical',
            'aria-valuemin': 0,
            'aria-valuemax': SHEET_STOPS.length - 1,
            'aria-valuenow': index,
            'aria-valuetext': stop,
            onKeyDown: (event) => {
              const step = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
              if (step === 0) return;
              event.preventDefault();
              go(index + step);
            },
          })}
          style={[
            webStyle({ cursor: 'grab' }),
            { height: space.xl, alignItems: 'center', justifyContent: 'center' },
          ]}
        >
          <View
            style={{
              width: target.min,
              height: space.xs,
              borderRadius: radius.pill,
              backgroundColor: color.edge,
            }}
          />
        </View>
        {head}
      </View>
      <ScrollView
        style={{ flex: 1 }}
        contentContainerStyle={{ padding: space.l, gap: space.l }}
        aria-hidden={stop === 'peek' && pulled === null}
        {...(stop === 'peek' && pulled === null ? { inert: true } : {})}
      >
        {children}
      </ScrollView>
    </View>
  );
}
