import type { Wire } from '../em/scene';
import { pairValidity } from '../em/validity';
import { marginState } from '../radio/margin-state';
import { wavelength } from '../units/constants';
import type { MechanismResult, PairResult, PairState, Reason } from './estimate-result';
import { frequencyWords, lengthWords } from './frequency-words';
import type { FrequencySolvers, SolverAt } from './frequency-solvers';
import { MOST_WAVELENGTHS } from './frequency-solvers';
import type { PlannedMechanism, PlannedPair } from './pair-plan';
import type { AntennaScene } from './scene-from-document';

/**
 * Uncertainty of an isolation that is held, dB: twice the worst departure of the live model from the full solution
 * of the same wires over seeded mixed-band layouts (0.1 dB), and what a mount's position is known to (a few
 * millimetres are worth a decibel near a null; common practice).
 */
export const LIVE_UNCERTAINTY_DB = 1.5;

/**
 * Surfaces whose heights differ by more than this share of a wavelength are not one plane: the way over the step
 * is then longer by a phase of 18 degrees or more (common practice).
 */
const FLAT_SHARE = 0.05;

/** Says of one ordered pair what it needs and what it has. */
export function judgePair(
  pair: PlannedPair,
  from: AntennaScene,
  into: AntennaScene,
  solvers: FrequencySolvers,
): PairResult {
  const { rule } = pair;
  if (rule !== null) return keptApart(pair, { code: 'never-together', message: rule.rule });
  const always = from.reason ?? into.reason ?? spacingReason(from, into);
  const mechanisms = pair.mechanisms.map((mechanism) =>
    always === null ? judgeMechanism(mechanism, from, into, solvers) : notHeld(mechanism, always),
  );
  return summarise(pair, mechanisms);
}

/** The order in which pairs are listed: lacking, not held, tight, clear, never together; then by margin. */
export function comparePairs(one: PairResult, other: PairResult): number {
  const byState = STATE_ORDER[one.state] - STATE_ORDER[other.state];
  return byState !== 0 ? byState : (one.marginDb ?? 0) - (other.marginDb ?? 0);
}

const STATE_ORDER: Readonly<Record<PairState, number>> = {
  lacking: 0,
  'not held': 1,
  tight: 2,
  clear: 3,
  'never together': 4,
};

/** The frequency with the least margin; a frequency that is not held counts unless another lacks already. */
function judgeMechanism(
  { mechanism, neededDb, points }: PlannedMechanism,
  from: AntennaScene,
  into: AntennaScene,
  solvers: FrequencySolvers,
): MechanismResult {
  let worst: { frequency: number; isolationDb: number; marginDb: number } | null = null;
  let open: { frequency: number; reason: Reason } | null = null;
  for (const { frequency, lossesDb } of points) {
    const at = solvers.at(frequency);
    const reason = reasonAt(at, from, into);
    const between = reason === null ? leastIsolationDb(at, from, into) : NaN;
    if (reason !== null || !Number.isFinite(between)) {
      open ??= { frequency, reason: reason ?? notFinite(frequency) };
      continue;
    }
    const isolationDb = between + lossesDb;
    const marginDb = isolationDb - neededDb;
    if (worst === null || marginDb < worst.marginDb) worst = { frequency, isolationDb, marginDb };
  }
  if (worst !== null && (open === null || worst.marginDb < 0)) {
    return { mechanism, neededDb, ...worst, reason: null };
  }
  const { frequency, reason } = open!;
  return { mechanism, frequency, isolationDb: null, neededDb, marginDb: null, reason };
}

/** Of several elements under one cover the pair with the least isolation counts. */
function leastIsolationDb({ solver }: SolverAt, from: AntennaScene, into: AntennaScene): number {
  let least = Infinity;
  for (const source of from.ports) {
    for (const victim of into.ports) least = Math.min(least, solver.isolationDb(0, victim, source));
  }
  return least;
}

/** Why the two are not held at one frequency, or null. */
function reasonAt(
  { leftOut, frequency, wireNotHeld }: SolverAt,
  from: AntennaScene,
  into: AntennaScene,
): Reason | null {
  for (const { antenna, ports } of [from, into]) {
    for (const port of ports) {
      if (leftOut.has(port)) {
        return {
          code: 'too-long',
          message: `${antenna.label} is longer than ${MOST_WAVELENGTHS} wavelengths at ${frequencyWords(frequency)}.`,
        };
      }
      const entry = wireNotHeld(port);
      if (entry !== null) {
        return {
          code: entry.code,
          message: `${antenna.label} at ${frequencyWords(frequency)}: ${entry.message}.`,
        };
      }
    }
  }
  const step = Math.abs(from.surface!.height - into.surface!.height);
  if (step > FLAT_SHARE * wavelength(frequency)) {
    const who = `${from.antenna.label} and ${into.antenna.label}`;
    return {
      code: 'different-heights',
      message: `${who} stand on surfaces ${lengthWords(step)} apart in height; the estimate knows one flat plane.`,
    };
  }
  return null;
}

/** Why the two stand too close for thin wires, or null; the same at every frequency. */
function spacingReason(from: AntennaScene, into: AntennaScene): Reason | null {
  for (const one of portWires(from)) {
    for (const other of portWires(into)) {
      const entry = pairValidity(one, other);
      if (entry === null) continue;
      const who = `${from.antenna.label} and ${into.antenna.label}`;
      return { code: entry.code, message: `${who}: ${entry.message}.` };
    }
  }
  return null;
}

function portWires({ wires, ports }: AntennaScene): readonly Wire[] {
  return wires.filter(({ id }) => ports.includes(id));
}

/** The mechanism with the least margin speaks; one that is not held speaks unless another lacks already. */
function summarise({ from, into }: PlannedPair, mechanisms: readonly MechanismResult[]): PairResult {
  let speaks = mechanisms[0]!;
  for (const mechanism of mechanisms.slice(1)) {
    if (urgency(mechanism) < urgency(speaks)) speaks = mechanism;
  }
  const { mechanism, frequency, isolationDb, neededDb, marginDb, reason } = speaks;
  const state = marginDb === null ? 'not held' : marginState(marginDb, LIVE_UNCERTAINTY_DB);
  return {
    from,
    into,
    state,
    model: 'live',
    mechanism,
    frequency,
    isolationDb,
    neededDb,
    marginDb,
    mechanisms,
    reason,
  };
}

/** Lacking margins first, then what is not held, then what is left. */
function urgency({ marginDb }: MechanismResult): number {
  return marginDb === null ? 0 : marginDb < 0 ? marginDb - 1e-9 : marginDb + 1e-9;
}

function notHeld({ mechanism, neededDb, points }: PlannedMechanism, reason: Reason): MechanismResult {
  return {
    mechanism,
    frequency: points[0]!.frequency,
    isolationDb: null,
    neededDb,
    marginDb: null,
    reason,
  };
}

function keptApart({ from, into }: PlannedPair, reason: Reason): PairResult {
  return {
    from,
    into,
    state: 'never together',
    model: 'live',
    mechanism: null,
    frequency: null,
    isolationDb: null,
    neededDb: null,
    marginDb: null,
    mechanisms: [],
    reason,
  };
}

/** Why a number that came out infinite, or not a number at all, is not shown. `frequency` in Hz. */
export function notFinite(frequency: number): Reason {
  return {
    code: 'not-finite',
    message: `The estimate gives no finite number at ${frequencyWords(frequency)}.`,
  };
}
