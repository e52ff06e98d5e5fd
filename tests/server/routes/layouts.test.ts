import type { Membership } from '@/server/models/membership';
import { layoutBriefSchema } from '@/shared/api/jobs';
import { layoutSchema, operationListSchema } from '@/shared/api/layouts';
import { createEstimator } from '@/shared/estimate/estimate';
import type { PairResult } from '@/shared/estimate/estimate-result';
import { createId } from '@/shared/ids';
import { DEMO_JOBS } from '@/shared/layout/demo/demo-jobs';
import type { LayoutDocument } from '@/shared/layout/document';
import type { Operation } from '@/shared/layout/operation';
import { buildLayout, buildMember, buildTeam } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

/** The patrol van of the demo: its radios make pairs. */
const VAN = DEMO_JOBS[0]!.platforms[0]!.layouts[0]!.document;

async function buildWorkshop(document?: LayoutDocument) {
  const team = await buildTeam();
  const integrator = await buildMember(['integrator'], { team });
  const { layout, job, platform } = await buildLayout(team, document && { document });
  return { team, integrator, layout, job, platform, agent: await server.signIn(integrator) };
}

function moveOf(antennaId: string, x: number): Operation {
  return {
    id: createId(),
    version: 1,
    changes: [{ kind: 'set', collection: 'antennas', id: antennaId, fields: { x } }],
  };
}

async function commit(layoutId: string, member: Membership, operation: Operation): Promise<void> {
  const writer = await server.services.live.open(layoutId);
  const answer = await writer.submit(operation, { id: member.id, name: 'Ina Integrator' });
  if (!answer.ok) throw new Error(answer.refusal.message);
}

/** The answer to a pair; a millionth of a decibel, because what was computed before may change the last digits. */
function describePair({ from, into, state, isolationDb, marginDb }: PairResult) {
  return [from, into, state, isolationDb?.toFixed(6), marginDb?.toFixed(6)];
}

/** Waits for the server's estimate of the state after `sequence` operations. */
function estimated(layoutId: string, sequence: number): Promise<void> {
  const { live } = server.services;
  return new Promise((resolve) => {
    const look = () => {
      if (live.estimates.latest(layoutId)?.sequence !== sequence) return;
      stop();
      resolve();
    };
    const stop = live.onEvent(look);
    look();
  });
}

test('a layout comes with what is committed, the server’s estimate of it and what one may do', async () => {
  const { integrator, layout, job, platform, agent } = await buildWorkshop(VAN);
  const first = layoutSchema.parse((await agent.get(`/api/layouts/${layout.id}`)).body);
  expect(first).toMatchObject({
    name: 'Layout 1',
    job: { id: job.id, name: job.name },
    platform: { id: platform.id, name: 'Roof' },
    lastLetter: null,
    nextLetter: 'A',
    sequence: 0,
    abilities: { edit: true, comment: true, saveRevision: true, submitRevision: true },
  });
  const [antenna] = Object.values(first.document.antennas);
  await commit(layout.id, integrator, moveOf(antenna!.id, 0.7));
  await estimated(layout.id, 1);
  const moved = layoutSchema.parse((await agent.get(`/api/layouts/${layout.id}`)).body);
  expect(moved.sequence).toBe(1);
  expect(moved.document.antennas[antenna!.id]?.x).toBe(0.7);
  expect(moved.estimate?.sequence).toBe(1);
  const own = createEstimator().estimate(moved.document);
  expect(moved.estimate?.result.pairs.map(describePair)).toEqual(own.pairs.map(describePair));
  expect(own.pairs.length).toBeGreaterThan(0);
});

test('a reviewer sees a layout without being offered to edit it', async () => {
  const { team, layout } = await buildWorkshop();
  const agent = await server.signIn(await buildMember(['reviewer'], { team }));
  const { abilities } = layoutSchema.parse((await agent.get(`/api/layouts/${layout.id}`)).body);
  expect(abilities).toEqual({ edit: false, comment: true, saveRevision: false, submitRevision: false });
});

test('a layout is renamed, and its watchers hear of it', async () => {
  const { layout, agent } = await buildWorkshop();
  const heard: string[] = [];
  const stop = server.services.live.onEvent((event) => {
    if (event.layoutId === layout.id) heard.push(event.kind);
  });
  const response = await agent.patch(`/api/layouts/${layout.id}`).send({ name: '  <i>Second</i> try ' });
  stop();
  expect(layoutBriefSchema.parse(response.body).name).toBe('<i>Second</i> try');
  expect(heard).toEqual(['layout-changed']);
  expect((await agent.get(`/api/layouts/${layout.id}`)).body.name).toBe('<i>Second</i> try');
});

test.each([
  ['an empty name', { name: '' }, 'name'],
  ['no name', {}, 'name'],
  ['a document', { name: 'x', document: {} }, 'document'],
])('a change to %s is refused with its path', async (_case, body, path) => {
  const { layout, agent } = await buildWorkshop();
  const response = await agent.patch(`/api/layouts/${layout.id}`).send(body);
  expect([response.status, response.body.problems[0].path]).toEqual([400, path]);
});

test('operations are fetched from where one left off, in their order', async () => {
  const { integrator, layout, agent } = await buildWorkshop();
  const [antenna] = Object.keys(
    layoutSchema.parse((await agent.get(`/api/layouts/${layout.id}`)).body).document.antennas,
  );
  const operations = [0.6, 0.7, 0.8].map((x) => moveOf(antenna!, x));
  for (const operation of operations) await commit(layout.id, integrator, operation);
  const fetch = async (after: number) =>
    operationListSchema.parse(
      (await agent.get(`/api/layouts/${layout.id}/operations`).query({ after })).body,
    );
  const all = await fetch(0);
  expect(all.items.map(({ sequence }) => sequence)).toEqual([1, 2, 3]);
  expect(all.items.map(({ operation }) => operation)).toEqual(operations);
  expect(all.items.every(({ memberId }) => memberId === integrator.id)).toBe(true);
  expect(all.sequence).toBe(3);
  expect((await fetch(2)).items.map(({ sequence }) => sequence)).toEqual([3]);
  expect(await fetch(3)).toEqual({ items: [], sequence: 3 });
});

test.each([
  {},
  { after: '-1' },
  { after: '1.5' },
  { after: 'x' },
  { after: '1e99' },
  { after: '0', more: '1' },
])('operations after %j are refused with the path', async (query) => {
  const { layout, agent } = await buildWorkshop();
  const response = await agent.get(`/api/layouts/${layout.id}/operations`).query(query);
  expect(response.status).toBe(400);
  expect(response.body.problems).toHaveLength(1);
  expect(['after', 'more']).toContain(response.body.problems[0].path);
});
