import { DEMO_JOBS } from '@/shared/layout/demo/demo-jobs';
import { STARTER_PARTS } from '@/shared/layout/starter-parts';
import type { PartContent } from '@/shared/api/parts';
import { encodeDocument } from '../../models/document-codec';
import { Job } from '../../models/job';
import { Layout } from '../../models/layout';
import { Part } from '../../models/part';
import { encodePart, nameOfPart } from '../../models/part-codec';
import { Platform } from '../../models/platform';
import type { DemoContext } from './demo-context';

/** Loads the demo's jobs, platforms, layouts and parts. */
export async function loadDemoJobs({ team, transaction }: DemoContext): Promise<void> {
  const teamId = team.id;
  // The first job of the scenario is the newest, and stands at the top of the list.
  const now = Date.now();
  for (const [index, { name, customer, platforms }] of DEMO_JOBS.entries()) {
    const at = new Date(now - index * 60_000);
    const job = await Job.create(
      { teamId, name, customer, createdAt: at, updatedAt: at },
      { transaction, silent: true },
    );
    for (const [place, platform] of platforms.entries())
      await loadPlatform(teamId, job, platform, place, transaction);
  }
  const contents: PartContent[] = [
    ...STARTER_PARTS.antennas.map((antenna) => ({ kind: 'antenna' as const, antenna })),
    ...STARTER_PARTS.radios.map((radio) => ({ kind: 'radio' as const, radio })),
  ];
  await Part.bulkCreate(
    contents.map((content) => ({
      teamId,
      kind: content.kind,
      name: nameOfPart(content),
      content: encodePart(content),
    })),
    { transaction },
  );
}

async function loadPlatform(
  teamId: string,
  job: Job,
  platform: (typeof DEMO_JOBS)[number]['platforms'][number],
  place: number,
  transaction: DemoContext['transaction'],
): Promise<void> {
  const [first] = platform.layouts;
  if (first === undefined) throw new Error(`the demo platform ${platform.name} has no layout`);
  const { document } = first;
  // The survey is the bare platform: what a further layout starts from.
  const survey = { ...document, antennas: {}, radios: {}, neverTogether: {} };
  const at = new Date(job.createdAt.getTime() + place);
  const row = await Platform.create(
    {
      teamId,
      jobId: job.id,
      name: platform.name,
      kind: document.platform.kind,
      document: encodeDocument(survey),
      createdAt: at,
      updatedAt: at,
    },
    { transaction, silent: true },
  );
  await Layout.bulkCreate(
    platform.layouts.map((layout) => ({
      teamId,
      platformId: row.id,
      name: layout.name,
      document: encodeDocument(layout.document),
    })),
    { transaction },
  );
}
