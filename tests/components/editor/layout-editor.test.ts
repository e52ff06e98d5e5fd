import { estimateByDistance, isolationByDistance } from '@/tests/support/distance-estimator';
import { LiveRoom } from '@/tests/support/live-room';
import { TestClock } from '@/tests/support/test-clock';
import { TestEditor } from '@/tests/support/test-editor';
import { vanRoof, WHIP } from '@/tests/support/van-roof';

const SHELF_WHIP = { name: 'Whip', part: WHIP };

async function openTwo(): Promise<[TestEditor, TestEditor]> {
  const room = new LiveRoom(vanRoof(), new TestClock());
  const ida = await new TestEditor({ room, name: 'Ida' }).open();
  const ole = await new TestEditor({ room, name: 'Ole' }).open();
  return [ida, ole];
}

describe('dragging', () => {
  test('a drop becomes one operation, and nothing goes out while the finger moves but nudges', async () => {
    const ida = await new TestEditor().open();
    ida.grab('A1').dragTo(0.7, -0.2).dragTo(0.9, 0.1);
    expect(ida.place('A1')).toEqual({ x: 0.5, y: -0.3 });
    expect(ida.painted('A1')).toMatchObject({ x: 0.9, y: 0.1 });
    await ida.drop().wait();
    expect(ida.place('A1')).toEqual({ x: 0.9, y: 0.1 });
    expect(ida.room.committed).toHaveLength(1);
    expect(ida.snapshot.pendingCount).toBe(0);
  });

  test('the numbers of every snapshot are the solver’s answer for the places painted in it', async () => {
    const ida = await new TestEditor().open();
    let looked = 0;
    ida.editor.subscribe(() => {
      const { painted, estimate } = ida.snapshot;
      if (!painted || !estimate) return;
      looked += 1;
      expect(estimate).toEqual(estimateByDistance(painted));
    });
    ida.grab('A1').dragTo(0.7, -0.2).dragTo(0.9, 0.1).drop().undo();
    await ida.wait();
    expect(looked).toBeGreaterThan(4);
    const pair = ida.snapshot.estimate?.pairs.find(({ from }) => from === ida.antenna('A1').id);
    expect(pair?.isolationDb).toBe(isolationByDistance(ida.antenna('A1'), ida.antenna('A2')));
  });

  test('the solver is asked once for each position and not at all when only a crosshair moves', async () => {
    const [ida, ole] = await openTwo();
    const before = ida.estimator.asked.length;
    ole.editor.pointAt({ x: 1, y: 0 });
    await ida.wait();
    expect(ida.snapshot.people.find(({ name }) => name === 'Ole')?.cursor).toEqual({ x: 1, y: 0 });
    expect(ida.estimator.asked).toHaveLength(before);
    ida.grab('A1');
    const held = ida.estimator.asked.length;
    ida.dragTo(0.7, 0).dragTo(0.7, 0).dragTo(0.8, 0);
    expect(ida.estimator.asked).toHaveLength(held + 2);
  });

  test('the antenna keeps its distance to the finger that took it beside its middle', async () => {
    const ida = await new TestEditor().open();
    ida.grab('A1', { x: 0.52, y: -0.29 }).dragTo(1.02, 0.21).drop();
    expect(ida.place('A1').x).toBeCloseTo(1, 9);
    expect(ida.place('A1').y).toBeCloseTo(0.2, 9);
  });

  test('an antenna returns from a keep-out, and the reason is said while it is held and after the drop', async () => {
    const ida = await new TestEditor().open();
    ida.grab('A1').dragTo(3.4, 0);
    expect(ida.snapshot.gesture?.problem).toMatchObject({ code: 'keep-out' });
    ida.drop();
    expect(ida.place('A1')).toEqual({ x: 0.5, y: -0.3 });
    expect(ida.lastNotice).toMatchObject({ kind: 'refused', code: 'not-placeable' });
    expect(ida.lastNotice?.message).toContain('The hatch opens here.');
    await ida.wait();
    expect(ida.room.committed).toHaveLength(0);
  });

  test('a cancelled drag leaves no trace', async () => {
    const ida = await new TestEditor().open();
    const before = ida.document;
    ida.grab('A1').dragTo(1, 0).press('Escape');
    expect(ida.snapshot.painted).toBe(before);
    expect(ida.snapshot.canUndo).toBe(false);
    expect(ida.line.nudges.at(-1)).toMatchObject({ antennas: [], done: true });
  });

  test('selected antennas move along with the one under the finger', async () => {
    const ida = await new TestEditor().open();
    ida.select('A1', 'A2').grab('A1').dragTo(0.5, 0.2).drop();
    expect(ida.place('A2')).toEqual({ x: 1.5, y: 0.2 });
    await ida.wait();
    expect(ida.room.committed).toHaveLength(1);
    ida.undo();
    expect([ida.place('A1').y, ida.place('A2').y]).toEqual([-0.3, -0.3]);
  });

  test('a part from the shelf becomes an antenna with the next free mark, selected', async () => {
    const ida = await new TestEditor().open();
    ida.grab(SHELF_WHIP).dragTo(-3, 0);
    expect(ida.snapshot.gesture).toMatchObject({ kind: 'place', label: 'A4' });
    expect(Object.keys(ida.snapshot.painted?.antennas ?? {})).toHaveLength(3);
    ida.dragTo(1, 0.5);
    expect(ida.painted('A4')).toMatchObject({ x: 1, y: 0.5, radioId: null });
    ida.drop();
    expect(ida.place('A4')).toEqual({ x: 1, y: 0.5 });
    expect(ida.snapshot.selection).toEqual([ida.antenna('A4').id]);
  });

  test('a part from the shelf can be placed without a pointer, at a spot where it may stand', async () => {
    const ida = await new TestEditor().open();
    expect(ida.editor.place(SHELF_WHIP).ok).toBe(true);
    expect(ida.has('A4')).toBe(true);
    await ida.wait();
    expect(ida.room.committed).toHaveLength(1);
  });

  test('an antenna that somebody removes while it is held slips from the finger, with a word', async () => {
    const [ida, ole] = await openTwo();
    ida.grab('A1').dragTo(1, 0);
    ole.remove('A1');
    await ida.wait();
    expect(ida.snapshot.gesture).toBeNull();
    expect(ida.messages).toContain('A1 was removed while you held it.');
  });
});

