import { verifyPassword } from '@/server/auth/password';
import { deriveDemoPassword } from '@/server/auth/demo-accounts';
import { DEMO_PEOPLE } from '@/server/database/demo/demo-accounts';
import { loadDemo } from '@/server/database/demo/load-demo';
import { CommentRow } from '@/server/models/comment-row';
import { Job } from '@/server/models/job';
import { Membership } from '@/server/models/membership';
import { Person } from '@/server/models/person';
import { Task } from '@/server/models/task';
import { Team } from '@/server/models/team';
import { commentListSchema } from '@/shared/api/comments';
import { jobDetailSchema, jobListSchema } from '@/shared/api/jobs';
import { layoutSchema } from '@/shared/api/layouts';
import { partListSchema } from '@/shared/api/parts';
import { frozenRevisionListSchema, revisionDetailSchema } from '@/shared/api/revisions';
import { createEstimator } from '@/shared/estimate/estimate';
import { misplacedAntennas } from '@/shared/layout/placement';
import { revisionHash } from '@/shared/layout/revision-hash';
import { startTestServer, type TestServer } from '../../support/test-server';

const SECRET = 'a secret that only this test knows, long enough';
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({ demo: true });
});
afterAll(() => server.stop());

async function signIn(email: string) {
  const agent = server.visitor();
  const password = deriveDemoPassword(SECRET, email);
  expect((await agent.post('/api/session').send({ email, password })).status).toBe(200);
  return agent;
}

test('a demo that fails half-way leaves nothing behind', async () => {
  const failing = jest.spyOn(CommentRow, 'create').mockRejectedValueOnce(new Error('the disk is full'));
  await expect(loadDemo(server.services.sequelize, SECRET)).rejects.toThrow('the disk is full');
  failing.mockRestore();
  expect(await Promise.all([Team.count(), Person.count(), Job.count()])).toEqual([0, 0, 0]);
});

test('the demo is loaded into an empty database, once, however often it is asked for', async () => {
  expect(await loadDemo(server.services.sequelize, SECRET)).toBe(true);
  expect(await loadDemo(server.services.sequelize, SECRET)).toBe(false);
  expect(await Promise.all([Team.count(), Job.count()])).toEqual([1, 3]);
});

test('everybody of the demo signs in with the derived password and has their roles', async () => {
  for (const { email, name, roles } of DEMO_PEOPLE) {
    const person = await Person.findOne({ where: { email }, rejectOnEmpty: true });
    expect(person.name).toBe(name);
    expect(await verifyPassword(deriveDemoPassword(SECRET, email), person.passwordHash)).toBe(true);
    const [membership] = await Membership.findAll({ where: { personId: person.id } });
    expect([...membership!.roles].sort()).toEqual([...roles].sort());
  }
});

test('the three jobs stand in the scenario’s order, each with a layout that is seen, edited and computed', async () => {
  const agent = await signIn('integrator@example.com');
  const { items } = jobListSchema.parse((await agent.get('/api/jobs')).body);
  expect(items.map(({ name }) => name)).toEqual(['Patrol van', 'Harbour office', "Pilot's tracker"]);
  expect(items.every(({ customer }) => customer === 'Corrin Bay Harbour Authority')).toBe(true);
  const kinds = [];
  for (const { id } of items) {
    const detail = jobDetailSchema.parse((await agent.get(`/api/jobs/${id}`)).body);
    for (const platform of detail.platforms) {
      kinds.push(platform.kind);
      for (const { id: layoutId } of platform.layouts) {
        const layout = layoutSchema.parse((await agent.get(`/api/layouts/${layoutId}`)).body);
        expect(Object.keys(layout.document.antennas).length).toBeGreaterThanOrEqual(4);
        expect(Object.keys(layout.document.radios).length).toBeGreaterThanOrEqual(4);
        expect(misplacedAntennas(layout.document)).toEqual([]);
      }
    }
  }
  expect(kinds).toEqual(['vehicle', 'rooftop', 'handset']);
});

test('the van opens with one pair that lacks isolation, and its VHF radios are never together', async () => {
  const agent = await signIn('integrator@example.com');
  const [van] = jobListSchema.parse((await agent.get('/api/jobs')).body).items;
  const detail = jobDetailSchema.parse((await agent.get(`/api/jobs/${van!.id}`)).body);
  const layoutId = detail.platforms[0]!.layouts[0]!.id;
  const { document } = layoutSchema.parse((await agent.get(`/api/layouts/${layoutId}`)).body);
  const { counts } = createEstimator().estimate(document);
  expect(counts.lacking).toBe(1);
  expect(Object.keys(document.neverTogether)).toHaveLength(1);
  const { items } = commentListSchema.parse((await agent.get(`/api/layouts/${layoutId}/comments`)).body);
  expect(items.map(({ number, resolvedAt }) => [number, resolvedAt !== null])).toEqual([
    [1, false],
    [2, true],
  ]);
  const labels = Object.values(document.antennas).map(({ id, label }) => [id, label]);
  for (const { target } of items)
    if (target.kind === 'antenna') expect(labels).toContainEqual([target.antennaId, target.label]);
  expect(await Task.count()).toBe(0);
});

test('a new layout of a demo platform begins without antennas', async () => {
  const agent = await signIn('integrator@example.com');
  const [van] = jobListSchema.parse((await agent.get('/api/jobs')).body).items;
  const detail = jobDetailSchema.parse((await agent.get(`/api/jobs/${van!.id}`)).body);
  const made = await agent
    .post(`/api/platforms/${detail.platforms[0]!.id}/layouts`)
    .send({ name: 'Layout 2' });
  const { document } = layoutSchema.parse((await agent.get(`/api/layouts/${made.body.id}`)).body);
  expect([document.antennas, document.radios, document.neverTogether]).toEqual([{}, {}, {}]);
});

test('the shelf holds antennas and radios, all of them to be edited', async () => {
  const agent = await signIn('integrator@example.com');
  const { items } = partListSchema.parse((await agent.get('/api/parts')).body);
  expect(new Set(items.map(({ content }) => content.kind))).toEqual(new Set(['antenna', 'radio']));
  expect(items.every(({ abilities }) => abilities.edit)).toBe(true);
});

test('the installer finds one frozen revision, whose hash holds and which nobody froze for themselves', async () => {
  const agent = await signIn('installer@example.com');
  const { items } = frozenRevisionListSchema.parse((await agent.get('/api/revisions')).body);
  expect(items).toMatchObject([{ job: 'Harbour office', letter: 'A', frozenBy: 'Nesta Quill' }]);
  const detail = revisionDetailSchema.parse((await agent.get(`/api/revisions/${items[0]!.id}`)).body);
  expect(revisionHash(detail)).toBe(items[0]!.hash);
  expect(detail.events.map(({ kind, by }) => [kind, by])).toEqual([
    ['saved', 'Ilka Ferrow'],
    ['submitted', 'Ilka Ferrow'],
    ['frozen', 'Nesta Quill'],
  ]);
  expect(detail.results.counts.lacking).toBe(0);
});
