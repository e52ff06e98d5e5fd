import { Job } from '../../models/job';
import { Layout } from '../../models/layout';
import { Platform } from '../../models/platform';
import type { DemoContext } from './demo-context';

/** The first layout of a demo job, by the job's name. */
export async function findDemoLayout(
  { team, transaction }: DemoContext,
  jobName: string,
): Promise<{ readonly job: Job; readonly platform: Platform; readonly layout: Layout }> {
  const own = { teamId: team.id };
  const options = { transaction, rejectOnEmpty: true } as const;
  const job = await Job.findOne({ where: { ...own, name: jobName }, ...options });
  const platform = await Platform.findOne({ where: { ...own, jobId: job.id }, ...options });
  const layout = await Layout.findOne({ where: { ...own, platformId: platform.id }, ...options });
  return { job, platform, layout };
}
