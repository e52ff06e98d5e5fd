import type { ScreenBox } from './label-placement';
import type { ScreenPoint } from './viewport';

/** What lies under the pointer. */
export type Target =
  | { readonly kind: 'antenna'; readonly id: string }
  | { readonly kind: 'comment'; readonly id: string }
  | { readonly kind: 'pair'; readonly from: string; readonly into: string }
  | { readonly kind: 'ground' };

/** What can be hit, in screen pixels. */
export type HitScene = {
  readonly antennas: readonly { readonly id: string; readonly at: ScreenPoint }[];
  readonly balloons: readonly { readonly id: string; readonly at: ScreenPoint; readonly radius: number }[];
  readonly pills: readonly { readonly from: string; readonly into: string; readonly box: ScreenBox }[];
};

/** Half the smallest target, by kind of pointer. */
export const REACH = { touch: 22, pen: 16, mouse: 14 } as const;
export type PointerKind = keyof typeof REACH;

/**
 * The thing under a pointer: the nearest antenna, balloon or pill within reach, else the ground. An antenna wins
 * over what is equally near.
 */
export function hitTarget(scene: HitScene, at: ScreenPoint, pointer: PointerKind): Target {
  const reach = REACH[pointer];
  let nearest: Target = { kind: 'ground' };
  let least = Infinity;
  const offer = (distance: number, target: Target) => {
    if (distance >= least) return;
    least = distance;
    nearest = target;
  };
  for (const { id, at: mark } of scene.antennas) {
    const distance = Math.hypot(mark.x - at.x, mark.y - at.y);
    if (distance <= reach) offer(distance, { kind: 'antenna', id });
  }
  for (const { id, at: balloon, radius } of scene.balloons) {
    const distance = Math.max(0, Math.hypot(balloon.x - at.x, balloon.y - at.y) - radius) + 1;
    if (distance <= reach) offer(distance, { kind: 'comment', id });
  }
  for (const { from, into, box } of scene.pills) {
    const dx = Math.max(box.left - at.x, 0, at.x - box.left - box.width);
    const dy = Math.max(box.top - at.y, 0, at.y - box.top - box.height);
    const distance = Math.hypot(dx, dy) + 1;
    if (distance <= reach / 2) offer(distance, { kind: 'pair', from, into });
  }
  return nearest;
}
