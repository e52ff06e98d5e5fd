import { solverVersion } from '../em/solver-version';
import type { LayoutDocument } from '../layout/document';
import { antennaResult } from './antenna-result';
import type { AntennaResult, Estimate, PairResult, PairState } from './estimate-result';
import { FrequencySolvers } from './frequency-solvers';
import { comparePairs, judgePair } from './judge-pair';
import { hasSamePlan, planPairs, type PairPlan } from './pair-plan';
import { SceneBuilder } from './scene-from-document';
import { warningsOf } from './warnings';

/** Which parts of an estimate are wanted; every pair always is. */
export type EstimateWish = {
  /** Antennas whose azimuth pattern is wanted; all when left out. */
  readonly patternFor?: readonly string[];
};

/** Computes estimates of one layout as it changes; keeps what the next answer can use. */
export interface Estimator {
  /**
   * The live estimate of a document. Depends on the document and the wish alone (to rounding), whatever was asked
   * before. Never throws for a document that the schema accepts.
   */
  estimate(document: LayoutDocument, wish?: EstimateWish): Estimate;
}

/** Makes an estimator; each open layout has its own. */
export function createEstimator(): Estimator {
  return new LiveEstimator();
}

class LiveEstimator implements Estimator {
  private readonly scenes = new SceneBuilder();
  private readonly solvers = new FrequencySolvers();
  private planned: { readonly document: LayoutDocument; readonly plan: PairPlan } | null = null;

  estimate(document: LayoutDocument, { patternFor }: EstimateWish = {}): Estimate {
    const plan = this.planFor(document);
    const scene = this.scenes.build(document);
    this.solvers.update(scene.ground, plan.frequencies, scene.wires);
    const byId = new Map(scene.antennas.map((one) => [one.antenna.id, one]));
    const labelOf = (id: string) => document.antennas[id]!.label;
    const pairs = plan.pairs
      .map((pair) => judgePair(pair, byId.get(pair.from)!, byId.get(pair.into)!, this.solvers))
      .sort(
        (a, b) =>
          comparePairs(a, b) ||
          compareText(labelOf(a.from), labelOf(b.from)) ||
          compareText(labelOf(a.into), labelOf(b.into)),
      );
    const antennas: Record<string, AntennaResult> = {};
    for (const one of scene.antennas) {
      const { id } = one.antenna;
      const wants = patternFor === undefined || patternFor.includes(id);
      antennas[id] = antennaResult(one, pairs, plan, this.solvers, wants);
    }
    return {
      solverVersion: solverVersion,
      model: 'live',
      assumption:
        scene.ground === 'plane'
          ? 'thin-wire estimate, infinite flat metal roof'
          : 'thin-wire estimate, free space',
      pairs,
      antennas,
      counts: countStates(pairs),
      warnings: warningsOf(document, scene, plan),
    };
  }

  private planFor(document: LayoutDocument): PairPlan {
    if (this.planned && hasSamePlan(this.planned.document, document)) return this.planned.plan;
    const plan = planPairs(document);
    this.planned = { document, plan };
    return plan;
  }
}

function countStates(pairs: readonly PairResult[]): Record<PairState, number> {
  const counts = { clear: 0, tight: 0, lacking: 0, 'not held': 0, 'never together': 0 };
  for (const { state } of pairs) counts[state] += 1;
  return counts;
}

function compareText(a: string, b: string): number {
  return LABEL_ORDER.compare(a, b);
}

/** A2 before A10; one for all, because `localeCompare` makes its own at every call. */
const LABEL_ORDER = new Intl.Collator('en', { numeric: true });
