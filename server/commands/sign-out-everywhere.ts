import { endSessions, revokePersonSockets } from '../auth/end-sessions';
import { transact } from '../database/transaction';
import { recordAudit } from '../models/audit-entry';
import type { Actor } from '../policies/policy';
import type { Services } from '../services';

/** Ends every session of the person and disconnects their sockets. */
export async function signOutEverywhere(services: Services, actor: Actor): Promise<void> {
  await transact(services.sequelize, async (transaction) => {
    await endSessions(actor.personId, undefined, transaction);
    await recordAudit(
      { action: 'signed-out-everywhere', teamId: actor.teamId, personId: actor.personId },
      transaction,
    );
  });
  await revokePersonSockets(services, actor.personId);
}
