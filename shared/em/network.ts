import { complexLuFactorise, complexLuSolve } from '../numerics/complex-lu';
import { createComplexMatrix, type ComplexMatrix } from '../numerics/complex-matrix';
import type { Complex, Wire } from './scene';

/** What closes a port unless something else is given, ohm. */
const usualLoad: Complex = { re: 50, im: 0 };

/** No isolation is told beyond this, dB: the numbers behind it are rounding. */
export const greatestIsolationDb = 300;

/** The impedance that closes a wire's port. */
export function loadOf(wire: Wire): Complex {
  return wire.load ?? usualLoad;
}

/**
 * Power-wave scattering matrix S = F (Z - G*) (Z + G)^-1 F^-1 with F = diag(1 / (2 sqrt(Re g_i))).
 * `z`: n by n, ohm; `references`: n impedances with positive real part.
 * @throws RangeError for shapes that do not fit, references without resistance, or a singular Z + G
 * @source Kurokawa 1965, equations 18 and 19
 */
export function scatteringMatrix(z: ComplexMatrix, references: readonly Complex[]): ComplexMatrix {
  const n = references.length;
  if (z.rows !== n || z.columns !== n) throw new RangeError(`${n} references for ${z.rows} by ${z.columns}`);
  const sum: ComplexMatrix = { rows: n, columns: n, re: z.re.slice(), im: z.im.slice() };
  const unit = createComplexMatrix(n, n);
  references.forEach((g, i) => {
    sum.re[i * n + i]! += g.re;
    sum.im[i * n + i]! += g.im;
    unit.re[i * n + i] = 1;
  });
  return scatteringFromLoaded(complexLuSolve(complexLuFactorise(sum), unit), references);
}

/**
 * The same from the admittance matrix of the loaded ports, Y = (Z + G)^-1:
 * S_ij = delta_ij - 2 sqrt(Re g_i Re g_j) Y_ij.
 * @throws RangeError for a reference without positive resistance
 */
export function scatteringFromLoaded(loaded: ComplexMatrix, references: readonly Complex[]): ComplexMatrix {
  const n = references.length;
  const s = createComplexMatrix(n, n);
  references.forEach((gi, i) => {
    if (!(gi.re > 0)) throw new RangeError(`reference ${gi.re} + j${gi.im} ohm has no positive resistance`);
    references.forEach((gj, j) => {
      const scale = 2 * Math.sqrt(gi.re * gj.re);
      s.re[i * n + j] = (i === j ? 1 : 0) - scale * loaded.re[i * n + j]!;
      s.im[i * n + j] = -scale * loaded.im[i * n + j]!;
    });
  });
  return s;
}

/**
 * Z = Y^-1 - G, ohm, of ports with loads G; every entry NaN when a port sits at a current zero and its
 * impedance is not finite.
 */
export function impedanceFromLoaded(loaded: ComplexMatrix, references: readonly Complex[]): ComplexMatrix {
  const n = references.length;
  const unit = createComplexMatrix(n, n);
  for (let i = 0; i < n; i += 1) {
    unit.re[i * n + i] = 1;
    if (loaded.re[i * n + i] === 0 && loaded.im[i * n + i] === 0) {
      return { rows: n, columns: n, re: unit.re.fill(NaN), im: unit.im.fill(NaN) };
    }
  }
  const z = complexLuSolve(complexLuFactorise(loaded), unit);
  references.forEach((g, i) => {
    z.re[i * n + i]! -= g.re;
    z.im[i * n + i]! -= g.im;
  });
  return z;
}

/** -20 lg |S|, dB, at most 300. */
export function isolationOf(re: number, im: number): number {
  return Math.min(greatestIsolationDb, -10 * Math.log10(re * re + im * im));
}
