import { Router, type Request, type RequestHandler } from 'express';
import { QueryTypes } from 'sequelize';
import { verifyPassword } from '../auth/password';
import { readSignedIn, requireSignedIn, type SignedIn } from '../auth/signed-in';
import { addComment } from '../commands/add-comment';
import { freezeRevision, returnRevision, submitRevision } from '../commands/decide-revision';
import { COMMENT_PARTS } from '../commands/load-comment';
import { findRevision, listRevisions, loadContent } from '../commands/load-revision';
import { limitAttempts } from '../middleware/limit-rate';
import { authorize, refuseNotFound, refuseRequest, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam, parseQuery } from '../middleware/validate';
import { CommentRow } from '../models/comment-row';
import { Revision } from '../models/revision';
import { stateOf } from '../models/revision-state';
import { revisionRecord } from '../policies/revision-record';
import type { Actor } from '../policies/policy';
import { presentComment } from '../presenters/comment';
import { decodeCursor, encodeCursor } from '../presenters/page-cursor';
import { presentRevision, presentRevisionDetail } from '../presenters/revision';
import type { Services } from '../services';
import { commentRequest } from '@/shared/api/comments';
import { idField, pageQuery } from '@/shared/api/fields';
import {
  freezeRevisionRequest,
  returnRevisionRequest,
  type FrozenRevision,
  type Revision as PresentedRevision,
} from '@/shared/api/revisions';

const PAGE_LENGTH = 50;

interface FrozenRow extends Omit<FrozenRevision, 'frozenAt'> {
  readonly eventId: number;
  readonly frozenAt: Date;
}

/** /api/revisions: saved states, which nobody can change. */
export function createRevisionsRouter(services: Services): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.get('/', async (request, response) => {
    const { actor } = readSignedIn(request);
    const query = parseQuery(pageQuery, request);
    const limit = query.limit ?? PAGE_LENGTH;
    const rows = await listFrozen(services, actor, query.cursor, limit + 1);
    const page = rows.slice(0, limit);
    const last = page.at(-1);
    response.json({
      items: page.map(presentFrozen),
      next: rows.length > limit && last ? encodeCursor([last.eventId]) : null,
    });
  });

  router.get('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const id = parseParam(idField, request, 'id');
    const revision = await Revision.findOne({ where: { id, teamId: actor.teamId }, include: ['events'] });
    if (revision === null) refuseNotFound();
    authorize(actor, 'see-revision', revisionRecord(revision));
    response.json(presentRevisionDetail(actor, revision));
  });

  const refuseChange: RequestHandler = async (request, response) => {
    await findSeenRevision(request);
    response.setHeader('Allow', 'GET, HEAD');
    refuseRequest(
      'method-not-allowed',
      'A revision does not change. Save the layout as the next letter instead.',
    );
  };
  router.patch('/:id', refuseChange);
  router.put('/:id', refuseChange);
  router.delete('/:id', refuseChange);

  router.post('/:id/submit', async (request, response) => {
    const { revision, by } = await findSeenRevision(request);
    authorize(by.actor, 'submit-revision', revisionRecord(revision));
    const submitted = unwrap(await submitRevision(services, by, revision.id));
    response.json(announce(services, by.actor, submitted));
  });

  router.post('/:id/return', async (request, response) => {
    const { revision, by } = await findSeenRevision(request);
    authorize(by.actor, 'return-revision', revisionRecord(revision));
    const { reason } = parseBody(returnRevisionRequest, request);
    const returned = unwrap(await returnRevision(services, by, revision.id, reason));
    response.json(announce(services, by.actor, returned));
  });

  router.post('/:id/freeze', ...limitAttempts(services.limits), async (request, response) => {
    const { revision, by } = await findSeenRevision(request);
    authorize(by.actor, 'freeze-revision', revisionRecord(revision));
    const { reason, password } = parseBody(freezeRevisionRequest, request);
    const state = stateOf(revision);
    if (state !== 'in review')
      refuseRequest('wrong-state', `Revision ${revision.letter} is ${state}, not in review.`);
    if (!(await verifyPassword(password, by.person.passwordHash))) {
      refuseRequest('wrong-password', 'This is not your password.', [
        { path: 'password', message: 'is not your password' },
      ]);
    }
    const frozen = unwrap(await freezeRevision(services, by, revision.id, reason));
    const answer = announce(services, by.actor, frozen);
    await announceSuperseded(services, frozen);
    response.json(answer);
  });

  router.get('/:id/comments', async (request, response) => {
    const { revision, by } = await findSeenRevision(request);
    const comments = await CommentRow.findAll({
      where: { revisionId: revision.id },
      include: COMMENT_PARTS,
      order: ['number'],
    });
    response.json({ items: comments.map((comment) => presentComment(by.actor, comment)) });
  });

  router.post('/:id/comments', async (request, response) => {
    const { revision, by } = await findSeenRevision(request);
    authorize(by.actor, 'comment-on-revision', revisionRecord(revision));
    const input = parseBody(commentRequest, request);
    const names = { job: revision.jobName, platform: revision.platformName, layout: revision.layoutName };
    const { document } = await loadContent(revision.id);
    const place = { layoutId: revision.layoutId, revisionId: revision.id, names, document };
    const { comment, isNew } = unwrap(await addComment(services, by, place, input));
    const present = (actor: Actor) => presentComment(actor, comment);
    if (isNew) services.live.announce({ kind: 'comment', layoutId: revision.layoutId, present });
    response.status(201).json(present(by.actor));
  });

  return router;
}

