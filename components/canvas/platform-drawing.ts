import { drawing } from '@/components/theme/drawing';
import { boxAround } from '@/shared/geometry/box';
import type { LayoutDocument, Point } from '@/shared/layout/document';
import { dimensionAlong, type Dimension } from './dimension';
import { drawnLength } from './drawn-length';
import { hatchLines } from './hatch';
import { boxAt, type ScreenBox } from './label-placement';
import { boxPath, circlePath, crossPath, linesPath, outlinePath } from './paths';
import type { LengthUnit } from './round-length';
import { fitText, textWidth } from './text-width';
import { toScreen, type ScreenPoint, type Viewport } from './viewport';

/** What of a document the fixed part of the drawing shows. */
export type DrawnPlatform = Pick<
  LayoutDocument,
  'platform' | 'surfaces' | 'obstacles' | 'keepOuts' | 'mountPoints' | 'cableEntries'
>;

/** A text on the drawing; `box` is what it covers. */
export type PlanText = {
  readonly key: string;
  readonly text: string;
  readonly at: ScreenPoint;
  readonly upright: boolean;
  readonly box: ScreenBox;
};

/** Everything of the drawing that stands still while antennas move, as paths and texts in pixels. */
export type PlatformDrawing = {
  readonly outline: string;
  readonly conducting: string;
  readonly nonConducting: string;
  readonly surfaceEdges: string;
  readonly obstacles: string;
  readonly keepOuts: string;
  readonly hatch: string;
  readonly mountPoints: string;
  readonly cableEntries: string;
  readonly centreLine: string;
  readonly datumRing: string;
  readonly datumCross: string;
  readonly forward: string;
  readonly dimensions: readonly Dimension[];
  readonly texts: readonly PlanText[];
  /** Paper under the texts on hatched areas. */
  readonly textGrounds: string;
};

/** Draws the platform as it lies on the canvas. */
export function drawPlatform(drawn: DrawnPlatform, view: Viewport, unit: LengthUnit): PlatformDrawing {
  const { platform } = drawn;
  const onScreen = (points: readonly Point[]) => points.map((point) => toScreen(view, point));
  const surfaces = Object.values(drawn.surfaces);
  const path = (points: readonly Point[]) => outlinePath(onScreen(points));
  const keepOuts = Object.values(drawn.keepOuts).map((keepOut) => onScreen(keepOut.outline));
  const datum = toScreen(view, { x: 0, y: 0 });
  const { mark } = drawing;
  const written = bodyTexts(drawn, view, unit);
  return {
    outline: path(platform.outline),
    conducting: surfaces.flatMap((surface) => (surface.conducting ? path(surface.outline) : [])).join(''),
    nonConducting: surfaces.flatMap((surface) => (surface.conducting ? [] : path(surface.outline))).join(''),
    surfaceEdges: surfaces.map((surface) => path(surface.outline)).join(''),
    obstacles: Object.values(drawn.obstacles)
      .map((obstacle) => path(obstacle.outline))
      .join(''),
    keepOuts: keepOuts.map(outlinePath).join(''),
    hatch: linesPath(keepOuts.flatMap((polygon) => hatchLines(polygon, drawing.hatch.spacing, datum))),
    mountPoints: Object.values(drawn.mountPoints)
      .map((point) => toScreen(view, point))
      .map((at) => circlePath(at, drawing.point.ring) + crossPath(at, 0, mark.ring))
      .join(''),
    cableEntries: Object.values(drawn.cableEntries)
      .map((point) => toScreen(view, point))
      .map((at) => circlePath(at, drawing.point.ring) + circlePath(at, mark.ring))
      .join(''),
    centreLine: platform.kind === 'rooftop' ? '' : centreLine(drawn, view),
    datumRing: circlePath(datum, drawing.datum.ring),
    datumCross: crossPath(datum, 0, drawing.datum.cross),
    ...forwardArrow(drawn, view, written),
    dimensions: outerDimensions(drawn, view, unit),
    textGrounds: written
      .filter(({ key }) => key in drawn.keepOuts)
      .map(({ box }) => boxPath(box))
      .join(''),
  };
}

function centreLine({ platform }: DrawnPlatform, view: Viewport): string {
  const box = boxAround(platform.outline);
  const y = (box.minY + box.maxY) / 2;
  const over = (box.maxX - box.minX) * 0.06;
  // behind, the width's dimension stands in the way
  const from = toScreen(view, { x: box.minX - drawing.mark.cross / view.scale, y });
  const to = toScreen(view, { x: box.maxX + over, y });
  return linesPath([{ x1: from.x, y1: from.y, x2: to.x, y2: to.y }]);
}

