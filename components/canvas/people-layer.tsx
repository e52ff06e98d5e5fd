import { Path } from 'react-native-svg';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import type { OthersNudge } from '@/components/editor/editor-snapshot';
import type { PersonHere } from '@/shared/api/live';
import { boxPath, circlePath, crossPath } from './paths';
import { boxAt } from './label-placement';
import { PlanText } from './plan-text';
import { textWidth } from './text-width';
import { toScreen, type Viewport } from './viewport';

type PeopleLayerProps = {
  /** The others who look at the plan; oneself is left out. */
  readonly people: readonly PersonHere[];
  readonly nudges: readonly OthersNudge[];
  readonly view: Viewport;
};

/** Other people as crosshairs with their initials, and what they drag with whose hand it is in. */
export function PeopleLayer({ people, nudges, view }: PeopleLayerProps) {
  const { color } = useTheme();
  const crosshairs = people.flatMap((person) =>
    person.cursor
      ? [{ key: person.socketId, initials: person.initials, at: toScreen(view, person.cursor) }]
      : [],
  );
  const carried = nudges.map((nudge) => ({
    key: `${nudge.socketId} ${nudge.antennaId}`,
    words: nudge.inDocument ? nudge.initials : `${nudge.label} ${nudge.initials}`,
    at: toScreen(view, nudge),
    ghost: !nudge.inDocument,
  }));
  if (crosshairs.length === 0 && carried.length === 0) return null;
  const { reach, hole } = drawing.crosshair;
  const { text, stroke, mark } = drawing;
  const tags = [
    ...crosshairs.map(({ key, initials, at }) => ({
      key,
      words: initials,
      x: at.x + hole + 3,
      y: at.y - 11,
    })),
    ...carried.map(({ key, words, at }) => ({ key, words, x: at.x + mark.cross + 2, y: at.y + 14 })),
  ];
  return (
    <>
      <Path
        d={crosshairs.map(({ at }) => crossPath(at, hole, reach)).join('')}
        stroke={color.ink}
        strokeWidth={stroke.link}
      />
      <Path
        d={carried
          .map(({ at, ghost }) => circlePath(at, mark.cross + 3) + (ghost ? circlePath(at, mark.ring) : ''))
          .join('')}
        fill="none"
        stroke={color.ink}
        strokeWidth={stroke.fine}
        strokeDasharray={drawing.dash.alone}
      />
      <Path
        d={tags
          .map(({ words, x, y }) => {
            const width = textWidth(words, text.small, true) + 6;
            return boxPath(boxAt({ x: x + width / 2 - 3, y }, width, text.small + 4));
          })
          .join('')}
        fill={color.ink}
      />
      {tags.map(({ key, words, x, y }) => (
        <PlanText key={key} x={x} y={y} text={words} size={text.small} weight="strong" color={color.ground} />
      ))}
    </>
  );
}
