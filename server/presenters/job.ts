import type { Job as JobRow } from '../models/job';
import { can, type Actor } from '../policies/policy';
import type { Job } from '@/shared/api/jobs';

/** A job, as a member sees it in the list. */
export function presentJob(actor: Actor, job: JobRow, platformCount: number): Job {
  return {
    id: job.id,
    name: job.name,
    customer: job.customer,
    archived: job.archivedAt !== null,
    updatedAt: job.updatedAt.toISOString(),
    platformCount,
    abilities: { edit: can(actor, 'edit-jobs', job) },
  };
}
