import { QueryTypes } from 'sequelize';
import { transact } from '../database/transaction';
import { Task } from '../models/task';
import type { Services } from '../services';
import { createId } from '@/shared/ids';
import { onTaskCommitted } from './enqueue-task';
import { findTaskHandler } from './handlers';

/** The worker's pace; tests choose a quicker one. */
export interface WorkerPace {
  readonly pollMs: number;
  readonly leaseMs: number;
  readonly firstRetryMs: number;
  readonly longestRetryMs: number;
  readonly atOnce: number;
}

/** The pace of a running server. */
export const DEFAULT_PACE: WorkerPace = {
  pollMs: 2_000,
  leaseMs: 30_000,
  firstRetryMs: 2_000,
  longestRetryMs: 60 * 60_000,
  atOnce: 2,
};

/**
 * Does the tasks of the database. A task is claimed by a lease that is renewed while its handler runs; when the
 * process is killed the lease runs out and another one takes the task, so a handler may see a task twice, never not at all.
 */
export class TaskWorker {
  private readonly running = new Map<string, { abort: AbortController; done: Promise<void> }>();
  private timer: NodeJS.Timeout | undefined;
  private looking: Promise<void> | undefined;
  private lookAgain = false;
  private stopped = true;

  constructor(
    private readonly services: Services,
    private readonly pace: WorkerPace = DEFAULT_PACE,
  ) {}

  /** Starts looking for tasks. */
  start(): void {
    this.stopped = false;
    onTaskCommitted(() => this.wake());
    this.timer = setInterval(() => this.wake(), this.pace.pollMs);
    this.wake();
  }

  /** Looks for due tasks now. */
  wake(): void {
    if (this.stopped) return;
    this.lookAgain = true;
    this.looking ??= this.look().finally(() => {
      this.looking = undefined;
      if (this.lookAgain) this.wake();
    });
  }

  /** Does what is due now and what comes of it, then ends; for command lines and tests. */
  async performDue(): Promise<void> {
    for (;;) {
      const tasks = await this.claim(this.pace.atOnce);
      if (tasks.length === 0) return;
      for (const task of tasks) await this.perform(task, new AbortController().signal);
    }
  }

  /** Stops the handler of a task that was cancelled. */
  abort(taskId: string): void {
    this.running.get(taskId)?.abort.abort();
  }

  /** Takes no more tasks and waits for those that run; what is given up is taken again at the next start. */
  async stop(): Promise<void> {
    this.stopped = true;
    clearInterval(this.timer);
    await this.looking;
    for (const { abort } of this.running.values()) abort.abort();
    await Promise.all([...this.running.values()].map(({ done }) => done));
  }

  private async look(): Promise<void> {
    try {
      while (this.lookAgain && !this.stopped) {
        this.lookAgain = false;
        const free = this.pace.atOnce - this.running.size;
        if (free <= 0) return;
        for (const task of await this.claim(free)) this.begin(task);
      }
    } catch (error) {
      this.services.log.error({ err: error }, 'tasks could not be looked for');
    }
  }

  private async claim(count: number): Promise<readonly Task[]> {
    const { sequelize } = this.services;
    return transact(sequelize, async (transaction) => {
      const now = new Date();
      // Sequelize ignores `skipLocked` for MariaDB, hence the statement.
      const due = await sequelize.query<{ id: string }>(
        `SELECT id FROM tasks
         WHERE (state = 'waiting' AND run_at <= :now) OR (state = 'running' AND lease_until < :now)
         ORDER BY run_at LIMIT :count FOR UPDATE SKIP LOCKED`,
        { replacements: { now, count }, type: QueryTypes.SELECT, transaction },
      );
      if (due.length === 0) return [];
      const tasks = await Task.findAll({ where: { id: due.map((row) => row.id) }, transaction });
      for (const task of tasks) {
        task.set({
          state: 'running',
          attempts: task.attempts + 1,
          lease: createId(),
          leaseUntil: this.leaseEnd(),
        });
        await task.save({ transaction });
      }
      return tasks;
    });
  }

  private begin(task: Task): void {
    const abort = new AbortController();
    const done = this.perform(task, abort.signal)
      .catch((error: unknown) =>
        this.services.log.error({ err: error, task: task.id }, 'a task was lost sight of'),
      )
      .finally(() => {
        this.running.delete(task.id);
        this.wake();
      });
    this.running.set(task.id, { abort, done });
  }

  private async perform(task: Task, signal: AbortSignal): Promise<void> {
    const renewal = setInterval(() => {
      this.keep(task, { leaseUntil: this.leaseEnd() }).catch((error: unknown) => {
        this.services.log.warn({ err: error, task: task.id }, 'a lease could not be renewed');
      });
    }, this.pace.leaseMs / 3);
    try {
      const handler = findTaskHandler(task.kind);
      if (handler === undefined) throw new Error(`no handler for tasks of kind ${task.kind}`);
      const payload = handler.payload.parse(JSON.parse(task.payload));
      const result = await handler.run(payload, {
        services: this.services,
        taskId: task.id,
        teamId: task.teamId,
        signal,
        progress: (fraction) => this.keep(task, { progress: fraction }),
      });
      await this.keep(task, {
        state: 'done',
        progress: 1,
        result: JSON.stringify(result ?? null),
        problem: null,
        ...(handler.secret ? { payload: '{}' } : {}),
      });
    } catch (error) {
      await this.putOff(task, error, signal.aborted);
    } finally {
      clearInterval(renewal);
    }
  }

  private async putOff(task: Task, error: unknown, aborted: boolean): Promise<void> {
    const problem = (error instanceof Error ? error.message : String(error)).slice(0, 500);
    if (aborted && this.stopped) {
      await this.keep(task, { state: 'waiting', attempts: task.attempts - 1, runAt: new Date() });
      return;
    }
    const failed = task.attempts >= (findTaskHandler(task.kind)?.attempts ?? 3);
    const waitMs = Math.min(this.pace.firstRetryMs * 2 ** (task.attempts - 1), this.pace.longestRetryMs);
    this.services.log.warn(
      { task: task.id, kind: task.kind, attempt: task.attempts, failed, problem },
      'a task failed',
    );
    await this.keep(task, {
      state: failed ? 'failed' : 'waiting',
      runAt: new Date(Date.now() + waitMs),
      problem,
    });
  }

  // Only the holder of the lease writes: a task that was cancelled or taken over in the meantime stays as it is.
  private async keep(task: Task, values: Partial<Task['_attributes']>): Promise<void> {
    await Task.update(values, { where: { id: task.id, lease: task.lease, state: 'running' } });
  }

  private leaseEnd(): Date {
    return new Date(Date.now() + this.pace.leaseMs);
  }
}
