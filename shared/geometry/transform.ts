import type { Point } from './point';

/** An affine map of the plane: x' = a x + c y + e, y' = b x + d y + f. */
export type Transform = {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
  readonly e: number;
  readonly f: number;
};

/** The map that leaves everything where it is. */
export const IDENTITY: Transform = { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 };

/** Moves by (x, y). */
export function transformTranslate(x: number, y: number): Transform {
  return { ...IDENTITY, e: x, f: y };
}

/** Stretches about the origin, x and y on their own. */
export function transformScale(x: number, y: number): Transform {
  return { a: x, b: 0, c: 0, d: y, e: 0, f: 0 };
}

/** Turns about the origin, degrees anticlockwise. */
export function transformRotate(angleDeg: number): Transform {
  const angle = (angleDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return { a: cos, b: sin, c: -sin, d: cos, e: 0, f: 0 };
}

/** One map after another: `transformCompose(second, first)` does `first`, then `second`. */
export function transformCompose(second: Transform, first: Transform): Transform {
  return {
    a: second.a * first.a + second.c * first.b,
    b: second.b * first.a + second.d * first.b,
    c: second.a * first.c + second.c * first.d,
    d: second.b * first.c + second.d * first.d,
    e: second.a * first.e + second.c * first.f + second.e,
    f: second.b * first.e + second.d * first.f + second.f,
  };
}

/**
 * The map that undoes `t`.
 * @throws Error when `t` flattens the plane.
 */
export function transformInvert(t: Transform): Transform {
  const determinant = t.a * t.d - t.b * t.c;
  if (determinant === 0) throw new Error('a map that flattens the plane cannot be undone');
  const [a, b, c, d] = [t.d / determinant, -t.b / determinant, -t.c / determinant, t.a / determinant];
  return { a, b, c, d, e: -(a * t.e + c * t.f), f: -(b * t.e + d * t.f) };
}

/** Where the map takes a point. */
export function transformApply(t: Transform, { x, y }: Point): Point {
  return { x: t.a * x + t.c * y + t.e, y: t.b * x + t.d * y + t.f };
}
