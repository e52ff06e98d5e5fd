import { assertNever } from '@/shared/errors';
import type { Comment } from '@/shared/api/comments';

/** Which balloons the list shows. */
export type CommentFilter = 'open' | 'resolved' | 'all';

/** The balloons that a filter lets through, in the order of their numbers. */
export function filterComments(comments: readonly Comment[], filter: CommentFilter): readonly Comment[] {
  return comments
    .filter((comment) => passes(comment, filter))
    .sort((a, b) => a.number - b.number || a.createdAt.localeCompare(b.createdAt));
}

/** How many balloons each filter would show. */
export function countComments(comments: readonly Comment[]): Readonly<Record<CommentFilter, number>> {
  const open = comments.filter((comment) => comment.resolvedAt === null).length;
  return { open, resolved: comments.length - open, all: comments.length };
}

function passes(comment: Comment, filter: CommentFilter): boolean {
  switch (filter) {
    case 'open':
      return comment.resolvedAt === null;
    case 'resolved':
      return comment.resolvedAt !== null;
    case 'all':
      return true;
    default:
      return assertNever(filter);
  }
}
