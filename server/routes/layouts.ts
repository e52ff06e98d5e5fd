import { Router, type Request } from 'express';
import { Op } from 'sequelize';
import { readSignedIn, requireSignedIn, type SignedIn } from '../auth/signed-in';
import { addComment } from '../commands/add-comment';
import { findLayout } from '../commands/load-layout';
import { COMMENT_PARTS } from '../commands/load-comment';
import { listRevisions } from '../commands/load-revision';
import { findLastLetter, saveRevision } from '../commands/save-revision';
import { touchJob } from '../commands/touch-job';
import { transact } from '../database/transaction';
import { authorize, refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam, parseQuery } from '../middleware/validate';
import { CommentRow } from '../models/comment-row';
import { OperationRow } from '../models/operation-row';
import { can } from '../policies/policy';
import { presentComment } from '../presenters/comment';
import { presentLayout } from '../presenters/layout';
import { presentLayoutBrief } from '../presenters/platform';
import { presentRevision } from '../presenters/revision';
import { revisionRecord } from '../policies/revision-record';
import type { Services } from '../services';
import { commentRequest } from '@/shared/api/comments';
import { idField } from '@/shared/api/fields';
import { layoutChangeRequest } from '@/shared/api/jobs';
import { operationListQuery } from '@/shared/api/layouts';
import { saveRevisionRequest } from '@/shared/api/revisions';
import type { LoadedLayout } from '../commands/load-layout';

const OPERATIONS_AT_ONCE = 500;

/** /api/layouts: the working arrangements, their comments and their revisions. */
export function createLayoutsRouter(services: Services): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.get('/:id', async (request, response) => {
    const { layout, by } = await findSeenLayout(request);
    const writer = await services.live.open(layout.id);
    const lastLetter = await findLastLetter(layout.id);
    const estimate = services.live.estimates.latest(layout.id);
    response.json(presentLayout(by.actor, layout, { state: writer.state, lastLetter, estimate }));
  });

  router.patch('/:id', async (request, response) => {
    const { layout, by } = await findSeenLayout(request);
    authorize(by.actor, 'edit-layouts', layout);
    const { name } = parseBody(layoutChangeRequest, request);
    await transact(services.sequelize, async (transaction) => {
      await layout.update({ name }, { transaction, fields: ['name', 'updatedAt'] });
      await touchJob(layout.platform.jobId, transaction);
    });
    services.live.announce({ kind: 'layout-changed', layoutId: layout.id });
    response.json(presentLayoutBrief(by.actor, layout, await listRevisions([layout.id])));
  });

  router.get('/:id/operations', async (request, response) => {
    const { layout } = await findSeenLayout(request);
    const { after } = parseQuery(operationListQuery, request);
    const writer = await services.live.open(layout.id);
    const rows = await OperationRow.findAll({
      where: { layoutId: layout.id, sequence: { [Op.gt]: after } },
      order: ['sequence'],
      limit: OPERATIONS_AT_ONCE,
    });
    const sequence = Math.max(writer.state.sequence, rows.at(-1)?.sequence ?? 0);
    response.json({ items: rows.map((row) => row.toCommitted()), sequence });
  });

  router.get('/:id/comments', async (request, response) => {
    const { layout, by } = await findSeenLayout(request);
    const comments = await CommentRow.findAll({
      where: { layoutId: layout.id },
      include: COMMENT_PARTS,
      order: ['number'],
    });
    response.json({ items: comments.map((comment) => presentComment(by.actor, comment)) });
  });

  router.post('/:id/comments', async (request, response) => {
    const { layout, by } = await findSeenLayout(request);
    authorize(by.actor, 'comment-on-layout', layout);
    const input = parseBody(commentRequest, request);
    // An antenna that was placed just before is among what is drained.
    const { document } = await services.live.drainLayout(layout.id);
    const place = { layoutId: layout.id, revisionId: null, names: namesOf(layout), document };
    const { comment, isNew } = unwrap(await addComment(services, by, place, input));
    if (isNew) {
      const present = (actor: typeof by.actor) => presentComment(actor, comment);
      services.live.announce({ kind: 'comment', layoutId: layout.id, present });
    }
    response.status(201).json(presentComment(by.actor, comment));
  });

  router.get('/:id/revisions', async (request, response) => {
    const by = readSignedIn(request);
    const layout = await findAnyLayout(request, by);
    const revisions = await listRevisions([layout.id]);
    const seen = revisions.filter((revision) => can(by.actor, 'see-revision', revisionRecord(revision)));
    if (seen.length === 0) authorize(by.actor, 'see-layouts', layout);
    response.json({ items: seen.map((revision) => presentRevision(by.actor, revision)) });
  });

  router.post('/:id/revisions', async (request, response) => {
    const { layout, by } = await findSeenLayout(request);
    authorize(by.actor, 'save-revision', layout);
    const { note } = parseBody(saveRevisionRequest, request);
    const state = await services.live.drainLayout(layout.id);
    const results = await services.live.estimate(layout.id, state);
    const input = { state, results, note, names: namesOf(layout) };
    const revision = await saveRevision(services, by, layout.id, input);
    const present = (actor: typeof by.actor) => presentRevision(actor, revision);
    services.live.announce({ kind: 'revision', layoutId: layout.id, present });
    response.status(201).json(present(by.actor));
  });

  return router;
}

async function findAnyLayout(request: Request, by: SignedIn): Promise<LoadedLayout> {
  const id = parseParam(idField, request, 'id');
  return (await findLayout(by.actor.teamId, id)) ?? refuseNotFound();
}

async function findSeenLayout(request: Request): Promise<{ layout: LoadedLayout; by: SignedIn }> {
  const by = readSignedIn(request);
  const layout = await findAnyLayout(request, by);
  authorize(by.actor, 'see-layouts', layout);
  return { layout, by };
}

function namesOf(layout: LoadedLayout) {
  return { job: layout.platform.job.name, platform: layout.platform.name, layout: layout.name };
}
