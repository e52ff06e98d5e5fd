import type { Box } from '@/shared/geometry/box';
import type { Point } from '@/shared/geometry/point';

/** Where the platform's forward axis points on the screen. */
export type Turn = 'right' | 'up';

/** A position on the canvas in pixels, x to the right, y down. */
export type ScreenPoint = { readonly x: number; readonly y: number };

export type Size = { readonly width: number; readonly height: number };

/** Space at the edges of the canvas that a fitted drawing leaves free, px. */
export type Insets = {
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
  readonly left: number;
};

/** How the plan lies on the canvas: pixels per metre, where the datum is, which way forward points. */
export type Viewport = {
  readonly scale: number;
  readonly originX: number;
  readonly originY: number;
  readonly turn: Turn;
};

/** Smallest and largest pixels per metre. */
export type ScaleRange = { readonly least: number; readonly most: number };

/** Plan to screen. With forward to the right, the platform's left is up; with forward up, it is left. */
export function toScreen(view: Viewport, point: Point): ScreenPoint {
  return view.turn === 'right'
    ? { x: view.originX + point.x * view.scale, y: view.originY - point.y * view.scale }
    : { x: view.originX - point.y * view.scale, y: view.originY - point.x * view.scale };
}

/** Screen to plan: the inverse of `toScreen`. */
export function toPlan(view: Viewport, point: ScreenPoint): Point {
  const right = (point.x - view.originX) / view.scale;
  const up = (view.originY - point.y) / view.scale;
  return view.turn === 'right' ? { x: right, y: up } : { x: up, y: -right };
}

/** Direction on the screen (radians, clockwise from the screen's right) of a bearing clockwise from forward. */
export function screenAngle(turn: Turn, azimuthDeg: number): number {
  return ((azimuthDeg - (turn === 'up' ? 90 : 0)) * Math.PI) / 180;
}

/** Moves the drawing by pixels. */
export function panBy(view: Viewport, dx: number, dy: number): Viewport {
  return { ...view, originX: view.originX + dx, originY: view.originY + dy };
}

/** Zooms by a factor so that the plan under `about` stays under it. */
export function zoomAbout(view: Viewport, about: ScreenPoint, factor: number, range: ScaleRange): Viewport {
  const scale = Math.min(range.most, Math.max(range.least, view.scale * factor));
  const ratio = scale / view.scale;
  return {
    ...view,
    scale,
    originX: about.x + (view.originX - about.x) * ratio,
    originY: about.y + (view.originY - about.y) * ratio,
  };
}

/** The turn under which the box is drawn larger; forward to the right when both are equal. */
export function betterTurn(box: Box, size: Size, insets: Insets): Turn {
  return fittedScale(box, size, insets, 'up') > fittedScale(box, size, insets, 'right') ? 'up' : 'right';
}

/** Shows the whole box, centred between the insets. */
export function fitBox(box: Box, size: Size, insets: Insets, turn: Turn): Viewport {
  const scale = fittedScale(box, size, insets, turn);
  const middle = { x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 };
  const at = {
    x: insets.left + (size.width - insets.left - insets.right) / 2,
    y: insets.top + (size.height - insets.top - insets.bottom) / 2,
  };
  const drawn = toScreen({ scale, originX: 0, originY: 0, turn }, middle);
  return { scale, originX: at.x - drawn.x, originY: at.y - drawn.y, turn };
}

/** Limits of zooming: from a quarter of the fitted drawing to where a millimetre is easily seen. */
export function scaleRange(box: Box, size: Size, insets: Insets): ScaleRange {
  const fitted = Math.min(fittedScale(box, size, insets, 'right'), fittedScale(box, size, insets, 'up'));
  return { least: fitted / 4, most: Math.max(fitted * 30, 4000) };
}

function fittedScale(box: Box, size: Size, insets: Insets, turn: Turn): number {
  const room = {
    across: Math.max(40, size.width - insets.left - insets.right),
    down: Math.max(40, size.height - insets.top - insets.bottom),
  };
  const along = Math.max(1e-3, box.maxX - box.minX);
  const aside = Math.max(1e-3, box.maxY - box.minY);
  return turn === 'right'
    ? Math.min(room.across / along, room.down / aside)
    : Math.min(room.across / aside, room.down / along);
}
