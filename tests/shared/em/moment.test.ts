import { meshOfManyPieces } from '@/shared/em/mesh';
import { solveCurrents } from '@/shared/em/current-model';
import { impedanceFromLoaded } from '@/shared/em/network';
import { radiationIntensity, directionOf } from '@/shared/em/radiation';
import { acceptedPower } from '@/shared/em/pattern';
import type { Scene } from '@/shared/em/scene';
import { solveScene } from '@/shared/em/solve-scene';
import { gaussLegendre } from '@/shared/numerics/gauss-legendre';
import { checksOf, complexOf, numberOf } from '../../support/thin-wire-checks';
import { dipole, uprightWhip } from '../../support/whip-scenes';

/** At this frequency one metre is one wavelength. */
const frequency = 299_792_458;
const k = 2 * Math.PI;

function solve(scene: Omit<Scene, 'frequencies'>, method: 'emf' | 'moment' = 'moment') {
  return solveScene({ ...scene, frequencies: [frequency] }, method).results[0]!;
}

describe('moment method', () => {
  it.each(checksOf('T13.mom'))(
    '$id: a dipole lies in the window of an independent Galerkin solution',
    (row) => {
      const wire = dipole(
        'd',
        [0, 0, 0],
        numberOf(row.inputs, 'l_over_lambda'),
        [0, 0, 1],
        numberOf(row.inputs, 'a_over_lambda'),
      );
      const z = solve({ ground: 'none', wires: [wire] }).z[0]![0]!;
      const wanted = complexOf(row.expected);
      expect(Math.abs(z.re - wanted.re)).toBeLessThanOrEqual(row.tolerance);
      expect(Math.abs(z.im - wanted.im)).toBeLessThanOrEqual(row.tolerance);
    },
  );

  it.each(checksOf('T13.mono'))('$id: two whips couple as in an independent Galerkin solution', (row) => {
    const h = numberOf(row.inputs, 'h_over_lambda');
    const a = numberOf(row.inputs, 'a_over_lambda');
    const d = numberOf(row.inputs, 'd_over_lambda');
    const wires = [uprightWhip('a', [0, 0, 0], h, a), uprightWhip('b', [d, 0, 0], h, a)];
    const isolation = solve({ ground: 'plane', wires }).isolationDb[1]![0]!;
    expect(Math.abs(isolation + numberOf(row.expected, 'S21_dB'))).toBeLessThanOrEqual(row.tolerance);
  });

  it.each(['emf', 'moment'] as const)('%s gives a whip on the plane half of its dipole', (method) => {
    const whip = solve({ ground: 'plane', wires: [uprightWhip('w', [0, 0, 0], 0.24, 1e-3)] }, method);
    const whole = solve({ ground: 'none', wires: [dipole('d', [0, 0, 0], 0.48, [0, 0, 1], 1e-3)] }, method);
    // The same mesh on either side of the plane: equal to rounding and quadrature.
    const ratio = method === 'emf' ? 1e-6 : 0.03;
    const z = whip.z[0]![0]!;
    const twice = whole.z[0]![0]!;
    expect(Math.hypot(2 * z.re - twice.re, 2 * z.im - twice.im)).toBeLessThanOrEqual(
      ratio * Math.hypot(twice.re, twice.im),
    );
  });

  it('tends to the transmission equation far away (Friis 1946)', () => {
    const d = 40;
    const wires = [
      dipole('a', [0, 0, 0], 0.5, [0, 0, 1], 1e-4),
      dipole('b', [d, 0, 0], 0.5, [0, 0, 1], 1e-4),
    ];
    const pattern = { elevationDeg: 0, stepDeg: 90 };
    const result = solve({ ground: 'none', wires, pattern });
    const gain = 10 ** (result.patterns['a']!.aloneDbi[0]! / 10);
    const mismatch = 1 - result.s[0]![0]!.re ** 2 - result.s[0]![0]!.im ** 2;
    const friis = -20 * Math.log10(1 / (4 * Math.PI * d)) - 20 * Math.log10(gain * mismatch);
    // At forty wavelengths the near field's share is 1e-4.
    expect(Math.abs(result.isolationDb[1]![0]! - friis)).toBeLessThanOrEqual(0.01);
  });

  it('loses 6 dB of coupling for each doubling of a far distance over the plane', () => {
    const isolation = (d: number) =>
      solve({
        ground: 'plane',
        wires: [uprightWhip('a', [0, 0, 0], 0.24, 1e-3), uprightWhip('b', [d, 0, 0], 0.24, 1e-3)],
      }).isolationDb[1]![0]!;
    expect(Math.abs(isolation(40) - isolation(20) - 20 * Math.log10(2))).toBeLessThanOrEqual(0.02);
  });

  it('gives a quarter-wave whip 5.15 dBi toward the horizon of the plane', () => {
    const wires = [uprightWhip('w', [0, 0, 0], 0.25, 1e-5)];
    const result = solve({ ground: 'plane', wires, pattern: { elevationDeg: 0, stepDeg: 120 } }, 'emf');
    for (const gain of result.patterns['w']!.gainDbi) expect(Math.abs(gain - 5.16)).toBeLessThanOrEqual(0.01);
  });

  it('radiates what its port accepts when nothing else is there to absorb', () => {
    const wires = [
      uprightWhip('w', [0, 0, 0], 0.31, 1e-3),
      { ...uprightWhip('p', [0.3, 0.1, 0], 0.28, 1e-3), feed: 'none' as const },
    ];
    const meshes = wires.map((wire) => meshOfManyPieces(wire, 'plane', frequency));
    const solved = solveCurrents('plane', frequency, meshes);
    const accepted = acceptedPower(
      { re: solved.loadedAdmittance.re[0]!, im: solved.loadedAdmittance.im[0]! },
      { re: 50, im: 0 },
    );
    const rule = gaussLegendre(12);
    let radiated = 0;
    rule.nodes.forEach((node, i) => {
      const elevation = Math.asin(node) * (180 / Math.PI);
      for (let azimuth = 0; azimuth < 360; azimuth += 15) {
        const u = radiationIntensity(k, 'plane', solved.currents(0), directionOf(azimuth, elevation));
        radiated += u * rule.weights[i]! * ((15 * Math.PI) / 180);
      }
    });
    // The balance of one per cent asked of every solved model.
    expect(Math.abs(radiated / accepted - 1)).toBeLessThanOrEqual(0.01);
  });

  it('lets a parasitic near by reflect when longer and direct when shorter (common practice)', () => {
    const forward = (length: number) => {
      const parasitic = { ...dipole('p', [0.1, 0, 0], length, [0, 0, 1], 1e-3), feed: 'none' as const };
      const driven = dipole('d', [0, 0, 0], 0.47, [0, 0, 1], 1e-3);
      const pattern = solve({
        ground: 'none',
        wires: [driven, parasitic],
        pattern: { elevationDeg: 0, stepDeg: 180 },
      }).patterns['d']!;
      return pattern.gainDbi[0]! - pattern.gainDbi[1]!;
    };
    expect(forward(0.51)).toBeLessThan(-3);
    expect(forward(0.43)).toBeGreaterThan(3);
  });

  it('agrees with a mesh of twice the pieces within 0.2 dB', () => {
    const wires = [uprightWhip('a', [0, 0, 0], 0.24, 1e-3), uprightWhip('b', [0.3, 0, 0], 0.9, 1e-3)];
    const transfer = (refinement: number) => {
      const meshes = wires.map((wire) => meshOfManyPieces(wire, 'plane', frequency, refinement));
      const { loadedAdmittance } = solveCurrents('plane', frequency, meshes);
      return 20 * Math.log10(Math.hypot(loadedAdmittance.re[1]!, loadedAdmittance.im[1]!));
    };
    expect(Math.abs(transfer(2) - transfer(1))).toBeLessThanOrEqual(0.2);
  });

  it('calls an impedance that is not finite not finite', () => {
    const nothing = { rows: 1, columns: 1, re: Float64Array.of(0), im: Float64Array.of(0) };
    expect(impedanceFromLoaded(nothing, [{ re: 50, im: 0 }]).re[0]).toBeNaN();
  });
});
