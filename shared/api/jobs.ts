import { z } from 'zod';
import { abilitiesOf, idField, nameField, optionalNameField, pageOf, pageQuery, timeField } from './fields';

/** Names of a revision's states. */
export const REVISION_STATES = ['saved', 'in review', 'returned', 'frozen', 'superseded'] as const;
export const revisionStateField = z.enum(REVISION_STATES);
export type RevisionState = z.infer<typeof revisionStateField>;

export const revisionBriefSchema = z.strictObject({
  id: idField,
  letter: z.string(),
  state: revisionStateField,
  at: timeField,
});

export const layoutBriefSchema = z.strictObject({
  id: idField,
  name: z.string(),
  updatedAt: timeField,
  /** Newest first. A member who only installs gets the frozen ones. */
  revisions: z.array(revisionBriefSchema),
});

export const platformBriefSchema = z.strictObject({
  id: idField,
  name: z.string(),
  kind: z.enum(['vehicle', 'rooftop', 'handset']),
  layouts: z.array(layoutBriefSchema),
});

/** A line of GET /api/jobs; POST and PATCH answer with it too. */
export const jobSchema = z.strictObject({
  id: idField,
  name: z.string(),
  customer: z.string(),
  archived: z.boolean(),
  updatedAt: timeField,
  platformCount: z.number().int(),
  abilities: abilitiesOf(['edit']),
});
export type Job = z.infer<typeof jobSchema>;

/** GET /api/jobs: newest change first. */
export const jobListQuery = pageQuery.extend({
  search: z.string().trim().max(120).optional(),
  archived: z.enum(['true', 'false']).optional(),
});
export const jobListSchema = pageOf(jobSchema);

/** GET /api/jobs/:id */
export const jobDetailSchema = jobSchema.extend({ platforms: z.array(platformBriefSchema) });
export type JobDetail = z.infer<typeof jobDetailSchema>;

/** POST /api/jobs */
export const jobRequest = z.strictObject({
  name: nameField,
  customer: optionalNameField.default(''),
});

/** PATCH /api/jobs/:id */
export const jobChangeRequest = z.strictObject({
  name: nameField.optional(),
  customer: optionalNameField.optional(),
  archived: z.boolean().optional(),
});

const dimensionField = z.number().positive('must be more than zero').max(1000);

/** POST /api/jobs/:id/platforms: from a starter outline, with its first layout. Answers with the platform. Metres. */
export const platformRequest = z.strictObject({
  name: nameField,
  starter: z.string().max(60),
  /** Named dimensions of the starter (`length`, `width`, `height` ...), m; left out: the starter's own. */
  dimensions: z.record(z.string().max(40), dimensionField).default({}),
});

/** PATCH /api/platforms/:id */
export const platformChangeRequest = z.strictObject({ name: nameField });

/** POST /api/platforms/:id/layouts: the survey of the platform, or a copy of one of its layouts. */
export const layoutRequest = z.strictObject({ name: nameField, copyOf: idField.nullable().default(null) });

/** PATCH /api/layouts/:id */
export const layoutChangeRequest = z.strictObject({ name: nameField });
