import type { EditorEstimator } from '@/components/editor/editor-estimator';
import type { Estimate, PairResult } from '@/shared/estimate/estimate-result';
import type { LayoutDocument, PlacedAntenna } from '@/shared/layout/document';

/** A stand-in for the solver with a law that a test can work out: 40 dB at a metre, 20 dB more per decade. */
export class DistanceEstimator implements EditorEstimator {
  /** Every document it was asked about, in order. */
  readonly asked: LayoutDocument[] = [];

  estimate(document: LayoutDocument): Estimate {
    this.asked.push(document);
    return estimateByDistance(document);
  }
}

/** The law's isolation between two places, dB. */
export function isolationByDistance(a: PlacedAntenna, b: PlacedAntenna): number {
  return 40 + 20 * Math.log10(Math.hypot(a.x - b.x, a.y - b.y));
}

export function estimateByDistance(document: LayoutDocument): Estimate {
  const antennas = Object.values(document.antennas);
  const pairs = antennas.flatMap((from) =>
    antennas.filter((into) => into !== from).map((into) => pairByDistance(from, into)),
  );
  return {
    solverVersion: 'distance-1',
    model: 'live',
    assumption: 'distance alone',
    pairs,
    antennas: {},
    counts: { clear: pairs.length, tight: 0, lacking: 0, 'not held': 0, 'never together': 0 },
    warnings: [],
  };
}

function pairByDistance(from: PlacedAntenna, into: PlacedAntenna): PairResult {
  const isolationDb = isolationByDistance(from, into);
  return {
    from: from.id,
    into: into.id,
    state: 'clear',
    model: 'live',
    mechanism: 'overload',
    frequency: 150e6,
    isolationDb,
    neededDb: 20,
    marginDb: isolationDb - 20,
    mechanisms: [],
    reason: null,
  };
}
