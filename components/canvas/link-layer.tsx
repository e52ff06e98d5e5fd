import { memo } from 'react';
import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import type { ThemeColors } from '@/components/theme/themes';
import { useTheme } from '@/components/theme/use-theme';
import type { PairState } from '@/shared/estimate/estimate-result';
import { linesPath, pillPath } from './paths';
import type { PlanScene, ScenePill } from './plan-scene';
import { PlanText } from './plan-text';
import { stateMarkPaths } from './state-mark-paths';
import { textWidth } from './text-width';

/** Ink of a state; words and shapes say the same. */
const STATE_INK = {
  clear: 'ink',
  tight: 'tight',
  lacking: 'lacking',
  'not held': 'inkSoft',
  'never together': 'inkSoft',
} as const satisfies Record<PairState, keyof ThemeColors>;

const STATE_WIDTH: Readonly<Record<PairState, number>> = {
  clear: drawing.stroke.fine,
  tight: drawing.stroke.link,
  lacking: drawing.stroke.urgent,
  'not held': drawing.stroke.fine,
  'never together': drawing.stroke.fine,
};

/** Painted in this order: what matters most lies on top. */
const ORDER: readonly PairState[] = ['never together', 'not held', 'clear', 'tight', 'lacking'];

/** Lines between antennas: one path for each state. */
export function LinkLines({ lines }: Pick<PlanScene, 'lines'>) {
  const { color } = useTheme();
  return ORDER.map((state) => {
    const own = lines.filter((line) => line.state === state);
    if (own.length === 0) return null;
    const dashed = state === 'not held' || state === 'never together';
    return (
      <Path
        key={state}
        d={linesPath(own)}
        stroke={color[STATE_INK[state]]}
        strokeWidth={STATE_WIDTH[state]}
        strokeDasharray={dashed ? drawing.dash.hidden : undefined}
      />
    );
  });
}

type LinkPillsProps = {
  readonly pills: readonly ScenePill[];
  /** The pair whose details are open. */
  readonly chosenKey: string | null;
};

/** What the links say: all frames of one state in one path, then the marks, then the texts. */
export function LinkPills({ pills, chosenKey }: LinkPillsProps) {
  const { color } = useTheme();
  return (
    <>
      {ORDER.map((state) => {
        const own = pills.filter((pill) => pill.state === state);
        if (own.length === 0) return null;
        const ink = color[STATE_INK[state]];
        const marks = own.map(({ box }) =>
          stateMarkPaths(state, { x: box.left + MARK_AT, y: box.top + box.height / 2 }, drawing.pill.state),
        );
        const chosen = own.filter(({ key }) => key === chosenKey);
        return [
          <Path
            key={`${state} frames`}
            d={own.map(({ box }) => pillPath(box)).join('')}
            fill={color.surface}
            stroke={state === 'clear' ? color.edge : ink}
            strokeWidth={drawing.stroke.fine}
          />,
          chosen.length > 0 ? (
            <Path
              key={`${state} chosen`}
              d={chosen.map(({ box }) => pillPath(box)).join('')}
              fill={color.chosen}
              stroke={ink}
              strokeWidth={drawing.stroke.urgent}
            />
          ) : null,
          <Path
            key={`${state} marks`}
            d={marks.map(({ stroked }) => stroked).join('')}
            fill="none"
            stroke={ink}
            strokeWidth={drawing.stroke.mark}
          />,
          <Path key={`${state} fills`} d={marks.map(({ filled }) => filled).join('')} fill={ink} />,
        ];
      })}
      {pills.map((pill) => (
        <PillText
          key={pill.key}
          x={pill.box.left + TEXT_AT}
          y={pill.box.top + pill.box.height / 2}
          first={pill.first}
          second={pill.second}
          ink={color[STATE_INK[pill.state]]}
          soft={color.inkSoft}
        />
      ))}
    </>
  );
}

const MARK_AT = drawing.pill.side + drawing.pill.state;
const TEXT_AT = MARK_AT + drawing.pill.state + drawing.pill.gap;

type PillTextProps = {
  readonly x: number;
  readonly y: number;
  readonly first: string;
  readonly second: string | null;
  readonly ink: string;
  readonly soft: string;
};

const PillText = memo(function PillText({ x, y, first, second, ink, soft }: PillTextProps) {
  const size = drawing.text.pill;
  return (
    <>
      <PlanText x={x} y={y} text={first} color={ink} size={size} weight="strong" />
      {second === null ? null : (
        <PlanText
          x={x + textWidth(first, size, true) + drawing.pill.gap}
          y={y}
          text={second}
          color={soft}
          size={size}
        />
      )}
    </>
  );
});
