import type { Router } from 'express';
import { addComment } from '@/server/commands/add-comment';
import { findSignedIn } from '@/server/auth/signed-in';
import type { Comment } from '@/shared/api/comments';
import type { Job } from '@/server/models/job';
import type { Layout } from '@/server/models/layout';
import type { Membership } from '@/server/models/membership';
import type { Part } from '@/server/models/part';
import type { Platform } from '@/server/models/platform';
import type { Revision } from '@/server/models/revision';
import { listRouters } from '@/server/routes/list-routers';
import { ROLES, type Role } from '@/shared/api/fields';
import { problemSchema } from '@/shared/api/problem';
import { createId } from '@/shared/ids';
import {
  buildJob,
  buildLayout,
  buildMember,
  buildPart,
  buildRevision,
  buildTeam,
  TEST_PASSWORD,
} from '../../support/factories';
import { startTestServer, type TestAgent, type TestServer } from '../../support/test-server';
import { vanRoof, WHIP } from '../../support/van-roof';

/** One of everything that requests are made about. */
interface Scene {
  readonly members: ReadonlyMap<Role, Membership>;
  readonly job: Job;
  readonly platform: Platform;
  readonly layout: Layout;
  readonly part: Part;
  /** On the layout. */
  readonly comment: Pick<Comment, 'id'>;
  readonly saved: Revision;
  /** Submitted by somebody who is none of the members. */
  readonly inReview: Revision;
  readonly frozen: Revision;
  /** In a job, a platform and a layout of which nothing was frozen. */
  readonly draft: { readonly job: Job; readonly platform: Platform; readonly layout: Layout };
}

type Method = 'get' | 'post' | 'patch' | 'put' | 'delete';
type Statuses = readonly [
  administrator: number,
  integrator: number,
  reviewer: number,
  approver: number,
  installer: number,
];
interface Endpoint {
  readonly method: Method;
  readonly route: string;
  readonly about: (scene: Scene) => string;
  readonly body?: (scene: Scene) => object;
  readonly statuses: Statuses;
  /** Lists of the team answer a member of another team with that team's own. */
  readonly isTeamWide?: true;
}

const SPOT = { kind: 'spot', x: 1, y: 0.2 };
const comment = () => ({ id: createId(), target: SPOT, text: 'Does the ladder fit?' });
const name = () => ({ name: 'Another name' });
const whip = () => ({ content: { kind: 'antenna', antenna: WHIP } });
const nowhere = () => '';

const EVERYBODY: Statuses = [200, 200, 200, 200, 200];
const OFFICE: Statuses = [200, 200, 200, 200, 404];
const EDITORS: Statuses = [200, 200, 403, 403, 404];
const MAKERS: Statuses = [201, 201, 403, 403, 404];
const COMMENTERS: Statuses = [201, 201, 201, 201, 404];

