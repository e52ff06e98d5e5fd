import { Router } from 'express';
import { requestNewPassword } from '../commands/request-new-password';
import { findPasswordReset, setForgottenPassword } from '../commands/set-password';
import { limitAttempts, limitMail } from '../middleware/limit-rate';
import { unwrap } from '../middleware/refusal-error';
import { parseBody, parseParam } from '../middleware/validate';
import type { Services } from '../services';
import { tokenField } from '@/shared/api/fields';
import { forgottenPasswordRequest, newPasswordRequest } from '@/shared/api/session';

/** /api/passwords: a forgotten password and the new one. */
export function createPasswordsRouter(services: Services): Router {
  const router = Router();

  router.post('/forgotten', ...limitMail(services.limits), (request, response) => {
    const { email } = parseBody(forgottenPasswordRequest, request);
    // Not awaited: the time of the answer must not tell whether there is an account.
    requestNewPassword(services, email).catch((error: unknown) => {
      request.log.error({ err: error }, 'a link for a new password could not be written');
    });
    response.status(202).json({});
  });

  router.get('/:token', ...limitAttempts(services.limits), async (request, response) => {
    const person = unwrap(await findPasswordReset(parseParam(tokenField, request, 'token')));
    response.json({ email: person.email });
  });

  router.post('/', ...limitAttempts(services.limits), async (request, response) => {
    unwrap(await setForgottenPassword(services, parseBody(newPasswordRequest, request)));
    response.status(204).end();
  });

  return router;
}
