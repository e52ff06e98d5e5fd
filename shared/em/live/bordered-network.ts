import {
  applyPivots,
  blockBackward,
  blockFactorise,
  blockForward,
  createBlockFactors,
  invertBlock,
  type BlockFactors,
} from '../../numerics/block-elimination';
import { createComplexMatrix, type ComplexMatrix } from '../../numerics/complex-matrix';
import type { Complex } from '../scene';

/** One antenna of the network: its functions' impedances with its port short-circuited, and its port. */
export type NetworkMember = {
  readonly impedance: ComplexMatrix;
  /** Port current of each function; null without a port. */
  readonly portCurrents: Float64Array | null;
  readonly load: Complex;
};

/**
 * The loaded network of antennas: all but the last are factorised once (`factoriseRest`), the last, which is
 * the one under the finger, is a border whose couplings may change at every frame (`solveBorder`).
 */
export type BorderedNetwork = {
  readonly members: readonly NetworkMember[];
  readonly factors: BlockFactors;
  /** Rest order by border functions: U, then y = L^-1 U, and P y. */
  readonly borderRe: Float64Array;
  readonly borderIm: Float64Array;
  readonly scaledRe: Float64Array;
  readonly scaledIm: Float64Array;
  /** Inverse of the border's Schur complement. */
  readonly schurRe: Float64Array;
  readonly schurIm: Float64Array;
  /** Ports of the rest (indices of members), and their columns k = L^-1 b, port by order. */
  readonly restPorts: readonly number[];
  readonly portRe: Float64Array;
  readonly portIm: Float64Array;
  /** Port currents per volt among the rest's ports without the border, and with it among all. */
  readonly restAdmittance: ComplexMatrix;
  readonly loadedAdmittance: ComplexMatrix;
  /** V: -G for the rest's ports, then b for the border's own; ports by border functions. */
  readonly linkRe: Float64Array;
  readonly linkIm: Float64Array;
  /** One row of V S^-1. */
  readonly rowRe: Float64Array;
  readonly rowIm: Float64Array;
};

/** The impedances between two members' functions, row-major, and whether they are stored the other way round. */
export type Coupling = { readonly re: Float64Array; readonly im: Float64Array; readonly transposed: boolean };

/** Room for a network; the last member is the border. @throws RangeError for no member */
export function createBorderedNetwork(members: readonly NetworkMember[]): BorderedNetwork {
  const last = members[members.length - 1];
  if (last === undefined) throw new RangeError('a network needs at least one wire');
  const factors = createBlockFactors(members.slice(0, -1).map((member) => member.impedance.rows));
  const m = last.impedance.rows;
  const restPorts = members.flatMap((member, i) =>
    member.portCurrents !== null && i < members.length - 1 ? [i] : [],
  );
  const ports = restPorts.length + (last.portCurrents === null ? 0 : 1);
  const room = (size: number) => new Float64Array(size);
  return {
    members,
    factors,
    borderRe: room(factors.order * m),
    borderIm: room(factors.order * m),
    scaledRe: room(factors.order * m),
    scaledIm: room(factors.order * m),
    schurRe: room(m * m),
    schurIm: room(m * m),
    restPorts,
    portRe: room(restPorts.length * factors.order),
    portIm: room(restPorts.length * factors.order),
    restAdmittance: createComplexMatrix(restPorts.length, restPorts.length),
    loadedAdmittance: createComplexMatrix(ports, ports),
    linkRe: room(ports * m),
    linkIm: room(ports * m),
    rowRe: room(m),
    rowIm: room(m),
  };
}

