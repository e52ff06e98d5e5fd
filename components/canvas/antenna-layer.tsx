import { memo } from 'react';
import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import type { ThemeColors } from '@/components/theme/themes';
import { useTheme } from '@/components/theme/use-theme';
import { boxPath, circlePath, crossPath, linesPath } from './paths';
import { boxAt } from './label-placement';
import type { MarkLook, PlanScene, SceneLabel, SceneMark } from './plan-scene';
import { PlanText } from './plan-text';
import { textWidth } from './text-width';

const LOOK_INK = {
  plain: 'ink',
  chosen: 'action',
  carried: 'action',
  refused: 'lacking',
  misplaced: 'lacking',
  others: 'inkSoft',
} as const satisfies Record<MarkLook, keyof ThemeColors>;

const ORDER: readonly MarkLook[] = ['plain', 'others', 'misplaced', 'chosen', 'carried', 'refused'];

/** Antennas as a drawing's hole-centre marks; all of one look in one path. */
export function AntennaMarks({ marks }: Pick<PlanScene, 'marks'>) {
  const { color } = useTheme();
  return ORDER.map((look) => {
    const own = marks.filter((mark) => mark.look === look);
    if (own.length === 0) return null;
    const ink = color[LOOK_INK[look]];
    return [
      <Path
        key={`${look} rings`}
        d={own.map(ringPath).join('')}
        fill={color.surface}
        stroke={ink}
        strokeWidth={drawing.stroke.mark}
        strokeDasharray={look === 'others' ? drawing.dash.alone : undefined}
      />,
      <Path
        key={`${look} strokes`}
        d={own.map((mark) => strokesPath(mark, look)).join('')}
        fill="none"
        stroke={ink}
        strokeWidth={drawing.stroke.mark}
      />,
      <Path
        key={`${look} dots`}
        d={own.map(({ at }) => circlePath(at, drawing.mark.dot)).join('')}
        fill={ink}
      />,
    ];
  });
}

/** Marks A1, A2 ... and names, on the paper of the plan so that lines stop before them. */
export function AntennaLabels({ labels }: Pick<PlanScene, 'labels'>) {
  const { color } = useTheme();
  return (
    <>
      <Path d={labels.map(({ box }) => boxPath(box)).join('')} fill={color.surface} fillOpacity={0.82} />
      {labels.map((label) => (
        <LabelText key={label.id} label={label} ink={color[LOOK_INK[label.look]]} soft={color.inkSoft} />
      ))}
    </>
  );
}

type LabelTextProps = { readonly label: SceneLabel; readonly ink: string; readonly soft: string };

const LabelText = memo(
  function LabelText({ label, ink, soft }: LabelTextProps) {
    const size = drawing.text.mark;
    const [x, y] = [label.box.left + 3, label.box.top + label.box.height / 2];
    return (
      <>
        <PlanText x={x} y={y} text={label.label} color={ink} size={size} weight="strong" />
        {label.name === null ? null : (
          <PlanText
            x={x + textWidth(label.label, size, true) + 4}
            y={y}
            text={label.name}
            color={soft}
            size={size}
          />
        )}
      </>
    );
  },
  (before, after) =>
    before.ink === after.ink &&
    before.soft === after.soft &&
    before.label.label === after.label.label &&
    before.label.name === after.label.name &&
    before.label.box.left === after.label.box.left &&
    before.label.box.top === after.label.box.top,
);

function ringPath({ at, declared }: SceneMark): string {
  const side = 2 * drawing.mark.ring;
  return declared ? boxPath(boxAt(at, side, side)) : circlePath(at, drawing.mark.ring);
}

function strokesPath({ at, lean }: SceneMark, look: MarkLook): string {
  const { ring, cross, halo } = drawing.mark;
  const parts = [crossPath(at, ring - 3, cross)];
  if (look === 'chosen' || look === 'carried') parts.push(circlePath(at, halo));
  if (look === 'refused' || look === 'misplaced') {
    const r = halo;
    parts.push(
      linesPath([
        { x1: at.x - r, y1: at.y - r, x2: at.x + r, y2: at.y + r },
        { x1: at.x - r, y1: at.y + r, x2: at.x + r, y2: at.y - r },
      ]),
    );
  }
  if (lean) {
    parts.push(linesPath([{ x1: at.x, y1: at.y, x2: at.x + lean.x, y2: at.y + lean.y }]));
  }
  return parts.join('');
}
