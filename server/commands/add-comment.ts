import type { Transaction } from 'sequelize';
import type { SignedIn } from '../auth/signed-in';
import { transact } from '../database/transaction';
import { writeComment, type LayoutNames } from '../mail/review-messages';
import { CommentReplyRow } from '../models/comment-reply-row';
import { CommentRow } from '../models/comment-row';
import { Layout } from '../models/layout';
import { can } from '../policies/policy';
import { revisionRecord } from '../policies/revision-record';
import type { Services } from '../services';
import { enqueueTask } from '../tasks/enqueue-task';
import type { CommentTarget } from '@/shared/api/comments';
import { accept, refuse, type Result } from '@/shared/errors';
import type { LayoutDocument } from '@/shared/layout/document';
import { findActiveMembers, findLayoutWorkers } from './find-concerned';
import { loadComment } from './load-comment';

/** A comment or an answer as it was made, and whether this arrival made it. */
export interface AddedComment {
  readonly comment: CommentRow;
  readonly isNew: boolean;
}

/** Where a comment is made. */
export interface CommentPlace {
  readonly layoutId: string;
  readonly revisionId: string | null;
  readonly names: LayoutNames;
  /** What a leader line can point at. */
  readonly document: LayoutDocument;
}

/**
 * Adds a comment under the layout's next number, and writes to those concerned in the same transaction. The
 * number is taken while the layout's row is locked, so there is no gap. A second arrival of an identifier
 * changes nothing. Refused when the antenna it points at is not there.
 */
export async function addComment(
  services: Services,
  by: SignedIn,
  place: CommentPlace,
  input: { readonly id: string; readonly target: CommentTarget; readonly text: string },
): Promise<Result<AddedComment>> {
  const { teamId, memberId } = by.actor;
  return transact(services.sequelize, async (transaction) => {
    const layout = await Layout.findByPk(place.layoutId, {
      attributes: ['id', 'commentCount'],
      transaction,
      lock: transaction.LOCK.UPDATE,
      rejectOnEmpty: true,
    });
    const first = await CommentRow.findByPk(input.id, { transaction });
    if (first !== null) {
      const same = first.layoutId === place.layoutId && (first.revisionId ?? null) === place.revisionId;
      return same
        ? accept({ comment: await reload(teamId, input.id, transaction), isNew: false })
        : refuseIdentifier();
    }
    if (input.target.kind === 'antenna' && !Object.hasOwn(place.document.antennas, input.target.antennaId)) {
      return refuse('invalid', `There is no antenna ${input.target.label} here. Point at something else.`, [
        { path: 'target.antennaId', message: 'is no antenna of this layout' },
      ]);
    }
    const number = layout.commentCount + 1;
    await Layout.update({ commentCount: number }, { where: { id: layout.id }, silent: true, transaction });
    await CommentRow.create(
      {
        id: input.id,
        teamId,
        layoutId: place.layoutId,
        revisionId: place.revisionId,
        number,
        target: JSON.stringify(input.target),
        text: input.text,
        authorId: memberId,
      },
      { transaction },
    );
    const comment = await reload(teamId, input.id, transaction);
    await writeToConcerned(services, by, place.names, comment, input.text, transaction);
    return accept({ comment, isNew: true });
  });
}

/** Adds an answer to a comment's thread, and writes to those concerned; a second arrival changes nothing. */
export async function addReply(
  services: Services,
  by: SignedIn,
  comment: { readonly id: string; readonly names: LayoutNames },
  input: { readonly id: string; readonly text: string },
): Promise<Result<AddedComment>> {
  const { teamId, memberId } = by.actor;
  return transact(services.sequelize, async (transaction) => {
    await CommentRow.findByPk(comment.id, {
      transaction,
      lock: transaction.LOCK.UPDATE,
      rejectOnEmpty: true,
    });
    const first = await CommentReplyRow.findByPk(input.id, { transaction });
    if (first !== null) {
      return first.commentId === comment.id
        ? accept({ comment: await reload(teamId, comment.id, transaction), isNew: false })
        : refuseIdentifier();
    }
    await CommentReplyRow.create(
      { id: input.id, commentId: comment.id, text: input.text, authorId: memberId },
      { transaction },
    );
    const thread = await reload(teamId, comment.id, transaction);
    await writeToConcerned(services, by, comment.names, thread, input.text, transaction);
    return accept({ comment: thread, isNew: true });
  });
}

/** Marks a comment as resolved, or as open again. */
export async function resolveComment(
  services: Services,
  by: SignedIn,
  commentId: string,
  resolved: boolean,
): Promise<CommentRow> {
  return transact(services.sequelize, async (transaction) => {
    const comment = await CommentRow.findByPk(commentId, {
      transaction,
      lock: transaction.LOCK.UPDATE,
      rejectOnEmpty: true,
    });
    if ((comment.resolvedAt !== null) !== resolved) {
      comment.set({
        resolvedAt: resolved ? new Date() : null,
        resolvedById: resolved ? by.actor.memberId : null,
      });
      await comment.save({ transaction });
    }
    return reload(by.actor.teamId, commentId, transaction);
  });
}

async function writeToConcerned(
  services: Services,
  by: SignedIn,
  names: LayoutNames,
  comment: CommentRow,
  text: string,
  transaction: Transaction,
): Promise<void> {
  const { revision } = comment;
  const participants = [comment.authorId, ...(comment.replies ?? []).map((reply) => reply.authorId)];
  const workers = await findLayoutWorkers(comment.layoutId, transaction);
  const concerned = await findActiveMembers(
    { id: [...new Set([...participants, ...workers])] },
    {
      but: by.actor.memberId,
      transaction,
      maySee: (actor) =>
        revision ? can(actor, 'see-revision', revisionRecord(revision)) : can(actor, 'see-layouts', comment),
    },
  );
  const target = JSON.parse(comment.target) as CommentTarget;
  const message = writeComment({
    names,
    number: comment.number,
    author: by.person.name,
    about: target.kind === 'antenna' ? `on ${target.label}` : 'on a spot',
    text,
    isReply: (comment.replies ?? []).length > 0,
    link: `${services.baseUrl()}/${revision ? `r/${revision.id}` : `layouts/${comment.layoutId}`}`,
  });
  for (const { person } of concerned) {
    await enqueueTask('mail', { to: person.email, ...message }, { transaction, teamId: comment.teamId });
  }
}

async function reload(teamId: string, commentId: string, transaction: Transaction): Promise<CommentRow> {
  const comment = await loadComment(teamId, commentId, transaction);
  if (comment === null) throw new Error(`comment ${commentId} is gone`);
  return comment;
}

function refuseIdentifier(): Result<AddedComment> {
  return refuse('conflict', 'This identifier was used for something else. Try again.', [
    { path: 'id', message: 'was used before' },
  ]);
}
