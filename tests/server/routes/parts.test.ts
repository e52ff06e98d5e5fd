import { partListSchema, partSchema, type PartContent } from '@/shared/api/parts';
import { STARTER_PARTS } from '@/shared/layout/starter-parts';
import { buildMember, buildPart, buildTeam } from '../../support/factories';
import { startTestServer, type TestAgent, type TestServer } from '../../support/test-server';
import { WHIP } from '../../support/van-roof';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.stop());

const RADIO = STARTER_PARTS.radios[0]!;

function antenna(overrides: object = {}): PartContent {
  return { kind: 'antenna', antenna: { ...WHIP, ...overrides } };
}

function radio(overrides: object = {}): PartContent {
  return { kind: 'radio', radio: { ...RADIO, ...overrides } };
}

function element(overrides: object) {
  return antenna({ elements: [{ ...WHIP.elements[0], ...overrides }] });
}

async function buildWorkshop() {
  const team = await buildTeam();
  return { team, agent: await server.signIn(await buildMember(['integrator'], { team })) };
}

async function listNames(agent: TestAgent, query: Record<string, string> = {}): Promise<string[]> {
  const response = await agent.get('/api/parts').query(query);
  expect(response.status).toBe(200);
  return partListSchema.parse(response.body).items.map(({ name }) => name);
}

test.each([
  ...STARTER_PARTS.antennas.map(
    (part) => [part.name, { kind: 'antenna', antenna: part } as PartContent] as const,
  ),
  ...STARTER_PARTS.radios.map((part) => [part.name, { kind: 'radio', radio: part } as PartContent] as const),
])('%s is put on the shelf and comes back as it was entered', async (name, content) => {
  const { agent } = await buildWorkshop();
  const created = await agent.post('/api/parts').send({ content });
  expect(created.status).toBe(201);
  const part = partSchema.parse((await agent.get(`/api/parts/${created.body.id}`)).body);
  expect(part).toMatchObject({ name, content, archived: false, abilities: { edit: true } });
});

test('a part is changed, put away and taken back', async () => {
  const { team, agent } = await buildWorkshop();
  const part = await buildPart(team);
  const address = `/api/parts/${part.id}`;
  const changed = await agent.put(address).send({ content: radio({ name: '<b>Radio</b>', power: 10 }) });
  expect(partSchema.parse(changed.body)).toMatchObject({
    id: part.id,
    name: '<b>Radio</b>',
    content: { kind: 'radio', radio: { name: '<b>Radio</b>', power: 10 } },
  });
  expect((await agent.patch(address).send({ archived: true })).body.archived).toBe(true);
  expect(await listNames(agent)).toEqual([]);
  expect(await listNames(agent, { archived: 'true' })).toEqual(['<b>Radio</b>']);
  expect((await agent.patch(address).send({ archived: false })).body.archived).toBe(false);
  expect(await listNames(agent)).toEqual(['<b>Radio</b>']);
});

test('a copy is a part of its own with a name that tells it from the first', async () => {
  const { team, agent } = await buildWorkshop();
  const part = await buildPart(team, antenna({ name: 'Whip' }));
  const copied = partSchema.parse((await agent.post(`/api/parts/${part.id}/copy`)).body);
  expect(copied.id).not.toBe(part.id);
  expect(copied).toMatchObject({ name: 'Whip (copy)', content: antenna({ name: 'Whip (copy)' }) });
  await agent.put(`/api/parts/${copied.id}`).send({ content: antenna({ name: 'Longer whip' }) });
  expect(await listNames(agent)).toEqual(['Longer whip', 'Whip']);
});

test('the name of a copy stays within its length and keeps characters whole', async () => {
  const { team, agent } = await buildWorkshop();
  // The hundred and thirteenth unit is the first half of a character.
  const part = await buildPart(team, antenna({ name: `${'n'.repeat(112)}\u{1F4E1}\u{1F4E1}xxxx` }));
  const response = await agent.post(`/api/parts/${part.id}/copy`);
  expect(response.status).toBe(201);
  const read = partSchema.parse((await agent.get(`/api/parts/${response.body.id}`)).body);
  expect(read.name).toBe(`${'n'.repeat(112)} (copy)`);
  expect(read.content).toEqual(antenna({ name: read.name }));
});

