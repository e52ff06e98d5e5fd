import type { Problem } from '../../errors';
import { polygonArea } from '../../geometry/polygon';
import { ID_PATTERN } from '../../ids';
import { LIMITS } from '../limits';

/**
 * Rules say what a value of the document may be. They are plain functions, so that an operation can be checked
 * under the finger and in a worker without a schema library; `schema.ts` makes zod schemas of the same rules.
 */

/** Checks one value and reports every problem with its path. */
export type Rule = (value: unknown, path: string, report: Report) => void;
export type Report = (path: string, message: string) => void;

/** One rule per field; no other field is allowed. */
export type FieldRules<T> = { readonly [K in keyof T]-?: Rule };

/** All problems that a rule finds in a value. */
export function problemsOf(rule: Rule, value: unknown, path = ''): Problem[] {
  const problems: Problem[] = [];
  rule(value, path, (where, message) => {
    // Enough to mend a form or a file; a hostile body must not make a list of a million lines.
    if (problems.length < 50) problems.push({ path: where, message });
  });
  return problems;
}

/** A finite number between `min` and `max`, both allowed. */
export function numberRule(min: number, max: number, unit = ''): Rule {
  const suffix = unit === '' ? '' : ` ${unit}`;
  return (value, path, report) => {
    if (typeof value !== 'number' || Number.isNaN(value)) report(path, missing(value) ?? 'is not a number');
    else if (!Number.isFinite(value)) report(path, 'is not a finite number');
    else if (value < min) report(path, `is less than ${min}${suffix}`);
    else if (value > max) report(path, `is more than ${max}${suffix}`);
  };
}

/** A finite number above zero, at most `max`. */
export function positiveRule(max: number, unit = ''): Rule {
  const range = numberRule(0, max, unit);
  return (value, path, report) =>
    value === 0 ? report(path, 'must be more than zero') : range(value, path, report);
}

/** True or false. */
export const booleanRule: Rule = (value, path, report) => {
  if (typeof value !== 'boolean') report(path, missing(value) ?? 'is neither true nor false');
};

/** A name: trimmed, not empty, on one line. Whatever stands in it is text and nothing else. */
export const nameRule: Rule = textRule({ most: LIMITS.nameLength, empty: false, lines: false });

/** A text of one line that may be empty. */
export const lineRule: Rule = textRule({ most: LIMITS.nameLength, empty: true, lines: false });

/** A longer text with line breaks, not empty. */
export const noteRule: Rule = textRule({ most: LIMITS.noteLength, empty: false, lines: true });

/** An identifier made by `createId`. */
export const idRule: Rule = (value, path, report) => {
  if (typeof value !== 'string' || !ID_PATTERN.test(value))
    report(path, missing(value) ?? 'is not an identifier');
};

/** One of a closed list of words or numbers. */
export function oneOfRule(words: readonly (string | number)[]): Rule {
  return (value, path, report) => {
    if (!words.some((word) => word === value))
      report(path, missing(value) ?? `is none of ${words.join(', ')}`);
  };
}

/** Null, or what the rule says. */
export function nullableRule(rule: Rule): Rule {
  return (value, path, report) => {
    if (value !== null) rule(value, path, report);
  };
}

/** A list of `least` to `most` values of one kind. */
export function listRule(rule: Rule, least: number, most: number): Rule {
  return (value, path, report) => {
    if (!Array.isArray(value)) report(path, missing(value) ?? 'is not a list');
    else if (value.length < least) report(path, least === 1 ? 'is empty' : `has fewer than ${least} entries`);
    else if (value.length > most) report(path, `has more than ${most} entries`);
    else value.forEach((item, index) => rule(item, join(path, index), report));
  };
}

/** An object with exactly these fields. `whole` looks at it once every field holds by itself. */
export function objectRule<T>(
  fields: FieldRules<T>,
  whole?: (value: T, path: string, report: Report) => void,
): Rule {
  const names = Object.keys(fields) as (keyof T & string)[];
  return (value, path, report) => {
    if (!isPlainObject(value)) return report(path, missing(value) ?? 'is not an object');
    let sound = true;
    const note: Report = (where, message) => {
      sound = false;
      report(where, message);
    };
    for (const name of Object.keys(value)) {
      if (!Object.hasOwn(fields, name)) note(join(path, name), 'is not a field we know');
    }
    for (const name of names)
      fields[name](Object.hasOwn(value, name) ? value[name] : undefined, join(path, name), note);
    if (sound && whole) whole(value as T, path, report);
  };
}

/** Objects by their identifiers, each keyed by its own `id`. */
export function recordRule(rule: Rule, most: number): Rule {
  return (value, path, report) => {
    if (!isPlainObject(value)) return report(path, missing(value) ?? 'is not an object');
    const ids = Object.keys(value);
    if (ids.length > most) return report(path, `holds more than ${most}`);
    for (const id of ids) {
      const item = value[id];
      rule(item, join(path, id), report);
      if (isPlainObject(item) && item['id'] !== id)
        report(join(path, id), 'is filed under another identifier');
    }
  };
}

/** One of several kinds of object, told apart by the field `kind`. */
export function taggedRule(rules: Readonly<Record<string, Rule>>): Rule {
  const kinds = Object.keys(rules);
  return (value, path, report) => {
    if (!isPlainObject(value)) return report(path, missing(value) ?? 'is not an object');
    const kind = value['kind'];
    const rule = typeof kind === 'string' && Object.hasOwn(rules, kind) ? rules[kind] : undefined;
    if (rule) rule(value, path, report);
    else report(join(path, 'kind'), `is none of ${kinds.join(', ')}`);
  };
}

/** A closed outline: at least three points, with an area. */
export const outlineRule: Rule = (value, path, report) => {
  let sound = true;
  listRule(pointRule, 3, LIMITS.outlinePoints)(value, path, (where, message) => {
    sound = false;
    report(where, message);
  });
  // A square micrometre: less is three points on one line.
  if (sound && polygonArea(value as { x: number; y: number }[]) < 1e-12) report(path, 'encloses no area');
};

const coordinateRule = numberRule(-LIMITS.extent, LIMITS.extent, 'm');
const pointRule = objectRule<{ x: number; y: number }>({ x: coordinateRule, y: coordinateRule });

/** True for an object that is neither null nor a list. */
export function isPlainObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** Path of a field inside a path, in dots. */
export function join(path: string, name: string | number): string {
  return path === '' ? String(name) : `${path}.${name}`;
}

function textRule({ most, empty, lines }: { most: number; empty: boolean; lines: boolean }): Rule {
  return (value, path, report) => {
    if (typeof value !== 'string') report(path, missing(value) ?? 'is not a text');
    else if (!empty && value.trim() === '') report(path, 'is empty');
    else if (value !== value.trim()) report(path, 'begins or ends with a space');
    else if (value.length > most) report(path, `is longer than ${most} characters`);
    else if (holdsControls(value, lines)) report(path, 'holds a control character');
  };
}

function holdsControls(text: string, lines: boolean): boolean {
  for (let index = 0; index < text.length; index += 1) {
    const code = text.charCodeAt(index);
    if (code === 0x7f || (code < 0x20 && !(lines && code === 0x0a))) return true;
  }
  return false;
}

function missing(value: unknown): string | null {
  return value === undefined ? 'is missing' : null;
}
