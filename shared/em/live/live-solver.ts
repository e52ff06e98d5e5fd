import { createComplexMatrix, type ComplexMatrix } from '../../numerics/complex-matrix';
import { greatestIsolationDb, loadOf } from '../network';
import type { Complex, Ground, Pattern, PatternRequest, ValidityEntry, Wire } from '../scene';
import { pairValidity, validityOf, wireValidity } from '../validity';
import { bringUpToDate, createFrequencySystem, type FrequencySystem } from './frequency-system';
import { livePattern, solveAlone, type RadiationCache } from './live-pattern';
import { createOwnCurrentCache, type OwnCurrentCache } from './own-current-cache';
import { changePlaced, type PlacedWire } from './placed-wire';

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
   * Replaces the wires; only what belongs to changed wires is computed again, and that when a question asks
   * for it. The answers equal those of a new solver of the same wires.
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
  /** Why the wire's numbers are not held at that frequency, or null when they are; wherever it stands. */
  wireNotHeld(frequencyIndex: number, wire: string): ValidityEntry | null;
  /** Why the pair's numbers are not held at that frequency, or null when they are. */
  pairNotHeld(frequencyIndex: number, one: string, other: string): ValidityEntry | null;
}

/** Makes the solver of the wires on that ground at those frequencies (hertz). */
export function createLiveSolver(input: LiveSolverInput): LiveSolver {
  return new OwnCurrentSolver(input);
}

class OwnCurrentSolver implements LiveSolver {
  readonly frequencies: readonly number[];
  private readonly ground: Ground;
  private readonly systems: FrequencySystem[];
  private readonly radiation: RadiationCache[];
  /** Counts the updates, and which of them each system has followed. */
  private revision = 0;
  private readonly followed: Int32Array;
  private placed: PlacedWire[] = [];
  private readonly indexOf = new Map<string, number>();

  constructor({ ground, frequencies, wires, cache = createOwnCurrentCache() }: LiveSolverInput) {
    this.ground = ground;
    this.frequencies = frequencies;
    this.systems = frequencies.map((frequency) => createFrequencySystem(ground, frequency, cache));
    this.radiation = frequencies.map(() => new Map());
    this.followed = new Int32Array(frequencies.length).fill(-1);
    this.update(wires);
  }

  update(wires: readonly Wire[]): void {
    const sameIds =
      wires.length === this.placed.length && wires.every((wire, i) => wire.id === this.placed[i]!.wire.id);
    if (!sameIds) this.takeIds(wires);
    wires.forEach((wire, i) => changePlaced(this.placed[i]!, wire, this.ground));
    this.revision += 1;
  }

  isolationDb(frequencyIndex: number, into: string, from: string): number {
    const system = this.systemAt(frequencyIndex);
    const i = this.portOf(system, into);
    const j = this.portOf(system, from);
    const y = system.network!.loadedAdmittance;
    const re = y.re[i * y.columns + j]!;
    const im = y.im[i * y.columns + j]!;
    const scale = 4 * this.loadAt(into).re * this.loadAt(from).re;
    return Math.min(greatestIsolationDb, -10 * Math.log10(scale * (re * re + im * im)));
  }

  loadedAdmittance(frequencyIndex: number): ComplexMatrix {
    const system = this.systemAt(frequencyIndex);
    const ports = system.portOf.filter((port) => port >= 0);
    const result = createComplexMatrix(ports.length, ports.length);
    const y = system.network?.loadedAdmittance;
    if (y === undefined) return result;
    ports.forEach((from, i) => {
      ports.forEach((to, j) => {
        result.re[i * ports.length + j] = y.re[from * y.columns + to]!;
        result.im[i * ports.length + j] = y.im[from * y.columns + to]!;
      });
    });
    return result;
  }

  impedanceInPlace(frequencyIndex: number, wire: string): Complex {
    const system = this.systemAt(frequencyIndex);
    const port = this.portOf(system, wire);
    const y = system.network!.loadedAdmittance;
    const at = port * y.columns + port;
    return behindLoad({ re: y.re[at]!, im: y.im[at]! }, this.loadAt(wire));
  }

  impedanceAlone(frequencyIndex: number, wire: string): Complex {
    const system = this.systemAt(frequencyIndex);
    const slot = system.slots[this.wireIndex(wire)]!;
    const load = loadOf(slot.wire);
    return behindLoad(solveAlone(slot, load).admittance, load);
  }

  pattern(frequencyIndex: number, wire: string, request: PatternRequest): Pattern {
    const system = this.systemAt(frequencyIndex);
    return livePattern(system, this.radiation[frequencyIndex]!, this.wireIndex(wire), request);
  }

  validity(frequencyIndex: number): readonly ValidityEntry[] {
    const system = this.systemAt(frequencyIndex);
    const steps = new Map(system.slots.map((slot) => [slot.wire, slot.own.mesh.chain.step]));
    const wires = this.placed.map(({ wire }) => wire);
    return validityOf(wires, system.frequency, 'live', (wire) => steps.get(wire)!);
  }

  wireNotHeld(frequencyIndex: number, wire: string): ValidityEntry | null {
    const system = this.systemAt(frequencyIndex);
    const { wire: placed, own } = system.slots[this.wireIndex(wire)]!;
    return wireValidity(placed, system.frequency, 'live', own.mesh.chain.step)[0] ?? null;
  }

  pairNotHeld(frequencyIndex: number, one: string, other: string): ValidityEntry | null {
    return (
      this.wireNotHeld(frequencyIndex, one) ??
      this.wireNotHeld(frequencyIndex, other) ??
      pairValidity(this.placed[this.wireIndex(one)]!.wire, this.placed[this.wireIndex(other)]!.wire)
    );
  }

  private takeIds(wires: readonly Wire[]): void {
    const known = new Map(this.placed.map((placed) => [placed.wire.id, placed]));
    this.placed = wires.map((wire) => known.get(wire.id) ?? { wire, place: 0, kind: 0 });
    this.indexOf.clear();
    wires.forEach((wire, i) => {
      if (this.indexOf.has(wire.id)) throw new RangeError(`two wires have the id ${wire.id}`);
      this.indexOf.set(wire.id, i);
    });
    const present = new Set(this.placed);
    for (const cache of this.radiation) {
      for (const slot of cache.keys()) if (!present.has(slot.placed)) cache.delete(slot);
    }
  }

  private systemAt(frequencyIndex: number): FrequencySystem {
    const system = this.systems[frequencyIndex];
    if (system === undefined) throw new RangeError(`no frequency of index ${frequencyIndex}`);
    if (this.followed[frequencyIndex] !== this.revision) {
      bringUpToDate(system, this.placed);
      this.followed[frequencyIndex] = this.revision;
    }
    return system;
  }

  private wireIndex(id: string): number {
    const index = this.indexOf.get(id);
    if (index === undefined) throw new RangeError(`no wire ${id}`);
    return index;
  }

  private portOf(system: FrequencySystem, id: string): number {
    const port = system.portOf[this.wireIndex(id)]!;
    if (port < 0) throw new RangeError(`wire ${id} has no port`);
    return port;
  }

  private loadAt(id: string): Complex {
    return loadOf(this.placed[this.wireIndex(id)]!.wire);
  }
}

/** 1 / Y - g. */
function behindLoad(admittance: Complex, load: Complex): Complex {
  const square = admittance.re ** 2 + admittance.im ** 2;
  return { re: admittance.re / square - load.re, im: -admittance.im / square - load.im };
}
