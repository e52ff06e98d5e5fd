import { z } from 'zod';
import type { AntennaPart, LayoutDocument, Radio } from './document';
import type { Operation } from './operation';
import { ANTENNA_PART_RULES, RADIO_RULES } from './rules/document-rules';
import { operationRule } from './rules/operation-rules';
import { problemsOf, type FieldRules, type Rule } from './rules/rule';
import { upgradeDocument } from './upgrades';

/**
 * The rules of the document as zod schemas, for requests, messages and forms. The rules themselves are plain
 * functions in `rules/`, so that nothing that runs under the finger or in a worker pulls in zod.
 */

/** A radio; on the shelf `radioSchema.omit({ id: true })`. The name is trimmed. */
export const radioSchema = z.strictObject(schemasOf<Radio>(RADIO_RULES));

/** An antenna as it stands on the shelf. The name is trimmed. */
export const antennaPartSchema = z.strictObject(schemasOf<AntennaPart>(ANTENNA_PART_RULES));

/** A whole document of the current version: form, references and size. */
export const layoutDocumentSchema = z.custom<LayoutDocument>().superRefine((value, context) => {
  const result = upgradeDocument(value);
  if (result.ok) return;
  const problems = result.refusal.problems ?? [{ path: '', message: result.refusal.message }];
  problems.forEach(({ path, message }) => context.addIssue({ code: 'custom', path: pathOf(path), message }));
});

/** An operation by its form; whether it can be applied is `applyOperation`'s to say. Nothing in it is altered. */
export const operationSchema = schemaOf<Operation>(operationRule);

/** A document and its stored text; an older version is upgraded on the way in. */
export const layoutDocumentCodec = z.codec(z.string(), layoutDocumentSchema, {
  decode: (text, context) => {
    const stored = parseJson(text);
    const result = stored.ok ? upgradeDocument(stored.value) : null;
    if (result?.ok) return result.value;
    context.issues.push({ code: 'custom', message: result?.refusal.message ?? 'is not JSON', input: text });
    return z.NEVER;
  },
  encode: (document) => JSON.stringify(document),
});

/** One rule as a schema of `T`, its problems as issues with their paths. */
export function schemaOf<T>(rule: Rule): z.ZodType<T, T> {
  return z.custom<T>().superRefine((value, context) => {
    problemsOf(rule, value).forEach(({ path, message }) =>
      context.addIssue({ code: 'custom', path: pathOf(path), message }),
    );
  });
}

/** Schemas of the fields of an object of kind `T`; a field called `name` is trimmed first. */
function schemasOf<T>(rules: FieldRules<T>): { [K in keyof T]-?: z.ZodType<T[K], T[K]> } {
  const schemas = Object.entries<Rule>(rules).map(([field, rule]) => {
    const schema = schemaOf(rule);
    return [field, field === 'name' ? z.preprocess(trimmed, schema) : schema];
  });
  return Object.fromEntries(schemas) as { [K in keyof T]-?: z.ZodType<T[K], T[K]> };
}

function trimmed(value: unknown): unknown {
  return typeof value === 'string' ? value.trim() : value;
}

function pathOf(path: string): (string | number)[] {
  return path === '' ? [] : path.split('.').map((part) => (/^\d+$/.test(part) ? Number(part) : part));
}

function parseJson(text: string): { ok: true; value: unknown } | { ok: false } {
  try {
    return { ok: true, value: JSON.parse(text) };
  } catch (error) {
    if (error instanceof SyntaxError) return { ok: false };
    throw error;
  }
}
