/**
 * A complex symmetric system that is eliminated block by block, with its last block kept apart: the *border*
 * can be exchanged at little cost while the *rest* stays factorised.
 *
 *     [ A   U ]      A = L P^-1 L^T,  L unit lower block triangular, P block diagonal (kept inverted),
 *     [ U^T D ]      S = D - U^T A^-1 U  (Schur complement)
 *
 * The blocks on the diagonal are inverted with pivoting; the blocks themselves are taken in the given order,
 * which suits systems whose every leading part is solvable by itself (passive networks are).
 * @source Golub and Van Loan 2013, sections 3.2.10 and 4.1; Zhang 2005, The Schur Complement
 */
export type BlockFactors = {
  readonly order: number;
  /** First row of each block, and the order at the end. */
  readonly starts: Int32Array;
  /** L below the block diagonal, row-major. */
  readonly lowerRe: Float64Array;
  readonly lowerIm: Float64Array;
  /** Inverted diagonal blocks, one after the other, row-major. */
  readonly pivotRe: Float64Array;
  readonly pivotIm: Float64Array;
  readonly pivotStarts: Int32Array;
};

/** Room for the factors of blocks of those sizes. */
export function createBlockFactors(sizes: readonly number[]): BlockFactors {
  const starts = new Int32Array(sizes.length + 1);
  const pivotStarts = new Int32Array(sizes.length + 1);
  sizes.forEach((size, b) => {
    starts[b + 1] = starts[b]! + size;
    pivotStarts[b + 1] = pivotStarts[b]! + size * size;
  });
  const order = starts[sizes.length]!;
  const pivots = pivotStarts[sizes.length]!;
  return {
    order,
    starts,
    pivotStarts,
    lowerRe: new Float64Array(order * order),
    lowerIm: new Float64Array(order * order),
    pivotRe: new Float64Array(pivots),
    pivotIm: new Float64Array(pivots),
  };
}

/**
 * Factorises in place: on entry `lowerRe`/`lowerIm` hold the lower triangle of A, diagonal blocks in full.
 * @throws RangeError when a diagonal block is singular
 */
export function blockFactorise(factors: BlockFactors): void {
  const { order: n, starts, lowerRe: re, lowerIm: im, pivotRe, pivotIm, pivotStarts } = factors;
  const widest = Math.max(
    0,
    ...Array.from({ length: starts.length - 1 }, (_, b) => starts[b + 1]! - starts[b]!),
  );
  const scaledRe = new Float64Array(n * widest);
  const scaledIm = new Float64Array(n * widest);
  for (let b = 0; b < starts.length - 1; b += 1) {
    const from = starts[b]!;
    const to = starts[b + 1]!;
    const m = to - from;
    const at = pivotStarts[b]!;
    for (let i = 0; i < m; i += 1) {
      for (let j = 0; j < m; j += 1) {
        pivotRe[at + i * m + j] = re[(from + i) * n + from + j]!;
        pivotIm[at + i * m + j] = im[(from + i) * n + from + j]!;
      }
    }
    if (!invertBlock(m, pivotRe, pivotIm, at)) throw new RangeError(`singular block ${b} of order ${m}`);
    for (let i = to; i < n; i += 1) {
      for (let j = 0; j < m; j += 1) {
        let tr = 0;
        let ti = 0;
        for (let q = 0; q < m; q += 1) {
          const zr = re[i * n + from + q]!;
          const zi = im[i * n + from + q]!;
          const pr = pivotRe[at + q * m + j]!;
          const pi = pivotIm[at + q * m + j]!;
          tr += zr * pr - zi * pi;
          ti += zr * pi + zi * pr;
        }
        scaledRe[i * m + j] = tr;
        scaledIm[i * m + j] = ti;
      }
    }
    for (let i = to; i < n; i += 1) updateRow(factors, from, m, to, i, scaledRe, scaledIm);
    // The next block's diagonal is needed in full; its upper half mirrors the lower one.
    mirrorNextBlock(factors, b + 1);
    for (let i = to; i < n; i += 1) {
      re.set(scaledRe.subarray(i * m, (i + 1) * m), i * n + from);
      im.set(scaledIm.subarray(i * m, (i + 1) * m), i * n + from);
    }
  }
}

