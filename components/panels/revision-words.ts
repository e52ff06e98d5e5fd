import type { Revision, RevisionDetail } from '@/shared/api/revisions';
import type { RevisionState } from '@/shared/api/jobs';
import { assertNever } from '@/shared/errors';

export type RevisionEvent = Revision['events'][number];

/** What a state means for somebody who is about to drill. */
export function explainState(state: RevisionState): string {
  switch (state) {
    case 'saved':
      return 'Saved. Not yet submitted: do not build from it.';
    case 'in review':
      return 'With the approvers. Not yet frozen: do not build from it.';
    case 'returned':
      return 'Returned by an approver. Do not build from it.';
    case 'frozen':
      return 'Frozen. This is the one to build from.';
    case 'superseded':
      return 'A later revision was frozen. Do not build from it.';
    default:
      return assertNever(state);
  }
}

/** What happened, as the start of a sentence that goes on with the name. */
export function describeEvent(event: RevisionEvent): string {
  switch (event.kind) {
    case 'saved':
      return `Saved by ${event.by}`;
    case 'submitted':
      return `Submitted for review by ${event.by}`;
    case 'returned':
      return `Returned by ${event.by}`;
    case 'frozen':
      return `Frozen by ${event.by}`;
    case 'superseded':
      return `Superseded when ${event.by} froze a later one`;
    default:
      return assertNever(event.kind);
  }
}

/** The first twelve digits of a hash in groups of four: enough to compare by eye. */
export function shortHash(hash: string): string {
  return groupHash(hash.slice(0, 12));
}

/** A whole hash in groups of four, as it can be read out over the telephone. */
export function groupHash(hash: string): string {
  return hash.match(/.{1,4}/g)?.join(' ') ?? '';
}

/** Who froze a revision and when; null when nobody has. A superseded one was frozen too. */
export function findFreeze(revision: Pick<RevisionDetail, 'events'>): RevisionEvent | null {
  return revision.events.findLast((event) => event.kind === 'frozen') ?? null;
}

/** Newest first: letters of a layout follow the order in which they were saved. */
export function orderRevisions(revisions: readonly Revision[]): readonly Revision[] {
  return [...revisions].sort((a, b) => b.savedAt.localeCompare(a.savedAt) || b.sequence - a.sequence);
}

/** What the working copy is, compared with what has been saved of it. */
export function describeWorkingCopy(
  revisions: readonly Revision[],
  sequence: number,
): { readonly title: string; readonly detail: string } {
  const last = orderRevisions(revisions)[0];
  if (!last) return { title: 'Working copy', detail: 'No revision has been saved of it yet.' };
  const changes = sequence - last.sequence;
  const title = `Working copy, after ${last.letter}`;
  if (changes <= 0) return { title, detail: `Nothing has changed since ${last.letter}.` };
  return { title, detail: `${changes} ${changes === 1 ? 'change' : 'changes'} since ${last.letter}.` };
}