test('the shelf is listed by name, in pages, by kind and by what is searched', async () => {
  const { team, agent } = await buildWorkshop();
  // The longest names in their longest encoding still fit into a cursor.
  const names = [
    `${'\u4e2d'.repeat(119)}A`,
    `${'\u4e2d'.repeat(119)}B`,
    '100% whip',
    'Whip_1',
    'whip_1',
    '"'.repeat(120),
  ];
  for (const name of names) await buildPart(team, antenna({ name }));
  await buildPart(team, radio({ name: 'Radio' }));
  const seen: string[] = [];
  let cursor: string | null = null;
  do {
    const query = { kind: 'antenna', limit: '1', ...(cursor === null ? {} : { cursor }) };
    const response = await agent.get('/api/parts').query(query);
    expect(response.status).toBe(200);
    const page = partListSchema.parse(response.body);
    seen.push(...page.items.map(({ name }) => name));
    cursor = page.next;
  } while (cursor !== null && seen.length < 20);
  expect([...seen].sort()).toEqual([...names].sort());
  expect(await listNames(agent, { kind: 'radio' })).toEqual(['Radio']);
  expect(await listNames(agent, { search: '0%' })).toEqual(['100% whip']);
  expect((await listNames(agent, { search: 'p_1' })).sort()).toEqual(['Whip_1', 'whip_1']);
});

test.each([
  ['no content', undefined, 'content'],
  ['a part of an unknown kind', { kind: 'feeder' }, 'content.kind'],
  ['an antenna without elements', antenna({ elements: [] }), 'content.antenna.elements'],
  ['a whip of no length', element({ length: 0 }), 'content.antenna.elements.0.length'],
  ['a whip of negative length', element({ length: -0.5 }), 'content.antenna.elements.0.length'],
  ['a length in words', element({ length: '46 cm' }), 'content.antenna.elements.0.length'],
  ['an element of an unknown kind', element({ kind: 'coil' }), 'content.antenna.elements.0.kind'],
  ['an unknown field', element({ colour: 'red' }), 'content.antenna.elements.0.colour'],
  ['an empty name', antenna({ name: ' ' }), 'content.antenna.name'],
  ['a radio with a negative power', radio({ power: -1 }), 'content.radio.power'],
  [
    'a band from high to low',
    radio({ receiveBands: [{ from: 2e8, to: 1e8 }] }),
    'content.radio.receiveBands.0.to',
  ],
  ['a radio with an identifier of its own', radio({ id: 'x' }), 'content.radio.id'],
])('%s is refused with its path', async (_case, content, path) => {
  const { team, agent } = await buildWorkshop();
  const part = await buildPart(team);
  for (const response of [
    await agent.post('/api/parts').send({ content }),
    await agent.put(`/api/parts/${part.id}`).send({ content }),
  ]) {
    expect([response.status, response.body.code]).toEqual([400, 'invalid']);
    expect(response.body.problems.map((problem: { path: string }) => problem.path)).toContain(path);
  }
  expect(await listNames(agent)).toEqual([WHIP.name]);
});

test('putting away something that is no answer is refused', async () => {
  const { team, agent } = await buildWorkshop();
  const part = await buildPart(team);
  const response = await agent.patch(`/api/parts/${part.id}`).send({ archived: 'yes' });
  expect([response.status, response.body.problems[0].path]).toEqual([400, 'archived']);
});

test('a reviewer sees the shelf without being offered to change it', async () => {
  const { team } = await buildWorkshop();
  await buildPart(team);
  const agent = await server.signIn(await buildMember(['reviewer'], { team }));
  const { items } = partListSchema.parse((await agent.get('/api/parts')).body);
  expect(items.map(({ abilities }) => abilities)).toEqual([{ edit: false }]);
});
