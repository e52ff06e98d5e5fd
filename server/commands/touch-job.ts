import { QueryTypes, type Transaction } from 'sequelize';
import { Job } from '../models/job';

/**
 * Moves a job's time of change on, because something in it changed.
 * @throws Error when the models are not bound to a connection.
 */
export async function touchJob(jobId: string, transaction: Transaction): Promise<void> {
  const { sequelize } = Job;
  if (sequelize === undefined) throw new Error('the models are not bound to a connection');
  // Said in SQL: Sequelize skips an update that changes nothing but the time of the update.
  await sequelize.query('UPDATE jobs SET updated_at = ? WHERE id = ?', {
    replacements: [new Date(), jobId],
    type: QueryTypes.UPDATE,
    transaction,
  });
}
