import { Op } from 'sequelize';
import { CommentRow } from '@/server/models/comment-row';
import type { Layout } from '@/server/models/layout';
import type { Membership } from '@/server/models/membership';
import { OperationRow } from '@/server/models/operation-row';
import { Task } from '@/server/models/task';
import type { Team } from '@/server/models/team';
import { commentListSchema, commentSchema, type Comment } from '@/shared/api/comments';
import { createId } from '@/shared/ids';
import { buildLayout, buildMember, buildRevision, buildTeam } from '../../support/factories';
import { startTestServer, type TestAgent, type TestServer } from '../../support/test-server';
import { vanRoof } from '../../support/van-roof';

const SPOT = { kind: 'spot', x: 1.25, y: -0.3 } as const;
const [A1] = Object.values(vanRoof().antennas);
const ANTENNA = { kind: 'antenna', antennaId: A1!.id, label: A1!.label } as const;

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterEach(async () => {
  server.outbox.length = 0;
  jest.restoreAllMocks();
  await Task.destroy({ where: {} });
});
afterAll(() => server.stop());

interface Workshop {
  readonly team: Team;
  readonly layout: Layout;
  readonly integrator: Membership;
  readonly reviewer: Membership;
  readonly asIntegrator: TestAgent;
  readonly asReviewer: TestAgent;
}

/** A layout that the integrator worked on. */
async function buildWorkshop(): Promise<Workshop> {
  const team = await buildTeam();
  const integrator = await buildMember(['integrator'], { team });
  const reviewer = await buildMember(['reviewer'], { team });
  const { layout } = await buildLayout(team);
  await OperationRow.create({
    layoutId: layout.id,
    sequence: 1,
    id: createId(),
    memberId: integrator.id,
    memberName: 'Ina Integrator',
    version: 1,
    changes: '[]',
    committedAt: new Date(),
  });
  const [asIntegrator, asReviewer] = [await server.signIn(integrator), await server.signIn(reviewer)];
  return { team, layout, integrator, reviewer, asIntegrator, asReviewer };
}

async function comment(agent: TestAgent, address: string, body: object = {}): Promise<Comment> {
  const response = await agent
    .post(address)
    .send({ id: createId(), target: SPOT, text: 'Does the ladder fit?', ...body });
  expect(response.status).toBe(201);
  return commentSchema.parse(response.body);
}

async function reply(agent: TestAgent, id: string, text: string): Promise<Comment> {
  const response = await agent.post(`/api/comments/${id}/replies`).send({ id: createId(), text });
  expect(response.status).toBe(201);
  return commentSchema.parse(response.body);
}

/** To whom mail is to be sent, from the rows of the queue. */
async function listAddressees(): Promise<string[]> {
  const tasks = await Task.findAll({ where: { kind: 'mail' } });
  return tasks.map(({ payload }) => (JSON.parse(payload) as { to: string }).to).sort();
}

function emailsOf(...members: readonly Membership[]): string[] {
  return members.map(({ person }) => person!.email).sort();
}

test('comments on a spot and on an antenna are numbered per layout and listed with their threads', async () => {
  const { layout, asIntegrator, asReviewer } = await buildWorkshop();
  const address = `/api/layouts/${layout.id}/comments`;
  const text = '<script>alert(1)</script>\nand a second line \u{1F4E1}';
  const first = await comment(asReviewer, address, { text: `  ${text} ` });
  const second = await comment(asIntegrator, address, { target: ANTENNA });
  expect(first).toMatchObject({ number: 1, target: SPOT, text, revisionId: null, resolvedAt: null });
  expect(second).toMatchObject({ number: 2, target: ANTENNA, abilities: { reply: true, resolve: true } });
  await reply(asIntegrator, first.id, 'It does.');
  await reply(asReviewer, first.id, 'Then move it forward.');
  const { items } = commentListSchema.parse((await asIntegrator.get(address)).body);
  expect(items.map(({ number }) => number)).toEqual([1, 2]);
  expect(items[0]?.replies.map((one) => one.text)).toEqual(['It does.', 'Then move it forward.']);
});

