import { createId } from '@/shared/ids';
import type { LayoutDocument, PlacedAntenna, Point } from '@/shared/layout/document';
import { nextLabel } from '@/shared/layout/labels';
import type { Change } from '@/shared/layout/operation';
import { placementProblem } from '@/shared/layout/placement';
import { distancesFrom } from './distances';
import type { Gesture, ShelfPart } from './editor-snapshot';
import { snapSpot, type SnapOptions } from './snap-spot';

/** A gesture with what the editor has to know of it beyond what is shown. */
export type ActiveGesture = {
  readonly shown: Gesture;
  /** From the pointer to the antenna's position, so that it does not jump under the finger. */
  readonly grab: Point;
  /** Where each antenna stood at the start. */
  readonly starts: Readonly<Record<string, Point>>;
  /** The antenna that a part from the shelf becomes. */
  readonly fresh: PlacedAntenna | null;
  /** A part from the shelf has been over the platform. */
  readonly hasMoved: boolean;
};

/** Positions closer than this are the same: a micrometre. */
const SAME_PLACE = 1e-6;

/** Takes standing antennas under the finger (or the keys); `id` is the one that is held. */
export function holdAntennas(
  document: LayoutDocument,
  kind: 'drag' | 'keys',
  id: string,
  ids: readonly string[],
  pointer: Point,
): ActiveGesture | null {
  const antenna = Object.hasOwn(document.antennas, id) ? document.antennas[id] : undefined;
  if (!antenna) return null;
  const held = [id, ...ids.filter((one) => one !== id && Object.hasOwn(document.antennas, one))];
  const start = { x: antenna.x, y: antenna.y };
  const shown: Gesture = {
    kind,
    id,
    ids: held,
    point: start,
    start,
    label: antenna.label,
    part: null,
    problem: null,
    guides: [],
    distances: distancesFrom(document, antenna, start, { without: held }),
  };
  const starts = Object.fromEntries(held.map((one) => [one, placeOf(document, one)]));
  return {
    shown,
    grab: { x: start.x - pointer.x, y: start.y - pointer.y },
    starts,
    fresh: null,
    hasMoved: false,
  };
}

/** Takes a part from the shelf under the finger. */
export function holdPart(
  document: LayoutDocument,
  part: ShelfPart,
  pointer: Point,
  reservedLabels: readonly string[],
): ActiveGesture {
  const fresh = freshAntenna(document, part, pointer, reservedLabels);
  const shown: Gesture = {
    kind: 'place',
    id: fresh.id,
    ids: [fresh.id],
    point: pointer,
    start: pointer,
    label: fresh.label,
    part,
    problem: problemAt(document, fresh, pointer),
    guides: [],
    distances: [],
  };
  return { shown, grab: { x: 0, y: 0 }, starts: { [fresh.id]: pointer }, fresh, hasMoved: false };
}

/** The gesture with its antenna at (or snapped near) the pointer. */
export function moveTo(
  document: LayoutDocument,
  gesture: ActiveGesture,
  pointer: Point,
  options: SnapOptions,
): ActiveGesture {
  const wanted = { x: pointer.x + gesture.grab.x, y: pointer.y + gesture.grab.y };
  const { point, guides } = snapSpot(document, wanted, gesture.shown.ids, options);
  return placeAt(document, gesture, point, guides);
}

/** The gesture with its antenna exactly at a point. */
export function placeAt(
  document: LayoutDocument,
  gesture: ActiveGesture,
  point: Point,
  guides: Gesture['guides'] = [],
): ActiveGesture {
  const { shown, starts, fresh } = gesture;
  const moved = { ...gesture, shown: { ...shown, point } };
  const problem = firstProblem(document, moved);
  const held = fresh ?? antennaIn(document, shown.id);
  const distances =
    fresh && problem ? [] : distancesFrom(document, held, point, { without: Object.keys(starts) });
  const hasMoved = gesture.hasMoved || !isSamePlace(point, shown.start);
  return { ...gesture, hasMoved, shown: { ...shown, point, problem, guides, distances } };
}

/** Where each held antenna is now: all keep their distances to the one that is held. */
export function heldPlaces({ shown, starts }: ActiveGesture): Record<string, Point> {
  const [dx, dy] = [shown.point.x - shown.start.x, shown.point.y - shown.start.y];
  return Object.fromEntries(
    Object.entries(starts).map(([id, start]) => [
      id,
      id === shown.id ? shown.point : { x: tidy(start.x + dx), y: tidy(start.y + dy) },
    ]),
  );
}

