import type { z } from 'zod';
import { listProblems } from '../middleware/validate';
import { accept, refuse, type Result } from '@/shared/errors';

const DEEPEST = 64;

/** A message of a socket, checked: its depth first, so that no check runs down a bottomless one. */
export function readMessage<T extends z.ZodType>(schema: T, message: unknown): Result<z.infer<T>> {
  if (isDeeperThan(message, DEEPEST)) return refuse('too-deep', 'What was sent is nested too deep.');
  const parsed = schema.safeParse(message);
  if (parsed.success) return accept(parsed.data);
  const problems = listProblems(parsed.error).slice(0, 50);
  return refuse('invalid', 'Something in what was sent is not right.', problems);
}

/** Whether objects and arrays are nested more than so many levels deep. Does not recurse. */
export function isDeeperThan(value: unknown, levels: number): boolean {
  let level: unknown[] = [value];
  for (let depth = 0; level.length > 0; depth += 1) {
    const next = level.flatMap((item) =>
      typeof item === 'object' && item !== null ? Object.values(item) : [],
    );
    if (depth > levels) return true;
    level = next.filter((item) => typeof item === 'object' && item !== null);
  }
  return false;
}
