import type { Revision as RevisionRow } from '../models/revision';
import { readRevisionContent } from '../models/revision-content';
import { eventsOf, stateOf } from '../models/revision-state';
import { can, type Actor } from '../policies/policy';
import { revisionRecord } from '../policies/revision-record';
import type { Revision, RevisionDetail } from '@/shared/api/revisions';

/** A revision with what happened to it, and what the member may do to it in its state. */
export function presentRevision(actor: Actor, revision: RevisionRow): Revision {
  const record = revisionRecord(revision);
  const state = stateOf(revision);
  return {
    id: revision.id,
    layoutId: revision.layoutId,
    letter: revision.letter,
    state,
    hash: revision.hash,
    note: revision.note,
    sequence: revision.sequence,
    savedBy: revision.savedByName,
    savedAt: revision.savedAt.toISOString(),
    events: eventsOf(revision).map(({ kind, memberName, at, reason }) => ({
      kind,
      by: memberName,
      at: at.toISOString(),
      reason: reason ?? null,
    })),
    abilities: {
      submit: state === 'saved' && can(actor, 'submit-revision', record),
      return: state === 'in review' && can(actor, 'return-revision', record),
      freeze: state === 'in review' && can(actor, 'freeze-revision', record),
      comment: can(actor, 'comment-on-revision', record),
    },
  };
}

/** A revision with all that its row holds. */
export function presentRevisionDetail(actor: Actor, revision: RevisionRow): RevisionDetail {
  const { document, results, solverVersion } = readRevisionContent(revision.content);
  return {
    ...presentRevision(actor, revision),
    job: revision.jobName,
    platform: revision.platformName,
    layout: revision.layoutName,
    document,
    results,
    solverVersion,
  };
}
