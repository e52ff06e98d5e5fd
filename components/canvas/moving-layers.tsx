import { Path } from 'react-native-svg';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import type { EditorSnapshot } from '@/components/editor/editor-snapshot';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import { boxAround } from '@/shared/geometry/box';
import type { Comment } from '@/shared/api/comments';
import type { LayoutDocument, PlacedAntenna } from '@/shared/layout/document';
import { misplacedAntennas } from '@/shared/layout/placement';
import { useMemo } from 'react';
import { AntennaLabels, AntennaMarks } from './antenna-layer';
import { BalloonLayer } from './balloon-layer';
import { dimensionAlong } from './dimension';
import { drawnLength } from './drawn-length';
import { GestureLayer } from './gesture-layer';
import type { ScreenBox } from './label-placement';
import { LinkLines, LinkPills } from './link-layer';
import { linkKey } from './links';
import { linesPath } from './paths';
import { PeopleLayer } from './people-layer';
import { DimensionMark } from './platform-layer';
import type { MarkLook } from './plan-scene';
import { RoseLayer } from './rose-layer';
import type { LengthUnit } from './round-length';
import type { SceneKeeper } from './scene-keeper';
import { useEditor } from './use-editor';
import { toScreen, type Viewport } from './viewport';

type MovingLayersProps = {
  readonly editor: LayoutEditor;
  readonly keeper: SceneKeeper;
  readonly view: Viewport;
  readonly unit: LengthUnit;
  readonly bounds: ScreenBox;
  readonly blocked: readonly ScreenBox[];
  readonly comments: readonly Comment[];
  readonly chosenComment: string | null;
  readonly chosenPair: { readonly from: string; readonly into: string } | null;
};

/** Everything of the drawing that follows a finger; the only part that is drawn anew in each frame of a drag. */
export function MovingLayers({
  editor,
  keeper,
  view,
  unit,
  bounds,
  blocked,
  comments,
  chosenComment,
  chosenPair,
}: MovingLayersProps) {
  const snapshot = useEditor(editor, (whole) => whole);
  const { document, painted, estimate, gesture, nudges } = snapshot;
  const misplaced = useMemo(
    () => (document ? misplacedAntennas(document).map(({ antenna }) => antenna.id) : []),
    [document],
  );
  const looks = useMemo(() => looksOf(gesture, nudges, misplaced), [gesture, nudges, misplaced]);
  if (!painted) return null;
  const chosen = chosenAntenna(snapshot);
  const antenna = chosen === null ? undefined : painted.antennas[chosen];
  const pattern = antenna ? estimate?.antennas[antenna.id]?.pattern : null;
  const scene = keeper.layOut({
    antennas: painted.antennas,
    estimate,
    chosen,
    looks,
    comments,
    chosenComment,
    view,
    bounds,
    blocked,
  });
  return (
    <>
      {antenna ? <DatumDimensions document={painted} antenna={antenna} view={view} unit={unit} /> : null}
      {antenna && pattern ? (
        <RoseLayer pattern={pattern} middle={toScreen(view, antenna)} turn={view.turn} />
      ) : null}
      <LinkLines lines={scene.lines} />
      {gesture ? <GestureLayer gesture={gesture} view={view} /> : null}
      <AntennaMarks marks={scene.marks} />
      <BalloonLayer balloons={scene.balloons} />
      <AntennaLabels labels={scene.labels} />
      <LinkPills
        pills={scene.pills}
        chosenKey={chosenPair ? linkKey(chosenPair.from, chosenPair.into) : null}
      />
      <PeopleLayer
        people={snapshot.people.filter(({ socketId }) => socketId !== snapshot.socketId)}
        nudges={nudges}
        view={view}
      />
    </>
  );
}

/** The antenna that links and rose are drawn for: the one under the finger, else the selected one. */
export function chosenAntenna({ gesture, selection }: EditorSnapshot): string | null {
  return gesture?.id ?? selection[0] ?? null;
}

function looksOf(
  gesture: EditorSnapshot['gesture'],
  nudges: EditorSnapshot['nudges'],
  misplaced: readonly string[],
): ReadonlyMap<string, MarkLook> {
  return new Map<string, MarkLook>([
    ...misplaced.map((id) => [id, 'misplaced'] as const),
    ...nudges.map((nudge) => [nudge.antennaId, 'others'] as const),
    ...(gesture?.ids ?? []).map((id) => [id, gesture?.problem ? 'refused' : 'carried'] as const),
  ]);
}

/** A shorter dimension is none: the antenna stands on the datum's line, m. */
const SHORTEST = 0.0005;

type DatumDimensionsProps = {
  readonly document: LayoutDocument;
  readonly antenna: PlacedAntenna;
  readonly view: Viewport;
  readonly unit: LengthUnit;
};

/** Where the chosen antenna is from the datum, as the installer will measure it. */
function DatumDimensions({ document, antenna, view, unit }: DatumDimensionsProps) {
  const { color } = useTheme();
  const box = boxAround(document.platform.outline);
  const { away } = drawing.dimension;
  const [x, y] = [antenna.x, antenna.y];
  const dimensions = [
    dimensionAlong(view, { x: 0, y: box.maxY }, { x, y: box.maxY }, 'y', away, {
      key: 'x',
      text: `${drawnLength(x, unit)} from datum`,
    }),
    dimensionAlong(view, { x: box.minX, y: 0 }, { x: box.minX, y }, 'x', -2 * away, {
      key: 'y',
      text: drawnLength(y, unit),
    }),
  ];
  const at = toScreen(view, antenna);
  const feet = [toScreen(view, { x, y: box.maxY }), toScreen(view, { x: box.minX, y })];
  return (
    <>
      <Path
        d={linesPath(feet.map((foot) => ({ x1: at.x, y1: at.y, x2: foot.x, y2: foot.y })))}
        stroke={color.dimension}
        strokeWidth={drawing.stroke.fine}
        strokeDasharray={drawing.dash.dotted}
      />
      {dimensions
        .filter((_, index) => Math.abs(index === 0 ? x : y) >= SHORTEST)
        .map((dimension) => (
          <DimensionMark key={dimension.key} dimension={dimension} />
        ))}
    </>
  );
}
