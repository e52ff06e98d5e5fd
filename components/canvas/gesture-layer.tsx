import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import type { Distance, Gesture } from '@/components/editor/editor-snapshot';
import { linesPath } from './paths';
import type { ScreenLine } from './hatch';
import { toScreen, type Viewport } from './viewport';
import type { Point } from '@/shared/layout/document';

type GestureLayerProps = { readonly gesture: Gesture; readonly view: Viewport };

/** What appears while an antenna is carried: the lines it snaps to, and its distances to the nearest edges. */
export function GestureLayer({ gesture, view }: GestureLayerProps) {
  const { color } = useTheme();
  const line = (from: Point, to: Point): ScreenLine => {
    const [a, b] = [toScreen(view, from), toScreen(view, to)];
    return { x1: a.x, y1: a.y, x2: b.x, y2: b.y };
  };
  const { stroke, dash } = drawing;
  return (
    <>
      <Path
        d={linesPath(gesture.guides.map(({ from, to }) => line(from, to)))}
        stroke={color.action}
        strokeWidth={stroke.fine}
        strokeDasharray={dash.hidden}
      />
      <Path
        d={linesPath(gesture.distances.filter(isToEdge).map(({ from, end }) => line(from, end)))}
        stroke={color.dimension}
        strokeWidth={stroke.fine}
        strokeDasharray={dash.dotted}
      />
    </>
  );
}

function isToEdge({ to }: Distance): boolean {
  return to.kind === 'edge';
}
