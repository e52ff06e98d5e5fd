import { createId } from '@/shared/ids';
import type { Role } from '@/shared/api/fields';
import type { CommittedOperation } from '@/shared/layout/operation';
import type { Team } from '@/server/models/team';
import { buildLayout, buildMember, buildTeam } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';
import { vanRoof } from '../../support/van-roof';
import { LiveGuest, setAntenna, signInCookie } from './live-guest';

let server: TestServer;
const guests: LiveGuest[] = [];
beforeAll(async () => {
  server = await startTestServer();
});
afterEach(() => guests.splice(0).forEach(({ socket }) => socket.disconnect()));
afterAll(() => server.stop());

const [A1, A2] = Object.keys(vanRoof().antennas) as [string, string];

async function enter(team: Team, roles: readonly Role[] = ['integrator']) {
  const member = await buildMember(roles, { team });
  const cookie = await signInCookie(server, member);
  const guest = await LiveGuest.connect(server, cookie);
  guests.push(guest);
  return { member, cookie, guest };
}

async function openRoof() {
  const team = await buildTeam();
  const { layout } = await buildLayout(team);
  const { guest, member, cookie } = await enter(team);
  await guest.join(layout.id);
  return { team, id: layout.id, guest, member, cookie };
}

const codeOf = (answer: { ok: true } | { ok: false; refusal: { code: string } }) =>
  answer.ok ? 'ok' : answer.refusal.code;

describe('joining', () => {
  it('needs a session', async () => {
    await expect(LiveGuest.connect(server, '')).rejects.toThrow('not-signed-in');
  });

  it('is refused to a page of another site', async () => {
    const { cookie } = await openRoof();
    await expect(LiveGuest.connect(server, cookie, 'https://elsewhere.example.com')).rejects.toThrow();
  });

  it('answers another team and an installer as if the layout were not there', async () => {
    const { id, team } = await openRoof();
    const stranger = await enter(await buildTeam());
    const installer = await enter(team, ['installer']);
    expect(codeOf(await stranger.guest.join(id))).toBe('not-found');
    expect(codeOf(await installer.guest.join(id))).toBe('not-found');
    expect(codeOf(await stranger.guest.join(createId()))).toBe('not-found');
  });

  it('tells a window of another document version to reload', async () => {
    const { id, guest } = await openRoof();
    expect(codeOf(await guest.join(id, null, 0))).toBe('outdated-client');
  });

  it('says who is here, and who left', async () => {
    const { id, team, guest, member } = await openRoof();
    const came = guest.next('people', ({ people }) => people.length === 2);
    const other = await enter(team, ['reviewer']);
    await other.guest.join(id);
    expect((await came).people.map((one) => one.memberId).sort()).toEqual(
      [member.id, other.member.id].sort(),
    );
    const left = guest.next('people', ({ people }) => people.length === 1);
    other.guest.socket.disconnect();
    expect((await left).people[0]?.memberId).toBe(member.id);
  });

  it('catches up with exactly the operations that were missed, by joining and by HTTP', async () => {
    const { id, guest, team, cookie } = await openRoof();
    const other = await enter(team);
    await other.guest.join(id);
    await guest.send(id, setAntenna(A1, { azimuthDeg: 1 }));
    other.guest.socket.disconnect();
    for (const azimuthDeg of [2, 3, 4]) await guest.send(id, setAntenna(A1, { azimuthDeg }));
    const back = await enter(team);
    const answer = await back.guest.join(id, 1);
    if (!answer.ok) throw new Error(answer.refusal.message);
    expect(answer.layout).toBeNull();
    expect(answer.operations).toEqual(guest.committed.slice(1));
    const response = await fetch(`${server.url}/api/layouts/${id}/operations?after=1`, {
      headers: { cookie },
    });
    const { items } = (await response.json()) as { items: CommittedOperation[] };
    expect(items).toEqual(guest.committed.slice(1));
  });
});

