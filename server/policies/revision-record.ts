import type { Revision } from '../models/revision';
import { findEvent } from '../models/revision-state';
import type { RevisionRecord } from './policy';

/** The revision as the policy sees it. */
export function revisionRecord(revision: Revision): RevisionRecord {
  return {
    teamId: revision.teamId,
    frozen: findEvent(revision, 'frozen') !== undefined,
    submittedById: findEvent(revision, 'submitted')?.memberId ?? null,
  };
}
