import { chainOfWire } from '@/shared/em/chain';
import { mutualBlock, onePieceSelfBlock, selfBlock } from '@/shared/em/impedance-block';
import { meshOfOnePiece } from '@/shared/em/mesh';
import { scatteringMatrix } from '@/shared/em/network';
import { directionOf, radiationIntensity, type ChainCurrent } from '@/shared/em/radiation';
import type { Complex, Wire } from '@/shared/em/scene';
import { solveScene } from '@/shared/em/solve-scene';
import { checksOf, complexOf, numberOf, type Check } from '../../support/thin-wire-checks';
import { dipole, uprightWhip } from '../../support/whip-scenes';

/** At this frequency one metre is one wavelength. */
const frequency = 299_792_458;
const k = 2 * Math.PI;
/** The tables are printed with 120 pi ohm; see the fixture's note. */
const exactOverPrinted = 0.999312;
const thin = 1e-6;

function upright(x: number, z: number, length: number): Wire {
  return dipole('d', [x, 0, z], length, [0, 0, 1], thin);
}

/** Current-maximum impedance between two dipoles' pieces. */
function mutual(one: Wire, other: Wire): Complex {
  const block = mutualBlock(k, 'none', meshOfOnePiece(one, 'none'), meshOfOnePiece(other, 'none'));
  return { re: block.re[4]!, im: block.im[4]! };
}

function self(wire: Wire): Complex {
  const block = onePieceSelfBlock(k, 'none', meshOfOnePiece(wire, 'none'));
  return { re: block.re[4]!, im: block.im[4]! };
}

/** With the whole field one radius off the axis, not its logarithm alone. */
function selfAtSurface(wire: Wire): Complex {
  const block = selfBlock(k, 'none', meshOfOnePiece(wire, 'none'));
  return { re: block.re[4]!, im: block.im[4]! };
}

function over(z: Complex, divisor: number): Complex {
  return { re: z.re / divisor, im: z.im / divisor };
}

/** |dZ| <= max(0.1 % of |Z|, the row's tolerance). */
function expectAgrees(actual: Complex, printed: Complex, row: Check): void {
  const wanted = { re: printed.re * exactOverPrinted, im: printed.im * exactOverPrinted };
  const limit = Math.max(1e-3 * Math.hypot(wanted.re, wanted.im), row.tolerance);
  expect(Math.hypot(actual.re - wanted.re, actual.im - wanted.im)).toBeLessThanOrEqual(limit);
}

describe('mutual impedance of half-wave dipoles (Carter 1932; Brown and King 1934; King 1957)', () => {
  it.each(checksOf('T1.sbs'))('$id: side by side', (row) => {
    const d = numberOf(row.inputs, 'd_over_lambda');
    const z = d === 0 ? self(upright(0, 0, 0.5)) : mutual(upright(0, 0, 0.5), upright(d, 0, 0.5));
    expectAgrees(z, complexOf(row.expected), row);
  });

  it.each(checksOf('T1.col'))('$id: collinear', (row) => {
    const spacing = numberOf(row.inputs, 'centre_spacing_over_lambda');
    expectAgrees(mutual(upright(0, 0, 0.5), upright(0, spacing, 0.5)), complexOf(row.expected), row);
  });

  it.each(checksOf('T1.ech'))('$id: echelon', (row) => {
    const d = numberOf(row.inputs, 'd_over_lambda');
    const h = numberOf(row.inputs, 'axial_centre_offset_over_lambda');
    expectAgrees(mutual(upright(0, 0, 0.5), upright(d, h, 0.5)), complexOf(row.expected), row);
  });
});

