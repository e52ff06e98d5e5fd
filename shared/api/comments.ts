import { z } from 'zod';
import { abilitiesOf, idField, noteField, timeField } from './fields';

const coordinate = z.number().min(-1000).max(1000);

/** What a comment's leader line points at. */
export const commentTargetSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('spot'), x: coordinate, y: coordinate }),
  z.strictObject({ kind: z.literal('antenna'), antennaId: idField, label: z.string().max(120) }),
]);
export type CommentTarget = z.infer<typeof commentTargetSchema>;

export const commentReplySchema = z.strictObject({
  id: idField,
  text: z.string(),
  author: z.strictObject({ id: idField, name: z.string(), initials: z.string() }),
  createdAt: timeField,
});

/** A balloon: a numbered thread on a spot or an antenna of a layout, or of one of its revisions. */
export const commentSchema = z.strictObject({
  id: idField,
  layoutId: idField,
  /** Set when it was made on a revision. */
  revisionId: idField.nullable(),
  /** Number in the balloon, counted per layout. */
  number: z.number().int(),
  target: commentTargetSchema,
  text: z.string(),
  author: z.strictObject({ id: idField, name: z.string(), initials: z.string() }),
  createdAt: timeField,
  resolvedAt: timeField.nullable(),
  resolvedBy: z.string().nullable(),
  replies: z.array(commentReplySchema),
  abilities: abilitiesOf(['reply', 'resolve']),
});
export type Comment = z.infer<typeof commentSchema>;

/** GET /api/layouts/:id/comments, GET /api/revisions/:id/comments */
export const commentListSchema = z.strictObject({ items: z.array(commentSchema) });

/** POST /api/layouts/:id/comments, POST /api/revisions/:id/comments (201); `id` made by the client: a second arrival gets the first. */
export const commentRequest = z.strictObject({ id: idField, target: commentTargetSchema, text: noteField });

/** POST /api/comments/:id/replies (201, answers with the whole comment) */
export const replyRequest = z.strictObject({ id: idField, text: noteField });

/** PATCH /api/comments/:id */
export const commentChangeRequest = z.strictObject({ resolved: z.boolean() });
