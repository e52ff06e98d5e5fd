import { decodeDocument } from '@/server/models/document-codec';
import { Job } from '@/server/models/job';
import { Layout } from '@/server/models/layout';
import { Platform } from '@/server/models/platform';
import { layoutBriefSchema, platformBriefSchema } from '@/shared/api/jobs';
import { layoutSchema } from '@/shared/api/layouts';
import { STARTER_PLATFORMS } from '@/shared/layout/starter-platforms';
import { buildJob, buildLayout, buildMember, buildTeam } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

const LONG_AGO = new Date(Date.UTC(2020, 0, 1));
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

async function buildWorkshop() {
  const team = await buildTeam();
  const agent = await server.signIn(await buildMember(['integrator'], { team }));
  const job = await buildJob(team, { updatedAt: LONG_AGO });
  return { team, agent, job };
}

async function readDocument(layoutId: string) {
  return decodeDocument((await Layout.findByPk(layoutId, { rejectOnEmpty: true })).document);
}

test.each(STARTER_PLATFORMS.map((starter) => [starter.id, starter] as const))(
  'a platform is made from the outline %s with typed dimensions, and its first layout with it',
  async (id, starter) => {
    const { agent, job } = await buildWorkshop();
    // Every dimension a tenth of the way from what it is to the most that it may be.
    const dimensions = Object.fromEntries(
      starter.dimensions.map(({ key, initial, most }) => [key, initial + (most - initial) / 10]),
    );
    const response = await agent
      .post(`/api/jobs/${job.id}/platforms`)
      .send({ name: 'Survey of Tuesday', starter: id, dimensions });
    expect(response.status).toBe(201);
    const platform = platformBriefSchema.parse(response.body);
    expect(platform).toMatchObject({
      name: 'Survey of Tuesday',
      layouts: [{ name: 'Layout 1', revisions: [] }],
    });
    const layoutId = platform.layouts[0]!.id;
    const layout = layoutSchema.parse((await agent.get(`/api/layouts/${layoutId}`)).body);
    expect(layout.document.platform).toMatchObject({
      starter: id,
      kind: platform.kind,
      name: 'Survey of Tuesday',
      length: dimensions['length'],
      width: dimensions['width'],
    });
    expect(layout.document.antennas).toEqual({});
    expect(Object.keys(layout.document.surfaces).length).toBeGreaterThan(0);
    expect((await job.reload()).updatedAt.getTime()).toBeGreaterThan(LONG_AGO.getTime());
  },
);

test.each([
  ['an outline that nobody drew', { name: 'Roof', starter: 'balloon' }, 'starter'],
  ['no outline', { name: 'Roof' }, 'starter'],
  ['an empty name', { name: '', starter: 'van-roof' }, 'name'],
  [
    'a negative length',
    { name: 'Roof', starter: 'van-roof', dimensions: { length: -1 } },
    'dimensions.length',
  ],
  [
    'a length of nothing',
    { name: 'Roof', starter: 'van-roof', dimensions: { length: 0 } },
    'dimensions.length',
  ],
  [
    'a length of a mile',
    { name: 'Roof', starter: 'van-roof', dimensions: { length: 900 } },
    'dimensions.length',
  ],
  [
    'a length in words',
    { name: 'Roof', starter: 'van-roof', dimensions: { length: '3 m' } },
    'dimensions.length',
  ],
  [
    'an unknown dimension',
    { name: 'Roof', starter: 'van-roof', dimensions: { wings: 2 } },
    'dimensions.wings',
  ],
])('%s is refused with its path', async (_case, body, path) => {
  const { agent, job } = await buildWorkshop();
  const response = await agent.post(`/api/jobs/${job.id}/platforms`).send(body);
  expect([response.status, response.body.code]).toEqual([400, 'invalid']);
  expect(response.body.problems[0].path).toBe(path);
  expect(await Platform.count({ where: { jobId: job.id } })).toBe(0);
});

test('a platform is renamed, and its job moves to the top of the list', async () => {
  const { team, agent } = await buildWorkshop();
  const { platform, job } = await buildLayout(team, { job: await buildJob(team, { updatedAt: LONG_AGO }) });
  const address = `/api/platforms/${platform.id}`;
  const response = await agent.patch(address).send({ name: 'Roof with ladder' });
  expect(platformBriefSchema.parse(response.body)).toMatchObject({
    name: 'Roof with ladder',
    layouts: [{ name: 'Layout 1' }],
  });
  expect((await Job.findByPk(job.id))?.updatedAt.getTime()).toBeGreaterThan(LONG_AGO.getTime());
  const refused = await agent.patch(address).send({ name: 'x'.repeat(121) });
  expect([refused.status, refused.body.problems[0].path]).toEqual([400, 'name']);
});

test('a further layout begins with the survey, or as a copy of one of the platform', async () => {
  const { agent, job } = await buildWorkshop();
  const made = await agent.post(`/api/jobs/${job.id}/platforms`).send({ name: 'Roof', starter: 'van-roof' });
  const { layout } = await buildLayout(await buildTeam());
  const platformId = made.body.id as string;
  const first = await Layout.findOne({ where: { platformId }, rejectOnEmpty: true });
  await first.update({ document: layout.document });
  const address = `/api/platforms/${platformId}/layouts`;
  const bare = layoutBriefSchema.parse((await agent.post(address).send({ name: 'Second try' })).body);
  expect((await readDocument(bare.id)).antennas).toEqual({});
  const copied = await agent.post(address).send({ name: 'Copy', copyOf: first.id });
  expect(copied.status).toBe(201);
  const copy = layoutBriefSchema.parse(copied.body);
  expect(await readDocument(copy.id)).toEqual(await readDocument(first.id));
  expect((await agent.get(`/api/layouts/${copy.id}`)).body).toMatchObject({ name: 'Copy', sequence: 0 });
});

test('a layout of another platform or team is not copied', async () => {
  const { team, agent } = await buildWorkshop();
  const { platform } = await buildLayout(team);
  const address = `/api/platforms/${platform.id}/layouts`;
  for (const other of [await buildLayout(team), await buildLayout(await buildTeam())]) {
    const response = await agent.post(address).send({ name: 'Copy', copyOf: other.layout.id });
    expect([response.status, response.body.problems?.[0]?.path]).toEqual([400, 'copyOf']);
  }
  expect(await Layout.count({ where: { platformId: platform.id } })).toBe(1);
});
