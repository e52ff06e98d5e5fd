import { createHash } from 'node:crypto';
import type { Layout } from '@/server/models/layout';
import type { Membership } from '@/server/models/membership';
import { Revision } from '@/server/models/revision';
import { RevisionEvent } from '@/server/models/revision-event';
import { Task } from '@/server/models/task';
import type { Team } from '@/server/models/team';
import type { Role } from '@/shared/api/fields';
import {
  frozenRevisionListSchema,
  revisionDetailSchema,
  revisionListSchema,
  revisionSchema,
} from '@/shared/api/revisions';
import { createEstimator } from '@/shared/estimate/estimate';
import type { PairResult } from '@/shared/estimate/estimate-result';
import { createId } from '@/shared/ids';
import { DEMO_JOBS } from '@/shared/layout/demo/demo-jobs';
import type { LayoutDocument } from '@/shared/layout/document';
import { canonicalJson, revisionHash } from '@/shared/layout/revision-hash';
import { buildLayout, buildMember, buildRevision, buildTeam, TEST_PASSWORD } from '../../support/factories';
import { startTestServer, type TestAgent, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({ limits: { attemptsPerAccount: 4 } });
});
afterEach(async () => {
  server.outbox.length = 0;
  await Task.destroy({ where: {} });
});
afterAll(() => server.stop());

interface Workshop {
  readonly team: Team;
  readonly layout: Layout;
  readonly integrator: Membership;
  readonly approver: Membership;
  readonly asIntegrator: TestAgent;
  readonly asApprover: TestAgent;
}

/** The patrol van of the demo: its radios make pairs. */
const VAN = DEMO_JOBS[0]!.platforms[0]!.layouts[0]!.document;

async function buildWorkshop(document?: LayoutDocument): Promise<Workshop> {
  const team = await buildTeam();
  const integrator = await buildMember(['integrator'], { team });
  const approver = await buildMember(['approver'], { team });
  const { layout } = await buildLayout(team, document && { document });
  const [asIntegrator, asApprover] = [await server.signIn(integrator), await server.signIn(approver)];
  return { team, layout, integrator, approver, asIntegrator, asApprover };
}

async function signInAs(team: Team, ...roles: Role[]) {
  const member = await buildMember(roles, { team });
  return { member, agent: await server.signIn(member) };
}

async function save(agent: TestAgent, layout: Layout, note = '') {
  const response = await agent.post(`/api/layouts/${layout.id}/revisions`).send({ note });
  expect(response.status).toBe(201);
  return revisionSchema.parse(response.body);
}

function freeze(agent: TestAgent, id: string, body: object = {}) {
  return agent
    .post(`/api/revisions/${id}/freeze`)
    .send({ reason: 'Agreed with the driver.', password: TEST_PASSWORD, ...body });
}

async function readKinds(revisionId: string): Promise<string[]> {
  const events = await RevisionEvent.findAll({ where: { revisionId }, order: ['id'] });
  return events.map(({ kind }) => kind);
}

async function listMails(): Promise<{ to: string; subject: string; text: string }[]> {
  const tasks = await Task.findAll({ where: { kind: 'mail' } });
  return tasks.map(({ payload }) => JSON.parse(payload) as { to: string; subject: string; text: string });
}

/** The answer to a pair; a millionth of a decibel, because what was computed before may change the last digits. */
function describePair({ from, into, state, isolationDb, marginDb }: PairResult) {
  return [from, into, state, isolationDb?.toFixed(6), marginDb?.toFixed(6)];
}

test('a revision takes the next letter and keeps the document, the estimate and the hash of both', async () => {
  const { layout, asIntegrator } = await buildWorkshop(VAN);
  const note = '<b>As</b> discussed\non Tuesday';
  const revision = await save(asIntegrator, layout, note);
  expect(revision).toMatchObject({
    letter: 'A',
    state: 'saved',
    note,
    sequence: 0,
    abilities: { submit: true, return: false, freeze: false, comment: true },
  });
  const detail = revisionDetailSchema.parse((await asIntegrator.get(`/api/revisions/${revision.id}`)).body);
  expect(detail).toMatchObject({
    job: 'Patrol van',
    platform: 'Roof',
    layout: 'Layout 1',
    hash: revision.hash,
  });
  expect(detail.document).toEqual(VAN);
  const own = createEstimator().estimate(VAN);
  expect(own.pairs.length).toBeGreaterThan(0);
  expect(detail.results.pairs.map(describePair)).toEqual(own.pairs.map(describePair));
  expect(detail.solverVersion).toBe(own.solverVersion);
  const row = await Revision.findByPk(revision.id, { rejectOnEmpty: true });
  const content = {
    layoutId: layout.id,
    letter: 'A',
    document: detail.document,
    results: detail.results,
    solverVersion: detail.solverVersion,
  };
  expect(row.content).toBe(canonicalJson(content));
  expect(createHash('sha256').update(row.content, 'utf8').digest('hex')).toBe(row.hash);
  expect(revisionHash(content)).toBe(row.hash);
  const next = await save(asIntegrator, layout);
  expect(next.letter).toBe('B');
  expect(next.hash).not.toBe(revision.hash);
});

