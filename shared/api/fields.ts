import { z } from 'zod';
import { ID_PATTERN } from '../ids';
import { LIMITS } from '../layout/limits';

/** Fields that many requests and responses share. */

// A surrogate without its other half has no UTF-8 form, so it would come back from the database as something else.
const WHOLE_CHARACTERS = /^\P{Surrogate}*$/u;
const CONTROLS = /[\u0000-\u001f\u007f]/;
const CONTROLS_BUT_BREAKS = /[\u0000-\u0009\u000b-\u001f\u007f]/;

export const idField = z.string().regex(ID_PATTERN, 'is not an identifier');

/** A name as people type it: trimmed, on one line. */
export const nameField = textField(LIMITS.nameLength, CONTROLS).min(1, 'is empty');

/** Like a name, but it may be left empty. */
export const optionalNameField = textField(LIMITS.nameLength, CONTROLS);

/** A longer text: line breaks allowed, other control characters not. */
export const noteField = textField(LIMITS.noteLength, CONTROLS_BUT_BREAKS).min(1, 'is empty');

/** Like a longer text, but it may be left empty. */
export const optionalNoteField = textField(LIMITS.noteLength, CONTROLS_BUT_BREAKS);

export const emailField = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'is longer than 254 characters')
  .pipe(z.email('is not an e-mail address'));

const utf8 = new TextEncoder();

/** A new password: 12 characters to 72 bytes (bcrypt reads no further). */
export const passwordField = z
  .string()
  .min(12, 'needs at least 12 characters')
  .refine((text) => utf8.encode(text).length <= 72, 'is longer than 72 bytes');

/** A password as it is entered to be checked. */
export const enteredPasswordField = z.string().min(1, 'is empty').max(200, 'is too long');

/** A secret token from a link. */
export const tokenField = z.string().regex(/^[A-Za-z0-9_-]{20,100}$/, 'is not a link of ours');

/** A moment in time, ISO 8601 in UTC. */
export const timeField = z.iso.datetime();

export const ROLES = ['administrator', 'integrator', 'reviewer', 'approver', 'installer'] as const;
export const roleField = z.enum(ROLES);
export type Role = z.infer<typeof roleField>;

/** A set of roles: at least one, none twice. */
export const rolesField = z
  .array(roleField)
  .min(1, 'needs at least one role')
  .max(ROLES.length)
  .refine((roles) => new Set(roles).size === roles.length, 'names a role twice');

/** Query of a list that comes in pages. */
export const pageQuery = z.strictObject({
  // Holds an order key, which may be a name of the greatest length in its longest encoding.
  cursor: z.string().max(1000).optional(),
  limit: z.coerce.number().int().min(1).max(100).optional(),
});

/** A page of a list; `next` is the cursor of the following one. */
export function pageOf<T extends z.ZodType>(item: T) {
  return z.strictObject({ items: z.array(item), next: z.string().nullable() });
}

/** What this member may do to a resource. */
export function abilitiesOf<const A extends string>(actions: readonly A[]) {
  return z.strictObject(Object.fromEntries(actions.map((a) => [a, z.boolean()])) as Record<A, z.ZodBoolean>);
}

function textField(most: number, refused: RegExp) {
  return z
    .string()
    .trim()
    .max(most, `is longer than ${most} characters`)
    .refine((text) => !refused.test(text), 'holds a control character')
    .regex(WHOLE_CHARACTERS, 'holds half a character');
}