/** Factorises all members but the last. `coupling(i, j)` gives the impedances of members i > j. */
export function factoriseRest(network: BorderedNetwork, coupling: (i: number, j: number) => Coupling): void {
  const { factors, members, restPorts, portRe, portIm, restAdmittance } = network;
  const { order: n, starts, lowerRe, lowerIm } = factors;
  for (let i = 0; i < members.length - 1; i += 1) {
    putLoadedSelf(members[i]!, lowerRe, lowerIm, starts[i]! * n + starts[i]!, n);
    for (let j = 0; j < i; j += 1) putCoupling(coupling(i, j), network, i, j);
  }
  blockFactorise(factors);
  const columnRe = new Float64Array(n);
  const columnIm = new Float64Array(n);
  const scaledRe = new Float64Array(n * restPorts.length);
  const scaledIm = new Float64Array(n * restPorts.length);
  restPorts.forEach((member, p) => {
    columnRe.fill(0);
    columnIm.fill(0);
    columnRe.set(members[member]!.portCurrents!, starts[member]!);
    blockForward(factors, 1, columnRe, columnIm);
    portRe.set(columnRe, p * n);
    portIm.set(columnIm, p * n);
    const at = scaledRe.subarray(p * n, (p + 1) * n);
    applyPivots(factors, 1, columnRe, columnIm, at, scaledIm.subarray(p * n, (p + 1) * n));
  });
  const ports = restPorts.length;
  for (let p = 0; p < ports; p += 1) {
    for (let q = 0; q <= p; q += 1) {
      let re = 0;
      let im = 0;
      // The later port's column begins at its own block.
      for (let i = starts[restPorts[p]!]!; i < n; i += 1) {
        re += portRe[p * n + i]! * scaledRe[q * n + i]! - portIm[p * n + i]! * scaledIm[q * n + i]!;
        im += portRe[p * n + i]! * scaledIm[q * n + i]! + portIm[p * n + i]! * scaledRe[q * n + i]!;
      }
      restAdmittance.re[p * ports + q] = restAdmittance.re[q * ports + p] = re;
      restAdmittance.im[p * ports + q] = restAdmittance.im[q * ports + p] = im;
    }
  }
}

/** Takes the border's couplings with member j of the rest: border functions by j's, or `transposed`. */
export function setBorderCoupling(
  network: BorderedNetwork,
  j: number,
  coupling: { readonly re: Float64Array; readonly im: Float64Array },
  transposed: boolean,
): void {
  const { borderRe, borderIm, factors, members } = network;
  const m = members[members.length - 1]!.impedance.rows;
  const width = members[j]!.impedance.rows;
  const start = factors.starts[j]!;
  for (let a = 0; a < width; a += 1) {
    for (let c = 0; c < m; c += 1) {
      const from = transposed ? a * m + c : c * width + a;
      borderRe[(start + a) * m + c] = coupling.re[from]!;
      borderIm[(start + a) * m + c] = coupling.im[from]!;
    }
  }
}

/**
 * Solves the ports after `setBorderCoupling` of every member of the rest:
 * Y = Y_rest + V S^-1 V^T, where V is -G = -k^T P y for the rest's ports and b for the border's own.
 * @throws RangeError when the border's Schur complement is singular
 */
export function solveBorder(network: BorderedNetwork): void {
  const { factors, members, borderRe, borderIm, scaledRe, scaledIm, schurRe, schurIm } = network;
  const last = members[members.length - 1]!;
  const m = last.impedance.rows;
  const n = factors.order;
  blockForward(factors, m, borderRe, borderIm);
  applyPivots(factors, m, borderRe, borderIm, scaledRe, scaledIm);
  putLoadedSelf(last, schurRe, schurIm, 0, m);
  for (let a = 0; a < m; a += 1) {
    for (let b = 0; b <= a; b += 1) {
      let re = 0;
      let im = 0;
      for (let i = 0, row = 0; i < n; i += 1, row += m) {
        const yr = borderRe[row + a]!;
        const yi = borderIm[row + a]!;
        const pr = scaledRe[row + b]!;
        const pi = scaledIm[row + b]!;
        re += yr * pr - yi * pi;
        im += yr * pi + yi * pr;
      }
      schurRe[b * m + a] = schurRe[a * m + b]! -= re;
      schurIm[b * m + a] = schurIm[a * m + b]! -= im;
    }
  }
  if (!invertBlock(m, schurRe, schurIm, 0)) throw new RangeError(`singular border of order ${m}`);
  linkPorts(network, m);
  closePorts(network, m);
}

/**
 * The functions' currents with one port driven by 1 V in series with its load, after `solveBorder`: first the
 * rest's, then the border's. `port` counts the rest's ports, then the border's own.
 */
export function drivenCurrents(
  network: BorderedNetwork,
  port: number,
  re: Float64Array,
  im: Float64Array,
): void {
  const { factors, members, restPorts, schurRe, schurIm, linkRe, linkIm, borderRe, borderIm } = network;
  const m = members[members.length - 1]!.impedance.rows;
  const n = factors.order;
  const fromRest = port < restPorts.length;
  for (let a = 0; a < m; a += 1) {
    let cr = 0;
    let ci = 0;
    for (let b = 0; b < m; b += 1) {
      const vr = linkRe[port * m + b]!;
      const vi = linkIm[port * m + b]!;
      cr += schurRe[a * m + b]! * vr - schurIm[a * m + b]! * vi;
      ci += schurRe[a * m + b]! * vi + schurIm[a * m + b]! * vr;
    }
    re[n + a] = cr;
    im[n + a] = ci;
  }
  const xr = new Float64Array(n);
  const xi = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    xr[i] = fromRest ? network.portRe[port * n + i]! : 0;
    xi[i] = fromRest ? network.portIm[port * n + i]! : 0;
    for (let a = 0; a < m; a += 1) {
      xr[i]! -= borderRe[i * m + a]! * re[n + a]! - borderIm[i * m + a]! * im[n + a]!;
      xi[i]! -= borderRe[i * m + a]! * im[n + a]! + borderIm[i * m + a]! * re[n + a]!;
    }
  }
  const restRe = re.subarray(0, n);
  const restIm = im.subarray(0, n);
  applyPivots(factors, 1, xr, xi, restRe, restIm);
  blockBackward(factors, restRe, restIm);
}

