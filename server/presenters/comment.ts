import type { CommentRow } from '../models/comment-row';
import type { Membership } from '../models/membership';
import { can, type Actor } from '../policies/policy';
import { revisionRecord } from '../policies/revision-record';
import type { Comment, CommentTarget } from '@/shared/api/comments';
import { initialsOf } from './person';

/** A comment with its thread, as a member sees it. */
export function presentComment(actor: Actor, comment: CommentRow): Comment {
  const may = mayComment(actor, comment);
  const replies = [...(comment.replies ?? [])].sort(
    (a, b) => a.createdAt.getTime() - b.createdAt.getTime() || (a.id < b.id ? -1 : 1),
  );
  return {
    id: comment.id,
    layoutId: comment.layoutId,
    revisionId: comment.revisionId ?? null,
    number: comment.number,
    target: JSON.parse(comment.target) as CommentTarget,
    text: comment.text,
    author: presentAuthor(comment.author),
    createdAt: comment.createdAt.toISOString(),
    resolvedAt: comment.resolvedAt?.toISOString() ?? null,
    resolvedBy: comment.resolvedBy ? presentAuthor(comment.resolvedBy).name : null,
    replies: replies.map((reply) => ({
      id: reply.id,
      text: reply.text,
      author: presentAuthor(reply.author),
      createdAt: reply.createdAt.toISOString(),
    })),
    abilities: { reply: may, resolve: may },
  };
}

/** Whether a member may add to a comment's thread or resolve it. */
export function mayComment(actor: Actor, comment: CommentRow): boolean {
  return comment.revision
    ? can(actor, 'comment-on-revision', revisionRecord(comment.revision))
    : can(actor, 'comment-on-layout', comment);
}

function presentAuthor(author: Membership | undefined): Comment['author'] {
  if (!author?.person) throw new Error('the comment came without its people');
  return { id: author.id, name: author.person.name, initials: initialsOf(author.person.name) };
}