async function findSeenRevision(request: Request): Promise<{ revision: Revision; by: SignedIn }> {
  const by = readSignedIn(request);
  const revision = await findRevision(by.actor.teamId, parseParam(idField, request, 'id'));
  if (revision === null) refuseNotFound();
  authorize(by.actor, 'see-revision', revisionRecord(revision));
  return { revision, by };
}

function announce(services: Services, actor: Actor, revision: Revision): PresentedRevision {
  const present = (to: Actor) => presentRevision(to, revision);
  services.live.announce({ kind: 'revision', layoutId: revision.layoutId, present });
  return present(actor);
}

async function announceSuperseded(services: Services, frozen: Revision): Promise<void> {
  for (const revision of await listRevisions([frozen.layoutId])) {
    if (stateOf(revision) !== 'superseded') continue;
    const present = (to: Actor) => presentRevision(to, revision);
    services.live.announce({ kind: 'revision', layoutId: revision.layoutId, present });
  }
}

// An administrator's or a colleague's list and an installer's are the same: what is frozen and not superseded.
function listFrozen(
  { sequelize }: Services,
  actor: Actor,
  cursor: string | undefined,
  limit: number,
): Promise<readonly FrozenRow[]> {
  const before = cursor === undefined ? null : unwrap(decodeCursor(cursor, ['number']))[0];
  return sequelize.query<FrozenRow>(
    `SELECT revisions.id, revisions.letter, revisions.hash, revisions.job_name AS job,
       revisions.platform_name AS platform, revisions.layout_name AS layout,
       frozen.id AS eventId, frozen.at AS frozenAt, frozen.member_name AS frozenBy
     FROM revisions
     JOIN revision_events AS frozen ON frozen.revision_id = revisions.id AND frozen.kind = 'frozen'
     LEFT JOIN revision_events AS superseded
       ON superseded.revision_id = revisions.id AND superseded.kind = 'superseded'
     WHERE revisions.team_id = :teamId AND superseded.id IS NULL AND (:before IS NULL OR frozen.id < :before)
     ORDER BY frozen.id DESC LIMIT :limit`,
    { replacements: { teamId: actor.teamId, before, limit }, type: QueryTypes.SELECT },
  );
}

function presentFrozen({ eventId: _eventId, frozenAt, ...row }: FrozenRow): FrozenRevision {
  return { ...row, frozenAt: frozenAt.toISOString() };
}