test('letters have no gap and none is given twice, also when several save at once', async () => {
  const { layout, asIntegrator } = await buildWorkshop();
  const saved = await Promise.all([1, 2, 3, 4].map(() => save(asIntegrator, layout)));
  expect(saved.map(({ letter }) => letter).sort()).toEqual(['A', 'B', 'C', 'D']);
});

test('a revision goes into review, is returned with a reason, and the next one is frozen', async () => {
  const { layout, integrator, approver, asIntegrator, asApprover } = await buildWorkshop();
  const first = await save(asIntegrator, layout);
  const submitted = revisionSchema.parse((await asIntegrator.post(`/api/revisions/${first.id}/submit`)).body);
  expect(submitted).toMatchObject({ state: 'in review', abilities: { submit: false, freeze: false } });
  const [asked] = await listMails();
  expect(asked).toMatchObject({
    to: approver.person!.email,
    subject: 'Revision A of Patrol van, Layout 1 is in review',
  });
  expect(asked?.text).toContain(`${server.url}/r/${first.id}`);
  await Task.destroy({ where: {} });
  const seen = revisionDetailSchema.parse((await asApprover.get(`/api/revisions/${first.id}`)).body);
  expect(seen.abilities).toEqual({ submit: false, return: true, freeze: true, comment: true });
  const reason = 'A2 stands in the way of the hatch.';
  const returned = await asApprover.post(`/api/revisions/${first.id}/return`).send({ reason });
  expect(revisionSchema.parse(returned.body)).toMatchObject({ state: 'returned' });
  expect(returned.body.events.at(-1)).toMatchObject({ kind: 'returned', by: approver.person!.name, reason });
  const [told] = await listMails();
  expect(told?.to).toBe(integrator.person!.email);
  expect(told?.text).toContain(reason);
  await Task.destroy({ where: {} });
  const second = await save(asIntegrator, layout);
  await asIntegrator.post(`/api/revisions/${second.id}/submit`);
  const frozen = await freeze(asApprover, second.id);
  expect(frozen.status).toBe(200);
  expect(revisionSchema.parse(frozen.body)).toMatchObject({
    letter: 'B',
    state: 'frozen',
    hash: second.hash,
    abilities: { submit: false, return: false, freeze: false, comment: true },
  });
  expect(await readKinds(first.id)).toEqual(['saved', 'submitted', 'returned']);
  expect(await readKinds(second.id)).toEqual(['saved', 'submitted', 'frozen']);
  expect((await listMails()).map(({ to, subject }) => [to, subject]).sort()).toEqual(
    [
      [approver.person!.email, 'Revision B of Patrol van, Layout 1 is in review'],
      [integrator.person!.email, 'Revision B of Patrol van, Layout 1 is frozen'],
    ].sort(),
  );
});

test('freezing the next revision supersedes the one before; an earlier one is not frozen after it', async () => {
  const { layout, integrator, asApprover } = await buildWorkshop();
  const [a, b, c] = [
    await buildRevision(server, layout, integrator, ['submitted']),
    await buildRevision(server, layout, integrator, ['submitted']),
    await buildRevision(server, layout, integrator, ['submitted']),
  ];
  expect((await freeze(asApprover, a.id)).status).toBe(200);
  expect((await freeze(asApprover, c.id)).status).toBe(200);
  const late = await freeze(asApprover, b.id);
  expect([late.status, late.body.code]).toEqual([409, 'wrong-state']);
  expect(await readKinds(a.id)).toEqual(['saved', 'submitted', 'frozen', 'superseded']);
  expect(await readKinds(b.id)).toEqual(['saved', 'submitted']);
  const list = revisionListSchema.parse((await asApprover.get(`/api/layouts/${layout.id}/revisions`)).body);
  expect(list.items.map(({ letter, state }) => [letter, state])).toEqual([
    ['C', 'frozen'],
    ['B', 'in review'],
    ['A', 'superseded'],
  ]);
});

