import { memo } from 'react';
import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import { boxPath } from './paths';
import { PlanText } from './plan-text';
import type { PlatformDrawing } from './platform-drawing';

const { stroke, dash } = drawing;

/** The platform as a workshop drawing; drawn anew only when it or the view changes. */
export const PlatformLayer = memo(function PlatformLayer({ drawn }: { readonly drawn: PlatformDrawing }) {
  const { color } = useTheme();
  return (
    <>
      <Path d={drawn.conducting} fill={color.surface} />
      <Path
        d={drawn.nonConducting}
        fill={color.surface}
        stroke={color.edge}
        strokeWidth={stroke.fine}
        strokeDasharray={dash.hidden}
      />
      <Path d={drawn.surfaceEdges} fill="none" stroke={color.rule} strokeWidth={stroke.fine} />
      <Path d={drawn.hatch} stroke={color.hatch} strokeWidth={stroke.fine} />
      <Path
        d={drawn.keepOuts}
        fill="none"
        stroke={color.dimension}
        strokeWidth={stroke.fine}
        strokeDasharray={dash.hidden}
      />
      <Path d={drawn.obstacles} fill={color.obstacle} stroke={color.ink} strokeWidth={stroke.link} />
      <Path d={drawn.outline} fill="none" stroke={color.ink} strokeWidth={stroke.outline} />
      <Path
        d={drawn.centreLine}
        stroke={color.dimension}
        strokeWidth={stroke.fine}
        strokeDasharray={dash.centre}
      />
      <Path d={drawn.mountPoints} fill="none" stroke={color.dimension} strokeWidth={stroke.fine} />
      <Path d={drawn.cableEntries} fill="none" stroke={color.dimension} strokeWidth={stroke.link} />
      <Path d={drawn.datumRing} fill={color.surface} stroke={color.ink} strokeWidth={stroke.link} />
      <Path d={drawn.datumCross} stroke={color.ink} strokeWidth={stroke.link} />
      <Path d={drawn.forward} fill="none" stroke={color.ink} strokeWidth={stroke.link} />
      <Path d={drawn.textGrounds} fill={color.surface} />
      {drawn.texts.map((text) => (
        <PlanText
          key={text.key}
          x={text.at.x}
          y={text.at.y}
          text={text.text}
          upright={text.upright}
          color={text.key === 'forward' ? color.ink : color.inkSoft}
          anchor="middle"
        />
      ))}
      {drawn.dimensions.map((dimension) => (
        <DimensionMark key={dimension.key} dimension={dimension} />
      ))}
    </>
  );
});

type DimensionMarkProps = { readonly dimension: PlatformDrawing['dimensions'][number] };

/** A dimension with its text on the ground of the paper. */
export const DimensionMark = memo(function DimensionMark({ dimension }: DimensionMarkProps) {
  const { color } = useTheme();
  return (
    <>
      <Path d={dimension.path} stroke={color.dimension} strokeWidth={stroke.fine} />
      <Path d={boxPath(dimension.box)} fill={color.ground} />
      <PlanText
        x={dimension.at.x}
        y={dimension.at.y}
        text={dimension.text}
        upright={dimension.upright}
        color={color.inkSoft}
        anchor="middle"
      />
    </>
  );
});
