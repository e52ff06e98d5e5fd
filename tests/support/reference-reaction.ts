import type { Vector3 } from '@/shared/em/scene';
import { gaussLegendre } from '@/shared/numerics/gauss-legendre';

/** A straight arm from `start` to `end` with a current and its derivative along it. */
export type ReferenceArm = {
  readonly start: Vector3;
  readonly end: Vector3;
  readonly current: (s: number) => number;
  readonly slope: (s: number) => number;
};

const rule = gaussLegendre(32);
const panels = 6;

/**
 * The reaction of two currents that vanish at their ends, straight from the potentials and by brute force:
 * Z = j (eta k / 4 pi) integral integral (t . u I_t I_u - I_t' I_u' / k^2) e^{-jkR} / R. Slow, and shares nothing
 * with the kernel but the physics. @source Harrington 1968, section 4.2
 */
export function referenceReaction(
  k: number,
  ones: readonly ReferenceArm[],
  others: readonly ReferenceArm[],
): { re: number; im: number } {
  const impedance = 376.730313668;
  let re = 0;
  let im = 0;
  for (const one of ones) {
    for (const other of others) {
      for (const p of pointsOf(one)) {
        for (const q of pointsOf(other)) {
          const r = Math.hypot(p.at[0] - q.at[0], p.at[1] - q.at[1], p.at[2] - q.at[2]);
          const cosine = p.along[0] * q.along[0] + p.along[1] * q.along[1] + p.along[2] * q.along[2];
          const value =
            (p.weight * q.weight * (cosine * p.current * q.current - (p.slope * q.slope) / (k * k))) / r;
          re += value * Math.sin(k * r);
          im += value * Math.cos(k * r);
        }
      }
    }
  }
  const scale = (impedance * k) / (4 * Math.PI);
  return { re: scale * re, im: scale * im };
}

type Point = { at: Vector3; along: Vector3; weight: number; current: number; slope: number };

function pointsOf(arm: ReferenceArm): Point[] {
  const axis: Vector3 = [arm.end[0] - arm.start[0], arm.end[1] - arm.start[1], arm.end[2] - arm.start[2]];
  const length = Math.hypot(...axis);
  const along: Vector3 = [axis[0] / length, axis[1] / length, axis[2] / length];
  const points: Point[] = [];
  for (let panel = 0; panel < panels; panel += 1) {
    rule.nodes.forEach((node, i) => {
      const s = ((panel + node) / panels) * length;
      points.push({
        at: [arm.start[0] + s * along[0], arm.start[1] + s * along[1], arm.start[2] + s * along[2]],
        along,
        weight: (rule.weights[i]! * length) / panels,
        current: arm.current(s),
        slope: arm.slope(s),
      });
    });
  }
  return points;
}
