import { memo } from 'react';
import { Text } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { font } from '@/components/theme/fonts';

type PlanTextProps = {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly color: string;
  readonly size?: number;
  readonly weight?: keyof typeof font.figures;
  readonly anchor?: 'start' | 'middle' | 'end';
  readonly upright?: boolean;
};

/** Share of the letter size from a line's middle to its base. */
const BASELINE = 0.36;

/** A text of the drawing, by the middle of its line. */
export const PlanText = memo(function PlanText({
  x,
  y,
  text,
  color,
  size = drawing.text.small,
  weight = 'regular',
  anchor = 'start',
  upright = false,
}: PlanTextProps) {
  return (
    <Text
      x={x}
      y={y + (upright ? 0 : size * BASELINE)}
      dx={0}
      dy={upright ? size * BASELINE : 0}
      transform={upright ? `rotate(-90 ${x} ${y})` : undefined}
      fill={color}
      fontSize={size}
      fontFamily={font.figures[weight]}
      textAnchor={anchor}
    >
      {text}
    </Text>
  );
});