describe('keys', () => {
  test('a burst of arrow keys is one operation and one undo', async () => {
    const ida = await new TestEditor().open();
    ida.select('A1').press('ArrowRight').press('ArrowRight').press('ArrowUp', { shift: true });
    expect(ida.painted('A1').x).toBeCloseTo(0.52, 9);
    expect(ida.painted('A1').y).toBeCloseTo(-0.2, 9);
    await ida.wait(1000);
    expect(ida.room.committed).toHaveLength(1);
    ida.undo();
    expect(ida.place('A1')).toEqual({ x: 0.5, y: -0.3 });
  });

  test('two bursts are two undo entries', async () => {
    const ida = await new TestEditor().open();
    ida.select('A1').press('ArrowRight');
    await ida.wait(1000);
    ida.press('ArrowRight');
    await ida.wait(1000);
    ida.undo();
    expect(ida.place('A1').x).toBeCloseTo(0.51, 9);
  });

  test('a step into a keep-out is not taken and says why; the steps before it hold', async () => {
    const ida = await new TestEditor().open();
    ida.move('A3', 2.95, 0).press('ArrowRight', { shift: true });
    expect(ida.lastNotice).toMatchObject({ code: 'not-placeable' });
    expect(ida.painted('A3')).toMatchObject({ x: 2.95, y: 0 });
  });

  test('Delete removes what is selected and undo brings it back as it was', async () => {
    const ida = await new TestEditor().open();
    const before = ida.document;
    ida.select('A1', 'A3').press('Delete');
    expect([ida.has('A1'), ida.has('A2'), ida.has('A3')]).toEqual([false, true, false]);
    expect(ida.snapshot.selection).toEqual([]);
    ida.press('z', { control: true });
    expect(ida.document).toEqual(before);
  });
});

