import type { Refusal } from '@/shared/errors';
import type { LayoutDocument } from '@/shared/layout/document';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';
import { applyOperation } from '@/shared/layout/operations';

/** An operation of mine that is not part of the confirmed document yet. */
export type PendingOperation = {
  readonly operation: Operation;
  /** It has left this device at least once, so the server may hold it whatever we know. */
  sent: boolean;
  /** Its place in the order, once the server has said so. */
  acknowledged: number | null;
};

/** What became of one committed operation that arrived. */
export type Arrival =
  | { readonly kind: 'applied'; readonly committed: readonly CommittedOperation[] }
  /** Already part of the confirmed document. */
  | { readonly kind: 'known' }
  /** Kept until the ones before it are there. */
  | { readonly kind: 'gap' }
  /** This client cannot apply what the server committed; only a whole document helps. */
  | {
      readonly kind: 'unreadable';
      readonly refusal: Refusal;
      readonly committed: readonly CommittedOperation[];
    };

/** A pending operation that no longer applies and was let go of, with the reason. */
export type DroppedOperation = { readonly operation: Operation; readonly refusal: Refusal };

/**
 * The confirmed document with its place in the order, and my pending operations on top. Invariants: the confirmed
 * document is the result of operations 1 to `sequence` and of nothing else; a pending operation leaves the list only
 * when it is part of the confirmed document, was refused, or was never sent and no longer applies.
 */
export class OperationLog {
  private confirmed: { readonly document: LayoutDocument; readonly sequence: number } | null = null;
  private pendingOperations: PendingOperation[] = [];
  private early = new Map<number, CommittedOperation>();
  private shownDocument: LayoutDocument | null = null;
  private isStale = true;

  get sequence(): number {
    return this.confirmed?.sequence ?? 0;
  }

  get isOpen(): boolean {
    return this.confirmed !== null;
  }

  get confirmedDocument(): LayoutDocument | null {
    return this.confirmed?.document ?? null;
  }

  get pending(): readonly PendingOperation[] {
    return this.pendingOperations;
  }

  /** True while a committed operation waits for ones before it. */
  get hasGap(): boolean {
    return this.early.size > 0;
  }

  /** The confirmed document with the pending operations replayed on it. */
  get shown(): LayoutDocument | null {
    if (this.isStale) this.replay();
    return this.shownDocument;
  }

  /** Takes a whole document from the server; operations that came early and follow it are applied. */
  open(document: LayoutDocument, sequence: number): Arrival {
    // A server restored from an older backup has forgotten what it acknowledged since: that is sent again.
    if (sequence < this.sequence) for (const pending of this.pendingOperations) pending.acknowledged = null;
    this.confirmed = { document, sequence };
    this.settleKnown();
    return this.drain();
  }

  /** Takes the next committed operation, in whatever order and however often they come. */
  receive(committed: CommittedOperation): Arrival {
    if (!this.confirmed || committed.sequence > this.confirmed.sequence + 1) {
      this.early.set(committed.sequence, committed);
      return { kind: 'gap' };
    }
    if (committed.sequence <= this.confirmed.sequence) return { kind: 'known' };
    this.early.set(committed.sequence, committed);
    return this.drain();
  }

  /** Appends an operation of mine; the caller has seen it apply to `shown`. */
  append(operation: Operation): PendingOperation {
    const pending: PendingOperation = { operation, sent: false, acknowledged: null };
    this.pendingOperations.push(pending);
    this.isStale = true;
    return pending;
  }

  /** Puts operations that waited on the device before those made since; they may have been sent in an earlier life. */
  restore(operations: readonly Operation[]): void {
    const known = new Set(this.pendingOperations.map((pending) => pending.operation.id));
    const restored = operations
      .filter((operation) => !known.has(operation.id))
      .map((operation): PendingOperation => ({ operation, sent: true, acknowledged: null }));
    this.pendingOperations = [...restored, ...this.pendingOperations];
    this.isStale = true;
  }

  /** The server committed it; it stays pending until the ordered stream has brought it. */
  acknowledge(operationId: string, sequence: number): void {
    const pending = this.pendingOperations.find(({ operation }) => operation.id === operationId);
    if (!pending) return;
    pending.acknowledged = sequence;
    this.settleKnown();
  }

  /** The server refused it: it is rolled back. Returns it, or null when it is not pending (any more). */
  refuse(operationId: string): Operation | null {
    const pending = this.pendingOperations.find(({ operation }) => operation.id === operationId);
    if (!pending || pending.acknowledged !== null) return null;
    this.remove((one) => one === pending);
    return pending.operation;
  }

  /** Lets go of pending operations that were never sent and no longer apply. */
  dropInapplicable(): DroppedOperation[] {
    const dropped: DroppedOperation[] = [];
    let document = this.confirmed?.document;
    if (!document) return dropped;
    for (const { operation, sent } of this.pendingOperations) {
      const result = applyOperation(document, operation);
      if (result.ok) document = result.value;
      // One that was sent may be committed already, for all we know: the server's answer decides.
      else if (!sent) dropped.push({ operation, refusal: result.refusal });
    }
    const ids = new Set(dropped.map(({ operation }) => operation.id));
    if (ids.size > 0) this.remove(({ operation }) => ids.has(operation.id));
    return dropped;
  }

  private drain(): Arrival {
    const applied: CommittedOperation[] = [];
    for (;;) {
      const current = this.confirmed;
      if (!current) return { kind: 'gap' };
      const next = this.early.get(current.sequence + 1);
      if (!next) break;
      const result = applyOperation(current.document, next.operation);
      this.isStale = true;
      if (!result.ok) return { kind: 'unreadable', refusal: result.refusal, committed: applied };
      this.early.delete(next.sequence);
      this.confirmed = { document: result.value, sequence: next.sequence };
      this.remove(({ operation }) => operation.id === next.operation.id);
      applied.push(next);
    }
    this.isStale = true;
    return applied.length > 0 ? { kind: 'applied', committed: applied } : { kind: 'known' };
  }

  private settleKnown(): void {
    for (const sequence of this.early.keys()) if (sequence <= this.sequence) this.early.delete(sequence);
    this.remove(({ acknowledged }) => acknowledged !== null && acknowledged <= this.sequence);
  }

  private remove(isGone: (pending: PendingOperation) => boolean): void {
    this.pendingOperations = this.pendingOperations.filter((pending) => !isGone(pending));
    this.isStale = true;
  }

  private replay(): void {
    this.isStale = false;
    let document = this.confirmed?.document ?? null;
    for (const { operation } of this.pendingOperations) {
      if (!document) break;
      const result = applyOperation(document, operation);
      if (result.ok) document = result.value;
    }
    this.shownDocument = document;
  }
}
