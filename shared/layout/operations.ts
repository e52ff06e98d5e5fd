import { accept, assertNever, refuse, type Problem, type Refusal, type Result } from '../errors';
import { DOCUMENT_VERSION, type CollectionName, type LayoutDocument, type ObjectOf } from './document';
import { referenceProblems, sizeProblems } from './integrity';
import type { Change, Operation } from './operation';
import { placementProblem } from './placement';
import { COLLECTION_LIMITS } from './rules/document-rules';
import { operationRule } from './rules/operation-rules';
import { problemsOf } from './rules/rule';

/** Names of one object of each collection, for sentences. */
export const OBJECT_WORDS: Readonly<Record<CollectionName, string>> = {
  surfaces: 'surface',
  obstacles: 'obstacle',
  keepOuts: 'keep-out',
  mountPoints: 'mount point',
  cableEntries: 'cable entry',
  radios: 'radio',
  neverTogether: 'never-together rule',
  antennas: 'antenna',
};

/**
 * Applies an operation to a document, whole or not at all; the document itself is left as it was, and what did
 * not change is shared with the new one. The same function decides in the client and in the server.
 * Refused as values: `outdated-client` (another document version), `invalid` (form, value or reference, with
 * paths), `already-there`, `removed-object`, `limit-reached`, `conflict` (a radio that is still in use) and
 * `not-placeable` (an antenna put where it may not stand).
 */
export function applyOperation(document: LayoutDocument, operation: Operation): Result<LayoutDocument> {
  const refusal = refuseForm(operation);
  if (refusal) return { ok: false, refusal };
  let next = document;
  for (const change of operation.changes) {
    const applied = applyChange(next, change);
    if (!applied.ok) return applied;
    next = applied.value;
  }
  const refused =
    refuseReferences(next, operation) ??
    refusePlaces(document, next, operation) ??
    refuseSize(next, operation);
  return refused ? { ok: false, refusal: refused } : accept(next);
}

/**
 * Applies one change without looking at its values, references or place: for the kernel of `applyOperation` and
 * for inverting. Refuses only what cannot be done at all.
 */
export function applyChange(document: LayoutDocument, change: Change): Result<LayoutDocument> {
  switch (change.kind) {
    case 'set-platform':
      return accept({ ...document, platform: { ...document.platform, ...change.fields } });
    case 'add': {
      const objects = collectionOf(document, change.collection);
      if (Object.hasOwn(objects, change.value.id)) {
        return refuse('already-there', `This ${OBJECT_WORDS[change.collection]} is already there.`);
      }
      if (Object.keys(objects).length >= COLLECTION_LIMITS[change.collection]) {
        const most = COLLECTION_LIMITS[change.collection];
        return refuse(
          'limit-reached',
          `No more than ${most} of these fit: ${OBJECT_WORDS[change.collection]}.`,
        );
      }
      return accept(
        withCollection(document, change.collection, { ...objects, [change.value.id]: change.value }),
      );
    }
    case 'remove': {
      const objects = collectionOf(document, change.collection);
      if (!Object.hasOwn(objects, change.id)) return refuseRemoved(change.collection);
      const { [change.id]: gone, ...rest } = objects;
      return gone
        ? accept(withCollection(document, change.collection, rest))
        : refuseRemoved(change.collection);
    }
    case 'set': {
      const objects = collectionOf(document, change.collection);
      const object = Object.hasOwn(objects, change.id) ? objects[change.id] : undefined;
      if (!object) return refuseRemoved(change.collection);
      const changed = { ...object, ...change.fields } as ObjectOf<CollectionName>;
      return accept(withCollection(document, change.collection, { ...objects, [change.id]: changed }));
    }
    default:
      return assertNever(change);
  }
}

/** The objects of one collection by identifier, whatever their kind. */
export function collectionOf(
  document: LayoutDocument,
  collection: CollectionName,
): Readonly<Record<string, ObjectOf<CollectionName>>> {
  return document[collection];
}

function withCollection(
  document: LayoutDocument,
  collection: CollectionName,
  objects: Readonly<Record<string, ObjectOf<CollectionName>>>,
): LayoutDocument {
  return { ...document, [collection]: objects };
}

