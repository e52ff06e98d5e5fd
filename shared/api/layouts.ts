import { z } from 'zod';
import type { Estimate } from '../estimate/estimate-result';
import { layoutDocumentSchema, operationSchema } from '../layout/schema';
import { abilitiesOf, idField, timeField } from './fields';

/** The estimate travels as the solver made it; it never comes from outside, so its shape is only typed. */
export const estimateField = z.custom<Estimate>((value) => typeof value === 'object' && value !== null);

export const committedOperationSchema = z.strictObject({
  sequence: z.number().int(),
  operation: operationSchema,
  memberId: idField,
  memberName: z.string(),
  committedAt: timeField,
});

/** GET /api/layouts/:id */
export const layoutSchema = z.strictObject({
  id: idField,
  name: z.string(),
  job: z.strictObject({ id: idField, name: z.string() }),
  platform: z.strictObject({ id: idField, name: z.string() }),
  /** Letter of the newest revision, null before the first. */
  lastLetter: z.string().nullable(),
  nextLetter: z.string(),
  sequence: z.number().int(),
  document: layoutDocumentSchema,
  /** The server's estimate and the sequence it belongs to; null until the first is computed. */
  estimate: z.strictObject({ sequence: z.number().int(), result: estimateField }).nullable(),
  abilities: abilitiesOf(['edit', 'comment', 'saveRevision', 'submitRevision']),
});
export type Layout = z.infer<typeof layoutSchema>;

/** GET /api/layouts/:id/operations?after=N: what a client missed, at most 500. */
export const operationListQuery = z.strictObject({ after: z.coerce.number().int().min(0) });
export const operationListSchema = z.strictObject({
  items: z.array(committedOperationSchema),
  sequence: z.number().int(),
});
