import { assertNever } from '../errors';
import type { CollectionName, LayoutDocument, ObjectOf, Platform } from './document';
import { valuesEqual } from './equality';
import type { Change, CommittedOperation, Operation } from './operation';
import { applyChange, collectionOf } from './operations';

/** A field, or a whole object when `field` is null, that somebody else changed since. */
export type UndoConflict = {
  readonly collection: CollectionName | 'platform';
  readonly id: string | null;
  readonly field: string | null;
};

/** What an undo can still do, and what it leaves alone because it no longer holds what was set. */
export type Undo = { readonly changes: readonly Change[]; readonly conflicts: readonly UndoConflict[] };

/**
 * The changes that take `operation` back, given the document it was applied to: applied to the result of the
 * operation they restore that document.
 * @throws Error when the operation cannot be applied to `before`.
 */
export function invertOperation(before: LayoutDocument, operation: Operation): Change[] {
  const inverse: Change[] = [];
  let current = before;
  for (const change of operation.changes) {
    inverse.unshift(invertChange(current, change));
    current = applied(current, change);
  }
  return inverse;
}

/**
 * Undo of my own edit in a document that others may have changed since: restores only fields that still hold
 * what I set, removes only what I added and nobody touched, brings back what I removed; the rest is reported as
 * conflicts. `before` is the document that my operation was applied to.
 */
export function undoFor(current: LayoutDocument, before: LayoutDocument, operation: Operation): Undo {
  const after = operation.changes.reduce(applied, before);
  const changes: Change[] = [];
  const conflicts: UndoConflict[] = [];
  for (const { collection, id } of touched(operation)) {
    if (collection === 'platform') {
      undoPlatform(current, before, after, changes, conflicts);
      continue;
    }
    const [mine, was, now] = [after, before, current].map(
      (document) => collectionOf(document, collection)[id],
    );
    if (was && mine) {
      const { fields, lost } = restorable(now, was, mine);
      if (Object.keys(fields).length > 0) changes.push({ kind: 'set', collection, id, fields });
      conflicts.push(...lost.map((field) => ({ collection, id, field: now ? field : null })));
    } else if (mine) {
      if (now && valuesEqual(now, mine)) changes.push({ kind: 'remove', collection, id });
      else if (now) conflicts.push({ collection, id, field: null });
    } else if (was && !now) {
      changes.push({ kind: 'add', collection, value: was });
    }
  }
  return { changes: inOrder(changes), conflicts: uniqueConflicts(conflicts) };
}

/** The name of whoever last wrote a field (or removed or added its object) in a stretch of history, or null. */
export function lastWriter(history: readonly CommittedOperation[], conflict: UndoConflict): string | null {
  const writer = history.findLast(({ operation }) =>
    operation.changes.some((change) => writes(change, conflict)),
  );
  return writer?.memberName ?? null;
}

function invertChange(before: LayoutDocument, change: Change): Change {
  switch (change.kind) {
    case 'add':
      return { kind: 'remove', collection: change.collection, id: change.value.id };
    case 'remove':
      return {
        kind: 'add',
        collection: change.collection,
        value: objectIn(before, change.collection, change.id),
      };
    case 'set': {
      const fields = pick(objectIn(before, change.collection, change.id), Object.keys(change.fields));
      return { kind: 'set', collection: change.collection, id: change.id, fields };
    }
    case 'set-platform':
      return { kind: 'set-platform', fields: pick(before.platform, Object.keys(change.fields)) };
    default:
      return assertNever(change);
  }
}

function applied(document: LayoutDocument, change: Change): LayoutDocument {
  const result = applyChange(document, change);
  if (!result.ok)
    throw new Error(`an operation that does not apply has no inverse: ${result.refusal.message}`);
  return result.value;
}

function objectIn(
  document: LayoutDocument,
  collection: CollectionName,
  id: string,
): ObjectOf<CollectionName> {
  const object = collectionOf(document, collection)[id];
  if (!object) throw new Error(`nothing in ${collection} has the identifier ${id}`);
  return object;
}

function touched(operation: Operation): { collection: CollectionName | 'platform'; id: string }[] {
  const seen = new Map<string, { collection: CollectionName | 'platform'; id: string }>();
  for (const change of operation.changes) {
    const collection = change.kind === 'set-platform' ? 'platform' : change.collection;
    const id = change.kind === 'set-platform' ? '' : change.kind === 'add' ? change.value.id : change.id;
    seen.set(`${collection} ${id}`, { collection, id });
  }
  return [...seen.values()];
}

function undoPlatform(
  current: LayoutDocument,
  before: LayoutDocument,
  after: LayoutDocument,
  changes: Change[],
  conflicts: UndoConflict[],
): void {
  const { fields, lost } = restorable(current.platform, before.platform, after.platform);
  if (Object.keys(fields).length > 0)
    changes.push({ kind: 'set-platform', fields: fields as Partial<Platform> });
  conflicts.push(...lost.map((field) => ({ collection: 'platform' as const, id: null, field })));
}

function restorable(
  now: object | undefined,
  was: object,
  mine: object,
): { fields: Record<string, unknown>; lost: string[] } {
  const [nowFields, wasFields, mineFields] = [now ?? {}, was, mine].map((o) => o as Record<string, unknown>);
  const fields: Record<string, unknown> = {};
  const lost: string[] = [];
  for (const name of Object.keys(mineFields ?? {})) {
    if (valuesEqual(wasFields?.[name], mineFields?.[name])) continue;
    if (now && valuesEqual(nowFields?.[name], mineFields?.[name])) fields[name] = wasFields?.[name];
    else if (!now || !valuesEqual(nowFields?.[name], wasFields?.[name])) lost.push(name);
  }
  return { fields, lost };
}

/** Radios come back before the antennas that use them and go after them. */
function inOrder(changes: readonly Change[]): Change[] {
  return [...changes].sort((a, b) => rank(a) - rank(b));
}

function rank(change: Change): number {
  if (change.kind === 'add')
    return change.collection === 'antennas' || change.collection === 'neverTogether' ? 1 : 0;
  return change.kind === 'remove' ? 3 : 2;
}

function uniqueConflicts(conflicts: readonly UndoConflict[]): UndoConflict[] {
  return conflicts.filter((one, index) => conflicts.findIndex((other) => valuesEqual(one, other)) === index);
}

function writes(change: Change, { collection, id, field }: UndoConflict): boolean {
  if (change.kind === 'set-platform')
    return collection === 'platform' && field !== null && Object.hasOwn(change.fields, field);
  if (change.collection !== collection) return false;
  if (change.kind === 'set')
    return change.id === id && (field === null || Object.hasOwn(change.fields, field));
  return (change.kind === 'add' ? change.value.id : change.id) === id;
}

function pick(object: object, names: readonly string[]): Record<string, unknown> {
  const source = object as Record<string, unknown>;
  return Object.fromEntries(names.map((name) => [name, source[name]]));
}
