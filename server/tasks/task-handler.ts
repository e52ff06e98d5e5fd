import type { z } from 'zod';
import type { Services } from '../services';

/** What a handler is given besides its payload. */
export interface TaskContext {
  readonly services: Services;
  readonly taskId: string;
  readonly teamId: string | null;
  /** Aborted when the task was cancelled, or the server stops. */
  readonly signal: AbortSignal;
  /** Tells how far it is, from 0 to 1. */
  progress(fraction: number): Promise<void>;
}

/** How one kind of task is done. It may be run again after a kill, so doing it twice must do no harm. */
export interface TaskHandler<P> {
  readonly payload: z.ZodType<P>;
  /** How often it is tried before it is put down as failed. */
  readonly attempts: number;
  /** Whether the payload holds something that must not be kept once it is done. */
  readonly secret?: boolean;
  /** Does the work; what it answers with is stored as the result. */
  run(payload: P, context: TaskContext): Promise<unknown>;
}
