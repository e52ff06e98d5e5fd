import type { ErrorCode, Problem } from '@/shared/errors';
import type { ProblemDocument } from '@/shared/api/problem';

/** The server's refusal: its problem document as an error, for query and mutation results. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';
  readonly status: number;
  readonly code: ErrorCode;
  readonly problems: readonly Problem[];
  readonly requestId: string | undefined;

  constructor(document: ProblemDocument) {
    super(document.detail ?? document.title);
    this.status = document.status;
    this.code = document.code;
    this.problems = document.problems ?? [];
    this.requestId = document.requestId;
  }
}

/** The server could not be reached, or what came back was not from it. */
export class Unreachable extends Error {
  override readonly name = 'Unreachable';
}

/** One sentence for a person about what went wrong and what to do. */
export function describeError(error: unknown): string {
  if (error instanceof Unreachable) return error.message;
  if (error instanceof ApiProblem) {
    const whole = error.problems.filter((problem) => problem.path === '').map((problem) => problem.message);
    const text = [error.message, ...whole].join(' ');
    return error.code === 'internal' && error.requestId
      ? `${text} Say this number to whoever looks after the server: ${error.requestId}.`
      : text;
  }
  return 'Something went wrong in this page. Load it again; what you typed is kept.';
}

/** One sentence about what stopped a whole page: a piece of it that did not arrive, or a fault of ours. */
export function describePageError(error: unknown): string {
  // The bundler's loader says so by this name, and exports no class to compare with.
  if (error instanceof Error && error.name === 'AsyncRequireError') {
    return 'A piece of it did not arrive: the connection is gone, or the server has a newer one. What you typed is kept.';
  }
  return describeError(error);
}

/** The server's problems by field: the path without its leading `body.`, and what is wrong there. */
export function fieldProblems(error: unknown): readonly Problem[] {
  return error instanceof ApiProblem ? error.problems.filter((problem) => problem.path !== '') : [];
}
