import { z } from 'zod';
import { layoutDocumentSchema } from '../layout/schema';
import {
  abilitiesOf,
  enteredPasswordField,
  idField,
  noteField,
  optionalNoteField,
  pageOf,
  timeField,
} from './fields';
import { revisionStateField } from './jobs';
import { estimateField } from './layouts';

export const REVISION_EVENTS = ['saved', 'submitted', 'returned', 'frozen', 'superseded'] as const;

export const revisionEventSchema = z.strictObject({
  kind: z.enum(REVISION_EVENTS),
  by: z.string(),
  at: timeField,
  reason: z.string().nullable(),
});

/** A line of GET /api/layouts/:id/revisions. */
export const revisionSchema = z.strictObject({
  id: idField,
  layoutId: idField,
  letter: z.string(),
  state: revisionStateField,
  hash: z.string(),
  note: z.string(),
  /** How many operations of the layout it holds. */
  sequence: z.number().int(),
  savedBy: z.string(),
  savedAt: timeField,
  events: z.array(revisionEventSchema),
  abilities: abilitiesOf(['submit', 'return', 'freeze', 'comment']),
});
export type Revision = z.infer<typeof revisionSchema>;
export const revisionListSchema = z.strictObject({ items: z.array(revisionSchema) });

/** GET /api/revisions/:id: read from its row alone. */
export const revisionDetailSchema = revisionSchema.extend({
  job: z.string(),
  platform: z.string(),
  layout: z.string(),
  document: layoutDocumentSchema,
  results: estimateField,
  solverVersion: z.string(),
});
export type RevisionDetail = z.infer<typeof revisionDetailSchema>;

/** GET /api/revisions?cursor=: frozen revisions of the team, newest first: what an installer starts from. */
export const frozenRevisionSchema = z.strictObject({
  id: idField,
  letter: z.string(),
  hash: z.string(),
  job: z.string(),
  platform: z.string(),
  layout: z.string(),
  frozenAt: timeField,
  frozenBy: z.string(),
});
export type FrozenRevision = z.infer<typeof frozenRevisionSchema>;
export const frozenRevisionListSchema = pageOf(frozenRevisionSchema);

/** POST /api/layouts/:id/revisions (201): saves what the server holds as the next letter. */
export const saveRevisionRequest = z.strictObject({ note: optionalNoteField.default('') });

/** POST /api/revisions/:id/submit has no body. POST /api/revisions/:id/return */
export const returnRevisionRequest = z.strictObject({ reason: noteField });

/** POST /api/revisions/:id/freeze */
export const freezeRevisionRequest = z.strictObject({ reason: noteField, password: enteredPasswordField });
