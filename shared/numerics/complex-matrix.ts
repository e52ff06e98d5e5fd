/** A dense complex matrix in two row-major arrays, real and imaginary parts apart. */
export type ComplexMatrix = {
  readonly rows: number;
  readonly columns: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
};

/** A matrix of zeros. @throws RangeError for a negative or fractional size */
export function createComplexMatrix(rows: number, columns: number): ComplexMatrix {
  if (!Number.isInteger(rows) || !Number.isInteger(columns) || rows < 0 || columns < 0) {
    throw new RangeError(`no matrix of ${rows} by ${columns}`);
  }
  return { rows, columns, re: new Float64Array(rows * columns), im: new Float64Array(rows * columns) };
}