describe('undo', () => {
  test('undo and redo walk back and forth over my own edits', async () => {
    const ida = await new TestEditor().open();
    ida.move('A1', 1, 0.2).type('A1', { azimuthDeg: 45 });
    ida.undo();
    expect(ida.antenna('A1')).toMatchObject({ x: 1, azimuthDeg: 0 });
    ida.undo();
    expect(ida.place('A1')).toEqual({ x: 0.5, y: -0.3 });
    ida.redo().redo();
    expect(ida.antenna('A1')).toMatchObject({ x: 1, azimuthDeg: 45 });
    expect(ida.snapshot.canRedo).toBe(false);
    await ida.wait(200);
    expect(ida.room.document).toEqual(ida.document);
  });

  test('a new edit ends what could be redone', async () => {
    const ida = await new TestEditor().open();
    ida.move('A1', 1, 0.2).undo().move('A2', 2, 0.2);
    expect(ida.snapshot.canRedo).toBe(false);
  });

  test('undo takes back only my own edits', async () => {
    const [ida, ole] = await openTwo();
    ida.move('A1', 1, 0.2);
    await ida.wait();
    ole.move('A2', 2, 0.2);
    await ida.wait();
    ida.undo();
    expect(ida.place('A1')).toEqual({ x: 0.5, y: -0.3 });
    expect(ida.place('A2')).toEqual({ x: 2, y: 0.2 });
  });

  test('undo leaves alone what somebody changed since, and says who', async () => {
    const [ida, ole] = await openTwo();
    ida.move('A1', 1, 0.2);
    await ida.wait();
    ole.move('A1', 1.2, 0.4);
    await ida.wait();
    ida.undo();
    expect(ida.place('A1')).toEqual({ x: 1.2, y: 0.4 });
    expect(ida.lastNotice).toMatchObject({
      kind: 'undo',
      message: 'Nothing was undone: A1 has been changed since by Ole.',
    });
  });

  test('undo restores the fields that still hold what I set and names the rest', async () => {
    const [ida, ole] = await openTwo();
    ida.type('A1', { azimuthDeg: 30, feederLossDb: 2 });
    await ida.wait();
    ole.type('A1', { feederLossDb: 3 });
    await ida.wait();
    ida.undo();
    expect(ida.antenna('A1')).toMatchObject({ azimuthDeg: 0, feederLossDb: 3 });
    expect(ida.lastNotice?.message).toBe('Only part was undone: A1 has been changed since by Ole.');
  });

  test('an undo of what somebody removed says who removed it', async () => {
    const [ida, ole] = await openTwo();
    ida.move('A1', 1, 0.2);
    await ida.wait();
    ole.remove('A1');
    await ida.wait();
    ida.undo();
    expect(ida.has('A1')).toBe(false);
    expect(ida.lastNotice?.message).toBe('Nothing was undone: A1 has been removed since by Ole.');
  });
});

describe('others', () => {
  test('an antenna under somebody’s finger moves on my screen with its numbers, and stays when it is dropped', async () => {
    const [ida, ole] = await openTwo();
    const seen: number[] = [];
    ida.editor.subscribeTo(
      (snapshot) => snapshot.painted,
      () => seen.push(ida.painted('A1').x),
    );
    ole.grab('A1').dragTo(0.9, 0.1);
    await ida.wait();
    expect(ida.place('A1').x).toBe(0.5);
    expect(ida.painted('A1')).toMatchObject({ x: 0.9, y: 0.1 });
    expect(ida.snapshot.nudges).toMatchObject([{ name: 'Ole', label: 'A1', inDocument: true }]);
    expect(ida.snapshot.estimate).toEqual(estimateByDistance(ida.snapshot.painted ?? vanRoof()));
    ole.drop();
    await ida.wait();
    expect(ida.place('A1')).toEqual({ x: 0.9, y: 0.1 });
    expect(ida.snapshot.nudges).toEqual([]);
    // It never jumped back between the drop and its operation.
    expect(new Set(seen)).toEqual(new Set([0.9]));
  });

  test('a nudge whose end got lost is forgotten, one that is held is not', async () => {
    const [ida, ole] = await openTwo();
    ole.grab('A1').dragTo(0.9, 0.1);
    await ida.wait(10_000);
    expect(ida.painted('A1').x).toBe(0.9);
    ida.line.losesEvents = 1;
    ole.editor.cancel();
    await ida.wait(1000);
    expect(ida.painted('A1').x).toBe(0.9);
    await ida.wait(4000);
    expect(ida.painted('A1').x).toBe(0.5);
  });

  test('whoever leaves takes their nudges along', async () => {
    const [ida, ole] = await openTwo();
    ole.grab('A1').dragTo(0.9, 0.1);
    await ida.wait();
    expect(ida.snapshot.people).toHaveLength(2);
    ole.loseTheLine();
    await ida.wait();
    expect(ida.snapshot.people.map(({ name }) => name)).toEqual(['Ida']);
    expect(ida.painted('A1').x).toBe(0.5);
  });

  test('a part on its way from somebody’s shelf is a ghost with its mark', async () => {
    const [ida, ole] = await openTwo();
    ole.grab(SHELF_WHIP).dragTo(1, 0.5);
    await ida.wait();
    expect(ida.snapshot.nudges).toMatchObject([{ label: 'A4', inDocument: false, x: 1, y: 0.5 }]);
    ole.drop();
    await ida.wait();
    expect(ida.snapshot.nudges).toEqual([]);
    expect(ida.has('A4')).toBe(true);
  });

  test('the antenna under my own finger follows mine alone', async () => {
    const [ida, ole] = await openTwo();
    ida.grab('A1').dragTo(1, 0);
    ole.grab('A1').dragTo(2, 0.5);
    await ida.wait();
    expect(ida.painted('A1')).toMatchObject({ x: 1, y: 0 });
  });
});

