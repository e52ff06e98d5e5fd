import fc from 'fast-check';
import { LiveRoom, type Network } from '@/tests/support/live-room';
import { MemoryStore } from '@/tests/support/memory-store';
import { TestClock } from '@/tests/support/test-clock';
import { TestEditor } from '@/tests/support/test-editor';
import { vanRoof, WHIP } from '@/tests/support/van-roof';

/**
 * Law: whatever the lines do, once they stand and rest, every client holds the server's document, the server's
 * document is its operations in their order, each id is in it once, and nothing acknowledged is missing.
 */

type Step =
  | {
      readonly do: 'move';
      readonly who: number;
      readonly which: number;
      readonly x: number;
      readonly y: number;
    }
  | { readonly do: 'turn'; readonly who: number; readonly which: number; readonly azimuthDeg: number }
  | { readonly do: 'place' | 'remove' | 'undo' | 'redo'; readonly who: number; readonly which: number }
  | { readonly do: 'lose' | 'find' | 'miss' | 'mute' | 'reload'; readonly who: number }
  | { readonly do: 'wait'; readonly milliseconds: number };

const who = fc.nat({ max: 2 });
const which = fc.nat({ max: 5 });
const step: fc.Arbitrary<Step> = fc.oneof(
  {
    weight: 6,
    arbitrary: fc.record({ do: fc.constant('move' as const), who, which, x: place(3), y: place(0.9) }),
  },
  {
    weight: 3,
    arbitrary: fc.record({ do: fc.constant('turn' as const), who, which, azimuthDeg: fc.nat({ max: 359 }) }),
  },
  {
    weight: 4,
    arbitrary: fc.record({ do: fc.constantFrom('place' as const, 'remove', 'undo', 'redo'), who, which }),
  },
  {
    weight: 3,
    arbitrary: fc.record({ do: fc.constantFrom('lose' as const, 'find', 'miss', 'mute', 'reload'), who }),
  },
  {
    weight: 5,
    arbitrary: fc.record({ do: fc.constant('wait' as const), milliseconds: fc.nat({ max: 120 }) }),
  },
);

function place(most: number): fc.Arbitrary<number> {
  return fc.integer({ min: 0, max: 100 }).map((part) => (part / 100) * most);
}

/** A stream of numbers in 0 ... 1 from a seed (xorshift32), for the moods of the lines. */
function numbersFrom(seed: number): () => number {
  let state = seed | 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}

/** Messages overtake one another, come twice, and some of those under way survive a broken line. */
function roughNetwork(seed: number): Network {
  const draw = numbersFrom(seed);
  return {
    delay: () => 1 + Math.floor(draw() * 60),
    repeats: () => (draw() < 0.25 ? 2 : 1),
    survives: () => draw() < 0.5,
  };
}

class People {
  readonly room: LiveRoom;
  readonly stores: MemoryStore[];
  editors: TestEditor[] = [];

  constructor(
    readonly count: number,
    seed: number,
  ) {
    this.room = new LiveRoom(vanRoof(), new TestClock(), roughNetwork(seed));
    this.stores = Array.from({ length: count }, () => new MemoryStore());
  }

  async open(): Promise<void> {
    for (let index = 0; index < this.count; index += 1) this.editors[index] = await this.enter(index);
    await this.room.clock.advance(500);
  }

  async do(step: Step): Promise<void> {
    if (step.do === 'wait') {
      await this.room.clock.advance(step.milliseconds);
      return;
    }
    const index = step.who % this.count;
    const editor = this.editors[index];
    if (!editor?.snapshot.document) return;
    switch (step.do) {
      case 'lose':
        editor.loseTheLine();
        return;
      case 'find':
        editor.findTheLine();
        return;
      case 'miss':
        editor.line.losesEvents += 1;
        return;
      case 'mute':
        editor.line.losesNextAnswer = true;
        return;
      case 'reload':
        // What was handed to the browser's database is written before the page is there again.
        await editor.loseTheLine().close().wait(0);
        this.editors[index] = await this.enter(index);
        return;
      case 'undo':
        editor.undo();
        return;
      case 'redo':
        editor.redo();
        return;
      case 'place':
        editor.editor.place({ name: 'Whip', part: WHIP });
        return;
      default:
        this.edit(editor, step);
    }
  }

  /** All lines stand, and nobody does anything for a while. */
  async rest(): Promise<void> {
    for (const editor of this.editors) {
      editor.line.losesEvents = 0;
      editor.findTheLine();
    }
    await this.room.clock.advance(40_000);
  }

  private edit(editor: TestEditor, step: Step & { readonly which: number }): void {
    const antennas = Object.values(editor.document.antennas);
    const label = antennas[step.which % Math.max(1, antennas.length)]?.label;
    if (!label) return;
    if (step.do === 'move') editor.move(label, step.x, step.y);
    else if (step.do === 'turn') editor.type(label, { azimuthDeg: step.azimuthDeg });
    else editor.remove(label);
  }

  private enter(index: number): Promise<TestEditor> {
    const store = this.stores[index] ?? null;
    return new TestEditor({ room: this.room, name: `P${index}`, memberId: `m${index}`, store }).open();
  }
}

describe.each([
  { count: 2, seed: 20_310_304 },
  { count: 3, seed: 20_310_305 },
])('$count people on bad lines', ({ count, seed }) => {
  test('end with the same document, and nothing acknowledged is lost', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 5, maxLength: 40 }), fc.integer(), async (steps, mood) => {
        const people = new People(count, mood);
        await people.open();
        for (const one of steps) await people.do(one);
        await people.rest();
        const { room, editors, stores } = people;
        for (const editor of editors) {
          expect(editor.snapshot.connection).toEqual({ kind: 'online' });
          expect(editor.snapshot.pendingCount).toBe(0);
          expect(editor.snapshot.sequence).toBe(room.sequence);
          expect(editor.document).toEqual(room.document);
        }
        const ids = room.committed.map(({ operation }) => operation.id);
        expect(new Set(ids).size).toBe(ids.length);
        for (const id of room.acknowledged) expect(ids).toContain(id);
        for (const store of stores) expect(store.operations).toEqual([]);
      }),
      { seed, numRuns: 60 },
    );
  });
});
