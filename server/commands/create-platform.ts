import type { Sequelize } from 'sequelize';
import { transact } from '../database/transaction';
import { encodeDocument } from '../models/document-codec';
import type { Job } from '../models/job';
import { Layout } from '../models/layout';
import { Platform } from '../models/platform';
import { accept, type Result } from '@/shared/errors';
import { buildPlatformDocument } from '@/shared/layout/starter-platforms';
import { touchJob } from './touch-job';

const FIRST_LAYOUT = 'Layout 1';

/** A platform from a starter outline, with its first layout. Refused when the outline or a dimension is unknown. */
export async function createPlatform(
  sequelize: Sequelize,
  job: Job,
  input: {
    readonly name: string;
    readonly starter: string;
    readonly dimensions: Readonly<Record<string, number>>;
  },
): Promise<Result<{ readonly platform: Platform; readonly layout: Layout }>> {
  const built = buildPlatformDocument(input.starter, input.dimensions);
  if (!built.ok) return built;
  const survey = { ...built.value, platform: { ...built.value.platform, name: input.name } };
  const document = encodeDocument(survey);
  return transact(sequelize, async (transaction) => {
    const { teamId } = job;
    const platform = await Platform.create(
      { teamId, jobId: job.id, name: input.name, kind: survey.platform.kind, document },
      { transaction },
    );
    const layout = await Layout.create(
      { teamId, platformId: platform.id, name: FIRST_LAYOUT, document },
      { transaction },
    );
    await touchJob(job.id, transaction);
    return accept({ platform, layout });
  });
}