describe('what is under the finger', () => {
  it('reaches the others with nudges and crosshairs, and never its sender', async () => {
    const { id, guest, team, member } = await openRoof();
    const other = await enter(team, ['reviewer']);
    await other.guest.join(id);
    let echoes = 0;
    guest.socket.on('nudge', () => (echoes += 1));
    const nudged = other.guest.next('nudge');
    guest.socket.emit('nudge', { layoutId: id, antennas: [{ id: A1, x: 1.25, y: 0.5 }], done: false });
    expect(await nudged).toMatchObject({ memberId: member.id, antennas: [{ id: A1, x: 1.25, y: 0.5 }] });
    const pointed = other.guest.next('presence');
    guest.socket.emit('presence', { layoutId: id, cursor: { x: 1, y: 2 }, selection: [A2] });
    expect((await pointed).person).toMatchObject({ cursor: { x: 1, y: 2 }, selection: [A2] });
    await guest.send(id, setAntenna(A1, { azimuthDeg: 9 }));
    expect(echoes).toBe(0);
  });
});

describe('operations', () => {
  it('arrive at everybody in one order without gaps', async () => {
    const { id, guest, team } = await openRoof();
    const other = await enter(team);
    await other.guest.join(id);
    const last = [guest, other.guest].map((one) =>
      one.next('operation', ({ committed }) => committed.sequence === 40),
    );
    const answers = await Promise.all(
      Array.from({ length: 40 }, (_, index) =>
        (index % 2 ? guest : other.guest).send(id, setAntenna(A1, { azimuthDeg: index })),
      ),
    );
    await Promise.all(last);
    expect(answers.map(codeOf)).toEqual(Array(40).fill('ok'));
    expect(guest.committed.map(({ sequence }) => sequence)).toEqual(
      Array.from({ length: 40 }, (_, at) => at + 1),
    );
    expect(other.guest.committed).toEqual(guest.committed);
    const { state } = await server.services.live.open(id);
    const winner = guest.committed.at(-1)?.operation.changes[0];
    expect(winner).toMatchObject({ fields: { azimuthDeg: state.document.antennas[A1]?.azimuthDeg } });
  });

  it('are answered as the first time when they arrive again', async () => {
    const { id, guest } = await openRoof();
    const operation = setAntenna(A1, { azimuthDeg: 5 });
    const first = await guest.send(id, operation);
    await guest.send(id, setAntenna(A1, { azimuthDeg: 6 }));
    expect(await guest.send(id, operation)).toEqual(first);
    expect(guest.committed).toHaveLength(2);
  });

  it('on a removed antenna are refused', async () => {
    const { id, guest } = await openRoof();
    const remove = {
      ...setAntenna(A1, {}),
      changes: [{ kind: 'remove' as const, collection: 'antennas' as const, id: A1 }],
    };
    expect(codeOf(await guest.send(id, remove))).toBe('ok');
    expect(codeOf(await guest.send(id, setAntenna(A1, { azimuthDeg: 5 })))).toBe('removed-object');
  });

  it('with a wrong value are refused with its path and a reason', async () => {
    const { id, guest } = await openRoof();
    const answer = await guest.send(id, setAntenna(A1, { azimuthDeg: 'north' }));
    if (answer.ok) throw new Error('a word was taken for an azimuth');
    const { problems = [] } = answer.refusal;
    expect(problems[0]?.path).toMatch(/azimuthDeg/);
    expect(problems[0]?.message).not.toBe('');
  });

  it('of a reviewer, and for a layout that is not open, are refused', async () => {
    const { id, team } = await openRoof();
    const reviewer = await enter(team, ['reviewer']);
    expect(codeOf(await reviewer.guest.send(id, setAntenna(A1, { azimuthDeg: 5 })))).toBe('not-found');
    await reviewer.guest.join(id);
    expect(codeOf(await reviewer.guest.send(id, setAntenna(A1, { azimuthDeg: 5 })))).toBe('forbidden');
  });

  it('are followed by the estimate of their sequence', async () => {
    const { id, guest, team } = await openRoof();
    const watcher = await enter(team, ['reviewer']);
    await watcher.guest.join(id);
    const estimated = watcher.guest.next('estimate', ({ sequence }) => sequence === 1);
    await guest.send(id, setAntenna(A1, { azimuthDeg: 5 }));
    expect((await estimated).result.solverVersion).toBeTruthy();
  });
});

