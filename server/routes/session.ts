import { Router } from 'express';
import { closeSession, openSession } from '../auth/open-session';
import { authenticateByBody } from '../auth/sign-in-passport';
import { findSignedIn, readSignedIn, requireSignedIn } from '../auth/signed-in';
import { signOutEverywhere } from '../commands/sign-out-everywhere';
import { limitAttempts } from '../middleware/limit-rate';
import { refuseNotFound, refuseRequest } from '../middleware/refusal-error';
import { parseBody } from '../middleware/validate';
import { recordAudit } from '../models/audit-entry';
import { presentSession } from '../presenters/session';
import type { Services } from '../services';
import { signInRequest, switchTeamRequest } from '@/shared/api/session';

/** /api/session: who is signed in here, signing in and out, and the current team. */
export function createSessionRouter(services: Services): Router {
  const router = Router();

  router.get('/', requireSignedIn, (request, response) => {
    response.json(presentSession(readSignedIn(request), services.config.demo));
  });

  router.post('/', ...limitAttempts(services.limits), async (request, response) => {
    const { email } = parseBody(signInRequest, request);
    const user = await authenticateByBody(request, response);
    if (user === undefined) {
      await recordAudit({ action: 'sign-in-refused', details: { email } });
      refuseRequest('wrong-credentials', 'This e-mail address and password do not belong together.');
    }
    const signedIn = await openSession(services, request, user.personId);
    if (signedIn === undefined) {
      refuseRequest('forbidden', 'You are in no team at the moment. Ask an administrator of your team.');
    }
    await recordAudit({ action: 'signed-in', teamId: signedIn.actor.teamId, personId: user.personId });
    response.json(presentSession(signedIn, services.config.demo));
  });

  router.patch('/', requireSignedIn, async (request, response) => {
    const { teamId } = parseBody(switchTeamRequest, request);
    const { person } = readSignedIn(request);
    const signedIn = await findSignedIn(person.id, teamId);
    if (signedIn?.actor.teamId !== teamId) refuseNotFound();
    request.session.teamId = teamId;
    services.revocation.revokeSession(request.sessionID);
    response.json(presentSession(signedIn, services.config.demo));
  });

  router.delete('/', async (request, response) => {
    await closeSession(services, request, response);
    response.status(204).end();
  });

  return router;
}

/** /api/sessions: all of a person's sessions. */
export function createSessionsRouter(services: Services): Router {
  const router = Router();

  router.delete('/', requireSignedIn, async (request, response) => {
    await signOutEverywhere(services, readSignedIn(request).actor);
    await closeSession(services, request, response);
    response.status(204).end();
  });

  return router;
}
