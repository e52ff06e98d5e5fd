import { hashToken, makeToken } from '../auth/token';
import { transact } from '../database/transaction';
import { writeNewPassword } from '../mail/messages';
import { PasswordReset } from '../models/password-reset';
import { normalizeEmail, Person } from '../models/person';
import type { Services } from '../services';
import { enqueueTask } from '../tasks/enqueue-task';

const LIFETIME_MINUTES = 60;

/** Sends a link for a new password when there is such an account; tells nobody whether there is. */
export async function requestNewPassword(services: Services, email: string): Promise<void> {
  const person = await Person.findOne({ where: { email: normalizeEmail(email) } });
  if (person === null) return;
  const token = makeToken();
  const message = writeNewPassword({
    link: `${services.baseUrl()}/password/${token}`,
    minutes: LIFETIME_MINUTES,
  });
  await transact(services.sequelize, async (transaction) => {
    await PasswordReset.create(
      {
        personId: person.id,
        tokenHash: hashToken(token),
        expiresAt: new Date(Date.now() + LIFETIME_MINUTES * 60_000),
      },
      { transaction },
    );
    await enqueueTask('mail', { to: person.email, ...message }, { transaction });
  });
}
