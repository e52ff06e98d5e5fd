import { hashSync } from 'bcryptjs';
import { findSignedIn } from '@/server/auth/signed-in';
import { saveRevision } from '@/server/commands/save-revision';
import { encodeDocument } from '@/server/models/document-codec';
import { Job } from '@/server/models/job';
import { Layout } from '@/server/models/layout';
import { Membership } from '@/server/models/membership';
import { Part } from '@/server/models/part';
import { encodePart, nameOfPart } from '@/server/models/part-codec';
import { Person } from '@/server/models/person';
import { Platform } from '@/server/models/platform';
import type { Revision } from '@/server/models/revision';
import { RevisionEvent, type RevisionEventKind } from '@/server/models/revision-event';
import { Team } from '@/server/models/team';
import type { Role } from '@/shared/api/fields';
import type { PartContent } from '@/shared/api/parts';
import { createId } from '@/shared/ids';
import type { LayoutDocument } from '@/shared/layout/document';
import { estimateByDistance } from './distance-estimator';
import type { TestServer } from './test-server';
import { vanRoof, WHIP } from './van-roof';

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

/** A job of a team. */
export function buildJob(
  team: Team,
  overrides: Partial<{ name: string; customer: string; archivedAt: Date | null; updatedAt: Date }> = {},
): Promise<Job> {
  return Job.create(
    {
      teamId: team.id,
      name: 'Patrol van',
      customer: 'Harbour',
      createdAt: new Date(),
      updatedAt: new Date(),
      ...overrides,
    },
    { silent: true },
  );
}

/** A layout with the platform and the job that it is in: a van's roof with three whips. */
export async function buildLayout(
  team: Team,
  overrides: Partial<{ job: Job; name: string; document: LayoutDocument }> = {},
): Promise<{ readonly job: Job; readonly platform: Platform; readonly layout: Layout }> {
  const job = overrides.job ?? (await buildJob(team));
  const document = encodeDocument(overrides.document ?? vanRoof());
  const teamId = team.id;
  const platform = await Platform.create({ teamId, jobId: job.id, name: 'Roof', kind: 'vehicle', document });
  const layout = await Layout.create({
    teamId,
    platformId: platform.id,
    name: overrides.name ?? 'Layout 1',
    document,
  });
  return { job, platform, layout };
}

/** A part on a team's shelf: a whip, unless something else is given. */
export function buildPart(
  team: Team,
  content: PartContent = { kind: 'antenna', antenna: WHIP },
): Promise<Part> {
  return Part.create({
    teamId: team.id,
    kind: content.kind,
    name: nameOfPart(content),
    content: encodePart(content),
  });
}

/**
 * The next revision of a layout, saved and led through these events by a member. Its estimate is a stand-in;
 * what the product itself computes is looked at where revisions are saved through the interface.
 */
export async function buildRevision(
  server: TestServer,
  layout: Layout,
  by: Membership,
  events: readonly Exclude<RevisionEventKind, 'saved'>[] = [],
): Promise<Revision> {
  const signedIn = await findSignedIn(by.personId, by.teamId);
  if (signedIn === undefined) throw new Error('the member of the revision is not active');
  const document = vanRoof();
  const revision = await saveRevision(server.services, signedIn, layout.id, {
    state: { document, sequence: 0 },
    results: estimateByDistance(document),
    note: '',
    names: { job: 'Patrol van', platform: 'Roof', layout: layout.name },
  });
  for (const kind of events) {
    await RevisionEvent.create({
      revisionId: revision.id,
      kind,
      memberId: by.id,
      memberName: signedIn.person.name,
      at: new Date(),
    });
  }
  return revision;
}
