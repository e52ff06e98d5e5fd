import { complexLuFactorise, complexLuSolve } from '../../numerics/complex-lu';
import { createComplexMatrix, type ComplexMatrix } from '../../numerics/complex-matrix';
import { leadingBasis } from '../../numerics/leading-basis';
import { waveNumber } from '../constants';
import { selfBlock } from '../impedance-block';
import { meshOfManyPieces, unknownCount, type WireMesh } from '../mesh';
import type { Ground, Wire } from '../scene';
import type { VerticalSamples } from './vertical-grid';
import { incidentFamily, type IncidentField } from './incident-family';

/**
 * The few real current functions by which one kind of wire answers at one frequency, whatever stands around
 * it: the current when its port is driven, and its responses to the fields that neighbours can throw at it,
 * reduced to the leading singular vectors of their stacked real and imaginary parts. Real functions keep the
 * reduced impedance matrix symmetric and its real part non-negative definite.
 * @source Prakash and Mittra 2003; Lucente, Monorchio and Mittra 2008
 */
export type OwnCurrents = {
  readonly k: number;
  readonly mesh: WireMesh;
  readonly count: number;
  /** Peak-referred node currents, nodes by functions, row-major; zero at free ends. */
  readonly functions: Float64Array;
  /** Impedances among the functions, ohm, the port short-circuited. */
  readonly impedance: ComplexMatrix;
  /** Port current of each function; null for a wire without a port. */
  readonly portCurrents: Float64Array | null;
  /** The functions on vertical grids (vertical-samples.ts), by start height, sense and level. */
  readonly samples: Map<string, VerticalSamples>;
};

/** Functions below this share of the strongest are left out. */
const keptShare = 0.005;
/** The driven current weighs more than any response: it carries the port, and most of the coupling. */
const drivenWeight = 10;

/** Solves a wire alone and keeps its own-current functions. `frequency` in hertz. */
export function findOwnCurrents(ground: Ground, frequency: number, wire: Wire): OwnCurrents {
  const k = waveNumber(frequency);
  const mesh = meshOfManyPieces(wire, ground, frequency);
  const block = selfBlock(k, ground, mesh);
  const n = unknownCount(mesh);
  const system = activePart(block, mesh);
  const family = incidentFamily(k, mesh);
  const driven = mesh.portNode === null ? 0 : 1;
  const right = createComplexMatrix(n, family.length + driven);
  if (mesh.portNode !== null) right.re[(mesh.portNode - mesh.firstNode) * right.columns] = 1;
  family.forEach((field, f) => {
    for (let i = 0; i < n; i += 1) {
      right.re[i * right.columns + driven + f] = field.re[i]!;
      right.im[i * right.columns + driven + f] = field.im[i]!;
    }
  });
  const responses = complexLuSolve(complexLuFactorise(system), right);
  const { count, vectors } = leadingBasis(stackedColumns(responses, driven, family), n, keptShare);
  const functions = new Float64Array((mesh.chain.segments + 1) * count);
  functions.set(vectors, mesh.firstNode * count);
  return {
    k,
    mesh,
    count,
    functions,
    impedance: reduced(system, vectors, count),
    portCurrents: portCurrentsOf(mesh, k, functions, count),
    samples: new Map(),
  };
}

/** The rows and columns of nodes that carry current. */
function activePart(block: ComplexMatrix, mesh: WireMesh): ComplexMatrix {
  const n = unknownCount(mesh);
  const part = createComplexMatrix(n, n);
  for (let i = 0; i < n; i += 1) {
    const from = (mesh.firstNode + i) * block.columns + mesh.firstNode;
    part.re.set(block.re.subarray(from, from + n), i * n);
    part.im.set(block.im.subarray(from, from + n), i * n);
  }
  return part;
}

/** Real and imaginary parts of every response as columns; each response normalised, the driven one weighted. */
function stackedColumns(
  responses: ComplexMatrix,
  driven: number,
  family: readonly IncidentField[],
): Float64Array[] {
  const { rows, columns } = responses;
  const stacked: Float64Array[] = [];
  for (let c = 0; c < columns; c += 1) {
    const re = new Float64Array(rows);
    const im = new Float64Array(rows);
    let square = 0;
    for (let i = 0; i < rows; i += 1) {
      re[i] = responses.re[i * columns + c]!;
      im[i] = responses.im[i * columns + c]!;
      square += re[i]! ** 2 + im[i]! ** 2;
    }
    if (square === 0) continue;
    const weight = c < driven ? drivenWeight : family[c - driven]!.weight;
    const scale = weight / Math.sqrt(square);
    stacked.push(
      re.map((value) => value * scale),
      im.map((value) => value * scale),
    );
  }
  return stacked;
}

/** Phi^T Z Phi, made exactly symmetric. */
function reduced(z: ComplexMatrix, vectors: Float64Array, count: number): ComplexMatrix {
  const n = z.rows;
  const result = createComplexMatrix(count, count);
  for (let i = 0; i < n; i += 1) {
    for (let b = 0; b < count; b += 1) {
      let re = 0;
      let im = 0;
      for (let j = 0; j < n; j += 1) {
        re += z.re[i * n + j]! * vectors[j * count + b]!;
        im += z.im[i * n + j]! * vectors[j * count + b]!;
      }
      for (let a = 0; a < count; a += 1) {
        result.re[a * count + b]! += vectors[i * count + a]! * re;
        result.im[a * count + b]! += vectors[i * count + a]! * im;
      }
    }
  }
  for (let a = 0; a < count; a += 1) {
    for (let b = 0; b < a; b += 1) {
      for (const part of [result.re, result.im]) {
        const mean = (part[a * count + b]! + part[b * count + a]!) / 2;
        part[a * count + b] = mean;
        part[b * count + a] = mean;
      }
    }
  }
  return result;
}

function portCurrentsOf(
  mesh: WireMesh,
  k: number,
  functions: Float64Array,
  count: number,
): Float64Array | null {
  if (mesh.portNode === null) return null;
  const peak = Math.sin(k * mesh.chain.step);
  return Float64Array.from({ length: count }, (_, m) => peak * functions[mesh.portNode! * count + m]!);
}