function forwardArrow(drawn: DrawnPlatform, view: Viewport, written: readonly PlanText[]) {
  const box = boxAround(drawn.platform.outline);
  const middle = (box.minY + box.maxY) / 2;
  const front = toScreen(view, { x: box.maxX, y: middle });
  const along = view.turn === 'right' ? { x: 1, y: 0 } : { x: 0, y: -1 };
  const aside = { x: along.y, y: -along.x };
  const { away } = drawing.dimension;
  // beside the centre line, where neither it nor a dimension runs
  const at = (forward: number, sideways: number): ScreenPoint => ({
    x: front.x + along.x * (away + forward) + aside.x * sideways,
    y: front.y + along.y * (away + forward) + aside.y * sideways,
  });
  const side = away;
  const shaft = { from: at(-away + 10, side), to: at(8, side) };
  const barbs = [at(0, side - 5), at(0, side + 5)];
  const lines = [
    { x1: shaft.from.x, y1: shaft.from.y, x2: shaft.to.x, y2: shaft.to.y },
    ...barbs.map((barb) => ({ x1: barb.x, y1: barb.y, x2: shaft.to.x, y2: shaft.to.y })),
  ];
  const words = drawn.platform.forwardAxis;
  const width = textWidth(words, drawing.text.small) + 4;
  const place =
    view.turn === 'right'
      ? { x: shaft.from.x + width / 2 - 2, y: shaft.from.y - 14 }
      : { x: shaft.to.x + width / 2 + 10, y: (shaft.from.y + shaft.to.y) / 2 };
  const forwardText: PlanText = {
    key: 'forward',
    text: words,
    at: place,
    upright: false,
    box: boxAt(place, width, drawing.text.small + 4),
  };
  return {
    forward: linesPath(lines),
    texts: [forwardText, ...written],
  };
}

function outerDimensions(
  { platform }: DrawnPlatform,
  view: Viewport,
  unit: LengthUnit,
): readonly Dimension[] {
  const box = boxAround(platform.outline);
  const { away } = drawing.dimension;
  return [
    // length runs on the platform's right, width behind it: forward and left stay free for the chosen antenna
    dimensionAlong(view, { x: box.minX, y: box.minY }, { x: box.maxX, y: box.minY }, 'y', -away, {
      key: 'length',
      text: drawnLength(box.maxX - box.minX, unit),
    }),
    dimensionAlong(view, { x: box.minX, y: box.minY }, { x: box.minX, y: box.maxY }, 'x', -away, {
      key: 'width',
      text: drawnLength(box.maxY - box.minY, unit),
    }),
  ];
}

function bodyTexts(drawn: DrawnPlatform, view: Viewport, unit: LengthUnit): readonly PlanText[] {
  const texts: PlanText[] = [];
  const offer = (key: string, outline: readonly Point[], wordings: readonly string[], beside: number) => {
    const text = writeInside(key, outline, wordings, beside, view);
    if (text) texts.push(text);
  };
  for (const obstacle of Object.values(drawn.obstacles)) {
    const height = `${drawnLength(obstacle.height, unit)} high`;
    offer(obstacle.id, obstacle.outline, [`${obstacle.name}, ${height}`, height], 2);
  }
  for (const keepOut of Object.values(drawn.keepOuts)) {
    offer(keepOut.id, keepOut.outline, [`${keepOut.name}: ${keepOut.reason}`, keepOut.name], BESIDE_HATCH);
  }
  return texts;
}

/** Share of a body's length that words may take when there are shorter ones. */
const FULL_SHARE = 0.75;
/** Hatch that must still be seen beside the words on it, px. */
const BESIDE_HATCH = 8;

function writeInside(
  key: string,
  outline: readonly Point[],
  wordings: readonly string[],
  beside: number,
  view: Viewport,
): PlanText | null {
  const screen = boxAround(outline.map((point) => toScreen(view, point)));
  const [width, height] = [screen.maxX - screen.minX, screen.maxY - screen.minY];
  const size = drawing.text.small;
  const middle = { x: (screen.minX + screen.maxX) / 2, y: (screen.minY + screen.maxY) / 2 };
  const upright = height > width;
  const [room, depth] = upright ? [height, width] : [width, height];
  if (depth < size + beside) return null;
  const whole =
    wordings.find((wording) => textWidth(wording, size) <= FULL_SHARE * room) ??
    wordings.slice(-1).find((wording) => textWidth(wording, size) + 6 <= room);
  const text = whole ?? (room > 60 ? fitText(wordings.at(-1) ?? '', size, room - 6) : null);
  if (text === null) return null;
  const length = textWidth(text, size) + 4;
  const [across, down] = upright ? [size + 4, length] : [length, size + 4];
  return { key, text, at: middle, upright, box: boxAt(middle, across, down) };
}