const ENDPOINTS: readonly Endpoint[] = [
  { method: 'get', route: '/api/jobs', about: nowhere, statuses: EVERYBODY, isTeamWide: true },
  { method: 'post', route: '/api/jobs', about: nowhere, body: name, statuses: MAKERS, isTeamWide: true },
  { method: 'get', route: '/api/jobs/:id', about: ({ job }) => job.id, statuses: EVERYBODY },
  { method: 'get', route: '/api/jobs/:id', about: ({ draft }) => draft.job.id, statuses: OFFICE },
  { method: 'patch', route: '/api/jobs/:id', about: ({ job }) => job.id, body: name, statuses: EDITORS },
  {
    method: 'post',
    route: '/api/jobs/:id/platforms',
    about: ({ job }) => job.id,
    body: () => ({ name: 'Roof', starter: 'van-roof' }),
    statuses: MAKERS,
  },
  {
    method: 'patch',
    route: '/api/platforms/:id',
    about: ({ platform }) => platform.id,
    body: name,
    statuses: EDITORS,
  },
  {
    method: 'post',
    route: '/api/platforms/:id/layouts',
    about: ({ platform }) => platform.id,
    body: name,
    statuses: MAKERS,
  },
  { method: 'get', route: '/api/parts', about: nowhere, statuses: OFFICE, isTeamWide: true },
  { method: 'post', route: '/api/parts', about: nowhere, body: whip, statuses: MAKERS, isTeamWide: true },
  { method: 'get', route: '/api/parts/:id', about: ({ part }) => part.id, statuses: OFFICE },
  { method: 'put', route: '/api/parts/:id', about: ({ part }) => part.id, body: whip, statuses: EDITORS },
  {
    method: 'patch',
    route: '/api/parts/:id',
    about: ({ part }) => part.id,
    body: () => ({ archived: true }),
    statuses: EDITORS,
  },
  { method: 'post', route: '/api/parts/:id/copy', about: ({ part }) => part.id, statuses: MAKERS },
  { method: 'get', route: '/api/layouts/:id', about: ({ layout }) => layout.id, statuses: OFFICE },
  {
    method: 'patch',
    route: '/api/layouts/:id',
    about: ({ layout }) => layout.id,
    body: name,
    statuses: EDITORS,
  },
  {
    method: 'get',
    route: '/api/layouts/:id/operations',
    about: ({ layout }) => `${layout.id}?after=0`,
    statuses: OFFICE,
  },
  { method: 'get', route: '/api/layouts/:id/comments', about: ({ layout }) => layout.id, statuses: OFFICE },
  {
    method: 'post',
    route: '/api/layouts/:id/comments',
    about: ({ layout }) => layout.id,
    body: comment,
    statuses: COMMENTERS,
  },
  {
    method: 'get',
    route: '/api/layouts/:id/revisions',
    about: ({ layout }) => layout.id,
    statuses: EVERYBODY,
  },
  {
    method: 'get',
    route: '/api/layouts/:id/revisions',
    about: ({ draft }) => draft.layout.id,
    statuses: OFFICE,
  },
  {
    method: 'post',
    route: '/api/layouts/:id/revisions',
    about: ({ layout }) => layout.id,
    body: () => ({ note: 'As agreed' }),
    statuses: MAKERS,
  },
  {
    method: 'post',
    route: '/api/comments/:id/replies',
    about: (scene) => scene.comment.id,
    body: () => ({ id: createId(), text: 'It does.' }),
    statuses: COMMENTERS,
  },
  {
    method: 'patch',
    route: '/api/comments/:id',
    about: (scene) => scene.comment.id,
    body: () => ({ resolved: true }),
    statuses: OFFICE,
  },
  { method: 'get', route: '/api/revisions', about: nowhere, statuses: EVERYBODY, isTeamWide: true },
  { method: 'get', route: '/api/revisions/:id', about: ({ frozen }) => frozen.id, statuses: EVERYBODY },
  { method: 'get', route: '/api/revisions/:id', about: ({ inReview }) => inReview.id, statuses: OFFICE },
  ...(['patch', 'put', 'delete'] as const).map((method): Endpoint => ({
    method,
    route: '/api/revisions/:id',
    about: ({ frozen }) => frozen.id,
    body: name,
    statuses: [405, 405, 405, 405, 405],
  })),
  { method: 'post', route: '/api/revisions/:id/submit', about: ({ saved }) => saved.id, statuses: EDITORS },
  {
    method: 'post',
    route: '/api/revisions/:id/return',
    about: ({ inReview }) => inReview.id,
    body: () => ({ reason: 'The hatch does not open.' }),
    statuses: [403, 403, 403, 200, 404],
  },
  {
    method: 'post',
    route: '/api/revisions/:id/freeze',
    about: ({ inReview }) => inReview.id,
    body: () => ({ reason: 'As agreed.', password: TEST_PASSWORD }),
    statuses: [403, 403, 403, 200, 404],
  },
  {
    method: 'get',
    route: '/api/revisions/:id/comments',
    about: ({ frozen }) => frozen.id,
    statuses: EVERYBODY,
  },
  { method: 'get', route: '/api/revisions/:id/comments', about: ({ saved }) => saved.id, statuses: OFFICE },
  {
    method: 'post',
    route: '/api/revisions/:id/comments',
    about: ({ frozen }) => frozen.id,
    body: comment,
    statuses: [201, 201, 201, 201, 201],
  },
  {
    method: 'post',
    route: '/api/revisions/:id/comments',
    about: ({ saved }) => saved.id,
    body: comment,
    statuses: COMMENTERS,
  },
];

let server: TestServer;
/** For requests that change nothing. */
let still: Scene;
beforeAll(async () => {
  server = await startTestServer();
  still = await buildScene();
});
afterAll(() => server.stop());

