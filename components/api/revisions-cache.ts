import type { Revision } from '@/shared/api/revisions';

/** Puts a revision that is new or changed its state into a list, newest first. */
export function upsertRevision(items: readonly Revision[], revision: Revision): readonly Revision[] {
  const rest = items.filter((item) => item.id !== revision.id);
  return [revision, ...rest].sort((a, b) => b.sequence - a.sequence || b.savedAt.localeCompare(a.savedAt));
}
