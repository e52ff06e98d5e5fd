import { complexLuFactorise, complexLuSolve } from '../numerics/complex-lu';
import { createComplexMatrix, type ComplexMatrix } from '../numerics/complex-matrix';
import { waveNumber } from './constants';
import { mutualBlock, onePieceSelfBlock, selfBlock } from './impedance-block';
import { unknownCount, type WireMesh } from './mesh';
import { loadOf } from './network';
import type { ChainCurrent } from './radiation';
import type { Ground } from './scene';

/**
 * The wires' currents with every port closed by its load, one column per port, 1 V in series with that port.
 * One piece per wire makes it the textbook's induced-EMF model, many pieces the moment method (Galerkin,
 * piecewise-sinusoidal). The unknowns I' are peak-referred: with s the port current of a unit I' and R the load,
 *
 *     (Z' + B R B^T) I' = B V,   I = B^T I',   B = s at the port's unknown
 *
 * stays finite where s = sin kd vanishes. A wire without a port has no row in B: it is short-circuited.
 * @source Carter 1932; Richmond 1974 (NASA CR-2399); Harrington 1968
 */
export type SolvedCurrents = {
  /** Port currents per volt: the admittance matrix of the loaded ports, siemens. */
  readonly loadedAdmittance: ComplexMatrix;
  /** All wires' currents with that port driven by 1 V. */
  currents(port: number): ChainCurrent[];
};

/** Fills and solves the system of the meshed wires at a frequency in hertz. */
export function solveCurrents(
  ground: Ground,
  frequency: number,
  meshes: readonly WireMesh[],
): SolvedCurrents {
  const k = waveNumber(frequency);
  const starts = startsOf(meshes);
  const system = impedanceMatrix(k, ground, meshes, starts);
  const ports = meshes.flatMap((mesh, m) => {
    if (mesh.portNode === null) return [];
    const unknown = starts[m]! + mesh.portNode - mesh.firstNode;
    return [{ unknown, amplitude: Math.sin(k * mesh.chain.step), load: loadOf(mesh.wire) }];
  });
  const right = createComplexMatrix(system.rows, ports.length);
  ports.forEach(({ unknown, amplitude, load }, p) => {
    system.re[unknown * system.rows + unknown]! += amplitude * amplitude * load.re;
    system.im[unknown * system.rows + unknown]! += amplitude * amplitude * load.im;
    right.re[unknown * ports.length + p] = amplitude;
  });
  const solution = complexLuSolve(complexLuFactorise(system), right);
  const loadedAdmittance = createComplexMatrix(ports.length, ports.length);
  ports.forEach(({ unknown, amplitude }, p) => {
    for (let q = 0; q < ports.length; q += 1) {
      loadedAdmittance.re[p * ports.length + q] = amplitude * solution.re[unknown * ports.length + q]!;
      loadedAdmittance.im[p * ports.length + q] = amplitude * solution.im[unknown * ports.length + q]!;
    }
  });
  return {
    loadedAdmittance,
    currents: (port) => meshes.map((mesh, m) => column(mesh, starts[m]!, solution, port)),
  };
}

/** Z' of all unknowns: node blocks of every pair of wires, without the ends that carry no current. */
export function impedanceMatrix(
  k: number,
  ground: Ground,
  meshes: readonly WireMesh[],
  starts: readonly number[] = startsOf(meshes),
): ComplexMatrix {
  const order = meshes.reduce((sum, mesh) => sum + unknownCount(mesh), 0);
  const z = createComplexMatrix(order, order);
  meshes.forEach((source, a) => {
    for (let b = a; b < meshes.length; b += 1) {
      const test = meshes[b]!;
      const self = source.isOnePiece ? onePieceSelfBlock : selfBlock;
      const block = a === b ? self(k, ground, source) : mutualBlock(k, ground, source, test);
      copyBlock(block, source, test, starts[a]!, starts[b]!, z);
    }
  });
  return z;
}

/** First unknown of every mesh. */
function startsOf(meshes: readonly WireMesh[]): number[] {
  let next = 0;
  return meshes.map((mesh) => {
    const start = next;
    next += unknownCount(mesh);
    return start;
  });
}

/** Reactions are reciprocal: one block serves for both corners of the matrix. */
function copyBlock(
  block: ComplexMatrix,
  source: WireMesh,
  test: WireMesh,
  row: number,
  column: number,
  z: ComplexMatrix,
): void {
  for (let i = source.firstNode; i <= source.lastNode; i += 1) {
    for (let j = test.firstNode; j <= test.lastNode; j += 1) {
      const from = i * block.columns + j;
      const r = row + i - source.firstNode;
      const c = column + j - test.firstNode;
      z.re[r * z.columns + c] = block.re[from]!;
      z.im[r * z.columns + c] = block.im[from]!;
      z.re[c * z.columns + r] = block.re[from]!;
      z.im[c * z.columns + r] = block.im[from]!;
    }
  }
}

function column(mesh: WireMesh, start: number, solution: ComplexMatrix, port: number): ChainCurrent {
  const nodes = mesh.chain.segments + 1;
  const current: ChainCurrent = {
    chain: mesh.chain,
    re: new Float64Array(nodes),
    im: new Float64Array(nodes),
  };
  for (let i = mesh.firstNode; i <= mesh.lastNode; i += 1) {
    const at = (start + i - mesh.firstNode) * solution.columns + port;
    current.re[i] = solution.re[at]!;
    current.im[i] = solution.im[at]!;
  }
  return current;
}
