import { createComplexMatrix, type ComplexMatrix } from './complex-matrix';

/** P A = L U of a square complex matrix; L has a unit diagonal and shares the storage with U. */
export type ComplexLu = { readonly factors: ComplexMatrix; readonly rowOrder: Int32Array };

/**
 * Factorises a square complex matrix with partial pivoting; the argument is left as it was.
 * @throws RangeError for a matrix that is not square or singular to working precision
 * @source Golub and Van Loan 2013, algorithm 3.4.1
 */
export function complexLuFactorise(matrix: ComplexMatrix): ComplexLu {
  if (matrix.rows !== matrix.columns) {
    throw new RangeError(`cannot factorise ${matrix.rows} by ${matrix.columns}: not square`);
  }
  const n = matrix.rows;
  const factors: ComplexMatrix = { rows: n, columns: n, re: matrix.re.slice(), im: matrix.im.slice() };
  const rowOrder = Int32Array.from({ length: n }, (_, i) => i);
  if (!luInPlace(n, factors.re, factors.im, rowOrder)) {
    throw new RangeError(`cannot factorise: singular matrix of order ${n}`);
  }
  return { factors, rowOrder };
}

/**
 * Solves A X = B for all columns of B by a factorisation of A.
 * @throws RangeError when B has another number of rows
 */
export function complexLuSolve(lu: ComplexLu, right: ComplexMatrix): ComplexMatrix {
  const n = lu.factors.rows;
  if (right.rows !== n) throw new RangeError(`right side of ${right.rows} rows for order ${n}`);
  const m = right.columns;
  const x = createComplexMatrix(n, m);
  for (let i = 0; i < n; i += 1) {
    const from = lu.rowOrder[i]! * m;
    x.re.set(right.re.subarray(from, from + m), i * m);
    x.im.set(right.im.subarray(from, from + m), i * m);
  }
  substitute(n, m, lu.factors.re, lu.factors.im, x.re, x.im);
  return x;
}

/** Solves A X = B once. @throws RangeError as the factorisation and the solution do */
export function complexSolve(matrix: ComplexMatrix, right: ComplexMatrix): ComplexMatrix {
  return complexLuSolve(complexLuFactorise(matrix), right);
}

/** The unchecked factorisation; false when a pivot vanishes. */
function luInPlace(n: number, re: Float64Array, im: Float64Array, order: Int32Array): boolean {
  for (let p = 0; p < n; p += 1) {
    let best = -1;
    let pivotRow = p;
    for (let i = p; i < n; i += 1) {
      const size = re[i * n + p]! ** 2 + im[i * n + p]! ** 2;
      if (size > best) {
        best = size;
        pivotRow = i;
      }
    }
    if (!(best > 0) || !Number.isFinite(best)) return false;
    if (pivotRow !== p) swapRows(n, re, im, order, p, pivotRow);
    const row = p * n;
    const invRe = re[row + p]! / best;
    const invIm = -im[row + p]! / best;
    for (let i = p + 1; i < n; i += 1) {
      const at = i * n;
      const lr = re[at + p]! * invRe - im[at + p]! * invIm;
      const li = re[at + p]! * invIm + im[at + p]! * invRe;
      re[at + p] = lr;
      im[at + p] = li;
      if (lr === 0 && li === 0) continue;
      for (let j = p + 1; j < n; j += 1) {
        const ur = re[row + j]!;
        const ui = im[row + j]!;
        re[at + j]! -= lr * ur - li * ui;
        im[at + j]! -= lr * ui + li * ur;
      }
    }
  }
  return true;
}

function swapRows(
  n: number,
  re: Float64Array,
  im: Float64Array,
  order: Int32Array,
  a: number,
  b: number,
): void {
  for (let j = 0; j < n; j += 1) {
    const r = re[a * n + j]!;
    const i = im[a * n + j]!;
    re[a * n + j] = re[b * n + j]!;
    im[a * n + j] = im[b * n + j]!;
    re[b * n + j] = r;
    im[b * n + j] = i;
  }
  const row = order[a]!;
  order[a] = order[b]!;
  order[b] = row;
}

/** Forward and backward substitution on all columns of x, in place. */
function substitute(
  n: number,
  m: number,
  re: Float64Array,
  im: Float64Array,
  xr: Float64Array,
  xi: Float64Array,
): void {
  for (let i = 0; i < n; i += 1) {
    for (let p = 0; p < i; p += 1) subtractRow(m, re[i * n + p]!, im[i * n + p]!, xr, xi, p * m, i * m);
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    for (let p = i + 1; p < n; p += 1) subtractRow(m, re[i * n + p]!, im[i * n + p]!, xr, xi, p * m, i * m);
    const pr = re[i * n + i]!;
    const pi = im[i * n + i]!;
    const size = pr * pr + pi * pi;
    for (let c = i * m; c < (i + 1) * m; c += 1) {
      const r = xr[c]!;
      const s = xi[c]!;
      xr[c] = (r * pr + s * pi) / size;
      xi[c] = (s * pr - r * pi) / size;
    }
  }
}

/** x[to] -= f x[from], one row of m columns. */
function subtractRow(
  m: number,
  fr: number,
  fi: number,
  xr: Float64Array,
  xi: Float64Array,
  from: number,
  to: number,
): void {
  for (let c = 0; c < m; c += 1) {
    const r = xr[from + c]!;
    const i = xi[from + c]!;
    xr[to + c]! -= fr * r - fi * i;
    xi[to + c]! -= fr * i + fi * r;
  }
}
