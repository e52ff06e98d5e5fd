import {
  applyPivots,
  blockBackward,
  blockFactorise,
  blockForward,
  createBlockFactors,
} from '@/shared/numerics/block-elimination';
import { complexLuFactorise, complexSolve } from '@/shared/numerics/complex-lu';
import { createComplexMatrix, type ComplexMatrix } from '@/shared/numerics/complex-matrix';
import { gaussLegendre } from '@/shared/numerics/gauss-legendre';
import { leadingBasis } from '@/shared/numerics/leading-basis';
import { seededRandom } from '../../support/whip-scenes';

function randomMatrix(seed: number, rows: number, columns: number): ComplexMatrix {
  const random = seededRandom(seed);
  const matrix = createComplexMatrix(rows, columns);
  for (let i = 0; i < rows * columns; i += 1) {
    matrix.re[i] = random() - 0.5;
    matrix.im[i] = random() - 0.5;
  }
  return matrix;
}

/** The greatest entry of |A X - B|. */
function residual(a: ComplexMatrix, x: ComplexMatrix, b: ComplexMatrix): number {
  let worst = 0;
  for (let i = 0; i < a.rows; i += 1) {
    for (let c = 0; c < b.columns; c += 1) {
      let re = -b.re[i * b.columns + c]!;
      let im = -b.im[i * b.columns + c]!;
      for (let j = 0; j < a.columns; j += 1) {
        const [ar, ai] = [a.re[i * a.columns + j]!, a.im[i * a.columns + j]!];
        const [xr, xi] = [x.re[j * b.columns + c]!, x.im[j * b.columns + c]!];
        re += ar * xr - ai * xi;
        im += ar * xi + ai * xr;
      }
      worst = Math.max(worst, Math.hypot(re, im));
    }
  }
  return worst;
}

// Random matrices of this order have condition numbers below 1e4.
const rounding = 1e-11;

describe('complex elimination', () => {
  it('solves for several right sides', () => {
    const a = randomMatrix(1, 30, 30);
    const b = randomMatrix(2, 30, 4);
    expect(residual(a, complexSolve(a, b), b)).toBeLessThanOrEqual(rounding);
  });

  it('takes a zero pivot in its stride and leaves its argument alone', () => {
    const a = { rows: 2, columns: 2, re: Float64Array.of(0, 1, 1, 0), im: new Float64Array(4) };
    const x = complexSolve(a, { rows: 2, columns: 1, re: Float64Array.of(3, 5), im: new Float64Array(2) });
    expect([...x.re]).toEqual([5, 3]);
    expect([...a.re]).toEqual([0, 1, 1, 0]);
  });

  it('refuses what is singular, not square or does not fit', () => {
    expect(() => complexLuFactorise(createComplexMatrix(3, 3))).toThrow(/singular/);
    expect(() => complexLuFactorise(createComplexMatrix(2, 3))).toThrow(/not square/);
    expect(() => complexSolve(randomMatrix(1, 2, 2), createComplexMatrix(3, 1))).toThrow(/rows/);
    expect(() => createComplexMatrix(-1, 2)).toThrow(RangeError);
  });

  it('solves a symmetric system block by block as the dense elimination does', () => {
    const sizes = [3, 1, 5, 2, 4];
    const order = 15;
    const a = randomMatrix(3, order, order);
    for (let i = 0; i < order; i += 1) {
      a.re[i * order + i]! += 4;
      for (let j = 0; j < i; j += 1) {
        a.re[j * order + i] = a.re[i * order + j]!;
        a.im[j * order + i] = a.im[i * order + j]!;
      }
    }
    const factors = createBlockFactors(sizes);
    factors.lowerRe.set(a.re);
    factors.lowerIm.set(a.im);
    blockFactorise(factors);
    for (const columns of [1, 4, 7]) {
      const b = randomMatrix(4 + columns, order, columns);
      const y = { ...b, re: b.re.slice(), im: b.im.slice() };
      blockForward(factors, columns, y.re, y.im);
      const x = createComplexMatrix(order, columns);
      applyPivots(factors, columns, y.re, y.im, x.re, x.im);
      for (let c = 0; c < columns; c += 1) {
        const re = Float64Array.from({ length: order }, (_, i) => x.re[i * columns + c]!);
        const im = Float64Array.from({ length: order }, (_, i) => x.im[i * columns + c]!);
        blockBackward(factors, re, im);
        for (let i = 0; i < order; i += 1) {
          x.re[i * columns + c] = re[i]!;
          x.im[i * columns + c] = im[i]!;
        }
      }
      expect(residual(a, x, b)).toBeLessThanOrEqual(rounding);
    }
  });

  it('refuses a singular block', () => {
    expect(() => blockFactorise(createBlockFactors([2, 2]))).toThrow(/singular block 0/);
  });
});

describe('leading basis', () => {
  const columns = [
    Float64Array.of(3, 0, 0, 0),
    Float64Array.of(3, 0.3, 0, 0),
    Float64Array.of(0, 0, 1e-6, 0),
  ];

  it('keeps the directions above the share, orthonormal', () => {
    const { count, vectors } = leadingBasis(columns, 4, 0.01);
    expect(count).toBe(2);
    for (let a = 0; a < 2; a += 1) {
      for (let b = 0; b < 2; b += 1) {
        let product = 0;
        for (let i = 0; i < 4; i += 1) product += vectors[i * 2 + a]! * vectors[i * 2 + b]!;
        expect(Math.abs(product - (a === b ? 1 : 0))).toBeLessThanOrEqual(1e-12);
      }
    }
  });

  it('keeps all for a small share, none of nothing, and refuses a share outside (0, 1)', () => {
    expect(leadingBasis(columns, 4, 1e-8).count).toBe(3);
    expect(leadingBasis([new Float64Array(4)], 4, 0.1).count).toBe(0);
    expect(() => leadingBasis(columns, 4, 0)).toThrow(RangeError);
  });
});

describe('Gauss-Legendre rule', () => {
  it.each([1, 2, 4, 8, 16, 32, 64])('of %i points integrates polynomials of degree 2n - 1', (n) => {
    const { nodes, weights } = gaussLegendre(n);
    for (const degree of [0, 1, n, 2 * n - 1]) {
      let sum = 0;
      nodes.forEach((x, i) => (sum += weights[i]! * x ** degree));
      expect(Math.abs(sum - 1 / (degree + 1))).toBeLessThanOrEqual(1e-13);
    }
  });

  it('refuses a number of points that makes no rule', () => {
    for (const n of [0, 1.5, 257, NaN]) expect(() => gaussLegendre(n)).toThrow(RangeError);
  });
});
