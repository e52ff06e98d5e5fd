import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import type { PatternResult } from '@/shared/estimate/estimate-result';
import { circlePath } from './paths';
import { PlanText } from './plan-text';
import { roseShapes } from './rose';
import type { ScreenPoint, Turn } from './viewport';

type RoseLayerProps = {
  readonly pattern: PatternResult;
  readonly middle: ScreenPoint;
  readonly radius?: number;
  readonly turn: Turn;
};

/** Pattern of an antenna around its place: own pattern alone dashed, the deepest bearing marked in ink. */
export function RoseLayer({ pattern, middle, radius = drawing.rose.radius, turn }: RoseLayerProps) {
  const { color } = useTheme();
  const rose = roseShapes(pattern, middle, radius, turn);
  const { stroke, dash, text } = drawing;
  return (
    <>
      <Path
        d={rose.rings.map((ring) => circlePath(middle, ring.radius)).join('')}
        fill="none"
        stroke={color.rule}
        strokeWidth={stroke.fine}
      />
      <Path d={rose.pattern} fill={color.roseFill} stroke={color.action} strokeWidth={stroke.rose} />
      <Path
        d={rose.alone}
        fill="none"
        stroke={color.inkSoft}
        strokeWidth={stroke.fine}
        strokeDasharray={dash.alone}
      />
      <Path d={rose.deepest} fill={color.ink} />
      {rose.rings.map((ring) => (
        <PlanText
          key={ring.value}
          x={middle.x + ring.radius * RING_LABEL.x}
          y={middle.y + ring.radius * RING_LABEL.y}
          text={ring.value.toFixed(1)}
          size={text.small - 2}
          color={color.inkSoft}
          anchor="middle"
        />
      ))}
    </>
  );
}

/** Ring labels stand on the diagonal, where no dimension or centre line runs. */
const RING_LABEL = { x: Math.SQRT1_2, y: -Math.SQRT1_2 };
