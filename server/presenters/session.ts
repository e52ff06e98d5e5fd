import type { SignedIn } from '../auth/signed-in';
import { can } from '../policies/policy';
import type { Session } from '@/shared/api/session';
import { initialsOf } from './person';

/** Who is signed in, as the client sees it. */
export function presentSession(
  { actor, person, membership, memberships }: SignedIn,
  demoOn: boolean,
): Session {
  const record = { teamId: actor.teamId };
  const demo = demoOn && membership.team.demo;
  return {
    person: { id: person.id, name: person.name, email: person.email },
    member: {
      id: membership.id,
      name: person.name,
      initials: initialsOf(person.name),
      roles: [...membership.roles],
    },
    team: { id: membership.team.id, name: membership.team.name },
    teams: memberships.map(({ team }) => ({ id: team.id, name: team.name })),
    demo,
    abilities: {
      seeJobs: can(actor, 'see-jobs', record),
      createJob: can(actor, 'edit-jobs', record),
      editParts: can(actor, 'edit-parts', record),
      administer: can(actor, 'invite', record),
      seeMails: can(actor, 'see-mails', { ...record, demo }),
    },
  };
}
