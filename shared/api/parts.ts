import { z } from 'zod';
import { antennaPartSchema, radioSchema } from '../layout/schema';
import { abilitiesOf, idField, pageOf, pageQuery, timeField } from './fields';

/** A radio on the shelf: the same fields as in a layout, without an identifier. */
export const shelfRadioSchema = radioSchema.omit({ id: true });

export const partContentSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('antenna'), antenna: antennaPartSchema }),
  z.strictObject({ kind: z.literal('radio'), radio: shelfRadioSchema }),
]);
export type PartContent = z.infer<typeof partContentSchema>;

/** A part on the team's shelf; its name is the name in its content. */
export const partSchema = z.strictObject({
  id: idField,
  name: z.string(),
  content: partContentSchema,
  archived: z.boolean(),
  updatedAt: timeField,
  abilities: abilitiesOf(['edit']),
});
export type Part = z.infer<typeof partSchema>;

/** GET /api/parts */
export const partListQuery = pageQuery.extend({
  kind: z.enum(['antenna', 'radio']).optional(),
  search: z.string().trim().max(120).optional(),
  archived: z.enum(['true', 'false']).optional(),
});
export const partListSchema = pageOf(partSchema);

/** POST /api/parts (201), PUT /api/parts/:id; POST /api/parts/:id/copy (201) has no body. */
export const partRequest = z.strictObject({ content: partContentSchema });

/** PATCH /api/parts/:id */
export const partChangeRequest = z.strictObject({ archived: z.boolean() });
