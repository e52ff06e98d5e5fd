/**
 * A vertical wire's functions as equivalent sources and receivers on the heights i h that all vertical wires
 * share at one frequency. Between two wires at distance d the kernel e^{-jkR}/R then depends on i - j and, for
 * the image, on i + j alone. Sources are the node waves' weights (reaction.ts), receivers the current itself;
 * both are brought to the grid by Lagrange interpolation of the kernel, so that the ends need no grid point.
 * @source interpolation onto a regular grid: Bleszynski, Bleszynski and Jaroszewicz 1996
 */
export type VerticalSamples = {
  /** Grid step, metres. */
  readonly step: number;
  /** Index of the first grid height; the height is index * step above the reference. */
  readonly first: number;
  readonly points: number;
  readonly count: number;
  /** Functions by points, row-major: jumps of I'/k, positive upward. */
  readonly sources: Float64Array;
  /** Functions by points, row-major: integral of the current times the interpolating polynomial, metres. */
  readonly receivers: Float64Array;
};