async function buildScene(): Promise<Scene> {
  const team = await buildTeam();
  const members = new Map<Role, Membership>();
  for (const role of ROLES) members.set(role, await buildMember([role], { team }));
  const author = await buildMember(['integrator'], { team });
  const { job, platform, layout } = await buildLayout(team);
  const frozen = await buildRevision(server, layout, author, ['submitted', 'frozen']);
  const inReview = await buildRevision(server, layout, author, ['submitted']);
  const saved = await buildRevision(server, layout, author);
  const draft = await buildLayout(team, { job: await buildJob(team, { name: 'Nothing frozen' }) });
  await buildRevision(server, draft.layout, author, ['submitted']);
  const by = await findSignedIn(author.personId, team.id);
  const names = { job: job.name, platform: platform.name, layout: layout.name };
  const place = { layoutId: layout.id, revisionId: null, names, document: vanRoof() };
  const id = createId();
  const target = { kind: 'spot' as const, x: 1, y: 0.2 };
  await addComment(server.services, by!, place, { id, target, text: 'Is this metal?' });
  return {
    members,
    job,
    platform,
    layout,
    part: await buildPart(team),
    comment: { id },
    saved,
    inReview,
    frozen,
    draft,
  };
}

function ask(agent: TestAgent, endpoint: Endpoint, scene: Scene) {
  const [id = '', query] = endpoint.about(scene).split('?');
  const address = endpoint.route.replace(':id', id) + (query === undefined ? '' : `?${query}`);
  const request = agent[endpoint.method](address);
  return endpoint.body ? request.send(endpoint.body(scene)) : request;
}

describe.each(ENDPOINTS.map((endpoint) => [endpoint.method, endpoint.route, endpoint] as const))(
  '%s %s',
  (_method, _route, endpoint) => {
    test(`answers the roles with ${endpoint.statuses.join(', ')}`, async () => {
      const answered: number[] = [];
      for (const role of ROLES) {
        const scene = endpoint.method === 'get' ? still : await buildScene();
        const agent = await server.signIn(scene.members.get(role)!);
        const response = await ask(agent, endpoint, scene);
        answered.push(response.status);
        if (response.status >= 400) expect(problemSchema.parse(response.body).status).toBe(response.status);
      }
      expect(answered).toEqual(endpoint.statuses);
    });

    test('is closed to who is not signed in', async () => {
      const response = await ask(server.visitor(), endpoint, still);
      expect([response.status, response.body.code]).toEqual([401, 'not-signed-in']);
    });

    test('shows nothing of another team', async () => {
      const response = await ask(await server.signIn(await buildMember(ROLES)), endpoint, still);
      if (endpoint.isTeamWide) expect(JSON.stringify(response.body)).not.toMatch(identifiersOf(still));
      else expect([response.status, response.body.code]).toEqual([404, 'not-found']);
    });

    test('knows nothing under an identifier that nobody has', async () => {
      if (endpoint.isTeamWide) return;
      const agent = await server.signIn(await buildMember(ROLES));
      for (const id of [createId(), 'nonsense', '%00', '..%2f..', '1'.repeat(500)]) {
        const response = await ask(agent, { ...endpoint, about: () => id }, still);
        expect([id, response.status]).toEqual([id, 404]);
      }
    });
  },
);

test('the table has every endpoint of these resources', () => {
  const tabled = new Set(ENDPOINTS.map(({ method, route }) => `${method} ${route}`));
  const resources = [
    '/api/jobs',
    '/api/platforms',
    '/api/parts',
    '/api/layouts',
    '/api/comments',
    '/api/revisions',
  ];
  const routed = listRouters(server.services)
    .filter(({ path }) => resources.includes(path))
    .flatMap(({ path, router }) => listRoutes(path, router as Router));
  expect(routed.length).toBeGreaterThan(0);
  expect([...tabled].sort()).toEqual(routed.sort());
});

/** Every identifier of a scene. */
function identifiersOf({ job, part, frozen }: Scene): RegExp {
  return new RegExp([job.id, part.id, frozen.id].join('|'));
}

function listRoutes(path: string, router: Router): string[] {
  return router.stack.flatMap(({ route }) => {
    if (route === undefined) return [];
    const methods = new Set(route.stack.map(({ method }) => method));
    return [...methods].map((method) => `${method} ${route.path === '/' ? path : path + route.path}`);
  });
}
