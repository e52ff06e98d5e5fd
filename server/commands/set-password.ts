import { endSessions, revokePersonSockets } from '../auth/end-sessions';
import { hashPassword, verifyPassword } from '../auth/password';
import { hashToken } from '../auth/token';
import { transact } from '../database/transaction';
import { recordAudit } from '../models/audit-entry';
import { PasswordReset } from '../models/password-reset';
import { Person } from '../models/person';
import type { Services } from '../services';
import { accept, refuse, type Result } from '@/shared/errors';

/** Changes one's own password, by the current one; ends all other sessions. */
export async function changePassword(
  services: Services,
  person: Person,
  sessionId: string,
  input: { readonly currentPassword: string; readonly password: string },
): Promise<Result<void>> {
  if (!(await verifyPassword(input.currentPassword, person.passwordHash))) {
    return refuse('wrong-password', 'The current password is not right.', [
      { path: 'currentPassword', message: 'is not your current password' },
    ]);
  }
  const passwordHash = await hashPassword(input.password);
  await transact(services.sequelize, async (transaction) => {
    await Person.update({ passwordHash }, { where: { id: person.id }, transaction });
    await endSessions(person.id, sessionId, transaction);
    await recordAudit(
      { action: 'password-set', personId: person.id, details: { by: 'person' } },
      transaction,
    );
  });
  await revokePersonSockets(services, person.id);
  return accept(undefined);
}

/** Sets a new password by the token of a link, which then is used up; ends every session of the person. */
export async function setForgottenPassword(
  services: Services,
  input: { readonly token: string; readonly password: string },
): Promise<Result<void>> {
  const passwordHash = await hashPassword(input.password);
  const personId = await transact(services.sequelize, async (transaction) => {
    const reset = await PasswordReset.findOne({
      where: { tokenHash: hashToken(input.token) },
      transaction,
      lock: transaction.LOCK.UPDATE,
    });
    if (reset === null || !isOpen(reset, new Date())) return undefined;
    const now = new Date();
    await Person.update({ passwordHash }, { where: { id: reset.personId }, transaction });
    // Other links that were asked for before end with this one.
    await PasswordReset.update(
      { usedAt: now },
      { where: { personId: reset.personId, usedAt: null }, transaction },
    );
    await endSessions(reset.personId, undefined, transaction);
    await recordAudit(
      { action: 'password-set', personId: reset.personId, details: { by: 'link' } },
      transaction,
    );
    return reset.personId;
  });
  if (personId === undefined)
    return refuse('expired', 'This link was used already, or its time is over. Ask for a new one.');
  await revokePersonSockets(services, personId);
  return accept(undefined);
}

/** The person a link gives a new password to, while it holds. */
export async function findPasswordReset(token: string): Promise<Result<Person>> {
  const reset = await PasswordReset.findOne({ where: { tokenHash: hashToken(token) } });
  const person = reset && isOpen(reset, new Date()) ? await Person.findByPk(reset.personId) : null;
  if (person === null)
    return refuse('expired', 'This link was used already, or its time is over. Ask for a new one.');
  return accept(person);
}

function isOpen(reset: PasswordReset, now: Date): boolean {
  return reset.usedAt === null && reset.expiresAt > now;
}
