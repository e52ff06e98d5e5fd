import { Router } from 'express';
import { listDemoAccounts } from '../auth/demo-accounts';
import { openSession } from '../auth/open-session';
import { setUpTeam } from '../commands/set-up-team';
import { limitAttempts } from '../middleware/limit-rate';
import { refuseNotFound, unwrap } from '../middleware/refusal-error';
import { parseBody } from '../middleware/validate';
import { Person } from '../models/person';
import { presentSession } from '../presenters/session';
import type { Services } from '../services';
import { firstVisitRequest, type Setup } from '@/shared/api/session';

/** /api/setup: what the sign-in screen offers, and the first visit. */
export function createSetupRouter(services: Services): Router {
  const router = Router();

  router.get('/', async (_request, response) => {
    const setup: Setup = {
      state: (await Person.count()) === 0 ? 'first-visit' : 'ready',
      demo: services.config.demo,
      demoAccounts: await listDemoAccounts(services),
    };
    response.json(setup);
  });

  router.post('/', ...limitAttempts(services.limits), async (request, response) => {
    const input = parseBody(firstVisitRequest, request);
    const membership = unwrap(await setUpTeam(services, input));
    const signedIn = await openSession(services, request, membership.personId);
    response.status(201).json(presentSession(signedIn ?? refuseNotFound(), services.config.demo));
  });

  return router;
}