function refuseForm(operation: Operation): Refusal | null {
  if (operation.version !== DOCUMENT_VERSION) {
    const message = 'This window speaks another version of the layout. Reload it; what you typed is kept.';
    return { code: 'outdated-client', message };
  }
  const problems = problemsOf(operationRule, operation);
  return problems.length > 0 ? refusalOf(problems) : null;
}

function refuseRemoved(collection: CollectionName): Result<LayoutDocument> {
  return refuse('removed-object', `This ${OBJECT_WORDS[collection]} was removed in the meantime.`);
}

function refuseReferences(next: LayoutDocument, operation: Operation): Refusal | null {
  if (!operation.changes.some(touchesReferences)) return null;
  const problems = referenceProblems(next);
  if (problems.length === 0) return null;
  const removed = operation.changes.some(
    (change) => change.kind === 'remove' && change.collection === 'radios',
  );
  return removed ? { code: 'conflict', message: radioInUse(next), problems } : refusalOf(problems);
}

function touchesReferences(change: Change): boolean {
  if (change.kind === 'set-platform') return false;
  if (change.collection === 'radios') return change.kind === 'remove';
  if (change.kind === 'remove') return false;
  if (change.collection === 'neverTogether') return true;
  return (
    change.collection === 'antennas' && (change.kind === 'add' || Object.hasOwn(change.fields, 'radioId'))
  );
}

function radioInUse(next: LayoutDocument): string {
  const users = Object.values(next.antennas).filter(
    (a) => a.radioId !== null && !Object.hasOwn(next.radios, a.radioId),
  );
  if (users.length === 0) return 'A never-together rule names this radio: remove the rule first.';
  const labels = users.map((antenna) => antenna.label).join(', ');
  return `This radio is in use at ${labels}: give ${users.length === 1 ? 'it' : 'them'} another radio first.`;
}

const PLACE_FIELDS = ['x', 'y', 'mountHeight', 'part'] as const;

function refusePlaces(before: LayoutDocument, next: LayoutDocument, operation: Operation): Refusal | null {
  for (const change of operation.changes) {
    if (change.kind === 'set-platform' || change.kind === 'remove' || change.collection !== 'antennas')
      continue;
    const antenna = next.antennas[change.kind === 'add' ? change.value.id : change.id];
    if (!antenna) continue;
    if (change.kind === 'set' && !PLACE_FIELDS.some((field) => Object.hasOwn(change.fields, field))) continue;
    const problem = placementProblem(next, antenna);
    if (!problem) continue;
    // One that was misplaced already by a change of the platform may still be raised or get another part there.
    const former = before.antennas[antenna.id];
    if (former && former.x === antenna.x && former.y === antenna.y && placementProblem(next, former))
      continue;
    const path =
      change.kind === 'set' && !Object.hasOwn(change.fields, 'x') && !Object.hasOwn(change.fields, 'y')
        ? 'mountHeight'
        : 'x';
    return {
      code: 'not-placeable',
      message: `${antenna.label} cannot stand there. ${problem.message}`,
      problems: [{ path: `antennas.${antenna.id}.${path}`, message: problem.message }],
    };
  }
  return null;
}

function refuseSize(next: LayoutDocument, operation: Operation): Refusal | null {
  // Numbers do not make a document grow: a move under the finger need not be measured.
  if (operation.changes.every(changesNumbersOnly)) return null;
  const problems = sizeProblems(next);
  const [first] = problems;
  return first ? { code: 'limit-reached', message: `The layout ${first.message}.`, problems } : null;
}

function changesNumbersOnly(change: Change): boolean {
  if (change.kind === 'remove') return true;
  if (change.kind === 'add') return false;
  return Object.values(change.fields).every((value) => typeof value === 'number');
}

function refusalOf(problems: readonly Problem[]): Refusal {
  const [first] = problems;
  const where = first && first.path !== '' ? `${first.path} ` : '';
  return { code: 'invalid', message: `The change does not hold: ${where}${first?.message ?? ''}.`, problems };
}
