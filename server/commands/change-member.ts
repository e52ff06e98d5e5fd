import { transact } from '../database/transaction';
import { recordAudit } from '../models/audit-entry';
import { Membership } from '../models/membership';
import { Team } from '../models/team';
import type { Actor } from '../policies/policy';
import type { Services } from '../services';
import type { Role } from '@/shared/api/fields';
import { accept, refuse, type Result } from '@/shared/errors';

/**
 * Changes the roles of a member, or ends or renews the membership, and disconnects their sockets. A team keeps at
 * least one active administrator.
 */
export async function changeMember(
  services: Services,
  actor: Actor,
  memberId: string,
  change: { readonly roles?: readonly Role[] | undefined; readonly active?: boolean | undefined },
): Promise<Result<Membership>> {
  const { teamId } = actor;
  const result = await transact(services.sequelize, async (transaction): Promise<Result<Membership>> => {
    // One change of a team's members at a time: two administrators could otherwise remove each other.
    await Team.findByPk(teamId, { transaction, lock: transaction.LOCK.UPDATE });
    const memberships = await Membership.findAll({
      where: { teamId },
      include: ['person', 'team'],
      transaction,
    });
    const membership = memberships.find(({ id }) => id === memberId);
    if (membership === undefined) return refuse('not-found', 'There is no such member in this team.');
    const before = { roles: membership.roles, active: membership.deactivatedAt === null };
    const after = { roles: change.roles ?? before.roles, active: change.active ?? before.active };
    const others = memberships.filter(({ id }) => id !== memberId);
    const administrators = others.filter((other) =>
      isAdministrator(other.roles, other.deactivatedAt === null),
    );
    if (administrators.length === 0 && !isAdministrator(after.roles, after.active)) {
      return refuse(
        'last-administrator',
        'A team needs an administrator. Give the role to somebody else first.',
      );
    }
    membership.roles = after.roles;
    if (after.active !== before.active) membership.deactivatedAt = after.active ? null : new Date();
    await membership.save({ transaction });
    const subject = { teamId, personId: actor.personId, subjectId: memberId };
    if (change.roles !== undefined) {
      const details = { from: before.roles, to: membership.roles };
      await recordAudit({ ...subject, action: 'roles-changed', details }, transaction);
    }
    if (after.active !== before.active) {
      await recordAudit({ ...subject, action: after.active ? 'reactivated' : 'deactivated' }, transaction);
    }
    return accept(membership);
  });
  if (result.ok) services.revocation.revokeMember(memberId);
  return result;
}

function isAdministrator(roles: readonly Role[], active: boolean): boolean {
  return active && roles.includes('administrator');
}
