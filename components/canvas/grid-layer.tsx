import { memo } from 'react';
import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import { linesPath } from './paths';
import { gridSpacing, type LengthUnit } from './round-length';
import type { ScreenLine } from './hatch';
import type { Size, Viewport } from './viewport';

type GridLayerProps = { readonly view: Viewport; readonly size: Size; readonly unit: LengthUnit };

/** The paper's grid: fine lines at a round length, every fifth one stronger. */
export const GridLayer = memo(function GridLayer({ view, size, unit }: GridLayerProps) {
  const { color } = useTheme();
  const { fine, bold } = gridPaths(view, size, unit);
  return (
    <>
      <Path d={fine} stroke={color.gridFine} strokeWidth={drawing.stroke.fine} />
      <Path d={bold} stroke={color.gridBold} strokeWidth={drawing.stroke.fine} />
    </>
  );
});

function gridPaths(view: Viewport, size: Size, unit: LengthUnit) {
  const step = gridSpacing(view.scale, unit) * view.scale;
  const fine: ScreenLine[] = [];
  const bold: ScreenLine[] = [];
  const each = (origin: number, length: number, line: (at: number) => ScreenLine) => {
    for (let index = Math.ceil(-origin / step); origin + index * step <= length; index++) {
      (index % 5 === 0 ? bold : fine).push(line(Math.round(origin + index * step) + 0.5));
    }
  };
  each(view.originX, size.width, (at) => ({ x1: at, y1: 0, x2: at, y2: size.height }));
  each(view.originY, size.height, (at) => ({ x1: 0, y1: at, x2: size.width, y2: at }));
  return { fine: linesPath(fine), bold: linesPath(bold) };
}
