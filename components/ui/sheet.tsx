import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { PanResponder, ScrollView, useWindowDimensions, View } from 'react-native';
import { duration, layer, line, measure, radius, space, target } from '../theme/tokens';
import { useReducedMotion } from '../theme/use-media';
import { useTheme } from '../theme/use-theme';
import { webAttributes, webStyle } from './web-attributes';

export type SheetStop = 'peek' | 'half' | 'full';

const ORDER: readonly SheetStop[] = ['peek', 'half', 'full'];
const HALF_SHARE = 0.5;
const FULL_SHARE = 0.88;
/** A flick faster than this (px per ms) goes to the next stop whatever the distance. */
const FLICK = 0.4;

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

/** A sheet from below that shares the screen with what it is about: peek, half, full. */
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

  const latest = useRef({ stop, heights, onStopChange });
  useEffect(() => {
    latest.current = { stop, heights, onStopChange };
  });
  const [responder] = useState(() =>
    PanResponder.create({
      onMoveShouldSetPanResponder: (_, { dy }) => Math.abs(dy) > space.xs,
      onPanResponderMove: (_, { dy }) => {
        const { heights: h, stop: s } = latest.current;
        setPulled(Math.min(h.full, Math.max(h.peek, h[s] - dy)));
      },
      onPanResponderRelease: (_, { dy, vy }) => {
        const { heights: h, stop: s, onStopChange: change } = latest.current;
        setPulled(null);
        const at = ORDER.indexOf(s);
        const flicked = Math.abs(vy) > FLICK ? ORDER[at + (vy < 0 ? 1 : -1)] : undefined;
        change(flicked ?? nearestStop(h[s] - dy, h));
      },
      onPanResponderTerminate: () => setPulled(null),
    }),
  );

  const index = ORDER.indexOf(stop);
  const go = (to: number) => {
    const next = ORDER[to];
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
      <View {...responder.panHandlers} style={webStyle({ touchAction: 'none' })}>
        <View
          role="slider"
          aria-label={`Height of ${label}`}
          {...webAttributes({
            tabIndex: 0,
            'aria-orientation': 'vertical',
            'aria-valuemin': 0,
            'aria-valuemax': ORDER.length - 1,
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

function nearestStop(height: number, heights: Readonly<Record<SheetStop, number>>): SheetStop {
  return ORDER.reduce((best, candidate) =>
    Math.abs(heights[candidate] - height) < Math.abs(heights[best] - height) ? candidate : best,
  );
}
