import { Router } from 'express';
import { readSignedIn, requireSignedIn } from '../auth/signed-in';
import { authorize } from '../middleware/refusal-error';
import { CaughtMail } from '../models/caught-mail';
import { presentMail } from '../presenters/mail';
import type { Services } from '../services';

/** /api/mails: what the local mail catcher kept, for members of the demo. */
export function createMailsRouter(services: Services): Router {
  const router = Router();

  router.get('/', requireSignedIn, async (request, response) => {
    const { actor, membership } = readSignedIn(request);
    authorize(actor, 'see-mails', {
      teamId: actor.teamId,
      demo: services.config.demo && membership.team.demo,
    });
    const mails = await CaughtMail.findAll({ order: [['id', 'DESC']], limit: 100 });
    response.json({ items: mails.map(presentMail) });
  });

  return router;
}