describe('dipoles of other lengths (King 1957; Balanis, chapter 8)', () => {
  it.each(checksOf('T1.gen'))('$id: unequal lengths', (row) => {
    const l1 = numberOf(row.inputs, 'l1_over_lambda');
    const l2 = numberOf(row.inputs, 'l2_over_lambda');
    const other = upright(
      numberOf(row.inputs, 'd_over_lambda'),
      numberOf(row.inputs, 'axial_offset_over_lambda'),
      l2,
    );
    const z = mutual(upright(0, 0, l1), other);
    expectAgrees(z, complexOf(row.expected, 'Z_current_max_ref'), row);
    const amplitudes = Math.sin((k * l1) / 2) * Math.sin((k * l2) / 2);
    expectAgrees(over(z, amplitudes), complexOf(row.expected, 'Z_input_ref'), row);
  });

  it.each(checksOf('T1.self'))('$id: self impedance at the terminals', (row) => {
    const l = numberOf(row.inputs, 'l_over_lambda');
    const wire = {
      ...upright(0, 0, l),
      radius: 'a_over_lambda' in row.inputs ? numberOf(row.inputs, 'a_over_lambda') : thin,
    };
    expectAgrees(over(self(wire), Math.sin((k * l) / 2) ** 2), complexOf(row.expected), row);
  });

  it.each(checksOf('T1.eta'))('$id: radiation resistance with exact constants', (row) => {
    const wanted = numberOf(row.expected, 'R_half_wave_with_exact_eta');
    expect(Math.abs(self(upright(0, 0, 0.5)).re - wanted)).toBeLessThanOrEqual(row.tolerance);
  });

  it.each(checksOf('T1.res'))('$id: resonant length', (row) => {
    const radius = numberOf(row.inputs, 'a_over_lambda');
    let short = 0.4;
    let long = 0.52;
    while (long - short > 1e-7) {
      const middle = (short + long) / 2;
      if (selfAtSurface({ ...upright(0, 0, middle), radius }).im > 0) long = middle;
      else short = middle;
    }
    expect(Math.abs(long - numberOf(row.expected, 'l_res_over_lambda'))).toBeLessThanOrEqual(row.tolerance);
    const resistance = over(
      selfAtSurface({ ...upright(0, 0, long), radius }),
      Math.sin((k * long) / 2) ** 2,
    ).re;
    const printed = numberOf(row.expected, 'R_res_ohm') * exactOverPrinted;
    expect(Math.abs(resistance - printed)).toBeLessThanOrEqual(1e-3 * printed);
  });
});

describe('coupling at 50 ohm (Kurokawa 1965)', () => {
  it.each(checksOf('T1.S21'))('$id: dipoles in free space and whips on the plane', (row) => {
    const d = numberOf(row.inputs, 'd_over_lambda');
    const dipoles = [upright(0, 0, 0.5), { ...upright(d, 0, 0.5), id: 'e' }];
    const whips = [uprightWhip('a', [0, 0, 0], 0.25, thin), uprightWhip('b', [d, 0, 0], 0.25, thin)];
    const isolation = (ground: 'none' | 'plane', wires: Wire[]) =>
      solveScene({ ground, frequencies: [frequency], wires }, 'emf').results[0]!.isolationDb[1]![0]!;
    const limit = row.tolerance;
    expect(
      Math.abs(isolation('none', dipoles) + numberOf(row.expected, 'dipole_50ohm_dB')),
    ).toBeLessThanOrEqual(limit);
    expect(
      Math.abs(isolation('plane', whips) + numberOf(row.expected, 'monopole_50ohm_dB')),
    ).toBeLessThanOrEqual(limit);
  });

  it.each(checksOf('T2.z2s'))('$id: impedances to power waves', (row) => {
    const own = complexOf(row.inputs, 'Z11');
    const between = complexOf(row.inputs, 'Z12');
    const load = { re: numberOf(row.inputs, 'Zref_ohm'), im: 0 };
    const z = {
      rows: 2,
      columns: 2,
      re: Float64Array.of(own.re, between.re, between.re, own.re),
      im: Float64Array.of(own.im, between.im, between.im, own.im),
    };
    const s = scatteringMatrix(z, [load, load]);
    const s11 = complexOf(row.expected, 'S11');
    const s21 = complexOf(row.expected, 'S21');
    expect(Math.hypot(s.re[0]! - s11.re, s.im[0]! - s11.im)).toBeLessThanOrEqual(row.tolerance);
    expect(Math.hypot(s.re[2]! - s21.re, s.im[2]! - s21.im)).toBeLessThanOrEqual(row.tolerance);
  });
});

describe('two driven half-wave dipoles (Kraus, chapter 10)', () => {
  it.each(checksOf('T10.drv'))('$id: gain over one dipole', (row) => {
    const d = numberOf(row.inputs, 'd_over_lambda');
    const phase = numberOf(row.inputs, 'phase_rad');
    const phi = (numberOf(row.inputs, 'phi_rad') * 180) / Math.PI;
    const one = chainOfWire(upright(0, 0, 0.5), 2);
    const other = chainOfWire(upright(d, 0, 0.5), 2);
    const current = (chain: typeof one, angle: number): ChainCurrent => ({
      chain,
      re: Float64Array.of(0, Math.cos(angle), 0),
      im: Float64Array.of(0, Math.sin(angle), 0),
    });
    const direction = directionOf(phi, 0);
    const pair = radiationIntensity(k, 'none', [current(one, 0), current(other, phase)], direction);
    const alone = radiationIntensity(k, 'none', [current(one, 0)], direction);
    const r11 = self(upright(0, 0, 0.5)).re;
    const r12 = mutual(upright(0, 0, 0.5), upright(d, 0, 0.5)).re;
    const ratio = (pair / alone) * (r11 / (2 * r11 + 2 * r12 * Math.cos(phase)));
    expect(Math.abs(ratio - numberOf(row.expected, 'gain_ratio'))).toBeLessThanOrEqual(row.tolerance);
  });
});
