import { ApiProblem, describeError, fieldProblems } from '@/components/api/api-problem';
import { noteField } from '@/shared/api/fields';

/** Why a reason cannot be sent as it is; null when it can. */
export function reasonProblem(text: string): string | null {
  if (text.trim() === '') return 'Say why.';
  const parsed = noteField.safeParse(text);
  if (parsed.success) return null;
  return `The reason ${parsed.error.issues.map((issue) => issue.message).join(' and ')}.`;
}

/** What the server says of one field; `subject` begins the sentence. */
export function fieldRefusal(error: unknown, field: string, subject: string): string | undefined {
  if (error instanceof ApiProblem && error.code === 'wrong-password') {
    return field === 'password' ? 'This is not your password. Nothing was frozen.' : undefined;
  }
  const problem = fieldProblems(error).find(({ path }) => isField(path, field));
  return problem ? `${subject} ${problem.message}.` : undefined;
}

/** What the server says that belongs to none of the fields; null when there is nothing. */
export function wholeRefusal(error: unknown, fields: readonly string[]): string | null {
  if (error === null || error === undefined) return null;
  if (error instanceof ApiProblem && error.code === 'wrong-password') return null;
  const atFields = fieldProblems(error).some(({ path }) => fields.some((field) => isField(path, field)));
  return atFields ? null : describeError(error);
}

function isField(path: string, field: string): boolean {
  return path === field || path.endsWith(`.${field}`);
}
