import { LiveRoom } from '@/tests/support/live-room';
import { MemoryStore } from '@/tests/support/memory-store';
import { TestClock } from '@/tests/support/test-clock';
import { TestEditor } from '@/tests/support/test-editor';
import { vanRoof } from '@/tests/support/van-roof';

async function openTwo(): Promise<[TestEditor, TestEditor]> {
  const room = new LiveRoom(vanRoof(), new TestClock());
  const ida = await new TestEditor({ room, name: 'Ida' }).open();
  const ole = await new TestEditor({ room, name: 'Ole' }).open();
  return [ida, ole];
}

describe('a lost line', () => {
  test('leaves me editing; what I did is sent in my order when it is found', async () => {
    const ida = await new TestEditor().open();
    ida.loseTheLine().move('A1', 1, 0.2).move('A1', 1.1, 0.2).move('A2', 2, 0.2);
    expect(ida.snapshot.connection).toEqual({ kind: 'offline' });
    expect(ida.snapshot).toMatchObject({ pendingCount: 3, canEdit: true });
    expect(ida.place('A1').x).toBe(1.1);
    await ida.findTheLine().wait(500);
    expect(ida.snapshot.connection).toEqual({ kind: 'online' });
    expect(ida.snapshot.pendingCount).toBe(0);
    expect(ida.room.document).toEqual(ida.document);
    expect(ida.room.document.antennas[ida.antenna('A1').id]?.x).toBe(1.1);
  });

  test('is caught up with exactly what was missed', async () => {
    const [ida, ole] = await openTwo();
    ida.loseTheLine();
    ole.move('A1', 1, 0.2).move('A2', 2, 0.2).remove('A3');
    await ole.wait(500);
    await ida.findTheLine().wait();
    expect(ida.document).toEqual(ole.room.document);
    expect(ida.snapshot.sequence).toBe(3);
  });

  test('is caught up with the whole layout when the server has its operations no longer one by one', async () => {
    const [ida, ole] = await openTwo();
    ida.loseTheLine();
    ole.move('A1', 1, 0.2);
    await ole.wait(500);
    ida.room.forgetsOperations = true;
    await ida.findTheLine().wait();
    expect(ida.document).toEqual(ole.room.document);
  });

  test('an operation whose answer got lost is sent again with its id and committed once', async () => {
    const ida = await new TestEditor().open();
    ida.line.losesNextAnswer = true;
    ida.line.losesEvents = 1;
    ida.move('A1', 1, 0.2);
    await ida.wait(10_000);
    expect(ida.room.arrivals).toBe(2);
    expect(ida.room.committed).toHaveLength(1);
    expect(ida.snapshot.pendingCount).toBe(0);
    expect(ida.document).toEqual(ida.room.document);
  });

  test('a committed operation that never arrived is missed and fetched', async () => {
    const [ida, ole] = await openTwo();
    ida.line.losesEvents = 1;
    ole.type('A1', { azimuthDeg: 20 });
    await ole.wait();
    expect(ida.antenna('A1').azimuthDeg).toBe(0);
    ole.type('A2', { azimuthDeg: 40 });
    await ole.wait(5000);
    expect(ida.document).toEqual(ida.room.document);
  });

  test('after a long time offline no more than fifty operations a second go out', async () => {
    const ida = await new TestEditor().open();
    ida.loseTheLine();
    for (let step = 1; step <= 120; step += 1) ida.type('A1', { azimuthDeg: step });
    await ida.findTheLine().wait(1000);
    expect(ida.room.committed.length).toBeLessThanOrEqual(51);
    expect(ida.room.committed.length).toBeGreaterThan(20);
    await ida.wait(5000);
    expect(ida.room.committed).toHaveLength(120);
  });
});

