import { AuditEntry } from '@/server/models/audit-entry';
import { Membership } from '@/server/models/membership';
import { memberListSchema, memberSchema } from '@/shared/api/session';
import { createId } from '@/shared/ids';
import { buildMember, buildTeam } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function buildPair() {
  const team = await buildTeam();
  const administrator = await buildMember(['administrator'], { team });
  const member = await buildMember(['integrator'], { team });
  return { team, administrator, member, agent: await server.signIn(administrator) };
}

test('members list the people of their own team, with what one may do to each', async () => {
  const { administrator, member, agent } = await buildPair();
  await buildMember(['integrator']);
  const response = await agent.get('/api/members');
  expect(response.status).toBe(200);
  const { items } = memberListSchema.parse(response.body);
  expect(items.map(({ id }) => id).sort()).toEqual([administrator.id, member.id].sort());
  expect(items.find(({ isYou }) => isYou)?.id).toBe(administrator.id);
  expect(items.every(({ abilities }) => abilities.changeRoles && abilities.deactivate)).toBe(true);
  const installer = await server.signIn(await buildMember(['installer']));
  const seen = memberListSchema.parse((await installer.get('/api/members')).body);
  expect(seen.items[0]?.abilities).toEqual({ changeRoles: false, deactivate: false });
});

test('the list and the change need somebody signed in', async () => {
  expect((await server.visitor().get('/api/members')).status).toBe(401);
  expect((await server.visitor().patch(`/api/members/${createId()}`).send({ active: false })).status).toBe(
    401,
  );
});

test('an administrator changes roles, which disconnects the member and is written down', async () => {
  const { member, agent } = await buildPair();
  const rooms: string[] = [];
  const stop = server.services.revocation.onRevoke((room) => rooms.push(room));
  const response = await agent.patch(`/api/members/${member.id}`).send({ roles: ['installer', 'reviewer'] });
  stop();
  expect(response.status).toBe(200);
  expect(memberSchema.parse(response.body).roles).toEqual(['reviewer', 'installer']);
  expect(rooms).toContain(`member:${member.id}`);
  const entry = await AuditEntry.findOne({ where: { subjectId: member.id }, rejectOnEmpty: true });
  expect(entry.action).toBe('roles-changed');
  expect(JSON.parse(entry.details)).toEqual({ from: ['integrator'], to: ['reviewer', 'installer'] });
});

test('a deactivated member is out at once, and back when activated again', async () => {
  const { member, agent } = await buildPair();
  const theirs = await server.signIn(member);
  expect((await agent.patch(`/api/members/${member.id}`).send({ active: false })).body.active).toBe(false);
  expect((await theirs.get('/api/session')).status).toBe(401);
  expect((await agent.patch(`/api/members/${member.id}`).send({ active: true })).body.active).toBe(true);
  expect((await theirs.get('/api/session')).status).toBe(200);
});

test.each([
  ['demoted', { roles: ['integrator'] }],
  ['deactivated', { active: false }],
])('the last administrator is not %s', async (_case, change) => {
  const { team, administrator, agent } = await buildPair();
  await buildMember(['administrator'], { team, deactivatedAt: new Date() });
  const response = await agent.patch(`/api/members/${administrator.id}`).send(change);
  expect(response.status).toBe(409);
  expect(response.body.code).toBe('last-administrator');
  const kept = await Membership.findByPk(administrator.id, { rejectOnEmpty: true });
  expect(kept.roles).toEqual(['administrator']);
  expect(kept.deactivatedAt).toBeNull();
});

test('two administrators who remove each other at once leave one', async () => {
  const team = await buildTeam();
  const [first, second] = [
    await buildMember(['administrator'], { team }),
    await buildMember(['administrator'], { team }),
  ];
  const [agentOfFirst, agentOfSecond] = [await server.signIn(first), await server.signIn(second)];
  await Promise.all([
    agentOfFirst.patch(`/api/members/${second.id}`).send({ active: false }),
    agentOfSecond.patch(`/api/members/${first.id}`).send({ active: false }),
  ]);
  const active = await Membership.count({ where: { teamId: team.id, deactivatedAt: null } });
  expect(active).toBeGreaterThanOrEqual(1);
});

test.each(['integrator', 'reviewer', 'approver', 'installer'] as const)(
  'an %s changes nobody',
  async (role) => {
    const { team, member } = await buildPair();
    const agent = await server.signIn(await buildMember([role], { team }));
    expect((await agent.patch(`/api/members/${member.id}`).send({ roles: ['reviewer'] })).status).toBe(403);
    expect((await agent.patch(`/api/members/${member.id}`).send({ active: false })).status).toBe(403);
  },
);

test('a member of another team is not found', async () => {
  const { agent } = await buildPair();
  const stranger = await buildMember(['integrator']);
  expect((await agent.patch(`/api/members/${stranger.id}`).send({ active: false })).status).toBe(404);
  expect((await agent.patch('/api/members/nonsense').send({ active: false })).status).toBe(404);
});

test.each([
  ['nothing', {}],
  ['no role', { roles: [] }],
  ['an unknown role', { roles: ['owner'] }],
  ['a role twice', { roles: ['reviewer', 'reviewer'] }],
  ['a number', { active: 1 }],
])('a change of %s is refused with its path', async (_case, change) => {
  const { member, agent } = await buildPair();
  const response = await agent.patch(`/api/members/${member.id}`).send(change);
  expect(response.status).toBe(400);
  expect(response.body.problems.length).toBeGreaterThan(0);
});
