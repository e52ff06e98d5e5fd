import fc from 'fast-check';
import { mutualBlock } from '@/shared/em/impedance-block';
import { meshOfOnePiece } from '@/shared/em/mesh';
import type { Ground, Vector3, Wire } from '@/shared/em/scene';
import { segmentDistance } from '@/shared/em/chain';
import { dipole, uprightWhip } from '../../support/whip-scenes';
import { referenceReaction, type ReferenceArm } from '../../support/reference-reaction';

/** One metre is one wavelength. */
const k = 2 * Math.PI;

/** The textbook's sinusoid of a dipole, with the image's arms when there is a plane. */
function armsOf(wire: Wire, image: boolean): ReferenceArm[] {
  const flip = (p: Vector3): Vector3 => (image ? [p[0], p[1], -p[2]] : p);
  const sign = image ? -1 : 1;
  const middle = wire.start.map((value, i) => (value + wire.end[i]!) / 2) as unknown as Vector3;
  const half = Math.hypot(...wire.end.map((value, i) => value - middle[i]!));
  return [
    {
      start: flip(wire.start),
      end: flip(middle),
      current: (s) => sign * Math.sin(k * s),
      slope: (s) => sign * k * Math.cos(k * s),
    },
    {
      start: flip(middle),
      end: flip(wire.end),
      current: (s) => sign * Math.sin(k * (half - s)),
      slope: (s) => -sign * k * Math.cos(k * (half - s)),
    },
  ];
}

function kernel(ground: Ground, one: Wire, other: Wire): { re: number; im: number } {
  const block = mutualBlock(k, ground, meshOfOnePiece(one, ground), meshOfOnePiece(other, ground));
  return { re: block.re[4]!, im: block.im[4]! };
}

function expectClose(
  actual: { re: number; im: number },
  wanted: { re: number; im: number },
  share: number,
): void {
  const size = Math.hypot(wanted.re, wanted.im);
  expect(Math.hypot(actual.re - wanted.re, actual.im - wanted.im)).toBeLessThanOrEqual(
    share * Math.max(size, 0.073),
  );
}

const unit = fc
  .tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: 0, max: 2 * Math.PI, noNaN: true }))
  .map(([z, a]): Vector3 => [Math.sqrt(1 - z * z) * Math.cos(a), Math.sqrt(1 - z * z) * Math.sin(a), z]);
const coordinate = fc.double({ min: -0.7, max: 0.7, noNaN: true });
const length = fc.double({ min: 0.1, max: 0.9, noNaN: true });

// The kernel's own rules are good to 1e-9; 1e-6 of |Z| (or of 0.073 ohm where Z passes through zero) is the promise.
const promise = 1e-6;

describe('reaction of two sinusoidal filaments', () => {
  it('equals converged quadrature of the potentials in any direction, from 0.05 wavelength spacing', () => {
    const one = dipole('a', [0, 0, 0], 0.5, [0, 0, 1], 1e-4);
    fc.assert(
      fc.property(unit, coordinate, coordinate, coordinate, length, (direction, x, y, z, l) => {
        const other = dipole('b', [x, y, z], l, direction, 1e-4);
        fc.pre(segmentDistance(one.start, one.end, other.start, other.end) >= 0.05);
        const wanted = referenceReaction(k, armsOf(one, false), armsOf(other, false));
        expectClose(kernel('none', one, other), wanted, promise);
      }),
      { seed: 20, numRuns: 12 },
    );
  });

  it('equals it for the closest spacing held, side by side, collinear and crossing', () => {
    const one = dipole('a', [0, 0, 0], 0.5, [0, 0, 1], 1e-4);
    for (const other of [
      dipole('b', [0.05, 0, 0], 0.46, [0, 0, 1], 1e-4),
      dipole('b', [0, 0, 0.5], 0.4, [0, 0, 1], 1e-4),
      dipole('b', [0, 0.05, 0.1], 0.46, [1, 0, 0], 1e-4),
    ]) {
      const wanted = referenceReaction(k, armsOf(one, false), armsOf(other, false));
      expectClose(kernel('none', one, other), wanted, promise);
    }
  });

  it('adds the image of the source over the plane, with horizontal currents reversed', () => {
    const one = dipole('a', [0, 0, 0.4], 0.5, [1, 0, 0], 1e-4);
    const other = dipole('b', [0.2, 0.3, 0.5], 0.4, [0.6, 0, 0.8], 1e-4);
    const wanted = referenceReaction(k, [...armsOf(one, false), ...armsOf(one, true)], armsOf(other, false));
    expectClose(kernel('plane', one, other), wanted, promise);
  });

  it('is reciprocal, also for tilted whips whose current goes on in the image', () => {
    const one: Wire = { ...uprightWhip('a', [0, 0, 0], 0.3, 1e-3), end: [0.15, 0, 0.25] };
    const other: Wire = { ...uprightWhip('b', [0.3, 0.1, 0], 0.2, 1e-3), end: [0.3, 0.2, 0.15] };
    const mesh = (wire: Wire) => meshOfOnePiece(wire, 'plane');
    const there = mutualBlock(k, 'plane', mesh(one), mesh(other));
    const back = mutualBlock(k, 'plane', mesh(other), mesh(one));
    expectClose({ re: there.re[0]!, im: there.im[0]! }, { re: back.re[0]!, im: back.im[0]! }, 1e-8);
  });
});