test('comments made at once get numbers without a gap', async () => {
  const { layout, asIntegrator, asReviewer } = await buildWorkshop();
  const address = `/api/layouts/${layout.id}/comments`;
  const agents = Array.from({ length: 10 }, (_, index) => (index % 2 === 0 ? asIntegrator : asReviewer));
  const made = await Promise.all(agents.map((agent) => comment(agent, address)));
  expect(made.map(({ number }) => number).sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
});

test('a comment is resolved, with who and when, and opened again', async () => {
  const { layout, asIntegrator, asReviewer } = await buildWorkshop();
  const { id } = await comment(asReviewer, `/api/layouts/${layout.id}/comments`);
  const address = `/api/comments/${id}`;
  const resolved = commentSchema.parse((await asIntegrator.patch(address).send({ resolved: true })).body);
  expect(resolved.resolvedBy).toMatch(/^Person /);
  expect(resolved.resolvedAt).not.toBeNull();
  const again = commentSchema.parse((await asReviewer.patch(address).send({ resolved: true })).body);
  expect([again.resolvedBy, again.resolvedAt]).toEqual([resolved.resolvedBy, resolved.resolvedAt]);
  const opened = commentSchema.parse((await asReviewer.patch(address).send({ resolved: false })).body);
  expect([opened.resolvedBy, opened.resolvedAt]).toEqual([null, null]);
});

test('a second arrival of a comment or an answer changes nothing and writes no second mail', async () => {
  const { layout, integrator, asIntegrator, asReviewer } = await buildWorkshop();
  const address = `/api/layouts/${layout.id}/comments`;
  const body = { id: createId(), target: SPOT, text: 'Once.' };
  const answers = await Promise.all([1, 2, 3].map(() => asReviewer.post(address).send(body)));
  expect(answers.map(({ status }) => status)).toEqual([201, 201, 201]);
  expect(answers.map((response) => response.body.number)).toEqual([1, 1, 1]);
  const answer = { id: createId(), text: 'Once as well.' };
  for (let count = 0; count < 2; count += 1) {
    const response = await asReviewer.post(`/api/comments/${body.id}/replies`).send(answer);
    expect(commentSchema.parse(response.body).replies).toHaveLength(1);
  }
  expect(await CommentRow.count({ where: { layoutId: layout.id } })).toBe(1);
  expect(await listAddressees()).toEqual([...emailsOf(integrator), ...emailsOf(integrator)]);
  const taken = await asIntegrator.post(address).send({ ...body, id: createId() });
  const misused = await asIntegrator.post(`/api/comments/${taken.body.id}/replies`).send(answer);
  expect([misused.status, misused.body.problems[0].path]).toEqual([409, 'id']);
});

test.each([
  ['no text', { text: '  ' }, 'text'],
  ['a long text', { text: 't'.repeat(1001) }, 'text'],
  ['a bell in the text', { text: '\u0007' }, 'text'],
  ['no identifier', { id: 'x' }, 'id'],
  ['a target of an unknown kind', { target: { kind: 'cloud' } }, 'target.kind'],
  ['a spot beside the world', { target: { kind: 'spot', x: 1e6, y: 0 } }, 'target.x'],
  ['a spot in words', { target: { kind: 'spot', x: 'left', y: 0 } }, 'target.x'],
  ['an antenna that does not exist', { target: { ...ANTENNA, antennaId: createId() } }, 'target.antennaId'],
  [
    'an antenna called like a method',
    { target: { ...ANTENNA, antennaId: 'constructor' } },
    'target.antennaId',
  ],
  ['a field that nobody knows', { number: 7 }, 'number'],
])('%s is refused with its path, on a layout as on a revision', async (_case, body, path) => {
  const { layout, integrator, asReviewer } = await buildWorkshop();
  const revision = await buildRevision(server, layout, integrator);
  for (const address of [`/api/layouts/${layout.id}/comments`, `/api/revisions/${revision.id}/comments`]) {
    const response = await asReviewer
      .post(address)
      .send({ id: createId(), target: SPOT, text: 'Does it fit?', ...body });
    expect([response.status, response.body.code]).toEqual([400, 'invalid']);
    expect(response.body.problems.map((problem: { path: string }) => problem.path)).toContain(path);
  }
  expect(await CommentRow.count({ where: { layoutId: layout.id } })).toBe(0);
  expect(await Task.count()).toBe(0);
});

test('an answer without text and a resolution without an answer are refused with their paths', async () => {
  const { layout, asReviewer } = await buildWorkshop();
  const { id } = await comment(asReviewer, `/api/layouts/${layout.id}/comments`);
  const answer = await asReviewer.post(`/api/comments/${id}/replies`).send({ id: createId(), text: '' });
  expect([answer.status, answer.body.problems[0].path]).toEqual([400, 'text']);
  const resolution = await asReviewer.patch(`/api/comments/${id}`).send({ resolved: 1 });
  expect([resolution.status, resolution.body.problems[0].path]).toEqual([400, 'resolved']);
});

test('those concerned get a message: who works on the layout and who speaks in the thread, never oneself', async () => {
  const { team, layout, integrator, reviewer, asIntegrator, asReviewer } = await buildWorkshop();
  const approver = await buildMember(['approver'], { team });
  const left = await buildMember(['reviewer'], { team });
  const asApprover = await server.signIn(approver);
  const asLeft = await server.signIn(left);
  const { id } = await comment(asReviewer, `/api/layouts/${layout.id}/comments`, { target: ANTENNA });
  expect(await listAddressees()).toEqual(emailsOf(integrator));
  await Task.destroy({ where: {} });
  await reply(asLeft, id, 'Ask the workshop.');
  await left.update({ deactivatedAt: new Date() });
  await Task.destroy({ where: {} });
  await reply(asApprover, id, 'I will.');
  expect(await listAddressees()).toEqual(emailsOf(integrator, reviewer));
  await Task.destroy({ where: {} });
  await reply(asIntegrator, id, 'Done.');
  expect(await listAddressees()).toEqual(emailsOf(reviewer, approver));
  await server.performTasks();
  const [mail] = server.outbox;
  expect(mail?.subject).toBe('Comment 1 on Patrol van, Layout 1');
  expect(mail?.text).toContain('answered comment 1 on A1, Patrol van, Roof, Layout 1:\n\nDone.');
  expect(mail?.text).toContain(`${server.url}/layouts/${layout.id}`);
});

test('a message is kept together with its comment, or neither', async () => {
  const { layout, asReviewer } = await buildWorkshop();
  jest.spyOn(Task, 'create').mockRejectedValueOnce(new Error('the queue is full'));
  const response = await asReviewer
    .post(`/api/layouts/${layout.id}/comments`)
    .send({ id: createId(), target: SPOT, text: 'Lost?' });
  expect(response.status).toBe(500);
  expect(await CommentRow.count({ where: { layoutId: layout.id } })).toBe(0);
  expect(await Task.count()).toBe(0);
  const next = await comment(asReviewer, `/api/layouts/${layout.id}/comments`);
  expect(next.number).toBe(1);
});

test('a message that cannot be sent waits and is sent once when it can', async () => {
  const { layout, integrator, asReviewer } = await buildWorkshop();
  const send = jest.spyOn(server.services.mailer, 'send').mockRejectedValue(new Error('no server there'));
  await comment(asReviewer, `/api/layouts/${layout.id}/comments`);
  await server.performTasks();
  const [task] = await Task.findAll();
  expect(task).toMatchObject({ state: 'waiting', attempts: 1, problem: 'no server there' });
  send.mockRestore();
  await task!.update({ runAt: new Date(0) });
  await server.performTasks();
  await server.performTasks();
  expect(server.outbox.map(({ to }) => to)).toEqual(emailsOf(integrator));
  expect(await Task.count({ where: { state: { [Op.ne]: 'done' } } })).toBe(0);
});

test('comments on a revision stay with it, in the numbers of its layout', async () => {
  const { team, layout, integrator, asReviewer } = await buildWorkshop();
  const revision = await buildRevision(server, layout, integrator, ['submitted', 'frozen']);
  const installer = await buildMember(['installer'], { team });
  const asInstaller = await server.signIn(installer);
  const onLayout = await comment(asReviewer, `/api/layouts/${layout.id}/comments`);
  await Task.destroy({ where: {} });
  const made = await comment(asInstaller, `/api/revisions/${revision.id}/comments`, { target: ANTENNA });
  expect(made).toMatchObject({ number: 2, revisionId: revision.id, layoutId: layout.id });
  expect(await listAddressees()).toEqual(emailsOf(integrator));
  const list = commentListSchema.parse(
    (await asInstaller.get(`/api/revisions/${revision.id}/comments`)).body,
  );
  expect(list.items.map(({ id }) => id)).toEqual([made.id]);
  await Task.destroy({ where: {} });
  await reply(asReviewer, made.id, 'Use the other hole.');
  expect(await listAddressees()).toEqual(emailsOf(integrator, installer));
  await server.performTasks();
  expect(server.outbox[0]?.text).toContain(`${server.url}/r/${revision.id}`);
  // What an installer may not see of the layout is not theirs to answer either.
  const hidden = await asInstaller
    .post(`/api/comments/${onLayout.id}/replies`)
    .send({ id: createId(), text: 'Hello?' });
  expect(hidden.status).toBe(404);
});

test('watchers hear of a comment, an answer and a resolution, once each', async () => {
  const { layout, asReviewer } = await buildWorkshop();
  const heard: string[] = [];
  const stop = server.services.live.onEvent((event) => {
    if (event.kind === 'comment' && event.layoutId === layout.id) heard.push(event.kind);
  });
  const address = `/api/layouts/${layout.id}/comments`;
  const body = { id: createId() };
  await comment(asReviewer, address, body);
  await comment(asReviewer, address, body);
  await reply(asReviewer, body.id, 'Yes.');
  await asReviewer.patch(`/api/comments/${body.id}`).send({ resolved: true });
  stop();
  expect(heard).toEqual(['comment', 'comment', 'comment']);
});
