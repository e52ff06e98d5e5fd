import type { Role } from '@/shared/api/fields';
import { assertNever, type ErrorCode } from '@/shared/errors';

/** Who acts: a membership in one team, with its set of roles. */
export interface Actor {
  readonly memberId: string;
  readonly personId: string;
  readonly teamId: string;
  readonly roles: readonly Role[];
  readonly active: boolean;
}

/** Anything that belongs to a team. */
export interface TeamRecord {
  readonly teamId: string;
}

/** What the policy needs to know of a revision. */
export interface RevisionRecord extends TeamRecord {
  /** Whether an approver froze it at some time; a superseded one stays frozen. */
  readonly frozen: boolean;
  /** The membership that submitted it last, null before the first time. */
  readonly submittedById: string | null;
}

/** What the policy needs to know of the caught mail. */
export interface MailRecord extends TeamRecord {
  readonly demo: boolean;
}

/** Every action, with the kind of record it is done to. */
export interface ActionRecords {
  'see-jobs': TeamRecord;
  'see-layouts': TeamRecord;
  'see-revision': RevisionRecord;
  'see-parts': TeamRecord;
  'edit-jobs': TeamRecord;
  'edit-layouts': TeamRecord;
  'edit-parts': TeamRecord;
  'comment-on-layout': TeamRecord;
  'comment-on-revision': RevisionRecord;
  'save-revision': TeamRecord;
  'submit-revision': RevisionRecord;
  'return-revision': RevisionRecord;
  'freeze-revision': RevisionRecord;
  'see-members': TeamRecord;
  invite: TeamRecord;
  'change-roles': TeamRecord;
  deactivate: TeamRecord;
  'see-mails': MailRecord;
}

/** Anything a member may or may not do. */
export type Action = keyof ActionRecords;

/** What the policy says: yes, or with which code it refuses (`not-found`: it may not even be seen). */
export type Decision = 'allowed' | Extract<ErrorCode, 'not-found' | 'forbidden' | 'own-submission'>;

const EVERY_ROLE: readonly Role[] = ['administrator', 'integrator', 'reviewer', 'approver', 'installer'];
const OFFICE: readonly Role[] = ['administrator', 'integrator', 'reviewer', 'approver'];
const EDITORS: readonly Role[] = ['administrator', 'integrator'];
const APPROVERS: readonly Role[] = ['approver'];
const ADMINISTRATORS: readonly Role[] = ['administrator'];

const ALLOWED_ROLES: Readonly<Record<Action, readonly Role[]>> = {
  'see-jobs': OFFICE,
  'see-layouts': OFFICE,
  'see-revision': OFFICE,
  'see-parts': OFFICE,
  'edit-jobs': EDITORS,
  'edit-layouts': EDITORS,
  'edit-parts': EDITORS,
  'comment-on-layout': OFFICE,
  'comment-on-revision': OFFICE,
  'save-revision': EDITORS,
  'submit-revision': EDITORS,
  'return-revision': APPROVERS,
  'freeze-revision': APPROVERS,
  'see-members': EVERY_ROLE,
  invite: ADMINISTRATORS,
  'change-roles': ADMINISTRATORS,
  deactivate: ADMINISTRATORS,
  'see-mails': EVERY_ROLE,
};

/** What an installer may do besides, once a revision is frozen. */
const ALLOWED_ON_FROZEN: Readonly<Partial<Record<Action, readonly Role[]>>> = {
  'see-revision': ['installer'],
  'comment-on-revision': ['installer'],
};

/** Seeing that comes before doing: what may not be seen is answered as if it were not there. */
const SEEN_BY: Readonly<Record<Action, Action>> = {
  'see-jobs': 'see-jobs',
  'see-layouts': 'see-layouts',
  'see-revision': 'see-revision',
  'see-parts': 'see-parts',
  'edit-jobs': 'see-jobs',
  'edit-layouts': 'see-layouts',
  'edit-parts': 'see-parts',
  'comment-on-layout': 'see-layouts',
  'comment-on-revision': 'see-revision',
  'save-revision': 'see-layouts',
  'submit-revision': 'see-revision',
  'return-revision': 'see-revision',
  'freeze-revision': 'see-revision',
  'see-members': 'see-members',
  invite: 'see-members',
  'change-roles': 'see-members',
  deactivate: 'see-members',
  'see-mails': 'see-mails',
};

/** Whether this member may do this to that record. Everything that is not listed is refused. */
export function can<A extends Action>(actor: Actor, action: A, record: ActionRecords[A]): boolean {
  return decide(actor, action, record) === 'allowed';
}

/** Like `can`, with the reason of a refusal. Depends on nothing but its arguments. */
export function decide<A extends Action>(actor: Actor, action: A, record: ActionRecords[A]): Decision {
  if (!actor.active || actor.teamId !== record.teamId) return 'not-found';
  if (!holdsRole(actor, SEEN_BY[action], record)) return 'not-found';
  if (!holdsRole(actor, action, record)) return 'forbidden';
  if ((action === 'return-revision' || action === 'freeze-revision') && isOwnSubmission(actor, record)) {
    return 'own-submission';
  }
  if (action === 'see-mails' && !('demo' in record && record.demo)) return 'not-found';
  return 'allowed';
}

/** The sentence that goes with a refusal of the policy. */
export function explainRefusal(decision: Exclude<Decision, 'allowed'>): string {
  switch (decision) {
    case 'not-found':
      return 'There is nothing here, or you may not see it.';
    case 'forbidden':
      return 'Your roles in this team do not allow this. Ask an administrator.';
    case 'own-submission':
      return 'You submitted this revision yourself; another approver has to decide on it.';
    default:
      return assertNever(decision);
  }
}

function holdsRole(actor: Actor, action: Action, record: TeamRecord): boolean {
  if (ALLOWED_ROLES[action].some((role) => actor.roles.includes(role))) return true;
  const onFrozen = ALLOWED_ON_FROZEN[action] ?? [];
  return 'frozen' in record && record.frozen === true && onFrozen.some((role) => actor.roles.includes(role));
}

function isOwnSubmission(actor: Actor, record: TeamRecord): boolean {
  return 'submittedById' in record && record.submittedById === actor.memberId;
}
