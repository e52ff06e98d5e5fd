import type { ErrorCode, Problem, Refusal, Result } from '@/shared/errors';
import { decide, explainRefusal, type Action, type ActionRecords, type Actor } from '../policies/policy';

/** A refusal on its way out of a handler; the error middleware answers it as a problem document. */
export class RefusalError extends Error {
  constructor(readonly refusal: Refusal) {
    super(refusal.message);
    this.name = 'RefusalError';
  }
}

/** Ends the handler with a refusal. */
export function refuseRequest(code: ErrorCode, message: string, problems?: readonly Problem[]): never {
  throw new RefusalError(problems ? { code, message, problems } : { code, message });
}

/** The value of a result, or the end of the handler with its refusal. */
export function unwrap<T>(result: Result<T>): T {
  if (result.ok) return result.value;
  throw new RefusalError(result.refusal);
}

/** Ends the handler unless the policy allows the action. */
export function authorize<A extends Action>(actor: Actor, action: A, record: ActionRecords[A]): void {
  const decision = decide(actor, action, record);
  if (decision !== 'allowed') refuseRequest(decision, explainRefusal(decision));
}

/** The refusal for what is not there, or may not be seen. */
export function refuseNotFound(): never {
  refuseRequest('not-found', explainRefusal('not-found'));
}
