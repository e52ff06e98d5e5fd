import type { Transaction } from 'sequelize';
import { CommentRow } from '../models/comment-row';

/** What a comment is presented with. */
export const COMMENT_PARTS = [
  { association: 'author', include: ['person'] },
  { association: 'resolvedBy', include: ['person'] },
  { association: 'revision', attributes: { exclude: ['content'] }, include: ['events'] },
  { association: 'replies', include: [{ association: 'author', include: ['person'] }] },
];

/** A comment of a team with its thread and its people, or null. */
export function loadComment(
  teamId: string,
  commentId: string,
  transaction?: Transaction,
): Promise<CommentRow | null> {
  return CommentRow.findOne({
    where: { id: commentId, teamId },
    include: COMMENT_PARTS,
    ...(transaction ? { transaction } : {}),
  });
}
