import Svg, { Path } from 'react-native-svg';
import { line, measure } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { boxAround } from '@/shared/geometry/box';
import type { LayoutDocument, Point } from '@/shared/layout/document';
import { outlinePath } from './paths';
import { betterTurn, fitBox, toScreen } from './viewport';

type PlatformPreviewProps = {
  readonly document: Pick<LayoutDocument, 'platform' | 'obstacles' | 'keepOuts'>;
  readonly width?: number;
  readonly height?: number;
};

const MARGIN = 6;

/** A platform as a small picture: outline, obstacles, keep-outs; without numbers. */
export function PlatformPreview({
  document,
  width = measure.preview,
  height = measure.preview,
}: PlatformPreviewProps) {
  const { color } = useTheme();
  const { platform, obstacles, keepOuts } = document;
  const box = boxAround(platform.outline);
  const size = { width, height };
  const insets = { top: MARGIN, right: MARGIN, bottom: MARGIN, left: MARGIN };
  const view = fitBox(box, size, insets, betterTurn(box, size, insets));
  const path = (points: readonly Point[]) => outlinePath(points.map((point) => toScreen(view, point)));
  return (
    <Svg width={width} height={height} aria-hidden>
      <Path d={path(platform.outline)} fill={color.surface} stroke={color.ink} strokeWidth={line.mark} />
      {Object.values(keepOuts).map(({ id, outline }) => (
        <Path
          key={id}
          d={path(outline)}
          fill="none"
          stroke={color.hatch}
          strokeWidth={line.hair}
          strokeDasharray={[3, 2]}
        />
      ))}
      {Object.values(obstacles).map(({ id, outline }) => (
        <Path key={id} d={path(outline)} fill={color.obstacle} stroke={color.ink} strokeWidth={line.hair} />
      ))}
    </Svg>
  );
}