/** Row i of the trailing matrix minus its scaled entries times those of the rows up to it, two rows at a time. */
function updateRow(
  { order: n, lowerRe: re, lowerIm: im }: BlockFactors,
  from: number,
  m: number,
  to: number,
  i: number,
  scaledRe: Float64Array,
  scaledIm: Float64Array,
): void {
  const row = i * n;
  const scaled = i * m;
  let j = to;
  for (; j < i; j += 2) {
    let ar = 0;
    let ai = 0;
    let br = 0;
    let bi = 0;
    for (let q = 0, a = j * n + from, b = a + n; q < m; q += 1, a += 1, b += 1) {
      const tr = scaledRe[scaled + q]!;
      const ti = scaledIm[scaled + q]!;
      const xr = re[a]!;
      const xi = im[a]!;
      const yr = re[b]!;
      const yi = im[b]!;
      ar += tr * xr - ti * xi;
      ai += tr * xi + ti * xr;
      br += tr * yr - ti * yi;
      bi += tr * yi + ti * yr;
    }
    re[row + j]! -= ar;
    im[row + j]! -= ai;
    re[row + j + 1]! -= br;
    im[row + j + 1]! -= bi;
  }
  if (j > i) return;
  let ar = 0;
  let ai = 0;
  for (let q = 0, a = j * n + from; q < m; q += 1, a += 1) {
    const tr = scaledRe[scaled + q]!;
    const ti = scaledIm[scaled + q]!;
    ar += tr * re[a]! - ti * im[a]!;
    ai += tr * im[a]! + ti * re[a]!;
  }
  re[row + j]! -= ar;
  im[row + j]! -= ai;
}

/** y = L^-1 x for `columns` right sides, in place; x is row-major, order by columns. */
export function blockForward(
  factors: BlockFactors,
  columns: number,
  xr: Float64Array,
  xi: Float64Array,
): void {
  const { starts } = factors;
  for (let b = 1; b < starts.length - 1; b += 1) {
    const width = starts[b]!;
    for (let j = width; j < starts[b + 1]!; j += 1) {
      let c = 0;
      // Several right sides at a time: each entry of L is read once for all of them.
      for (; c + 3 < columns; c += 4) forwardFour(factors, columns, width, j, c, xr, xi);
      for (; c < columns; c += 1) forwardOne(factors, columns, width, j, c, xr, xi);
    }
  }
}

function forwardFour(
  { order, lowerRe, lowerIm }: BlockFactors,
  columns: number,
  width: number,
  j: number,
  c: number,
  xr: Float64Array,
  xi: Float64Array,
): void {
  let r0 = 0;
  let i0 = 0;
  let r1 = 0;
  let i1 = 0;
  let r2 = 0;
  let i2 = 0;
  let r3 = 0;
  let i3 = 0;
  for (let i = 0, at = c, l = j * order; i < width; i += 1, l += 1, at += columns) {
    const lr = lowerRe[l]!;
    const li = lowerIm[l]!;
    const a = xr[at]!;
    const b = xi[at]!;
    r0 += lr * a - li * b;
    i0 += lr * b + li * a;
    const e = xr[at + 1]!;
    const f = xi[at + 1]!;
    r1 += lr * e - li * f;
    i1 += lr * f + li * e;
    const g = xr[at + 2]!;
    const h = xi[at + 2]!;
    r2 += lr * g - li * h;
    i2 += lr * h + li * g;
    const p = xr[at + 3]!;
    const q = xi[at + 3]!;
    r3 += lr * p - li * q;
    i3 += lr * q + li * p;
  }
  const to = j * columns + c;
  xr[to]! -= r0;
  xi[to]! -= i0;
  xr[to + 1]! -= r1;
  xi[to + 1]! -= i1;
  xr[to + 2]! -= r2;
  xi[to + 2]! -= i2;
  xr[to + 3]! -= r3;
  xi[to + 3]! -= i3;
}

function forwardOne(
  { order, lowerRe, lowerIm }: BlockFactors,
  columns: number,
  width: number,
  j: number,
  c: number,
  xr: Float64Array,
  xi: Float64Array,
): void {
  let re = 0;
  let im = 0;
  for (let i = 0, at = c, l = j * order; i < width; i += 1, l += 1, at += columns) {
    const lr = lowerRe[l]!;
    const li = lowerIm[l]!;
    re += lr * xr[at]! - li * xi[at]!;
    im += lr * xi[at]! + li * xr[at]!;
  }
  xr[j * columns + c]! -= re;
  xi[j * columns + c]! -= im;
}

