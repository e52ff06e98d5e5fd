import { bearingNormalise } from '../geometry/point';
import type { AntennaResult, PairResult, PatternResult, Reason } from './estimate-result';
import { frequencyWords } from './frequency-words';
import type { FrequencySolvers } from './frequency-solvers';
import { MOST_WAVELENGTHS } from './frequency-solvers';
import { notFinite } from './judge-pair';
import type { PairPlan } from './pair-plan';
import type { AntennaScene } from './scene-from-document';

/** The azimuth cut that is shown: the horizon, every five degrees. */
const CUT = { elevationDeg: 0, stepDeg: 5 } as const;

/** What the estimate says of one antenna; its pattern only when it is asked for. */
export function antennaResult(
  scene: AntennaScene,
  pairs: readonly PairResult[],
  plan: PairPlan,
  solvers: FrequencySolvers,
  wantsPattern: boolean,
): AntennaResult {
  const { antenna } = scene;
  const frequency = plan.patternFrequency.get(antenna.id);
  const port = scene.ports[0];
  let pattern: PatternResult | null = null;
  let { reason } = scene;
  if (wantsPattern && frequency !== undefined && port !== undefined) {
    const { solver, leftOut, wireNotHeld } = solvers.at(frequency);
    if (leftOut.has(port)) {
      reason ??= {
        code: 'too-long',
        message: `${antenna.label} is longer than ${MOST_WAVELENGTHS} wavelengths at ${frequencyWords(frequency)}.`,
      };
    } else {
      const { gainDbi, aloneDbi, rippleDb, deepestBearingDeg } = solver.pattern(0, port, CUT);
      const entry = wireNotHeld(port);
      const ownReason = reason ?? patternReason(antenna.label, entry?.code, entry?.message);
      if ([rippleDb, deepestBearingDeg, ...gainDbi, ...aloneDbi].every(Number.isFinite)) {
        pattern = {
          frequency,
          ...CUT,
          gainDbi,
          aloneDbi,
          rippleDb,
          deepestAzimuthDeg: bearingNormalise(-deepestBearingDeg),
          reason: ownReason,
        };
      } else {
        reason = ownReason ?? notFinite(frequency);
      }
    }
  }
  return { antennaId: antenna.id, pattern, reason, worstMarginDb: worstMargin(antenna.id, pairs) };
}

function patternReason(label: string, code: string | undefined, message: string | undefined): Reason | null {
  return code === undefined ? null : { code, message: `${label}: ${message}.` };
}

function worstMargin(antennaId: string, pairs: readonly PairResult[]): number | null {
  let worst: number | null = null;
  for (const { from, into, marginDb } of pairs) {
    if (marginDb === null || (from !== antennaId && into !== antennaId)) continue;
    if (worst === null || marginDb < worst) worst = marginDb;
  }
  return worst;
}
