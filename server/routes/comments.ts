import { Router, type Request } from 'express';
import { readSignedIn, requireSignedIn, type SignedIn } from '../auth/signed-in';
import { addReply, resolveComment } from '../commands/add-comment';
import { loadComment } from '../commands/load-comment';
import { findLayout } from '../commands/load-layout';
import type { LayoutNames } from '../mail/review-messages';
import { authorize, refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam } from '../middleware/validate';
import type { CommentRow } from '../models/comment-row';
import type { Actor } from '../policies/policy';
import { revisionRecord } from '../policies/revision-record';
import { presentComment } from '../presenters/comment';
import type { Services } from '../services';
import { commentChangeRequest, replyRequest, type Comment } from '@/shared/api/comments';
import { idField } from '@/shared/api/fields';

/** /api/comments: the threads of balloons. */
export function createCommentsRouter(services: Services): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.post('/:id/replies', async (request, response) => {
    const { comment, by } = await findThread(request);
    const input = parseBody(replyRequest, request);
    const thread = { id: comment.id, names: await namesOf(by, comment) };
    const added = unwrap(await addReply(services, by, thread, input));
    response.status(201).json(announce(services, by.actor, added.comment));
  });

  router.patch('/:id', async (request, response) => {
    const { comment, by } = await findThread(request);
    const { resolved } = parseBody(commentChangeRequest, request);
    const changed = await resolveComment(services, by, comment.id, resolved);
    response.json(announce(services, by.actor, changed));
  });

  return router;
}

async function findThread(request: Request): Promise<{ comment: CommentRow; by: SignedIn }> {
  const by = readSignedIn(request);
  const comment = await loadComment(by.actor.teamId, parseParam(idField, request, 'id'));
  if (comment === null) refuseNotFound();
  if (comment.revision) authorize(by.actor, 'comment-on-revision', revisionRecord(comment.revision));
  else authorize(by.actor, 'comment-on-layout', comment);
  return { comment, by };
}

async function namesOf(by: SignedIn, comment: CommentRow): Promise<LayoutNames> {
  const layout = await findLayout(by.actor.teamId, comment.layoutId);
  if (layout === null) throw new Error(`the layout of comment ${comment.id} is gone`);
  return { job: layout.platform.job.name, platform: layout.platform.name, layout: layout.name };
}

function announce(services: Services, actor: Actor, comment: CommentRow): Comment {
  const present = (to: Actor) => presentComment(to, comment);
  services.live.announce({ kind: 'comment', layoutId: comment.layoutId, present });
  return present(actor);
}
