import { Layout } from '../models/layout';
import type { Job } from '../models/job';
import type { Platform } from '../models/platform';

/** A layout with its platform and job, without its document. */
export type LoadedLayout = Layout & { readonly platform: Platform & { readonly job: Job } };

/** A layout of a team with its platform and job, without its document; or null. */
export async function findLayout(teamId: string, id: string): Promise<LoadedLayout | null> {
  const layout = await Layout.findOne({
    where: { id, teamId },
    attributes: { exclude: ['document'] },
    include: [{ association: 'platform', attributes: { exclude: ['document'] }, include: ['job'] }],
  });
  if (layout === null) return null;
  if (!layout.platform?.job) throw new Error(`layout ${id} came without its platform and job`);
  return layout as LoadedLayout;
}