describe('refusals', () => {
  test('roll the operation back with the reason and what was wanted, and it can be tried again', async () => {
    const ida = await new TestEditor().open();
    ida.room.refuseNext = { code: 'limit-reached', message: 'The layout is full.' };
    ida.type('A1', { azimuthDeg: 33 });
    expect(ida.antenna('A1').azimuthDeg).toBe(33);
    await ida.wait();
    expect(ida.antenna('A1').azimuthDeg).toBe(0);
    expect(ida.snapshot.canUndo).toBe(false);
    const notice = ida.lastNotice;
    expect(notice).toMatchObject({ kind: 'refused', code: 'limit-reached' });
    expect(notice?.message).toBe('The server refused the change of A1. The layout is full.');
    ida.editor.retryNotice(notice?.id ?? 0);
    await ida.wait();
    expect(ida.room.document.antennas[ida.antenna('A1').id]?.azimuthDeg).toBe(33);
    expect(ida.snapshot.notices).toEqual([]);
  });

  test('a passing trouble of the server costs nothing: the operation is sent again', async () => {
    const ida = await new TestEditor().open();
    ida.room.refuseNext = { code: 'unavailable', message: 'The database is away.' };
    ida.type('A1', { azimuthDeg: 33 });
    await ida.wait(3000);
    expect(ida.room.committed).toHaveLength(1);
    expect(ida.messages).toEqual([]);
  });

  test('an operation that no longer applies after the others’ edits is dropped with a word', async () => {
    const [ida, ole] = await openTwo();
    ida.loseTheLine().move('A1', 1, 0.2).move('A2', 2, 0.2);
    ole.remove('A1');
    await ole.wait();
    await ida.findTheLine().wait(500);
    expect(ida.has('A1')).toBe(false);
    expect(ida.place('A2')).toEqual({ x: 2, y: 0.2 });
    expect(ida.lastNotice).toMatchObject({ kind: 'dropped', code: 'removed-object' });
    expect(ida.snapshot.pendingCount).toBe(0);
    expect(ida.document).toEqual(ida.room.document);
  });

  test('what depended on a refused operation is let go of with it', async () => {
    const ida = await new TestEditor().open();
    ida.room.refuseNext = { code: 'limit-reached', message: 'The layout is full.' };
    const a1 = ida.antenna('A1');
    const fresh = { ...a1, id: '0123456789abcdefghjkmnpqrs', label: 'A9', x: 1, y: 0.6 };
    ida.commit({ kind: 'add', collection: 'antennas', value: fresh }).type('A9', { azimuthDeg: 20 });
    await ida.wait(200);
    expect(ida.has('A9')).toBe(false);
    expect(ida.snapshot.notices.map(({ kind }) => kind)).toEqual(['refused', 'dropped']);
    expect(ida.document).toEqual(ida.room.document);
  });

  test('a member who was signed out keeps what is pending and sends it after signing in again', async () => {
    const ida = await new TestEditor().open();
    ida.loseTheLine().move('A1', 1, 0.2);
    ida.room.joinRefusal = { code: 'not-signed-in', message: 'Sign in again.' };
    await ida.findTheLine().wait();
    expect(ida.snapshot.connection).toMatchObject({ kind: 'refused' });
    expect(ida.snapshot).toMatchObject({ pendingCount: 1, canEdit: false });
    expect(ida.place('A1').x).toBe(1);
    ida.room.joinRefusal = null;
    ida.editor.reconnect();
    await ida.wait(200);
    expect(ida.room.document.antennas[ida.antenna('A1').id]?.x).toBe(1);
  });

  test('a client with an older form of the document stops editing until it is reloaded', async () => {
    const ida = await new TestEditor().open();
    ida.loseTheLine();
    ida.room.joinRefusal = { code: 'outdated-client', message: 'Reload.' };
    await ida.findTheLine().wait();
    expect(ida.snapshot.connection).toEqual({ kind: 'outdated' });
    expect(ida.editor.commit([]).ok).toBe(false);
  });
});

describe('a reload', () => {
  test('keeps what was not answered and sends it with the same ids', async () => {
    const room = new LiveRoom(vanRoof(), new TestClock());
    const store = new MemoryStore();
    const before = await new TestEditor({ room, store, memberId: 'm1' }).open();
    before.loseTheLine().move('A1', 1, 0.2).move('A2', 2, 0.2);
    await before.wait();
    const ids = store.operations.map(({ id }) => id);
    before.close();
    expect(ids).toHaveLength(2);
    const after = await new TestEditor({ room, store, memberId: 'm1' }).open();
    await after.wait(500);
    expect(room.committed.map(({ operation }) => operation.id)).toEqual(ids);
    expect(store.operations).toEqual([]);
    expect(after.document).toEqual(room.document);
  });

  test('of an operation that had been committed already commits nothing twice and says nothing', async () => {
    const room = new LiveRoom(vanRoof(), new TestClock());
    const store = new MemoryStore();
    const before = await new TestEditor({ room, store, memberId: 'm1' }).open();
    before.line.losesNextAnswer = true;
    before.line.losesEvents = 1;
    const fresh = { ...before.antenna('A1'), id: '0123456789abcdefghjkmnpqrs', label: 'A9', x: 1, y: 0.6 };
    before.commit({ kind: 'add', collection: 'antennas', value: fresh });
    await before.wait();
    before.loseTheLine().close();
    expect(store.operations).toHaveLength(1);
    const after = await new TestEditor({ room, store, memberId: 'm1' }).open();
    await after.wait(500);
    expect(room.committed).toHaveLength(1);
    expect(after.messages).toEqual([]);
    expect(store.operations).toEqual([]);
    expect(after.has('A9')).toBe(true);
  });

  test('a refused operation is not kept', async () => {
    const ida = await new TestEditor().open();
    ida.room.refuseNext = { code: 'limit-reached', message: 'The layout is full.' };
    ida.type('A1', { azimuthDeg: 33 });
    await ida.wait();
    expect(ida.store?.operations).toEqual([]);
  });

  test('a device that keeps nothing says so once, and editing goes on', async () => {
    const store = new MemoryStore();
    store.isBroken = true;
    const ida = await new TestEditor({ store }).open();
    ida.move('A1', 1, 0.2).move('A2', 2, 0.2);
    await ida.wait(200);
    expect(ida.snapshot.notices.filter(({ kind }) => kind === 'storage')).toHaveLength(1);
    expect(ida.room.committed).toHaveLength(2);
  });
});

describe('closing', () => {
  test('ends a burst of keys and waits for the answers that are still out', async () => {
    const ida = await new TestEditor().open();
    ida.select('A1').press('ArrowRight').close();
    await ida.wait(200);
    expect(ida.room.committed).toHaveLength(1);
    expect(ida.line.isUp).toBe(false);
    expect(ida.store?.operations).toEqual([]);
  });

  test('and opening again in the same moment goes on as if nothing had been', async () => {
    const ida = await new TestEditor().open();
    ida.close();
    await ida.open();
    ida.move('A1', 1, 0.2);
    await ida.wait();
    expect(ida.room.committed).toHaveLength(1);
    expect(ida.snapshot.connection).toEqual({ kind: 'online' });
  });
});
