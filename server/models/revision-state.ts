import type { RevisionState } from '@/shared/api/jobs';
import type { Revision } from './revision';
import { stateAfter, type RevisionEvent, type RevisionEventKind } from './revision-event';

/**
 * What happened to a revision, in order.
 * @throws Error when its events were not loaded.
 */
export function eventsOf(revision: Revision): readonly RevisionEvent[] {
  if (revision.events === undefined) throw new Error('the revision came without its events');
  return [...revision.events].sort((a, b) => a.id - b.id);
}

/** The state of a revision: what its last event made of it. */
export function stateOf(revision: Revision): RevisionState {
  const last = eventsOf(revision).at(-1);
  if (last === undefined) throw new Error(`revision ${revision.id} has no event`);
  return stateAfter(last.kind);
}

/** The event of a kind, if it happened. */
export function findEvent(revision: Revision, kind: RevisionEventKind): RevisionEvent | undefined {
  return eventsOf(revision).find((event) => event.kind === kind);
}