describe('the server’s estimate', () => {
  test('confirms my own for the same document, and says when it differs', async () => {
    const ida = await new TestEditor().open();
    expect(ida.snapshot.agreement).toEqual({ kind: 'waiting' });
    ida.move('A1', 1, 0.2);
    await ida.wait();
    ida.room.sendEstimate(estimateByDistance(ida.room.document));
    await ida.wait();
    expect(ida.snapshot.agreement).toEqual({ kind: 'confirmed', sequence: 1 });
    ida.grab('A1').dragTo(1.1, 0.2);
    expect(ida.snapshot.agreement).toEqual({ kind: 'waiting' });
    ida.editor.cancel();
    ida.room.sendEstimate(estimateByDistance(vanRoof()));
    await ida.wait();
    expect(ida.snapshot.agreement).toMatchObject({ kind: 'differs', sequence: 1 });
  });

  test('of another solver version asks for a reload', async () => {
    const ida = await new TestEditor().open();
    ida.room.sendEstimate({ ...estimateByDistance(ida.room.document), solverVersion: 'distance-2' });
    await ida.wait();
    expect(ida.snapshot.agreement).toMatchObject({ kind: 'differs' });
    expect(JSON.stringify(ida.snapshot.agreement)).toContain('Reload');
  });
});

describe('a reader', () => {
  test('sees everything move and changes nothing, with a word why', async () => {
    const room = new LiveRoom(vanRoof(), new TestClock());
    const ole = await new TestEditor({ room, name: 'Ole' }).open();
    room.abilities = { edit: false, comment: true, saveRevision: false, submitRevision: false };
    const ida = await new TestEditor({ room, name: 'Ida' }).open();
    expect(ida.snapshot.canEdit).toBe(false);
    expect(ida.editor.beginDrag(ida.antenna('A1').id, ida.place('A1'))).toBe(false);
    ida.type('A1', { azimuthDeg: 20 });
    expect(ida.lastNotice).toMatchObject({ kind: 'refused', code: 'forbidden' });
    ole.move('A1', 1, 0.2);
    await ida.wait();
    expect(ida.place('A1')).toEqual({ x: 1, y: 0.2 });
  });
});

describe('snapshots', () => {
  test('are the same object until something changes, and parts that did not change keep their identity', async () => {
    const ida = await new TestEditor().open();
    const before = ida.snapshot;
    expect(ida.editor.getSnapshot()).toBe(before);
    ida.select('A1');
    expect(ida.snapshot).not.toBe(before);
    expect(ida.snapshot.document).toBe(before.document);
    expect(ida.snapshot.painted).toBe(before.painted);
    expect(ida.snapshot.notices).toBe(before.notices);
    expect(ida.snapshot.people).toBe(before.people);
  });
});
