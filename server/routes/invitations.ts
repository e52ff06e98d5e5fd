import { Router } from 'express';
import { openSession } from '../auth/open-session';
import { readSignedIn, requireSignedIn } from '../auth/signed-in';
import { acceptInvitation, findInvitation } from '../commands/accept-invitation';
import { inviteMember, sendInvitationAgain, withdrawInvitation } from '../commands/invite-member';
import { limitAttempts, limitMail } from '../middleware/limit-rate';
import { authorize, refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam } from '../middleware/validate';
import { recordAudit } from '../models/audit-entry';
import { Invitation } from '../models/invitation';
import { Membership } from '../models/membership';
import { presentInvitation } from '../presenters/invitation';
import { presentSession } from '../presenters/session';
import type { Services } from '../services';
import { idField, tokenField } from '@/shared/api/fields';
import { acceptInvitationRequest, invitationRequest } from '@/shared/api/session';

/** /api/invitations: asking people into the team, and coming in. */
export function createInvitationsRouter(services: Services): Router {
  const router = Router();

  router.get('/by-token/:token', ...limitAttempts(services.limits), async (request, response) => {
    const { invitation, team, person } = unwrap(
      await findInvitation(parseParam(tokenField, request, 'token')),
    );
    response.json({
      email: invitation.email,
      team: team.name,
      roles: invitation.roles,
      hasAccount: person !== null,
    });
  });

  router.post('/accept', ...limitAttempts(services.limits), async (request, response) => {
    const input = parseBody(acceptInvitationRequest, request);
    const membership = unwrap(await acceptInvitation(services, input));
    const signedIn =
      (await openSession(services, request, membership.personId, membership.teamId)) ?? refuseNotFound();
    await recordAudit({ action: 'signed-in', teamId: membership.teamId, personId: membership.personId });
    response.status(201).json(presentSession(signedIn, services.config.demo));
  });

  router.get('/', requireSignedIn, async (request, response) => {
    const { actor } = readSignedIn(request);
    authorize(actor, 'invite', { teamId: actor.teamId });
    const invitations = await Invitation.findAll({
      where: { teamId: actor.teamId, acceptedAt: null, withdrawnAt: null },
      order: [
        ['createdAt', 'DESC'],
        ['id', 'ASC'],
      ],
      limit: 200,
    });
    const names = await namesOf(invitations.map((invitation) => invitation.invitedById));
    response.json({
      items: invitations.map((invitation) =>
        presentInvitation(invitation, names.get(invitation.invitedById) ?? ''),
      ),
    });
  });

  router.post('/', requireSignedIn, ...limitMail(services.limits), async (request, response) => {
    const signedIn = readSignedIn(request);
    authorize(signedIn.actor, 'invite', { teamId: signedIn.actor.teamId });
    const invitation = unwrap(await inviteMember(services, signedIn, parseBody(invitationRequest, request)));
    response.status(201).json(presentInvitation(invitation, signedIn.person.name));
  });

  router.post('/:id/send', requireSignedIn, ...limitMail(services.limits), async (request, response) => {
    const signedIn = readSignedIn(request);
    authorize(signedIn.actor, 'invite', { teamId: signedIn.actor.teamId });
    const id = parseParam(idField, request, 'id');
    const invitation = unwrap(await sendInvitationAgain(services, signedIn, id));
    const names = await namesOf([invitation.invitedById]);
    response.json(presentInvitation(invitation, names.get(invitation.invitedById) ?? ''));
  });

  router.delete('/:id', requireSignedIn, async (request, response) => {
    const signedIn = readSignedIn(request);
    authorize(signedIn.actor, 'invite', { teamId: signedIn.actor.teamId });
    unwrap(await withdrawInvitation(services, signedIn, parseParam(idField, request, 'id')));
    response.status(204).end();
  });

  return router;
}

async function namesOf(memberIds: readonly string[]): Promise<ReadonlyMap<string, string>> {
  const memberships = await Membership.findAll({
    where: { id: [...new Set(memberIds)] },
    include: ['person'],
  });
  return new Map(memberships.map((membership) => [membership.id, membership.person?.name ?? '']));
}
