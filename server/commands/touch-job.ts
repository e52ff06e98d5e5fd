import type { Transaction } from 'sequelize';
import { Job } from '../models/job';

/** Moves a job's time of change on, because something in it changed. */
export async function touchJob(jobId: string, transaction: Transaction): Promise<void> {
  // `silent` keeps Sequelize from writing a time of its own over this one.
  await Job.update({ updatedAt: new Date() }, { where: { id: jobId }, silent: true, transaction });
}
