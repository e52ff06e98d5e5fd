import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';
import { upgradeDocument } from '@/shared/layout/upgrades';

/** What the canonical JSON of a revision holds. */
export interface StoredRevisionContent {
  readonly document: LayoutDocument;
  readonly results: Estimate;
  readonly solverVersion: string;
}

/**
 * Reads the canonical JSON of a revision; the document is upgraded on the way, the row stays as it is.
 * @throws Error when what is stored is no revision.
 */
export function readRevisionContent(content: string): StoredRevisionContent {
  const stored = JSON.parse(content) as { document: unknown; results: Estimate; solverVersion: string };
  const document = upgradeDocument(stored.document);
  if (!document.ok) throw new Error(`a stored revision does not hold: ${document.refusal.message}`);
  return { document: document.value, results: stored.results, solverVersion: stored.solverVersion };
}
