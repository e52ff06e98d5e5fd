import type { Change, Operation } from '../operation';
import { LIMITS } from '../limits';
import { COLLECTION_NAMES, COLLECTION_RULES, OBJECT_RULES, PLATFORM_RULES } from './document-rules';
import type { CollectionName } from '../document';
import {
  idRule,
  isPlainObject,
  join,
  listRule,
  numberRule,
  objectRule,
  oneOfRule,
  taggedRule,
  type Report,
  type Rule,
} from './rule';

type ChangeOf<K extends Change['kind']> = Extract<Change, { kind: K }>;

const collection = oneOfRule(COLLECTION_NAMES);
const anything: Rule = () => undefined;

/** The form of one change: its fields and the values in them; what it refers to is looked at when it is applied. */
export const changeRule: Rule = taggedRule({
  add: objectRule<ChangeOf<'add'>>(
    { kind: oneOfRule(['add']), collection, value: anything },
    (change, path, report) => OBJECT_RULES[change.collection](change.value, join(path, 'value'), report),
  ),
  remove: objectRule<ChangeOf<'remove'>>({ kind: oneOfRule(['remove']), collection, id: idRule }),
  set: objectRule<ChangeOf<'set'>>(
    { kind: oneOfRule(['set']), collection, id: idRule, fields: anything },
    (change, path, report) =>
      checkFields(rulesOf(change.collection), change.fields, join(path, 'fields'), report),
  ),
  'set-platform': objectRule<ChangeOf<'set-platform'>>(
    { kind: oneOfRule(['set-platform']), fields: anything },
    (change, path, report) => checkFields(PLATFORM_RULES, change.fields, join(path, 'fields'), report),
  ),
});

/** The form of an operation. */
export const operationRule: Rule = objectRule<Operation>({
  id: idRule,
  version: numberRule(0, Number.MAX_SAFE_INTEGER),
  changes: listRule(changeRule, 1, LIMITS.changesPerOperation),
});

function rulesOf(name: CollectionName): Readonly<Record<string, Rule>> {
  return COLLECTION_RULES[name];
}

function checkFields(
  rules: Readonly<Record<string, Rule>>,
  fields: unknown,
  path: string,
  report: Report,
): void {
  if (!isPlainObject(fields)) return report(path, 'is not an object');
  const names = Object.keys(fields);
  if (names.length === 0) report(path, 'changes nothing');
  for (const name of names) {
    const rule = name !== 'id' && Object.hasOwn(rules, name) ? rules[name] : undefined;
    if (rule) rule(fields[name], join(path, name), report);
    else report(join(path, name), name === 'id' ? 'never changes' : 'is not a field we know');
  }
}
