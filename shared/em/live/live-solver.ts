import type { ComplexMatrix } from '../../numerics/complex-matrix';
import type { Complex, Ground, Pattern, PatternRequest, ValidityEntry, Wire } from '../scene';
import type { OwnCurrentCache } from './own-current-cache';

export type LiveSolverInput = {
  readonly ground: Ground;
  /** Hertz. */
  readonly frequencies: readonly number[];
  readonly wires: readonly Wire[];
  /** May be shared among solvers; made anew when absent. */
  readonly cache?: OwnCurrentCache;
};

/** The solver under the finger: every question is answered for the wires of the last `update`. */
export interface LiveSolver {
  readonly frequencies: readonly number[];
  /**
   * Replaces the wires; only what belongs to changed wires is computed again. The answers equal those of a
   * new solver of the same wires.
   */
  update(wires: readonly Wire[]): void;
  /** -20 lg |S_ij| from one port into another, dB, at most 300. @throws RangeError for a wire without a port */
  isolationDb(frequencyIndex: number, into: string, from: string): number;
  /** Admittance matrix of the loaded ports, siemens; rows and columns follow the fed wires. */
  loadedAdmittance(frequencyIndex: number): ComplexMatrix;
  /** Driving-point impedance of a port in place, all other ports closed, ohm. */
  impedanceInPlace(frequencyIndex: number, wire: string): Complex;
  /** Driving-point impedance of the wire alone on the same ground, ohm. */
  impedanceAlone(frequencyIndex: number, wire: string): Complex;
  /** Azimuth cut of one port driven, all others closed, against the wire alone. */
  pattern(frequencyIndex: number, wire: string, request: PatternRequest): Pattern;
  /** All that is not held at one frequency. */
  validity(frequencyIndex: number): readonly ValidityEntry[];
  /** Why the pair's numbers are not held at that frequency, or null when they are. */
  pairNotHeld(frequencyIndex: number, one: string, other: string): ValidityEntry | null;
}

/** Makes the solver of the wires on that ground at those frequencies (hertz). */
export function createLiveSolver(input: LiveSolverInput): LiveSolver {
  throw new Error(`live solver of ${input.wires.length} wires: not built yet`);
}