/** x = L^-T y for one right side, in place. */
export function blockBackward(factors: BlockFactors, xr: Float64Array, xi: Float64Array): void {
  const { order: n, starts, lowerRe, lowerIm } = factors;
  for (let b = starts.length - 2; b > 0; b -= 1) {
    const width = starts[b]!;
    for (let j = starts[b + 1]! - 1; j >= width; j -= 1) {
      const row = j * n;
      const yr = xr[j]!;
      const yi = xi[j]!;
      for (let i = 0; i < width; i += 1) {
        const lr = lowerRe[row + i]!;
        const li = lowerIm[row + i]!;
        xr[i]! -= lr * yr - li * yi;
        xi[i]! -= lr * yi + li * yr;
      }
    }
  }
}

/** out = P y for `columns` right sides, row-major; `out` and `y` are different arrays. */
export function applyPivots(
  factors: BlockFactors,
  columns: number,
  yr: Float64Array,
  yi: Float64Array,
  outRe: Float64Array,
  outIm: Float64Array,
): void {
  const { starts, pivotRe, pivotIm, pivotStarts } = factors;
  for (let b = 0; b < starts.length - 1; b += 1) {
    const from = starts[b]!;
    const m = starts[b + 1]! - from;
    for (let i = 0; i < m; i += 1) {
      const row = pivotStarts[b]! + i * m;
      for (let c = 0; c < columns; c += 1) {
        let re = 0;
        let im = 0;
        for (let q = 0; q < m; q += 1) {
          const pr = pivotRe[row + q]!;
          const pi = pivotIm[row + q]!;
          const at = (from + q) * columns + c;
          re += pr * yr[at]! - pi * yi[at]!;
          im += pr * yi[at]! + pi * yr[at]!;
        }
        outRe[(from + i) * columns + c] = re;
        outIm[(from + i) * columns + c] = im;
      }
    }
  }
}

/** Inverts the m-by-m block that starts at `at`, in place, by Gauss-Jordan with row pivots; false when singular. */
export function invertBlock(m: number, re: Float64Array, im: Float64Array, at: number): boolean {
  const order = new Int32Array(m);
  for (let p = 0; p < m; p += 1) {
    let best = 0;
    let pivotRow = p;
    for (let i = p; i < m; i += 1) {
      const size = re[at + i * m + p]! ** 2 + im[at + i * m + p]! ** 2;
      if (size > best) {
        best = size;
        pivotRow = i;
      }
    }
    if (!(best > 0) || !Number.isFinite(best)) return false;
    order[p] = pivotRow;
    if (pivotRow !== p) {
      for (let j = 0; j < m; j += 1) exchange(re, im, at + p * m + j, at + pivotRow * m + j);
    }
    const pr = re[at + p * m + p]! / best;
    const pi = -im[at + p * m + p]! / best;
    re[at + p * m + p] = 1;
    im[at + p * m + p] = 0;
    for (let j = 0; j < m; j += 1) multiplyBy(re, im, at + p * m + j, pr, pi);
    for (let i = 0; i < m; i += 1) {
      if (i === p) continue;
      const fr = re[at + i * m + p]!;
      const fi = im[at + i * m + p]!;
      re[at + i * m + p] = 0;
      im[at + i * m + p] = 0;
      for (let j = 0; j < m; j += 1) {
        const ur = re[at + p * m + j]!;
        const ui = im[at + p * m + j]!;
        re[at + i * m + j]! -= fr * ur - fi * ui;
        im[at + i * m + j]! -= fr * ui + fi * ur;
      }
    }
  }
  for (let p = m - 1; p >= 0; p -= 1) {
    const other = order[p]!;
    if (other === p) continue;
    for (let i = 0; i < m; i += 1) exchange(re, im, at + i * m + p, at + i * m + other);
  }
  return true;
}

function mirrorNextBlock(factors: BlockFactors, b: number): void {
  const { order: n, starts, lowerRe: re, lowerIm: im } = factors;
  if (b >= starts.length - 1) return;
  for (let i = starts[b]!; i < starts[b + 1]!; i += 1) {
    for (let j = starts[b]!; j < i; j += 1) {
      re[j * n + i] = re[i * n + j]!;
      im[j * n + i] = im[i * n + j]!;
    }
  }
}

function exchange(re: Float64Array, im: Float64Array, a: number, b: number): void {
  const r = re[a]!;
  const i = im[a]!;
  re[a] = re[b]!;
  im[a] = im[b]!;
  re[b] = r;
  im[b] = i;
}

function multiplyBy(re: Float64Array, im: Float64Array, at: number, fr: number, fi: number): void {
  const r = re[at]!;
  const i = im[at]!;
  re[at] = r * fr - i * fi;
  im[at] = r * fi + i * fr;
}
