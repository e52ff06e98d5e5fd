import { Job } from '@/server/models/job';
import { jobDetailSchema, jobListSchema, jobSchema } from '@/shared/api/jobs';
import { buildJob, buildLayout, buildMember, buildRevision, buildTeam } from '../../support/factories';
import { startTestServer, type TestAgent, type TestServer } from '../../support/test-server';

const SCRIPT = `<script>alert("1")</script> & 'more' \u{1F4E1}`;
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function buildWorkshop() {
  const team = await buildTeam();
  const integrator = await buildMember(['integrator'], { team });
  return { team, integrator, agent: await server.signIn(integrator) };
}

async function listNames(agent: TestAgent, query: Record<string, string> = {}): Promise<string[]> {
  const response = await agent.get('/api/jobs').query(query);
  expect(response.status).toBe(200);
  return jobListSchema.parse(response.body).items.map(({ name }) => name);
}

test('a job is created, renamed, archived and taken back', async () => {
  const { agent } = await buildWorkshop();
  const created = await agent.post('/api/jobs').send({ name: '  Patrol van ', customer: 'Harbour' });
  expect(created.status).toBe(201);
  const job = jobSchema.parse(created.body);
  expect(job).toMatchObject({
    name: 'Patrol van',
    customer: 'Harbour',
    archived: false,
    platformCount: 0,
    abilities: { edit: true },
  });
  const address = `/api/jobs/${job.id}`;
  const renamed = jobSchema.parse((await agent.patch(address).send({ name: 'Van', customer: '' })).body);
  expect(renamed).toMatchObject({ name: 'Van', customer: '' });
  expect(jobSchema.parse((await agent.patch(address).send({ archived: true })).body).archived).toBe(true);
  expect(await listNames(agent)).toEqual([]);
  expect(await listNames(agent, { archived: 'true' })).toEqual(['Van']);
  expect((await agent.get(address)).body).toMatchObject({ name: 'Van', archived: true });
  await agent.patch(address).send({ archived: false });
  expect(await listNames(agent)).toEqual(['Van']);
});

test('a name is text, whatever stands in it, and comes back as it was typed', async () => {
  const { agent } = await buildWorkshop();
  const created = await agent.post('/api/jobs').send({ name: SCRIPT, customer: SCRIPT });
  const read = await agent.get(`/api/jobs/${created.body.id}`);
  expect(read.headers['content-type']).toMatch('application/json');
  expect(jobDetailSchema.parse(read.body)).toMatchObject({ name: SCRIPT, customer: SCRIPT });
  expect(await listNames(agent, { search: '<script>' })).toEqual([SCRIPT]);
});

test.each([
  ['no name', {}, 'name'],
  ['an empty name', { name: '   ' }, 'name'],
  ['a long name', { name: 'n'.repeat(121) }, 'name'],
  ['a name that is a number', { name: 12 }, 'name'],
  ['a name on two lines', { name: 'one\ntwo' }, 'name'],
  ['half a character', { name: 'one \ud83d' }, 'name'],
  ['a long customer', { name: 'Van', customer: 'c'.repeat(121) }, 'customer'],
  ['a customer with a bell in it', { name: 'Van', customer: '\u0007' }, 'customer'],
  ['a field that nobody knows', { name: 'Van', teamId: 'x' }, 'teamId'],
])('%s is refused with its path', async (_case, body, path) => {
  const { team, agent } = await buildWorkshop();
  const response = await agent.post('/api/jobs').send(body);
  expect([response.status, response.body.code]).toEqual([400, 'invalid']);
  expect(response.body.problems.map((problem: { path: string }) => problem.path)).toEqual([path]);
  expect(await Job.count({ where: { teamId: team.id } })).toBe(0);
});

test('a change that does not hold is refused with its path and changes nothing', async () => {
  const { team, agent } = await buildWorkshop();
  const job = await buildJob(team, { name: 'Van' });
  const response = await agent.patch(`/api/jobs/${job.id}`).send({ name: 'Other', archived: 'yes' });
  expect(response.status).toBe(400);
  expect(response.body.problems[0].path).toBe('archived');
  expect((await job.reload()).name).toBe('Van');
});

test('the list comes in pages, newest change first, with nothing twice and nothing left out', async () => {
  const { team, agent } = await buildWorkshop();
  // Three of them changed at the same moment: then the identifier decides.
  const times = [5, 4, 4, 4, 3, 2, 1].map((second) => new Date(Date.UTC(2031, 0, 1, 0, 0, second)));
  for (const [index, updatedAt] of times.entries()) await buildJob(team, { name: `Job ${index}`, updatedAt });
  const seen: string[] = [];
  const moments: string[] = [];
  let cursor: string | null = null;
  do {
    const response = await agent.get('/api/jobs').query({ limit: 2, ...(cursor === null ? {} : { cursor }) });
    const page = jobListSchema.parse(response.body);
    expect(page.items.length).toBeLessThanOrEqual(2);
    seen.push(...page.items.map(({ name }) => name));
    moments.push(...page.items.map(({ updatedAt }) => updatedAt));
    cursor = page.next;
  } while (cursor !== null);
  expect(moments).toEqual(times.map((time) => time.toISOString()));
  expect([...seen].sort()).toEqual(times.map((_time, index) => `Job ${index}`));
});

