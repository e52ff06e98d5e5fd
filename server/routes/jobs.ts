import { Router, type Request } from 'express';
import { Op, QueryTypes, type WhereOptions } from 'sequelize';
import { readSignedIn, requireSignedIn } from '../auth/signed-in';
import { createPlatform } from '../commands/create-platform';
import { listRevisions } from '../commands/load-revision';
import { authorize, refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam, parseQuery } from '../middleware/validate';
import { Job } from '../models/job';
import { Layout } from '../models/layout';
import { Platform } from '../models/platform';
import { can, type Actor } from '../policies/policy';
import { presentJob } from '../presenters/job';
import { decodeCursor, encodeCursor } from '../presenters/page-cursor';
import { presentPlatform, type PlatformBrief } from '../presenters/platform';
import type { Services } from '../services';
import { idField } from '@/shared/api/fields';
import { jobChangeRequest, jobListQuery, jobRequest, platformRequest } from '@/shared/api/jobs';
import { escapeLike } from './escape-like';

const PAGE_LENGTH = 50;

/** /api/jobs: the jobs of the current team. */
export function createJobsRouter(services: Services): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.get('/', async (request, response) => {
    const { actor } = readSignedIn(request);
    const query = parseQuery(jobListQuery, request);
    const limit = query.limit ?? PAGE_LENGTH;
    const conditions: WhereOptions<Job['_attributes']>[] = [
      { teamId: actor.teamId },
      { archivedAt: query.archived === 'true' ? { [Op.ne]: null } : null },
    ];
    if (query.search) {
      const like = { [Op.like]: `%${escapeLike(query.search)}%` };
      conditions.push({ [Op.or]: [{ name: like }, { customer: like }] });
    }
    const frozen = can(actor, 'see-jobs', actor) ? null : await countFrozenPlatforms(services, actor);
    if (frozen) conditions.push({ id: [...frozen.keys()] });
    if (query.cursor !== undefined) conditions.push(readPosition(query.cursor));
    const jobs = await Job.findAll({
      where: { [Op.and]: conditions },
      order: [
        ['updatedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: limit + 1,
    });
    const page = jobs.slice(0, limit);
    const counts = frozen ?? (await countPlatforms(page.map((job) => job.id)));
    const last = page.at(-1);
    response.json({
      items: page.map((job) => presentJob(actor, job, counts.get(job.id) ?? 0)),
      next: jobs.length > limit && last ? encodeCursor([last.updatedAt.getTime(), last.id]) : null,
    });
  });

  router.post('/', async (request, response) => {
    const { actor } = readSignedIn(request);
    authorize(actor, 'edit-jobs', actor);
    const input = parseBody(jobRequest, request);
    const job = await Job.create({ teamId: actor.teamId, ...input });
    response.status(201).json(presentJob(actor, job, 0));
  });

  router.get('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const job = await findJob(request, actor);
    const platforms = await describePlatforms(actor, job.id);
    const shown = can(actor, 'see-jobs', job)
      ? platforms
      : platforms.filter(({ layouts }) => layouts.length > 0);
    if (!can(actor, 'see-jobs', job) && shown.length === 0) refuseNotFound();
    response.json({ ...presentJob(actor, job, shown.length), platforms: shown });
  });

  router.patch('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const job = await findJob(request, actor);
    authorize(actor, 'edit-jobs', job);
    const { archived, name, customer } = parseBody(jobChangeRequest, request);
    if (name !== undefined) job.name = name;
    if (customer !== undefined) job.customer = customer;
    if (archived !== undefined && archived !== (job.archivedAt !== null))
      job.archivedAt = archived ? new Date() : null;
    await job.save();
    const counts = await countPlatforms([job.id]);
    response.json(presentJob(actor, job, counts.get(job.id) ?? 0));
  });

  router.post('/:id/platforms', async (request, response) => {
    const { actor } = readSignedIn(request);
    const job = await findJob(request, actor);
    authorize(actor, 'edit-layouts', job);
    const input = parseBody(platformRequest, request);
    const { platform, layout } = unwrap(await createPlatform(services.sequelize, job, input));
    response.status(201).json(presentPlatform(actor, platform, [{ layout, revisions: [] }]));
  });

  return router;
}

/** The platforms of a job with their layouts and revisions. */
export async function describePlatforms(actor: Actor, jobId: string): Promise<PlatformBrief[]> {
  const platforms = await Platform.findAll({
    where: { jobId },
    attributes: { exclude: ['document'] },
    order: ['createdAt', 'id'],
  });
  return Promise.all(platforms.map((platform) => describePlatform(actor, platform)));
}

/** A platform with its layouts and revisions. */
export async function describePlatform(actor: Actor, platform: Platform): Promise<PlatformBrief> {
  const layouts = await Layout.findAll({
    where: { platformId: platform.id },
    attributes: { exclude: ['document'] },
    order: ['createdAt', 'id'],
  });
  const revisions = await listRevisions(layouts.map((layout) => layout.id));
  return presentPlatform(
    actor,
    platform,
    layouts.map((layout) => ({
      layout,
      revisions: revisions.filter(({ layoutId }) => layoutId === layout.id),
    })),
  );
}

async function findJob(request: Request, actor: Actor): Promise<Job> {
  const id = parseParam(idField, request, 'id');
  const job = await Job.findOne({ where: { id, teamId: actor.teamId } });
  return job ?? refuseNotFound();
}

async function countPlatforms(jobIds: readonly string[]): Promise<ReadonlyMap<string, number>> {
  const rows = await Platform.count({ where: { jobId: [...jobIds] }, group: ['jobId'] });
  return new Map(rows.map((row) => [String(row['jobId'] ?? row['job_id']), row.count]));
}

/** Jobs that lead to a revision that was frozen, each with how many of its platforms do. */
async function countFrozenPlatforms(
  { sequelize }: Services,
  actor: Actor,
): Promise<ReadonlyMap<string, number>> {
  const rows = await sequelize.query<{ id: string; count: number }>(
    `SELECT platforms.job_id AS id, COUNT(DISTINCT platforms.id) AS count FROM revisions
     JOIN revision_events ON revision_events.revision_id = revisions.id AND revision_events.kind = 'frozen'
     JOIN layouts ON layouts.id = revisions.layout_id
     JOIN platforms ON platforms.id = layouts.platform_id
     WHERE revisions.team_id = ? GROUP BY platforms.job_id`,
    { replacements: [actor.teamId], type: QueryTypes.SELECT },
  );
  return new Map(rows.map((row) => [row.id, row.count]));
}

function readPosition(cursor: string): WhereOptions<Job['_attributes']> {
  const [at, id] = unwrap(decodeCursor(cursor, ['number', 'string']));
  const updatedAt = new Date(Number(at));
  return { [Op.or]: [{ updatedAt: { [Op.lt]: updatedAt } }, { updatedAt, id: { [Op.lt]: String(id) } }] };
}
