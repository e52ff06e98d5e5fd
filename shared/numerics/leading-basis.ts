/**
 * Orthonormal basis of the leading left singular vectors of the real matrix whose `columns` have n entries each,
 * as an n-by-r row-major array: those with a singular value of at least `share` of the greatest.
 * A pivoted Gram-Schmidt elimination first brings the columns to their numerical rank, then Jacobi rotations
 * diagonalise the small Gram matrix.
 * @throws RangeError for a share outside (0, 1)
 * @source Golub and Van Loan 2013, algorithms 5.4.1 and 8.5.3
 */
export function leadingBasis(
  columns: readonly Float64Array[],
  n: number,
  share: number,
): { count: number; vectors: Float64Array } {
  if (!(share > 0 && share < 1)) throw new RangeError(`no share of ${share}`);
  // An order finer than asked for, so that the cut is made by singular values and not by the pivots.
  const range = orthogonalRange(columns, n, share / 10);
  const r = range.length;
  const gram = new Float64Array(r * r);
  const projected = new Float64Array(r);
  for (const column of columns) {
    for (let a = 0; a < r; a += 1) projected[a] = product(range[a]!, column);
    for (let a = 0; a < r; a += 1) {
      for (let b = 0; b < r; b += 1) gram[a * r + b]! += projected[a]! * projected[b]!;
    }
  }
  const { values, vectors } = symmetricEigen(gram, r);
  const order = Array.from({ length: r }, (_, i) => i).sort((a, b) => values[b]! - values[a]!);
  const greatest = r > 0 ? values[order[0]!]! : 0;
  const kept = order.filter((i) => values[i]! >= share * share * greatest && values[i]! > 0);
  const basis = new Float64Array(n * kept.length);
  kept.forEach((e, m) => {
    for (let a = 0; a < r; a += 1) {
      const factor = vectors[a * r + e]!;
      const direction = range[a]!;
      for (let i = 0; i < n; i += 1) basis[i * kept.length + m]! += factor * direction[i]!;
    }
  });
  return { count: kept.length, vectors: basis };
}

/** Orthonormal vectors that span the columns up to a remainder of `share` of the longest column. */
function orthogonalRange(columns: readonly Float64Array[], n: number, share: number): Float64Array[] {
  const rest = columns.map((column) => column.slice());
  const range: Float64Array[] = [];
  let first = 0;
  while (range.length < Math.min(n, columns.length)) {
    let longest = 0;
    let pivot = -1;
    rest.forEach((column, i) => {
      const length = Math.sqrt(product(column, column));
      if (length > longest) {
        longest = length;
        pivot = i;
      }
    });
    first = Math.max(first, longest);
    if (pivot < 0 || longest <= share * first) break;
    const direction = rest[pivot]!.map((value) => value / longest);
    // Twice is enough: the second pass removes what rounding left of earlier directions.
    for (const earlier of range) subtract(direction, earlier);
    const length = Math.sqrt(product(direction, direction));
    for (let i = 0; i < n; i += 1) direction[i]! /= length;
    range.push(direction);
    for (const column of rest) subtract(column, direction);
  }
  return range;
}

/** Eigenvalues and eigenvectors (columns) of a symmetric matrix of order n by cyclic Jacobi rotations. */
function symmetricEigen(matrix: Float64Array, n: number): { values: Float64Array; vectors: Float64Array } {
  const a = matrix.slice();
  const vectors = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) vectors[i * n + i] = 1;
  const scale = a.reduce((sum, value) => sum + value * value, 0);
  // Convergence is quadratic; thirty sweeps are never reached by a matrix of finite numbers.
  for (let sweep = 0; sweep < 30; sweep += 1) {
    let off = 0;
    for (let p = 0; p < n; p += 1) for (let q = p + 1; q < n; q += 1) off += a[p * n + q]! ** 2;
    if (off <= 1e-24 * scale) break;
    for (let p = 0; p < n; p += 1) for (let q = p + 1; q < n; q += 1) rotate(a, vectors, n, p, q);
  }
  return { values: Float64Array.from({ length: n }, (_, i) => a[i * n + i]!), vectors };
}

/** One Jacobi rotation that annihilates a_pq. */
function rotate(a: Float64Array, vectors: Float64Array, n: number, p: number, q: number): void {
  const apq = a[p * n + q]!;
  if (apq === 0) return;
  const theta = (a[q * n + q]! - a[p * n + p]!) / (2 * apq);
  const t = (theta >= 0 ? 1 : -1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
  const c = 1 / Math.sqrt(t * t + 1);
  const s = t * c;
  for (let i = 0; i < n; i += 1) {
    const ip = a[i * n + p]!;
    const iq = a[i * n + q]!;
    a[i * n + p] = c * ip - s * iq;
    a[i * n + q] = s * ip + c * iq;
    const vp = vectors[i * n + p]!;
    const vq = vectors[i * n + q]!;
    vectors[i * n + p] = c * vp - s * vq;
    vectors[i * n + q] = s * vp + c * vq;
  }
  for (let i = 0; i < n; i += 1) {
    const pi = a[p * n + i]!;
    const qi = a[q * n + i]!;
    a[p * n + i] = c * pi - s * qi;
    a[q * n + i] = s * pi + c * qi;
  }
}

function product(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) sum += a[i]! * b[i]!;
  return sum;
}

/** Removes from `column` its part along a unit vector. */
function subtract(column: Float64Array, direction: Float64Array): void {
  const part = product(column, direction);
  for (let i = 0; i < column.length; i += 1) column[i]! -= part * direction[i]!;
}
