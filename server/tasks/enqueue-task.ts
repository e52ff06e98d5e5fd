import type { Transaction } from 'sequelize';
import { Task } from '../models/task';
import type { TaskKind, TaskPayload } from './handlers';

/** How a task is written down. */
export interface EnqueueOptions {
  /** The transaction of what caused the task: both are kept, or neither. */
  readonly transaction: Transaction;
  readonly teamId?: string | null;
  readonly runAt?: Date;
}

let wakeWorker: () => void = () => undefined;

/** Writes a task; the worker of this process looks for it after the commit. */
export async function enqueueTask<K extends TaskKind>(
  kind: K,
  payload: TaskPayload<K>,
  options: EnqueueOptions,
): Promise<Task> {
  const task = await Task.create(
    {
      kind,
      payload: JSON.stringify(payload),
      teamId: options.teamId ?? null,
      runAt: options.runAt ?? new Date(),
    },
    { transaction: options.transaction },
  );
  options.transaction.afterCommit(() => wakeWorker());
  return task;
}

/** Says whom to call when a new task was committed. */
export function onTaskCommitted(wake: () => void): void {
  wakeWorker = wake;
}