test('a wrong password freezes nothing, and guesses are limited for the person alone', async () => {
  const { team, layout, integrator, asApprover } = await buildWorkshop();
  const revision = await buildRevision(server, layout, integrator, ['submitted']);
  const answers = [];
  for (let count = 0; count < 5; count += 1)
    answers.push(await freeze(asApprover, revision.id, { password: 'guess' }));
  expect(answers.map(({ status }) => status)).toEqual([403, 403, 403, 403, 429]);
  expect(answers[0]?.body).toMatchObject({ code: 'wrong-password', problems: [{ path: 'password' }] });
  expect(await readKinds(revision.id)).toEqual(['saved', 'submitted']);
  expect(await Task.count()).toBe(0);
  const other = await signInAs(team, 'approver');
  expect((await freeze(other.agent, revision.id)).status).toBe(200);
});

test('nobody returns or freezes what they submitted, whatever other roles they hold', async () => {
  const { team, layout } = await buildWorkshop();
  const { agent, member } = await signInAs(team, 'administrator', 'integrator', 'approver');
  const revision = await save(agent, layout);
  const submitted = await agent.post(`/api/revisions/${revision.id}/submit`);
  expect(submitted.body.abilities).toMatchObject({ return: false, freeze: false });
  for (const response of [
    await freeze(agent, revision.id),
    await agent.post(`/api/revisions/${revision.id}/return`).send({ reason: 'My own.' }),
  ]) {
    expect([response.status, response.body.code]).toEqual([403, 'own-submission']);
  }
  expect(await readKinds(revision.id)).toEqual(['saved', 'submitted']);
  const mails = await listMails();
  expect(mails.map(({ to }) => to)).not.toContain(member.person!.email);
  const other = await signInAs(team, 'integrator', 'approver');
  expect((await freeze(other.agent, revision.id)).status).toBe(200);
});

test('two approvers who decide at once make one decision', async () => {
  const { team, layout, integrator, asApprover } = await buildWorkshop();
  const revision = await buildRevision(server, layout, integrator, ['submitted']);
  const other = await signInAs(team, 'approver');
  const [frozen, returned] = await Promise.all([
    freeze(asApprover, revision.id),
    other.agent.post(`/api/revisions/${revision.id}/return`).send({ reason: 'Not yet.' }),
  ]);
  expect([frozen.status, returned.status].sort()).toEqual([200, 409]);
  expect(await readKinds(revision.id)).toEqual([
    'saved',
    'submitted',
    frozen.status === 200 ? 'frozen' : 'returned',
  ]);
});

test('each step has the state that it starts from', async () => {
  const { layout, integrator, asIntegrator, asApprover } = await buildWorkshop();
  const saved = await buildRevision(server, layout, integrator);
  const returned = await buildRevision(server, layout, integrator, ['submitted', 'returned']);
  const frozen = await buildRevision(server, layout, integrator, ['submitted', 'frozen']);
  const reason = { reason: 'Because.' };
  for (const response of [
    await freeze(asApprover, saved.id),
    await asApprover.post(`/api/revisions/${saved.id}/return`).send(reason),
    await asIntegrator.post(`/api/revisions/${returned.id}/submit`),
    await freeze(asApprover, returned.id),
    await asIntegrator.post(`/api/revisions/${frozen.id}/submit`),
    await asApprover.post(`/api/revisions/${frozen.id}/return`).send(reason),
  ]) {
    expect([response.status, response.body.code]).toEqual([409, 'wrong-state']);
  }
  expect(await readKinds(frozen.id)).toEqual(['saved', 'submitted', 'frozen']);
});

