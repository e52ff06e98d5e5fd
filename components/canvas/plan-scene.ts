import { drawing } from '@/components/theme/drawing';
import type { Comment } from '@/shared/api/comments';
import type { Estimate, PairState } from '@/shared/estimate/estimate-result';
import type { PlacedAntenna } from '@/shared/layout/document';
import type { HitScene } from './hit-test';
import type { ScreenLine } from './hatch';
import {
  alongLine,
  besideMark,
  boxAt,
  clipLine,
  placeLabels,
  type LabelRequest,
  type ScreenBox,
} from './label-placement';
import { linksToDraw, type Link } from './links';
import { pillText } from './margin-text';
import { fitText, textWidth } from './text-width';
import { toScreen, type ScreenPoint, type Viewport } from './viewport';

/** How an antenna stands on the drawing. */
export type MarkLook = 'plain' | 'chosen' | 'carried' | 'refused' | 'misplaced' | 'others';

export type SceneMark = {
  readonly id: string;
  readonly at: ScreenPoint;
  readonly look: MarkLook;
  /** Known by its datasheet only: drawn with a square around the hole. */
  readonly declared: boolean;
  /** Where a tilted antenna leans to, relative to `at`; null when it is upright. */
  readonly lean: ScreenPoint | null;
};

export type SceneLabel = {
  readonly id: string;
  readonly label: string;
  readonly name: string | null;
  readonly box: ScreenBox;
  readonly look: MarkLook;
};

export type ScenePill = {
  readonly key: string;
  readonly from: string;
  readonly into: string;
  readonly state: PairState;
  readonly first: string;
  readonly second: string | null;
  readonly box: ScreenBox;
};

export type SceneBalloon = {
  readonly id: string;
  readonly number: number;
  readonly at: ScreenPoint;
  readonly target: ScreenPoint;
  readonly chosen: boolean;
};

/** All of the drawing that follows a finger, in pixels. */
export type PlanScene = {
  readonly marks: readonly SceneMark[];
  readonly labels: readonly SceneLabel[];
  readonly lines: readonly (ScreenLine & { readonly state: PairState })[];
  readonly pills: readonly ScenePill[];
  readonly balloons: readonly SceneBalloon[];
  readonly hit: HitScene;
  /** Which of its places each label took: the next scene keeps them where it can. */
  readonly places: ReadonlyMap<string, number>;
};

export type SceneInput = {
  readonly antennas: Readonly<Record<string, PlacedAntenna>>;
  readonly estimate: Estimate | null;
  readonly chosen: string | null;
  readonly looks: ReadonlyMap<string, MarkLook>;
  readonly comments: readonly Comment[];
  readonly chosenComment: string | null;
  readonly view: Viewport;
  /** Where labels may stand. */
  readonly bounds: ScreenBox;
  /** Texts of the fixed drawing, and what else must not be written over. */
  readonly blocked: readonly ScreenBox[];
  readonly places: ReadonlyMap<string, number>;
};

/** Lays out marks, links, labels, pills and balloons so that nothing that is written overlaps. */
export function layOutScene(input: SceneInput): PlanScene {
  const antennas = Object.values(input.antennas);
  const at = new Map(antennas.map((antenna) => [antenna.id, toScreen(input.view, antenna)]));
  const lookOf = (id: string): MarkLook => input.looks.get(id) ?? (id === input.chosen ? 'chosen' : 'plain');
  const links = linksToDraw(input.estimate, input.chosen).flatMap((link) => {
    const [near, far] = [at.get(link.near), at.get(link.far)];
    return near && far ? [{ ...link, line: { x1: near.x, y1: near.y, x2: far.x, y2: far.y } }] : [];
  });
  const balloons = balloonTargets(input, at);
  const marks = antennas.flatMap((antenna) => {
    const mark = at.get(antenna.id);
    return mark ? [markOf(antenna, mark, lookOf(antenna.id), input.view)] : [];
  });
  const chosenAt = input.chosen === null ? undefined : at.get(input.chosen);
  const placed = placeLabels(
    [
      ...antennas.filter(({ id }) => id === input.chosen).map((antenna) => labelRequest(antenna, at)),
      ...links.filter(isUrgent).map((link) => pillRequest(link, input.bounds)),
      ...balloons.map(balloonRequest),
      ...antennas.filter(({ id }) => id !== input.chosen).map((antenna) => labelRequest(antenna, at)),
      ...links.filter((link) => !isUrgent(link)).map((link) => pillRequest(link, input.bounds)),
    ],
    {
      blocked: [...input.blocked, ...marks.map((mark) => boxAt(mark.at, MARK_SIDE, MARK_SIDE))],
      avoided: chosenAt ? [boxAt(chosenAt, 1.7 * drawing.rose.radius, 1.7 * drawing.rose.radius)] : [],
      lines: links.map(({ line }) => line),
      bounds: input.bounds,
      previous: input.places,
    },
  );
  const labels = antennas.flatMap((antenna): SceneLabel[] => {
    const placement = placed.get(`label ${antenna.id}`);
    if (!placement) return [];
    const short = placement.index >= besideMark({ x: 0, y: 0 }, 0, 0, 0).length;
    const name = short ? null : shownName(antenna);
    return [{ id: antenna.id, label: antenna.label, name, box: placement.box, look: lookOf(antenna.id) }];
  });
  const pills = links.flatMap(({ key, pair }): ScenePill[] => {
    const placement = placed.get(`pill ${key}`);
    if (!placement) return [];
    const { first, second } = pillText(pair);
    const compact = placement.index >= COMPACT_FROM;
    return [
      {
        key,
        from: pair.from,
        into: pair.into,
        state: pair.state,
        first,
        second: compact ? null : second,
        box: placement.box,
      },
    ];
  });
  const drawnBalloons = balloons.flatMap(({ comment, target }): SceneBalloon[] => {
    const box = placed.get(`balloon ${comment.id}`)?.box;
    if (!box) return [];
    const middle = { x: box.left + box.width / 2, y: box.top + box.height / 2 };
    const chosen = comment.id === input.chosenComment;
    return [{ id: comment.id, number: comment.number, at: middle, target, chosen }];
  });
  return {
    marks,
    labels,
    lines: links.map(({ line, pair }) => ({ ...line, state: pair.state })),
    pills,
    balloons: drawnBalloons,
    hit: {
      antennas: marks,
      balloons: drawnBalloons.map(({ id, at: middle }) => ({
        id,
        at: middle,
        radius: drawing.balloon.radius,
      })),
      pills,
    },
    places: new Map([...placed].map(([id, { index }]) => [id, index])),
  };
}

