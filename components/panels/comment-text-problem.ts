import { describeError, fieldProblems } from '@/components/api/api-problem';
import { noteField } from '@/shared/api/fields';

/** Why a text cannot be sent as it is; null when it can. */
export function textProblem(text: string): string | null {
  if (text.trim() === '') return 'Write something first.';
  const parsed = noteField.safeParse(text);
  if (parsed.success) return null;
  return `The text ${parsed.error.issues.map((issue) => issue.message).join(' and ')}.`;
}

/** Why the server did not take a text: what is wrong with it, else the whole sentence. */
export function refusalText(error: unknown): string | undefined {
  if (error === null || error === undefined) return undefined;
  const atText = fieldProblems(error).find((problem) => problem.path.endsWith('text'));
  return atText ? `The text ${atText.message}.` : describeError(error);
}