/** The document as it is painted with the gesture. A part that may not stand where it is has no place in it yet. */
export function paintGesture(document: LayoutDocument, gesture: ActiveGesture): LayoutDocument {
  if (gesture.fresh) {
    if (gesture.shown.problem) return document;
    const fresh = { ...gesture.fresh, ...gesture.shown.point };
    return { ...document, antennas: { ...document.antennas, [fresh.id]: fresh } };
  }
  return paintPlaces(document, heldPlaces(gesture));
}

/** The document with antennas at other places; itself when none is elsewhere. */
export function paintPlaces(
  document: LayoutDocument,
  places: Readonly<Record<string, Point>>,
): LayoutDocument {
  let antennas: Record<string, PlacedAntenna> | null = null;
  for (const [id, { x, y }] of Object.entries(places)) {
    const antenna = Object.hasOwn(document.antennas, id) ? document.antennas[id] : undefined;
    if (!antenna || (antenna.x === x && antenna.y === y)) continue;
    antennas ??= { ...document.antennas };
    antennas[id] = { ...antenna, x, y };
  }
  return antennas ? { ...document, antennas } : document;
}

/** What the drop changes in the document; nothing when everything stands where it stood. */
export function gestureChanges(document: LayoutDocument, gesture: ActiveGesture): Change[] {
  if (gesture.fresh) {
    return [{ kind: 'add', collection: 'antennas', value: { ...gesture.fresh, ...gesture.shown.point } }];
  }
  return Object.entries(heldPlaces(gesture)).flatMap(([id, place]): Change[] => {
    const antenna = Object.hasOwn(document.antennas, id) ? document.antennas[id] : undefined;
    if (!antenna || isSamePlace(antenna, place)) return [];
    return [{ kind: 'set', collection: 'antennas', id, fields: { x: place.x, y: place.y } }];
  });
}

/** The antenna that a part from the shelf becomes at a point. */
export function freshAntenna(
  document: LayoutDocument,
  shelfPart: ShelfPart,
  point: Point,
  reservedLabels: readonly string[],
): PlacedAntenna {
  return {
    id: createId(),
    label: nextLabel(document, reservedLabels),
    name: shelfPart.name,
    part: shelfPart.part,
    x: point.x,
    y: point.y,
    mountHeight: shelfPart.mountHeight ?? 0,
    azimuthDeg: 0,
    tiltDeg: 0,
    radioId: shelfPart.radioId ?? null,
    feederLossDb: shelfPart.feederLossDb ?? 0,
  };
}

/** A coordinate without the dust of floating point: a nanometre is far below any tape measure. */
export function tidy(metres: number): number {
  const rounded = Math.round(metres * 1e9) / 1e9;
  return rounded === 0 ? 0 : rounded;
}

function firstProblem(document: LayoutDocument, gesture: ActiveGesture): Gesture['problem'] {
  if (gesture.fresh) return problemAt(document, gesture.fresh, gesture.shown.point);
  for (const [id, place] of Object.entries(heldPlaces(gesture))) {
    const antenna = antennaIn(document, id);
    // One that the platform was changed under may stay where it stands.
    const problem = isSamePlace(antenna, place) ? null : problemAt(document, antenna, place);
    if (problem && id !== gesture.shown.id)
      return { ...problem, message: `${antenna.label}: ${problem.message}` };
    if (problem) return problem;
  }
  return null;
}

function problemAt(document: LayoutDocument, antenna: PlacedAntenna, { x, y }: Point): Gesture['problem'] {
  const problem = placementProblem(document, { ...antenna, x, y });
  return problem && { code: problem.code, message: problem.message };
}

function antennaIn(document: LayoutDocument, id: string): PlacedAntenna {
  const antenna = document.antennas[id];
  if (!antenna) throw new Error(`no antenna ${id} under the finger`);
  return antenna;
}

function placeOf(document: LayoutDocument, id: string): Point {
  const { x, y } = antennaIn(document, id);
  return { x, y };
}

function isSamePlace(a: Point, b: Point): boolean {
  return Math.abs(a.x - b.x) < SAME_PLACE && Math.abs(a.y - b.y) < SAME_PLACE;
}
