import type { Transaction } from 'sequelize';
import type { SignedIn } from '../auth/signed-in';
import { hashToken, makeToken } from '../auth/token';
import { transact } from '../database/transaction';
import { writeInvitation } from '../mail/messages';
import { recordAudit } from '../models/audit-entry';
import { Invitation } from '../models/invitation';
import { Membership } from '../models/membership';
import { normalizeEmail, Person } from '../models/person';
import type { Services } from '../services';
import { enqueueTask } from '../tasks/enqueue-task';
import type { Role } from '@/shared/api/fields';
import { accept, refuse, type Result } from '@/shared/errors';

const LIFETIME_MS = 7 * 24 * 60 * 60 * 1000;

/** Invites an e-mail address into the team; an open invitation to the same address ends. */
export async function inviteMember(
  services: Services,
  by: SignedIn,
  input: { readonly email: string; readonly roles: readonly Role[] },
): Promise<Result<Invitation>> {
  const email = normalizeEmail(input.email);
  const { teamId, memberId, personId } = by.actor;
  return transact(services.sequelize, async (transaction) => {
    const membership = await findMembership(teamId, email, transaction);
    if (membership) {
      const message =
        membership.deactivatedAt === null
          ? 'Somebody with this address is in the team already.'
          : 'Somebody with this address was in the team; activate their membership again instead.';
      return refuse('already-there', message, [{ path: 'email', message: 'is in the team already' }]);
    }
    await Invitation.update(
      { withdrawnAt: new Date() },
      { where: { teamId, email, acceptedAt: null, withdrawnAt: null }, transaction },
    );
    const token = makeToken();
    const invitation = await Invitation.create(
      {
        teamId,
        email,
        roles: input.roles,
        tokenHash: hashToken(token),
        invitedById: memberId,
        expiresAt: new Date(Date.now() + LIFETIME_MS),
      },
      { transaction },
    );
    await recordAudit(
      {
        action: 'invited',
        teamId,
        personId,
        subjectId: invitation.id,
        details: { email, roles: input.roles },
      },
      transaction,
    );
    await sendInvitation(services, by, invitation, token, transaction);
    return accept(invitation);
  });
}

/** Sends an open invitation again, with a new link and a new end; the former link ends. */
export async function sendInvitationAgain(
  services: Services,
  by: SignedIn,
  invitationId: string,
): Promise<Result<Invitation>> {
  return transact(services.sequelize, async (transaction) => {
    const invitation = await lockOpenInvitation(by.actor.teamId, invitationId, transaction);
    if (invitation === null) return refuse('not-found', 'There is no open invitation like this.');
    const token = makeToken();
    invitation.tokenHash = hashToken(token);
    invitation.expiresAt = new Date(Date.now() + LIFETIME_MS);
    await invitation.save({ transaction });
    await sendInvitation(services, by, invitation, token, transaction);
    return accept(invitation);
  });
}

/** Ends an open invitation. */
export async function withdrawInvitation(
  services: Services,
  by: SignedIn,
  invitationId: string,
): Promise<Result<void>> {
  const { teamId, personId } = by.actor;
  return transact(services.sequelize, async (transaction) => {
    const invitation = await lockOpenInvitation(teamId, invitationId, transaction);
    if (invitation === null) return refuse('not-found', 'There is no open invitation like this.');
    invitation.withdrawnAt = new Date();
    await invitation.save({ transaction });
    await recordAudit(
      {
        action: 'invitation-withdrawn',
        teamId,
        personId,
        subjectId: invitation.id,
        details: { email: invitation.email },
      },
      transaction,
    );
    return accept(undefined);
  });
}

async function findMembership(
  teamId: string,
  email: string,
  transaction: Transaction,
): Promise<Membership | null> {
  const person = await Person.findOne({ where: { email }, transaction });
  return person && Membership.findOne({ where: { teamId, personId: person.id }, transaction });
}

function lockOpenInvitation(
  teamId: string,
  id: string,
  transaction: Transaction,
): Promise<Invitation | null> {
  return Invitation.findOne({
    where: { id, teamId, acceptedAt: null, withdrawnAt: null },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
}

async function sendInvitation(
  services: Services,
  by: SignedIn,
  invitation: Invitation,
  token: string,
  transaction: Transaction,
): Promise<void> {
  const message = writeInvitation({
    team: by.membership.team.name,
    invitedBy: by.person.name,
    link: `${services.baseUrl()}/invitation/${token}`,
    expiresAt: invitation.expiresAt,
  });
  await enqueueTask('mail', { to: invitation.email, ...message }, { transaction, teamId: invitation.teamId });
}
