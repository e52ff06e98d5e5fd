import { Router } from 'express';
import { readSignedIn, requireLoaded, requireSignedIn } from '../auth/signed-in';
import { changeMember } from '../commands/change-member';
import { authorize, unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam } from '../middleware/validate';
import { Membership } from '../models/membership';
import { presentMember } from '../presenters/member';
import type { Services } from '../services';
import { idField } from '@/shared/api/fields';
import { memberChangeRequest } from '@/shared/api/session';

/** /api/members: the people of the current team. */
export function createMembersRouter(services: Services): Router {
  const router = Router();
  router.use(requireSignedIn);

  router.get('/', async (request, response) => {
    const { actor } = readSignedIn(request);
    authorize(actor, 'see-members', { teamId: actor.teamId });
    const memberships = await Membership.findAll({
      where: { teamId: actor.teamId },
      include: ['person', 'team'],
      order: [
        ['person', 'name', 'ASC'],
        ['id', 'ASC'],
      ],
    });
    response.json({
      items: memberships.map((membership) => presentMember(actor, requireLoaded(membership))),
    });
  });

  router.patch('/:id', async (request, response) => {
    const { actor } = readSignedIn(request);
    const id = parseParam(idField, request, 'id');
    const change = parseBody(memberChangeRequest, request);
    if (change.roles !== undefined) authorize(actor, 'change-roles', { teamId: actor.teamId });
    if (change.active !== undefined) authorize(actor, 'deactivate', { teamId: actor.teamId });
    const membership = unwrap(await changeMember(services, actor, id, change));
    response.json(presentMember(actor, requireLoaded(membership)));
  });

  return router;
}
