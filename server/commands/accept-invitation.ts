import { hashPassword, verifyPassword } from '../auth/password';
import { hashToken } from '../auth/token';
import { transact } from '../database/transaction';
import { recordAudit } from '../models/audit-entry';
import { Invitation } from '../models/invitation';
import { Membership } from '../models/membership';
import { Person } from '../models/person';
import type { Team } from '../models/team';
import type { Services } from '../services';
import { nameField, passwordField } from '@/shared/api/fields';
import { accept, refuse, type Problem, type Result } from '@/shared/errors';

/** An invitation that may be accepted now. */
export interface OpenInvitation {
  readonly invitation: Invitation;
  readonly team: Team;
  /** The account that the invited address has already. */
  readonly person: Person | null;
}

const ENDED = 'This invitation was used already, withdrawn, or its time is over. Ask for a new one.';

/** The invitation behind the token of a link, while it holds. */
export async function findInvitation(token: string): Promise<Result<OpenInvitation>> {
  const invitation = await Invitation.findOne({ where: { tokenHash: hashToken(token) }, include: ['team'] });
  if (!invitation?.team || !isOpen(invitation, new Date())) return refuse('expired', ENDED);
  const person = await Person.findOne({ where: { email: invitation.email } });
  return accept({ invitation, team: invitation.team, person });
}

/** Makes the invited person a member; by the password of the account they have, or with a new account. */
export async function acceptInvitation(
  services: Services,
  input: { readonly token: string; readonly name?: string | undefined; readonly password: string },
): Promise<Result<Membership>> {
  const found = await findInvitation(input.token);
  if (!found.ok) return found;
  const { person } = found.value;
  if (person && !(await verifyPassword(input.password, person.passwordHash))) {
    return refuse('wrong-password', 'This is not the password of the account with this address.', [
      { path: 'password', message: 'is not the password of your account' },
    ]);
  }
  const problems = person ? [] : checkNewAccount(input);
  if (problems.length > 0) return refuse('invalid', 'Something in what was sent is not right.', problems);
  const passwordHash = person ? person.passwordHash : await hashPassword(input.password);
  return transact(services.sequelize, async (transaction) => {
    const invitation = await Invitation.findByPk(found.value.invitation.id, {
      transaction,
      lock: transaction.LOCK.UPDATE,
    });
    if (invitation === null || !isOpen(invitation, new Date())) return refuse('expired', ENDED);
    const { teamId, email, roles } = invitation;
    const member =
      person ??
      (await Person.create({ name: input.name?.trim() ?? '', email, passwordHash }, { transaction }));
    const membership = await Membership.create({ teamId, personId: member.id, roles }, { transaction });
    invitation.acceptedAt = new Date();
    await invitation.save({ transaction });
    await recordAudit(
      {
        action: 'invitation-accepted',
        teamId,
        personId: member.id,
        subjectId: membership.id,
        details: { invitation: invitation.id, roles },
      },
      transaction,
    );
    return accept(membership);
  });
}

function checkNewAccount(input: {
  readonly name?: string | undefined;
  readonly password: string;
}): Problem[] {
  return [
    ...nameIssues(input.name).map((message) => ({ path: 'name', message })),
    ...(passwordField.safeParse(input.password).error?.issues ?? []).map(({ message }) => ({
      path: 'password',
      message,
    })),
  ];
}

function nameIssues(name: string | undefined): string[] {
  return (nameField.safeParse(name ?? '').error?.issues ?? []).map(({ message }) => message);
}

function isOpen(invitation: Invitation, now: Date): boolean {
  return invitation.acceptedAt === null && invitation.withdrawnAt === null && invitation.expiresAt > now;
}
