import type { LayoutDocument } from '@/shared/layout/document';
import type { Change, Operation } from '@/shared/layout/operation';
import { OBJECT_WORDS } from '@/shared/layout/operations';

/** What an operation was about, for a sentence: "the move of A2", "the new antenna A4", "the change of the platform". */
export function describeOperation(document: LayoutDocument | null, operation: Operation): string {
  const [first, ...rest] = operation.changes;
  if (!first) return 'an empty change';
  const more = rest.length > 0 ? ` and ${rest.length} more` : '';
  return `${describeChange(document, first)}${more}`;
}

function describeChange(document: LayoutDocument | null, change: Change): string {
  if (change.kind === 'set-platform') return 'the change of the platform';
  const word = OBJECT_WORDS[change.collection];
  if (change.kind === 'add') return `the new ${word}${named(change.value)}`;
  const object = document?.[change.collection][change.id];
  const what = object ? (named(object).trim() ? named(object).trim() : `a ${word}`) : `the ${word}`;
  if (change.kind === 'remove') return `the removal of ${what}`;
  const isMove = Object.keys(change.fields).every((field) => field === 'x' || field === 'y');
  return `the ${isMove ? 'move' : 'change'} of ${what}`;
}

function named(object: object): string {
  if ('label' in object && typeof object.label === 'string') return ` ${object.label}`;
  return 'name' in object && typeof object.name === 'string' ? ` “${object.name}”` : '';
}
