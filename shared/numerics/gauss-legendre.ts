/** Nodes and weights of a quadrature rule on [0, 1]. */
export type QuadratureRule = { readonly nodes: Float64Array; readonly weights: Float64Array };

/**
 * Gauss-Legendre rule of `n` points on [0, 1]: exact for polynomials up to degree 2n - 1.
 * The nodes are the zeros of P_n, by Newton's method from Tricomi's estimate.
 * @throws RangeError unless n is a whole number from 1 to 256
 * @source Abramowitz and Stegun 1964, 25.4.29 and 25.4.30
 */
export function gaussLegendre(n: number): QuadratureRule {
  if (!Number.isInteger(n) || n < 1 || n > 256) throw new RangeError(`no Gauss rule of ${n} points`);
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 1;
    // Quadratic convergence from an estimate good to 1e-4: eight steps are more than enough.
    for (let step = 0; step < 8; step += 1) {
      let previous = 1;
      let value = x;
      for (let m = 2; m <= n; m += 1) {
        const next = ((2 * m - 1) * x * value - (m - 1) * previous) / m;
        previous = value;
        value = next;
      }
      slope = n === 1 ? 1 : (n * (x * value - previous)) / (x * x - 1);
      x -= value / slope;
    }
    nodes[n - 1 - i] = (1 + x) / 2;
    weights[n - 1 - i] = 1 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