const MARK_SIDE = 2 * drawing.mark.ring + 4;
const COMPACT_FROM = 24;

type DrawnLink = Link & { readonly line: ScreenLine };

function isUrgent({ pair }: Link): boolean {
  return pair.state === 'lacking' || pair.state === 'tight';
}

function markOf(antenna: PlacedAntenna, at: ScreenPoint, look: MarkLook, view: Viewport): SceneMark {
  const declared = antenna.part.elements.every((element) => element.kind === 'declared');
  const radians = (antenna.azimuthDeg * Math.PI) / 180;
  // a unit step along the azimuth, as the drawing lies: clockwise from forward is toward -y
  const step = toScreen(
    { ...view, originX: 0, originY: 0, scale: drawing.mark.cross + 6 },
    { x: Math.cos(radians), y: -Math.sin(radians) },
  );
  return { id: antenna.id, at, look, declared, lean: antenna.tiltDeg > 0 || declared ? step : null };
}

function shownName(antenna: PlacedAntenna): string | null {
  const name = antenna.name.trim();
  return name === '' || name === antenna.label ? null : fitText(name, drawing.text.mark, 120);
}

function labelRequest(antenna: PlacedAntenna, at: ReadonlyMap<string, ScreenPoint>): LabelRequest {
  const mark = at.get(antenna.id) ?? { x: 0, y: 0 };
  const size = drawing.text.mark;
  const short = textWidth(antenna.label, size, true) + 6;
  const name = shownName(antenna);
  const full = name === null ? short : short + 5 + textWidth(name, size);
  const radius = drawing.mark.cross;
  return {
    id: `label ${antenna.id}`,
    candidates: [...besideMark(mark, radius, full, size + 5), ...besideMark(mark, radius, short, size + 5)],
  };
}

function pillRequest({ key, pair, line }: DrawnLink, bounds: ScreenBox): LabelRequest {
  const visible = clipLine(line, bounds);
  if (!visible) return { id: `pill ${key}`, candidates: [] };
  const { first, second } = pillText(pair);
  const { side, state, gap, height } = drawing.pill;
  const size = drawing.text.pill;
  const compact = 2 * side + 2 * state + gap + textWidth(first, size, true);
  const full = second === null ? compact : compact + gap + textWidth(second, size);
  return {
    id: `pill ${key}`,
    candidates: [...alongLine(visible, full, height), ...alongLine(visible, compact, height)],
  };
}

type BalloonTarget = { readonly comment: Comment; readonly target: ScreenPoint };

/** Open comments, and the chosen one even when it is resolved. */
function balloonTargets(input: SceneInput, at: ReadonlyMap<string, ScreenPoint>): readonly BalloonTarget[] {
  return input.comments.flatMap((comment) => {
    if (comment.resolvedAt !== null && comment.id !== input.chosenComment) return [];
    const target =
      comment.target.kind === 'spot'
        ? toScreen(input.view, comment.target)
        : at.get(comment.target.antennaId);
    return target ? [{ comment, target }] : [];
  });
}

function balloonRequest({ comment, target }: BalloonTarget): LabelRequest {
  const { away, radius } = drawing.balloon;
  const candidates: ScreenBox[] = [];
  for (const distance of [away, away * 1.6]) {
    for (const angle of [-45, -135, 45, 135, -90, 0, 180, 90]) {
      const radians = (angle * Math.PI) / 180;
      const middle = {
        x: target.x + distance * Math.cos(radians),
        y: target.y + distance * Math.sin(radians),
      };
      candidates.push(boxAt(middle, 2 * radius, 2 * radius));
    }
  }
  return { id: `balloon ${comment.id}`, candidates };
}