test.each([
  ['freeze', { reason: ' ' }, 'reason'],
  ['freeze', { reason: 'r'.repeat(1001) }, 'reason'],
  ['freeze', { password: '' }, 'password'],
  ['freeze', { password: 12 }, 'password'],
  ['freeze', { meaning: 'x' }, 'meaning'],
  ['return', { reason: '' }, 'reason'],
  ['return', { reason: null }, 'reason'],
])('%s with %j is refused with its path', async (step, body, path) => {
  const { layout, integrator, asApprover } = await buildWorkshop();
  const revision = await buildRevision(server, layout, integrator, ['submitted']);
  const whole = step === 'freeze' ? { reason: 'Agreed.', password: TEST_PASSWORD } : { reason: 'Not yet.' };
  const response = await asApprover.post(`/api/revisions/${revision.id}/${step}`).send({ ...whole, ...body });
  expect([response.status, response.body.code]).toEqual([400, 'invalid']);
  expect(response.body.problems[0].path).toBe(path);
  expect(await readKinds(revision.id)).toEqual(['saved', 'submitted']);
});

test('a note that does not hold is refused with its path and takes no letter', async () => {
  const { layout, asIntegrator } = await buildWorkshop();
  for (const note of ['n'.repeat(1001), '\u0000', 7]) {
    const response = await asIntegrator.post(`/api/layouts/${layout.id}/revisions`).send({ note });
    expect([response.status, response.body.problems[0].path]).toEqual([400, 'note']);
  }
  expect((await save(asIntegrator, layout)).letter).toBe('A');
});

test('a revision is not changed by what happens to its layout afterwards', async () => {
  const { layout, integrator, asIntegrator } = await buildWorkshop();
  const revision = await save(asIntegrator, layout);
  const read = async () =>
    revisionDetailSchema.parse((await asIntegrator.get(`/api/revisions/${revision.id}`)).body);
  const before = await read();
  const [antenna] = Object.keys(before.document.antennas);
  const writer = await server.services.live.open(layout.id);
  const removal = { kind: 'remove', collection: 'antennas', id: antenna! } as const;
  const answer = await writer.submit(
    { id: createId(), version: 1, changes: [removal] },
    { id: integrator.id, name: 'Ina Integrator' },
  );
  expect(answer).toEqual({ ok: true, value: 1 });
  await asIntegrator.patch(`/api/layouts/${layout.id}`).send({ name: 'Second try' });
  expect(await read()).toEqual(before);
  expect((await save(asIntegrator, layout)).sequence).toBe(1);
});

test('frozen revisions of the team are listed newest first in pages, without the superseded ones', async () => {
  const { team, layout, integrator, asIntegrator, asApprover } = await buildWorkshop();
  await buildRevision(server, layout, integrator, ['submitted', 'frozen', 'superseded']);
  const ids: string[] = [];
  for (let count = 0; count < 3; count += 1) {
    const other = await buildLayout(team);
    const revision = await buildRevision(server, other.layout, integrator, ['submitted']);
    await freeze(asApprover, revision.id);
    ids.unshift(revision.id);
  }
  const installer = await signInAs(team, 'installer');
  for (const agent of [asIntegrator, installer.agent]) {
    const first = frozenRevisionListSchema.parse(
      (await agent.get('/api/revisions').query({ limit: 2 })).body,
    );
    expect(first.items.map(({ id }) => id)).toEqual(ids.slice(0, 2));
    const rest = await agent.get('/api/revisions').query({ limit: 2, cursor: first.next });
    expect(frozenRevisionListSchema.parse(rest.body)).toMatchObject({ items: [{ id: ids[2] }], next: null });
  }
  const refused = await asIntegrator.get('/api/revisions').query({ cursor: 'nonsense' });
  expect([refused.status, refused.body.problems[0].path]).toEqual([400, 'cursor']);
});

test('an installer sees what was frozen, also once it is superseded, and nothing else', async () => {
  const { team, layout, integrator } = await buildWorkshop();
  const superseded = await buildRevision(server, layout, integrator, ['submitted', 'frozen', 'superseded']);
  const frozen = await buildRevision(server, layout, integrator, ['submitted', 'frozen']);
  const returned = await buildRevision(server, layout, integrator, ['submitted', 'returned']);
  const { agent } = await signInAs(team, 'installer');
  const statuses = [];
  for (const { id } of [superseded, frozen, returned])
    statuses.push((await agent.get(`/api/revisions/${id}`)).status);
  expect(statuses).toEqual([200, 200, 404]);
  const list = revisionListSchema.parse((await agent.get(`/api/layouts/${layout.id}/revisions`)).body);
  expect(list.items.map(({ letter }) => letter)).toEqual(['B', 'A']);
  const detail = revisionDetailSchema.parse((await agent.get(`/api/revisions/${frozen.id}`)).body);
  expect(detail.abilities).toEqual({ submit: false, return: false, freeze: false, comment: true });
});
