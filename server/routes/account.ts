import { Router } from 'express';
import { readSignedIn, requireSignedIn } from '../auth/signed-in';
import { changePassword } from '../commands/set-password';
import { limitAttempts } from '../middleware/limit-rate';
import { unwrap } from '../middleware/refusal-error';
import { parseBody } from '../middleware/validate';
import { presentSession } from '../presenters/session';
import type { Services } from '../services';
import { accountRequest, changePasswordRequest } from '@/shared/api/session';

/** /api/account: one's own name and password. */
export function createAccountRouter(services: Services): Router {
  const router = Router();

  router.patch('/', requireSignedIn, async (request, response) => {
    const { name } = parseBody(accountRequest, request);
    const signedIn = readSignedIn(request);
    await signedIn.person.update({ name });
    response.json(presentSession(signedIn, services.config.demo));
  });

  router.put('/password', requireSignedIn, ...limitAttempts(services.limits), async (request, response) => {
    const input = parseBody(changePasswordRequest, request);
    unwrap(await changePassword(services, readSignedIn(request).person, request.sessionID, input));
    response.status(204).end();
  });

  return router;
}
