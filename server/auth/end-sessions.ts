import { Op, type Transaction } from 'sequelize';
import { Membership } from '../models/membership';
import { SessionRecord } from '../models/session-record';
import type { Services } from '../services';

/** Ends every session of a person, but for the kept one; call `revokePersonSockets` after the commit. */
export async function endSessions(
  personId: string,
  keptSessionId: string | undefined,
  transaction: Transaction,
): Promise<void> {
  await SessionRecord.destroy({
    where: { personId, ...(keptSessionId === undefined ? {} : { sid: { [Op.ne]: keptSessionId } }) },
    transaction,
  });
}

/** Disconnects every socket of a person, in all their teams; those whose session goes on connect again. */
export async function revokePersonSockets(services: Services, personId: string): Promise<void> {
  const memberships = await Membership.findAll({ where: { personId } });
  for (const membership of memberships) services.revocation.revokeMember(membership.id);
}

/** Removes the sessions whose time is over and disconnects their sockets. */
export async function sweepSessions(services: Services, now: Date): Promise<void> {
  const expired = await SessionRecord.findAll({
    where: { expires: { [Op.lt]: now } },
    attributes: ['sid'],
    limit: 1000,
  });
  if (expired.length === 0) return;
  await SessionRecord.destroy({ where: { sid: expired.map((record) => record.sid) } });
  for (const record of expired) services.revocation.revokeSession(record.sid);
}