function linkPorts(network: BorderedNetwork, m: number): void {
  const { factors, restPorts, portRe, portIm, scaledRe, scaledIm, linkRe, linkIm } = network;
  const n = factors.order;
  const own = network.members[network.members.length - 1]!.portCurrents;
  linkRe.fill(0);
  linkIm.fill(0);
  if (own !== null) linkRe.set(own, restPorts.length * m);
  for (let p = 0; p < restPorts.length; p += 1) {
    for (let i = factors.starts[restPorts[p]!]!; i < n; i += 1) {
      const kr = portRe[p * n + i]!;
      const ki = portIm[p * n + i]!;
      for (let a = 0; a < m; a += 1) {
        const pr = scaledRe[i * m + a]!;
        const pi = scaledIm[i * m + a]!;
        linkRe[p * m + a]! -= kr * pr - ki * pi;
        linkIm[p * m + a]! -= kr * pi + ki * pr;
      }
    }
  }
}

/** Y = Y_rest + V S^-1 V^T; row p of V is -G for the rest's ports, b for the border's own. */
function closePorts(network: BorderedNetwork, m: number): void {
  const { restPorts, restAdmittance, loadedAdmittance: y, schurRe, schurIm, linkRe, linkIm } = network;
  const { rowRe, rowIm } = network;
  const rest = restPorts.length;
  const ports = y.rows;
  for (let p = 0; p < ports; p += 1) {
    rowRe.fill(0);
    rowIm.fill(0);
    for (let b = 0; b < m; b += 1) {
      const vr = linkRe[p * m + b]!;
      const vi = linkIm[p * m + b]!;
      for (let a = 0; a < m; a += 1) {
        rowRe[a]! += schurRe[b * m + a]! * vr - schurIm[b * m + a]! * vi;
        rowIm[a]! += schurRe[b * m + a]! * vi + schurIm[b * m + a]! * vr;
      }
    }
    for (let q = 0; q <= p; q += 1) {
      let re = p < rest ? restAdmittance.re[p * rest + q]! : 0;
      let im = p < rest ? restAdmittance.im[p * rest + q]! : 0;
      for (let a = 0; a < m; a += 1) {
        const wr = linkRe[q * m + a]!;
        const wi = linkIm[q * m + a]!;
        re += rowRe[a]! * wr - rowIm[a]! * wi;
        im += rowRe[a]! * wi + rowIm[a]! * wr;
      }
      y.re[p * ports + q] = y.re[q * ports + p] = re;
      y.im[p * ports + q] = y.im[q * ports + p] = im;
    }
  }
}

/** Z + g b b^T at `at` of a matrix with that many columns. */
function putLoadedSelf(
  member: NetworkMember,
  re: Float64Array,
  im: Float64Array,
  at: number,
  columns: number,
): void {
  const { impedance, portCurrents: b, load } = member;
  const m = impedance.rows;
  for (let i = 0; i < m; i += 1) {
    for (let j = 0; j < m; j += 1) {
      const closing = b === null ? 0 : b[i]! * b[j]!;
      re[at + i * columns + j] = impedance.re[i * m + j]! + closing * load.re;
      im[at + i * columns + j] = impedance.im[i * m + j]! + closing * load.im;
    }
  }
}

function putCoupling(coupling: Coupling, network: BorderedNetwork, i: number, j: number): void {
  const { factors, members } = network;
  const { order: n, starts, lowerRe, lowerIm } = factors;
  const rows = members[i]!.impedance.rows;
  const columns = members[j]!.impedance.rows;
  for (let a = 0; a < rows; a += 1) {
    for (let b = 0; b < columns; b += 1) {
      const from = coupling.transposed ? b * rows + a : a * columns + b;
      const to = (starts[i]! + a) * n + starts[j]! + b;
      lowerRe[to] = coupling.re[from]!;
      lowerIm[to] = coupling.im[from]!;
    }
  }
}