describe('the end of access', () => {
  it('disconnects on signing out', async () => {
    const { guest, cookie } = await openRoof();
    const ended = guest.hungUp();
    const headers = { cookie, origin: server.url };
    await fetch(`${server.url}/api/session`, { method: 'DELETE', headers });
    expect(await ended).toBe('not-signed-in');
  });

  it.each([{ roles: ['reviewer'] }, { active: false }])(
    'disconnects on a change of the membership',
    async (change) => {
      const { guest, team, member } = await openRoof();
      const administrator = await buildMember(['administrator'], { team });
      const agent = await server.signIn(administrator);
      const ended = guest.hungUp();
      const response = await agent.patch(`/api/members/${member.id}`).send(change);
      expect(response.status).toBe(200);
      expect(await ended).toBe('not-signed-in');
    },
  );
});

describe('hostile messages', () => {
  const deep = () => {
    let value: unknown = 1;
    for (let level = 0; level < 1000; level += 1) value = [value];
    return value;
  };
  it.each([
    ['nothing', () => null],
    ['a word', () => 'operation'],
    ['nested a thousand deep', deep],
    ['a key of the prototype', () => JSON.parse('{"__proto__":{"layoutId":"x"},"constructor":1}') as unknown],
    ['lists for objects', () => ({ layoutId: [], operation: [] })],
  ])('are refused: %s', async (_name, content) => {
    const { guest, id } = await openRoof();
    expect(['invalid', 'too-deep']).toContain(codeOf(await guest.askRaw('operation', content())));
    expect(['invalid', 'too-deep']).toContain(codeOf(await guest.askRaw('join', content())));
    expect(codeOf(await guest.send(id, setAntenna(A1, { azimuthDeg: 7 })))).toBe('ok');
  });

  it.each([
    ['an unknown event', 'fly', {}],
    ['a wrong nudge', 'nudge', { layoutId: 3 }],
    ['an operation without a way to answer', 'operation', {}],
  ])('that cannot be answered end the connection: %s', async (_name, event, content) => {
    const { guest } = await openRoof();
    const ended = guest.hungUp();
    guest.sendRaw(event, content);
    expect(await ended).toBe('invalid');
  });

  it('of two megabytes end the connection and leave the server up', async () => {
    const { guest, team, id } = await openRoof();
    const ended = guest.hungUp();
    guest.sendRaw('operation', { text: 'x'.repeat(2 * 1024 ** 2) });
    await ended;
    const other = await enter(team);
    expect(codeOf(await other.guest.join(id))).toBe('ok');
  });

  it.each([
    ['operation', 60],
    ['presence', 240],
  ] as const)(
    'too many of %s in a second end the connection, while another layout goes on',
    async (event, limit) => {
      const { guest, id } = await openRoof();
      const calm = await openRoof();
      const ended = guest.hungUp();
      for (let count = 0; count < limit * 2; count += 1) {
        if (event === 'operation')
          guest.socket.emit(
            'operation',
            { layoutId: id, operation: setAntenna(A1, { azimuthDeg: 1 }) },
            () => undefined,
          );
        else guest.socket.emit('presence', { layoutId: id, cursor: null, selection: [] });
      }
      expect(codeOf(await calm.guest.send(calm.id, setAntenna(A1, { azimuthDeg: 2 })))).toBe('ok');
      expect(await ended).toBe('too-many');
    },
  );
});
