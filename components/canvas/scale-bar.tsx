import { memo } from 'react';
import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import { readLength } from './drawn-length';
import { linesPath } from './paths';
import { PlanText } from './plan-text';
import { scaleBarLength, type LengthUnit } from './round-length';

type ScaleBarProps = {
  readonly scale: number;
  readonly unit: LengthUnit;
  readonly x: number;
  readonly y: number;
};

/** A round length at the drawing's scale. */
export const ScaleBar = memo(function ScaleBar({ scale, unit, x, y }: ScaleBarProps) {
  const { color } = useTheme();
  const { room, tick } = drawing.scaleBar;
  const length = scaleBarLength(scale, room, unit);
  const width = length * scale;
  const mark = (at: number, reach: number) => ({ x1: x + at, y1: y - reach, x2: x + at, y2: y + reach });
  return (
    <>
      <Path
        d={linesPath([
          { x1: x, y1: y, x2: x + width, y2: y },
          mark(0, tick),
          mark(width / 2, tick / 2),
          mark(width, tick),
        ])}
        stroke={color.ink}
        strokeWidth={drawing.stroke.link}
      />
      <PlanText x={x + width + 8} y={y} text={readLength(length, unit)} color={color.inkSoft} />
    </>
  );
});
