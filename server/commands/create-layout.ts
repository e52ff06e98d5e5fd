import type { Sequelize } from 'sequelize';
import { transact } from '../database/transaction';
import { Layout } from '../models/layout';
import type { Platform } from '../models/platform';
import { accept, refuse, type Result } from '@/shared/errors';
import { touchJob } from './touch-job';

/** A new layout of a platform: its survey, or a copy of what is committed in one of its layouts. */
export async function createLayout(
  sequelize: Sequelize,
  platform: Platform,
  input: { readonly name: string; readonly copyOf: string | null },
): Promise<Result<Layout>> {
  return transact(sequelize, async (transaction) => {
    const original =
      input.copyOf === null
        ? platform
        : await Layout.findOne({ where: { id: input.copyOf, platformId: platform.id }, transaction });
    if (original === null) {
      return refuse('invalid', 'The layout to copy is not one of this platform.', [
        { path: 'copyOf', message: 'is not a layout of this platform' },
      ]);
    }
    const layout = await Layout.create(
      { teamId: platform.teamId, platformId: platform.id, name: input.name, document: original.document },
      { transaction },
    );
    await touchJob(platform.jobId, transaction);
    return accept(layout);
  });
}
