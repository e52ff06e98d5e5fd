import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';

/** What the editor asks of the solver: the answer for one document, at once. */
export interface EditorEstimator {
  /** `patternFor`: the antennas whose azimuth pattern is wanted (the selected and the dragged ones). */
  estimate(document: LayoutDocument, wanted: { readonly patternFor: readonly string[] }): Estimate;
}
