import { parentPort } from 'node:worker_threads';
import { createEstimator, type Estimator } from '@/shared/estimate/estimate';
import type { EstimateAnswer, EstimateQuestion } from './estimate-messages';

const ESTIMATORS_KEPT = 12;

/** Estimators by layout, the most recently used last: each keeps what it prepared for the layout's antennas. */
const estimators = new Map<string, Estimator>();

if (parentPort === null) throw new Error('this file runs as a worker thread');
const port = parentPort;

port.on('message', (question: EstimateQuestion) => {
  port.postMessage(answerQuestion(question));
});

function answerQuestion({ id, layoutId, document }: EstimateQuestion): EstimateAnswer {
  const estimator = estimators.get(layoutId) ?? createEstimator();
  estimators.delete(layoutId);
  try {
    const result = estimator.estimate(document);
    estimators.set(layoutId, estimator);
    for (const oldest of estimators.keys()) {
      if (estimators.size <= ESTIMATORS_KEPT) break;
      estimators.delete(oldest);
    }
    return { id, ok: true, result };
  } catch (error) {
    // The estimator may be in any state now, so it is not kept.
    return {
      id,
      ok: false,
      problem: error instanceof Error ? (error.stack ?? error.message) : String(error),
    };
  }
}
