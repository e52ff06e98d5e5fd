import type { PendingStore } from '@/components/api/offline-pending-store';
import type { Operation } from '@/shared/layout/operation';

/** Pending operations in memory: outlives an editor as a browser's database outlives a page. */
export class MemoryStore implements PendingStore {
  operations: Operation[] = [];
  /** Every write fails, as in a browser that keeps nothing. */
  isBroken = false;

  async load(): Promise<readonly Operation[]> {
    this.refuseWhenBroken();
    return this.operations;
  }

  async add(operation: Operation): Promise<void> {
    this.refuseWhenBroken();
    this.operations = [...this.operations, operation];
  }

  async remove(operationIds: readonly string[]): Promise<void> {
    this.refuseWhenBroken();
    this.operations = this.operations.filter(({ id }) => !operationIds.includes(id));
  }

  private refuseWhenBroken(): void {
    if (this.isBroken) throw new Error('this browser keeps nothing');
  }
}
