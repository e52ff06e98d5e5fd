import type { z } from 'zod';
import { problemSchema, type ProblemDocument } from '@/shared/api/problem';
import { ApiProblem, Unreachable } from './api-problem';
import { noteArrival } from './connection';
import { renewSession } from './session-renewal';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

type RequestOptions<S extends z.ZodType> = {
  readonly body?: unknown;
  /** Shape of the answer; left out where there is none. */
  readonly schema?: S;
  readonly signal?: AbortSignal;
  /** False for the requests that are about the session itself. */
  readonly renew?: boolean;
};

const UNREACHABLE =
  'The server cannot be reached. Check the connection and try again; nothing typed is lost.';

/**
 * One request to the server's API. An expired session is renewed in place and the request sent again, so a form
 * that was sent too late still arrives.
 * @throws ApiProblem when the server refuses
 * @throws Unreachable when it does not answer
 */
export async function request<S extends z.ZodType = z.ZodUndefined>(
  method: Method,
  path: string,
  options: RequestOptions<S> = {},
): Promise<z.output<S>> {
  const response = await send(method, path, options);
  if (response.ok) return readAnswer(response, options.schema);
  const problem = await readProblem(response);
  if (problem.code === 'not-signed-in' && options.renew !== false && (await renewSession())) {
    return request(method, path, { ...options, renew: false });
  }
  throw new ApiProblem(problem);
}

async function send(
  method: Method,
  path: string,
  { body, signal }: RequestOptions<z.ZodType>,
): Promise<Response> {
  try {
    const response = await fetch(path, {
      method,
      signal,
      credentials: 'same-origin',
      headers: body === undefined ? {} : { 'content-type': 'application/json' },
      body: body === undefined ? undefined : JSON.stringify(body),
    });
    noteArrival(true);
    return response;
  } catch (error) {
    if (signal?.aborted) throw error;
    noteArrival(false);
    throw new Unreachable(UNREACHABLE, { cause: error });
  }
}

async function readAnswer<S extends z.ZodType>(
  response: Response,
  schema: S | undefined,
): Promise<z.output<S>> {
  const text = await response.text();
  const value: unknown = text === '' ? undefined : parseJson(text);
  // Our own server made it: the shape is proven in development and in the tests, not again at every visit.
  if (schema && __DEV__) return schema.parse(value);
  return value as z.output<S>;
}

async function readProblem(response: Response): Promise<ProblemDocument> {
  const text = await response.text();
  const parsed = problemSchema.safeParse(text.startsWith('{') ? parseJson(text) : null);
  if (parsed.success) return parsed.data;
  throw new Unreachable(
    `The server answered in an unexpected way (${response.status}). Try again in a moment; nothing typed is lost.`,
  );
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    throw new Unreachable(UNREACHABLE, { cause: error });
  }
}
