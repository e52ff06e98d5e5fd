import type { LayoutDocument } from '@/shared/layout/document';
import { lastWriter, undoFor, type UndoConflict } from '@/shared/layout/invert';
import type { Change, CommittedOperation, Operation } from '@/shared/layout/operation';
import { collectionOf, OBJECT_WORDS } from '@/shared/layout/operations';

/** How far back a name can be found for what changed since. */
const WRITERS_KEPT = 500;
/** Steps of undo that a tab keeps. */
const STEPS_KEPT = 200;

/** One gesture of mine: its operation and the document it was applied to. */
type Step = { readonly operation: Operation; readonly before: LayoutDocument };

/** What taking a step back comes to: the changes to make, and what stays because others changed it since. */
export type StepBack = { readonly changes: readonly Change[]; readonly left: readonly string[] };

/** My own edits of this tab, one entry per gesture. Undo is an edit like any other; redo is the undo of an undo. */
export class EditHistory {
  private undoSteps: Step[] = [];
  private redoSteps: Step[] = [];
  private committed: CommittedOperation[] = [];

  get canUndo(): boolean {
    return this.undoSteps.length > 0;
  }

  get canRedo(): boolean {
    return this.redoSteps.length > 0;
  }

  /** Remembers a new edit; what was undone before it can no longer be redone. */
  record(operation: Operation, before: LayoutDocument): void {
    this.undoSteps = [...this.undoSteps, { operation, before }].slice(-STEPS_KEPT);
    this.redoSteps = [];
  }

  /** Remembers who wrote what, for the sentence of an undo that cannot be done. */
  witness(committed: readonly CommittedOperation[]): void {
    this.committed = [...this.committed, ...committed].slice(-WRITERS_KEPT);
  }

  /** An operation that does not hold leaves nothing to undo. */
  forget(operationId: string): void {
    this.undoSteps = this.undoSteps.filter(({ operation }) => operation.id !== operationId);
    this.redoSteps = this.redoSteps.filter(({ operation }) => operation.id !== operationId);
  }

  /** Takes the last edit off the stack and says what its undo is in the present document; null when there is none. */
  takeUndo(current: LayoutDocument): StepBack | null {
    return this.stepBack(this.undoSteps.pop(), current);
  }

  takeRedo(current: LayoutDocument): StepBack | null {
    return this.stepBack(this.redoSteps.pop(), current);
  }

  /** The undo was made as this operation: it can be redone. */
  recordUndo(operation: Operation, before: LayoutDocument): void {
    this.redoSteps.push({ operation, before });
  }

  recordRedo(operation: Operation, before: LayoutDocument): void {
    this.undoSteps.push({ operation, before });
  }

  private stepBack(step: Step | undefined, current: LayoutDocument): StepBack | null {
    if (!step) return null;
    const { changes, conflicts } = undoFor(current, step.before, step.operation);
    return { changes, left: this.describe(conflicts, current, step) };
  }

  private describe(conflicts: readonly UndoConflict[], current: LayoutDocument, step: Step): string[] {
    const since = this.since(step.operation.id);
    const lines = conflicts.map((conflict) => {
      const name = lastWriter(since, conflict) ?? 'somebody else';
      return conflict.field === null && !objectName(current, conflict)
        ? `${objectName(step.before, conflict) ?? wordOf(conflict)} has been removed since by ${name}`
        : `${objectName(current, conflict) ?? wordOf(conflict)} has been changed since by ${name}`;
    });
    return [...new Set(lines)];
  }

  private since(operationId: string): readonly CommittedOperation[] {
    return this.committed.slice(
      this.committed.findIndex(({ operation }) => operation.id === operationId) + 1,
    );
  }
}

function objectName(document: LayoutDocument, { collection, id }: UndoConflict): string | null {
  if (collection === 'platform') return 'The platform';
  const object = id === null ? undefined : collectionOf(document, collection)[id];
  if (!object) return null;
  if ('label' in object && typeof object.label === 'string') return object.label;
  return 'name' in object && typeof object.name === 'string' ? object.name : null;
}

function wordOf({ collection }: UndoConflict): string {
  return collection === 'platform' ? 'The platform' : `The ${OBJECT_WORDS[collection]}`;
}
