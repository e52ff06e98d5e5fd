import { wireLength } from '../em/chain';
import { createLiveSolver, type LiveSolver } from '../em/live/live-solver';
import { createOwnCurrentCache } from '../em/live/own-current-cache';
import type { Ground, ValidityEntry, Wire } from '../em/scene';
import { nearestFrequency } from '../radio/band-frequencies';
import { wavelength } from '../units/constants';

/**
 * Wires longer than so many wavelengths are left out at that frequency: their mesh would have more than some
 * four hundred unknowns, and the finger would wait for it.
 */
export const MOST_WAVELENGTHS = 30;

/** Wires and frequencies whose own-current functions are kept; a layout of sixteen antennas asks for a thousand. */
const KINDS_KEPT = 6_000;

/** The solver at one frequency, for the wires of the last `update`. */
export type SolverAt = {
  readonly frequency: number;
  readonly solver: LiveSolver;
  /** Wires that are too long there. */
  readonly leftOut: ReadonlySet<string>;
  /** Why a wire by itself is not held there, or null; found once however many pairs ask. */
  wireNotHeld(wire: string): ValidityEntry | null;
};

type Kept = SolverAt & {
  revision: number;
  leftOut: ReadonlySet<string>;
  readonly asked: Map<string, ValidityEntry | null>;
};

/** One solver a frequency, made when it is asked and kept as long as its frequency is asked for. */
export class FrequencySolvers {
  private readonly cache = createOwnCurrentCache(KINDS_KEPT);
  private readonly kept = new Map<number, Kept>();
  private frequencies: readonly number[] = [];
  private ground: Ground = 'none';
  private wires: readonly Wire[] = [];
  private revision = 0;

  /** Takes over the frequencies (Hz, ascending) and wires; nothing is solved before it is asked. */
  update(ground: Ground, frequencies: readonly number[], wires: readonly Wire[]): void {
    if (ground !== this.ground) this.kept.clear();
    if (frequencies !== this.frequencies) {
      const wanted = new Set(frequencies);
      for (const frequency of this.kept.keys()) if (!wanted.has(frequency)) this.kept.delete(frequency);
    }
    this.ground = ground;
    this.frequencies = frequencies;
    this.wires = wires;
    this.revision += 1;
  }

  /** The solver that stands for a frequency, Hz. */
  at(frequency: number): SolverAt {
    const solved = this.frequencies[nearestFrequency(this.frequencies, frequency)]!;
    const known = this.kept.get(solved);
    if (known?.revision === this.revision) return known;
    const longest = MOST_WAVELENGTHS * wavelength(solved);
    const tooLong = this.wires.filter((wire) => wireLength(wire) > longest);
    const leftOut = new Set(tooLong.map(({ id }) => id));
    const wires = tooLong.length === 0 ? this.wires : this.wires.filter(({ id }) => !leftOut.has(id));
    if (known) {
      known.solver.update(wires);
      known.leftOut = leftOut;
      known.asked.clear();
      known.revision = this.revision;
      return known;
    }
    const { ground, cache, revision } = this;
    const solver = createLiveSolver({ ground, frequencies: [solved], wires, cache });
    const asked = new Map<string, ValidityEntry | null>();
    const wireNotHeld = (wire: string) => {
      let entry = asked.get(wire);
      if (entry === undefined) asked.set(wire, (entry = solver.wireNotHeld(0, wire)));
      return entry;
    };
    const made: Kept = { frequency: solved, solver, leftOut, revision, asked, wireNotHeld };
    this.kept.set(solved, made);
    return made;
  }
}
