import type { ComplexMatrix } from '../numerics/complex-matrix';
import { waveNumber } from './constants';
import { solveCurrents } from './current-model';
import { createLiveSolver } from './live/live-solver';
import { meshOfManyPieces, meshOfOnePiece, type WireMesh } from './mesh';
import { impedanceFromLoaded, isolationOf, loadOf, scatteringFromLoaded } from './network';
import { acceptedPower, azimuthsOf, comparePatterns, gainDbi } from './pattern';
import { directionOf, radiationIntensity } from './radiation';
import type {
  Complex,
  FrequencyResult,
  Ground,
  Method,
  Pattern,
  PatternRequest,
  Scene,
  SceneAnswer,
  ValidityEntry,
  Wire,
} from './scene';
import { sceneProblems } from './scene-problems';
import { solverVersion } from './solver-version';
import { validityOf } from './validity';

/**
 * Solves a scene by one of the models: `emf` (one assumed sinusoid per wire), `live` (own-current functions)
 * or `moment` (many pieces).
 * @throws RangeError for a scene with problems; `sceneProblems` tells them beforehand
 */
export function solveScene(scene: Scene, method: Method): SceneAnswer {
  const problem = sceneProblems(scene)[0];
  if (problem !== undefined) throw new RangeError(`${problem.path} ${problem.message}`);
  const results =
    method === 'live' ? solveLive(scene) : scene.frequencies.map((f) => solveDirectly(scene, method, f));
  return { method, solverVersion, results };
}

function solveLive(scene: Scene): FrequencyResult[] {
  const solver = createLiveSolver(scene);
  return scene.frequencies.map((frequency, f) => {
    const patterns: Record<string, Pattern> = {};
    if (scene.pattern !== undefined) {
      for (const wire of scene.wires) {
        if (wire.feed !== 'none') patterns[wire.id] = solver.pattern(f, wire.id, scene.pattern);
      }
    }
    return networkResult(scene.wires, frequency, solver.loadedAdmittance(f), patterns, [
      ...solver.validity(f),
    ]);
  });
}

function solveDirectly(scene: Scene, method: 'emf' | 'moment', frequency: number): FrequencyResult {
  const meshes = scene.wires.map((wire) => meshFor(method, wire, scene.ground, frequency));
  const solved = solveCurrents(scene.ground, frequency, meshes);
  const patterns: Record<string, Pattern> = {};
  if (scene.pattern !== undefined) {
    for (const mesh of meshes) {
      if (mesh.portNode === null) continue;
      const alone = gainCut(scene.ground, frequency, [mesh], mesh.wire.id, scene.pattern);
      const inPlace = gainCut(scene.ground, frequency, meshes, mesh.wire.id, scene.pattern, solved);
      patterns[mesh.wire.id] = comparePatterns(azimuthsOf(scene.pattern), inPlace, alone);
    }
  }
  const steps = new Map(meshes.map((mesh) => [mesh.wire, mesh.chain.step]));
  const validity = validityOf(scene.wires, frequency, method, (wire) => steps.get(wire)!);
  return networkResult(scene.wires, frequency, solved.loadedAdmittance, patterns, validity);
}

function meshFor(method: 'emf' | 'moment', wire: Wire, ground: Ground, frequency: number): WireMesh {
  return method === 'emf' ? meshOfOnePiece(wire, ground) : meshOfManyPieces(wire, ground, frequency);
}

function gainCut(
  ground: Ground,
  frequency: number,
  meshes: readonly WireMesh[],
  driven: string,
  request: PatternRequest,
  solved = solveCurrents(ground, frequency, meshes),
): number[] {
  const k = waveNumber(frequency);
  const fed = meshes.filter((mesh) => mesh.portNode !== null);
  const port = fed.findIndex((mesh) => mesh.wire.id === driven);
  const power = acceptedPower(entry(solved.loadedAdmittance, port, port), loadOf(fed[port]!.wire));
  const currents = solved.currents(port);
  return azimuthsOf(request).map((azimuth) =>
    gainDbi(radiationIntensity(k, ground, currents, directionOf(azimuth, request.elevationDeg)), power),
  );
}

/** The network's side of the answer, the same for all models. */
function networkResult(
  wires: readonly Wire[],
  frequency: number,
  loaded: ComplexMatrix,
  patterns: Record<string, Pattern>,
  validity: ValidityEntry[],
): FrequencyResult {
  const fed = wires.filter((wire) => wire.feed !== 'none');
  const loads = fed.map(loadOf);
  const z = impedanceFromLoaded(loaded, loads);
  const s = scatteringFromLoaded(loaded, loads);
  const notFinite = fed.filter((wire, i) => !isRowFinite(z, i) || !isPatternFinite(patterns[wire.id]));
  for (const wire of notFinite) {
    validity.push({ wires: [wire.id], code: 'not-finite', message: 'a number of this wire is not finite' });
  }
  return {
    frequency,
    ports: fed.map((wire) => wire.id),
    z: matrixRows(z),
    s: matrixRows(s),
    isolationDb: fed.map((_, i) =>
      fed.map((__, j) => {
        const { re, im } = entry(s, i, j);
        return i === j ? null : isolationOf(re, im);
      }),
    ),
    patterns,
    validity,
  };
}

function entry(matrix: ComplexMatrix, row: number, column: number): Complex {
  const at = row * matrix.columns + column;
  return { re: matrix.re[at]!, im: matrix.im[at]! };
}

function matrixRows(matrix: ComplexMatrix): Complex[][] {
  return Array.from({ length: matrix.rows }, (_, i) =>
    Array.from({ length: matrix.columns }, (__, j) => entry(matrix, i, j)),
  );
}

function isRowFinite(matrix: ComplexMatrix, row: number): boolean {
  return Array.from({ length: matrix.columns }, (_, j) => entry(matrix, row, j)).every(
    ({ re, im }) => Number.isFinite(re) && Number.isFinite(im),
  );
}

function isPatternFinite(pattern: Pattern | undefined): boolean {
  return pattern === undefined || pattern.gainDbi.every(Number.isFinite);
}
