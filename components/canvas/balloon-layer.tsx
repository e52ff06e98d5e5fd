import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import { circlePath, linesPath } from './paths';
import type { PlanScene, SceneBalloon } from './plan-scene';
import { PlanText } from './plan-text';

/** Comments as a drawing's balloons, each with a leader to what it is about. */
export function BalloonLayer({ balloons }: Pick<PlanScene, 'balloons'>) {
  const { color } = useTheme();
  if (balloons.length === 0) return null;
  const { radius } = drawing.balloon;
  const chosen = balloons.filter((balloon) => balloon.chosen);
  return (
    <>
      <Path d={linesPath(balloons.map(leader))} stroke={color.ink} strokeWidth={drawing.stroke.fine} />
      <Path d={balloons.map(({ target }) => circlePath(target, 2)).join('')} fill={color.ink} />
      <Path
        d={balloons.map(({ at }) => circlePath(at, radius)).join('')}
        fill={color.surface}
        stroke={color.ink}
        strokeWidth={drawing.stroke.link}
      />
      <Path
        d={chosen.map(({ at }) => circlePath(at, radius)).join('')}
        fill={color.chosen}
        stroke={color.action}
        strokeWidth={drawing.stroke.outline}
      />
      {balloons.map(({ id, at, number, chosen: open }) => (
        <PlanText
          key={id}
          x={at.x}
          y={at.y}
          text={String(number)}
          size={drawing.text.mark}
          weight="strong"
          color={open ? color.action : color.ink}
          anchor="middle"
        />
      ))}
    </>
  );
}

function leader({ at, target }: SceneBalloon) {
  const length = Math.hypot(target.x - at.x, target.y - at.y) || 1;
  const { radius } = drawing.balloon;
  return {
    x1: at.x + ((target.x - at.x) / length) * radius,
    y1: at.y + ((target.y - at.y) / length) * radius,
    x2: target.x,
    y2: target.y,
  };
}
