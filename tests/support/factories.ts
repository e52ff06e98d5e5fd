import { hashSync } from 'bcryptjs';
import { Membership } from '@/server/models/membership';
import { Person } from '@/server/models/person';
import { Team } from '@/server/models/team';
import type { Role } from '@/shared/api/fields';
import { createId } from '@/shared/ids';

/** The password of everybody that a factory makes. */
export const TEST_PASSWORD = 'a password of tests';
// The lowest cost that bcrypt takes: tests sign in often.
const TEST_PASSWORD_HASH = hashSync(TEST_PASSWORD, 4);

/** A team with a name of its own. */
export function buildTeam(overrides: Partial<{ name: string; demo: boolean }> = {}): Promise<Team> {
  return Team.create({ name: `Team ${createId().slice(0, 6)}`, ...overrides });
}

/** A person with an address of their own. */
export function buildPerson(overrides: Partial<{ name: string; email: string }> = {}): Promise<Person> {
  const tag = createId().slice(0, 10);
  return Person.create({
    name: `Person ${tag}`,
    email: `${tag}@example.com`,
    passwordHash: TEST_PASSWORD_HASH,
    ...overrides,
  });
}

/** A member with these roles, in a team and with a person made for them when none is given. */
export async function buildMember(
  roles: readonly Role[],
  overrides: Partial<{ team: Team; person: Person; deactivatedAt: Date }> = {},
): Promise<Membership> {
  const team = overrides.team ?? (await buildTeam());
  const person = overrides.person ?? (await buildPerson());
  const membership = await Membership.create({
    teamId: team.id,
    personId: person.id,
    roles,
    deactivatedAt: overrides.deactivatedAt ?? null,
  });
  return Object.assign(membership, { team, person });
}
