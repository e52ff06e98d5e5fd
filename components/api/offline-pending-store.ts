import type { Operation } from '@/shared/layout/operation';

/** Keeps the operations of one member on one layout that have no answer yet, in the order they were made. */
export interface PendingStore {
  load(): Promise<readonly Operation[]>;
  add(operation: Operation): Promise<void>;
  remove(operationIds: readonly string[]): Promise<void>;
}
