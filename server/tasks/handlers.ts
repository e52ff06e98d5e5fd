import type { z } from 'zod';
import { mailHandler } from './mail-handler';
import type { TaskHandler } from './task-handler';

/** Every kind of task and how it is done. */
export const TASK_HANDLERS = {
  mail: mailHandler,
} as const;

/** The name of a kind of task. */
export type TaskKind = keyof typeof TASK_HANDLERS;

/** What a task of this kind needs to know. */
export type TaskPayload<K extends TaskKind> = z.input<(typeof TASK_HANDLERS)[K]['payload']>;

/** How a kind of task is done, or undefined for a kind that this version does not know. */
export function findTaskHandler(kind: string): TaskHandler<unknown> | undefined {
  return Object.hasOwn(TASK_HANDLERS, kind)
    ? (TASK_HANDLERS[kind as TaskKind] as TaskHandler<unknown>)
    : undefined;
}
