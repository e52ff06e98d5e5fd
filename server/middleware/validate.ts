import type { Request } from 'express';
import type { z } from 'zod';
import type { Problem } from '@/shared/errors';
import { refuseRequest } from './refusal-error';

/** The request's body, checked; otherwise a refusal with every problem and its path. */
export function parseBody<T extends z.ZodType>(schema: T, request: Request): z.infer<T> {
  return parse(schema, request.body ?? {}, 'Something in what was sent is not right.');
}

/** The request's query, checked. */
export function parseQuery<T extends z.ZodType>(schema: T, request: Request): z.infer<T> {
  return parse(schema, request.query, 'Something in the address is not right.');
}

/** One part of the request's path, checked; an identifier that cannot exist is answered like one that does not. */
export function parseParam<T extends z.ZodType>(schema: T, request: Request, name: string): z.infer<T> {
  const parsed = schema.safeParse(request.params[name]);
  if (!parsed.success) refuseRequest('not-found', 'There is nothing here, or you may not see it.');
  return parsed.data;
}

/** Every issue of a failed check, as a path in dots and what is wrong there. */
export function listProblems(error: z.ZodError): Problem[] {
  return error.issues.flatMap((issue) => {
    const path = issue.path.map(String).join('.');
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({
        path: path === '' ? key : `${path}.${key}`,
        message: 'is not known here',
      }));
    }
    return [{ path, message: issue.message }];
  });
}

function parse<T extends z.ZodType>(schema: T, input: unknown, message: string): z.infer<T> {
  const parsed = schema.safeParse(input);
  if (!parsed.success) refuseRequest('invalid', message, listProblems(parsed.error).slice(0, 50));
  return parsed.data;
}
