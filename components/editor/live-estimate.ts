import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';
import type { EditorEstimator } from './editor-estimator';

/** The solver's answer for what is painted, computed only when that has changed. */
export class LiveEstimate {
  private document: LayoutDocument | null = null;
  private patternFor: readonly string[] = [];
  private result: Estimate | null = null;

  constructor(private readonly estimator: EditorEstimator) {}

  /** At once: the document and the answer that belongs to it are painted together or not at all. */
  for(document: LayoutDocument, patternFor: readonly string[]): Estimate {
    const isKnown =
      document === this.document && patternFor.every((antennaId) => this.patternFor.includes(antennaId));
    if (!this.result || !isKnown) {
      this.result = this.estimator.estimate(document, { patternFor });
      this.document = document;
      this.patternFor = patternFor;
    }
    return this.result;
  }
}