test('the list is searched by name and customer; signs of the pattern stand for themselves', async () => {
  const { team, agent } = await buildWorkshop();
  await buildJob(team, { name: 'Patrol van', customer: 'Harbour' });
  await buildJob(team, { name: 'Roof, 100% done', customer: 'Office_1' });
  await buildJob(team, { name: 'Roof', customer: 'Officex1' });
  expect(await listNames(agent, { search: 'patrol' })).toEqual(['Patrol van']);
  expect(await listNames(agent, { search: 'HARB' })).toEqual(['Patrol van']);
  expect(await listNames(agent, { search: '%' })).toEqual(['Roof, 100% done']);
  expect(await listNames(agent, { search: 'e_1' })).toEqual(['Roof, 100% done']);
  expect(await listNames(agent, { search: '\\' })).toEqual([]);
  expect((await listNames(agent, { search: '' })).sort()).toEqual(['Patrol van', 'Roof', 'Roof, 100% done']);
});

test.each([
  ['cursor', 'nonsense'],
  ['cursor', Buffer.from('["x","y"]').toString('base64url')],
  ['cursor', Buffer.from('[1e300,"y"]').toString('base64url')],
  ['cursor', 'c'.repeat(2000)],
  ['limit', '0'],
  ['limit', '101'],
  ['limit', 'many'],
  ['archived', 'perhaps'],
  ['search', 's'.repeat(121)],
  ['order', 'name'],
])('the list refuses %s=%s with its path', async (key, value) => {
  const { agent } = await buildWorkshop();
  const response = await agent.get('/api/jobs').query({ [key]: value });
  expect(response.status).toBe(400);
  expect(response.body.problems[0].path).toBe(key);
});

test('a job shows its platforms, their layouts and the revisions of these, newest first', async () => {
  const { team, integrator, agent } = await buildWorkshop();
  const { job, platform, layout } = await buildLayout(team);
  await buildRevision(server, layout, integrator, ['submitted', 'returned']);
  await buildRevision(server, layout, integrator, ['submitted']);
  const detail = jobDetailSchema.parse((await agent.get(`/api/jobs/${job.id}`)).body);
  expect(detail.platformCount).toBe(1);
  expect(detail.platforms).toMatchObject([
    {
      id: platform.id,
      kind: 'vehicle',
      layouts: [{ id: layout.id, name: 'Layout 1', revisions: [{ letter: 'B' }, { letter: 'A' }] }],
    },
  ]);
  expect(detail.platforms[0]?.layouts[0]?.revisions.map(({ state }) => state)).toEqual([
    'in review',
    'returned',
  ]);
});

test('an installer sees the jobs that lead to a frozen revision, and of these no more than that', async () => {
  const { team, integrator } = await buildWorkshop();
  const frozen = await buildLayout(team, { job: await buildJob(team, { name: 'With a frozen one' }) });
  await buildRevision(server, frozen.layout, integrator, ['submitted', 'frozen', 'superseded']);
  await buildRevision(server, frozen.layout, integrator, ['submitted', 'frozen']);
  await buildRevision(server, frozen.layout, integrator, ['submitted']);
  await buildLayout(team, { job: frozen.job });
  const draft = await buildLayout(team, { job: await buildJob(team, { name: 'In review only' }) });
  await buildRevision(server, draft.layout, integrator, ['submitted']);
  const agent = await server.signIn(await buildMember(['installer'], { team }));
  const list = jobListSchema.parse((await agent.get('/api/jobs')).body);
  expect(list.items).toMatchObject([
    { name: 'With a frozen one', platformCount: 1, abilities: { edit: false } },
  ]);
  const detail = jobDetailSchema.parse((await agent.get(`/api/jobs/${frozen.job.id}`)).body);
  expect(detail.platformCount).toBe(1);
  expect(detail.platforms.map(({ id }) => id)).toEqual([frozen.platform.id]);
  expect(detail.platforms[0]?.layouts[0]?.revisions.map(({ letter, state }) => [letter, state])).toEqual([
    ['B', 'frozen'],
    ['A', 'superseded'],
  ]);
  expect((await agent.get(`/api/jobs/${draft.job.id}`)).status).toBe(404);
});

test('a reviewer sees a job without being offered to edit it', async () => {
  const { team } = await buildWorkshop();
  const job = await buildJob(team);
  const agent = await server.signIn(await buildMember(['reviewer'], { team }));
  expect(jobDetailSchema.parse((await agent.get(`/api/jobs/${job.id}`)).body).abilities).toEqual({
    edit: false,
  });
});
