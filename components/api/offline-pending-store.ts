import { get, update, type UseStore } from 'idb-keyval';
import { ID_PATTERN } from '@/shared/ids';
import type { Operation } from '@/shared/layout/operation';

/** Keeps the operations of one member on one layout that have no answer yet, in the order they were made. */
export interface PendingStore {
  load(): Promise<readonly Operation[]>;
  add(operation: Operation): Promise<void>;
  remove(operationIds: readonly string[]): Promise<void>;
}

/**
 * Keeps them in the browser's IndexedDB. Each write is one transaction on the whole list, so that two tabs of the
 * same member do not undo each other's; an operation that both send is answered twice and committed once.
 */
export function createPendingStore(memberId: string, layoutId: string, database?: UseStore): PendingStore {
  const key = `pending:${memberId}:${layoutId}`;
  return {
    async load() {
      return readOperations(await get(key, database));
    },
    add(operation) {
      return update(
        key,
        (kept: unknown) => [...readOperations(kept).filter(({ id }) => id !== operation.id), operation],
        database,
      );
    },
    remove(operationIds) {
      return update(
        key,
        (kept: unknown) => readOperations(kept).filter(({ id }) => !operationIds.includes(id)),
        database,
      );
    },
  };
}

/** What was kept, as far as it has the form of operations; their values are judged when they are applied. */
function readOperations(kept: unknown): Operation[] {
  return Array.isArray(kept) ? kept.filter(isOperation) : [];
}

function isOperation(value: unknown): value is Operation {
  return (
    typeof value === 'object' &&
    value !== null &&
    'id' in value &&
    typeof value.id === 'string' &&
    ID_PATTERN.test(value.id) &&
    'version' in value &&
    typeof value.version === 'number' &&
    'changes' in value &&
    Array.isArray(value.changes)
  );
}
