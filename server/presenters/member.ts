import type { LoadedMembership } from '../auth/signed-in';
import { can, type Actor } from '../policies/policy';
import type { Member } from '@/shared/api/session';
import { initialsOf } from './person';

/** A member of the team, as another member sees them. */
export function presentMember(actor: Actor, membership: LoadedMembership): Member {
  const record = { teamId: membership.teamId };
  return {
    id: membership.id,
    name: membership.person.name,
    email: membership.person.email,
    initials: initialsOf(membership.person.name),
    roles: [...membership.roles],
    active: membership.deactivatedAt === null,
    isYou: membership.id === actor.memberId,
    abilities: {
      changeRoles: can(actor, 'change-roles', record),
      deactivate: can(actor, 'deactivate', record),
    },
  };
}
