import type { ScreenLine } from './hatch';
import type { ScreenPoint } from './viewport';

/** A box on the screen, px. */
export type ScreenBox = {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
};

/** Something to be written, with the places it may stand at, best first. */
export type LabelRequest = { readonly id: string; readonly candidates: readonly ScreenBox[] };

export type Surroundings = {
  /** Nothing may be written over these. */
  readonly blocked: readonly ScreenBox[];
  /** Better not written over, where there is a choice. */
  readonly avoided: readonly ScreenBox[];
  /** Lines that a label should not hide. */
  readonly lines: readonly ScreenLine[];
  /** Labels stay within. */
  readonly bounds: ScreenBox;
  /** Where each label stood before: it stays while that place is free, so that labels do not jump. */
  readonly previous?: ReadonlyMap<string, number>;
};

export type Placement = { readonly index: number; readonly box: ScreenBox };

const GAP = 2;
const COST = { line: 40, avoided: 60, later: 3, moved: 25 };

/**
 * Finds a place for each label in the order of the requests so that none overlaps another or what is blocked, and
 * all stay within the bounds; lines and avoided areas are kept free where possible. A label without a free place
 * is left out.
 */
export function placeLabels(
  requests: readonly LabelRequest[],
  surroundings: Surroundings,
): ReadonlyMap<string, Placement> {
  const taken = [...surroundings.blocked];
  const placed = new Map<string, Placement>();
  for (const request of requests) {
    const before = surroundings.previous?.get(request.id);
    let best: Placement | null = null;
    let least = Infinity;
    for (const [index, box] of request.candidates.entries()) {
      if (!isInside(box, surroundings.bounds)) continue;
      let cost = index * COST.later + (before !== undefined && before !== index ? COST.moved : 0);
      if (cost >= least) continue;
      if (taken.some((other) => boxesOverlap(box, other, GAP))) continue;
      for (const area of surroundings.avoided) if (boxesOverlap(box, area, 0)) cost += COST.avoided;
      for (const line of surroundings.lines) if (segmentMeetsBox(line, box)) cost += COST.line;
      if (cost < least) {
        least = cost;
        best = { index, box };
      }
    }
    if (best === null) continue;
    placed.set(request.id, best);
    taken.push(best.box);
  }
  return placed;
}

/** Whether two boxes come closer than `gap` to each other. */
export function boxesOverlap(one: ScreenBox, other: ScreenBox, gap: number): boolean {
  return (
    one.left < other.left + other.width + gap &&
    other.left < one.left + one.width + gap &&
    one.top < other.top + other.height + gap &&
    other.top < one.top + one.height + gap
  );
}

/** Whether a line runs through a box. */
export function segmentMeetsBox(line: ScreenLine, box: ScreenBox): boolean {
  return clipLine(line, box) !== null;
}

/** The part of a line inside a box, or null when it passes by (Liang and Barsky 1984). */
export function clipLine(line: ScreenLine, box: ScreenBox): ScreenLine | null {
  const dx = line.x2 - line.x1;
  const dy = line.y2 - line.y1;
  let enter = 0;
  let leave = 1;
  const sides: readonly (readonly [number, number])[] = [
    [-dx, line.x1 - box.left],
    [dx, box.left + box.width - line.x1],
    [-dy, line.y1 - box.top],
    [dy, box.top + box.height - line.y1],
  ];
  for (const [direction, distance] of sides) {
    if (direction === 0) {
      if (distance < 0) return null;
      continue;
    }
    const at = distance / direction;
    if (direction < 0) enter = Math.max(enter, at);
    else leave = Math.min(leave, at);
    if (enter > leave) return null;
  }
  return {
    x1: line.x1 + enter * dx,
    y1: line.y1 + enter * dy,
    x2: line.x1 + leave * dx,
    y2: line.y1 + leave * dy,
  };
}

/** Box of a size around its middle. */
export function boxAt(middle: ScreenPoint, width: number, height: number): ScreenBox {
  return { left: middle.x - width / 2, top: middle.y - height / 2, width, height };
}

/** Places beside a mark: above, below, right, left and the corners, near ones first, then farther out. */
export function besideMark(
  mark: ScreenPoint,
  radius: number,
  width: number,
  height: number,
): readonly ScreenBox[] {
  const boxes: ScreenBox[] = [];
  for (const away of [radius + 4, radius + 20, radius + 38]) {
    const dy = away + height / 2;
    const dx = away + width / 2;
    const corner = away * 0.7;
    boxes.push(
      boxAt({ x: mark.x, y: mark.y - dy }, width, height),
      boxAt({ x: mark.x, y: mark.y + dy }, width, height),
      boxAt({ x: mark.x + dx, y: mark.y }, width, height),
      boxAt({ x: mark.x - dx, y: mark.y }, width, height),
      boxAt({ x: mark.x + corner + width / 2, y: mark.y - corner - height / 2 }, width, height),
      boxAt({ x: mark.x - corner - width / 2, y: mark.y - corner - height / 2 }, width, height),
      boxAt({ x: mark.x + corner + width / 2, y: mark.y + corner + height / 2 }, width, height),
      boxAt({ x: mark.x - corner - width / 2, y: mark.y + corner + height / 2 }, width, height),
    );
  }
  return boxes;
}

/** Places along a line, from a little beyond its middle outward in both directions, on the line and beside it. */
export function alongLine(line: ScreenLine, width: number, height: number): readonly ScreenBox[] {
  const length = Math.hypot(line.x2 - line.x1, line.y2 - line.y1) || 1;
  const normal = { x: -(line.y2 - line.y1) / length, y: (line.x2 - line.x1) / length };
  const boxes: ScreenBox[] = [];
  for (const beside of [0, 1, -1]) {
    const reach = beside * (Math.abs(normal.x) * width + Math.abs(normal.y) * height) * 0.55;
    for (const t of [0.55, 0.45, 0.65, 0.35, 0.74, 0.28, 0.82, 0.2]) {
      boxes.push(
        boxAt(
          {
            x: line.x1 + (line.x2 - line.x1) * t + normal.x * reach,
            y: line.y1 + (line.y2 - line.y1) * t + normal.y * reach,
          },
          width,
          height,
        ),
      );
    }
  }
  return boxes;
}

function isInside(box: ScreenBox, bounds: ScreenBox): boolean {
  return (
    box.left >= bounds.left &&
    box.top >= bounds.top &&
    box.left + box.width <= bounds.left + bounds.width &&
    box.top + box.height <= bounds.top + bounds.height
  );
}
