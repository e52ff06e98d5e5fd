import { createLayoutEditor, type LayoutEditor } from '@/components/editor/layout-editor';
import type { EditorSnapshot, Notice, ShelfPart } from '@/components/editor/editor-snapshot';
import { keyCommand, keyMove, gridStep, type KeyPress } from '@/components/editor/key-commands';
import { createId } from '@/shared/ids';
import type { LayoutDocument, PlacedAntenna, Point } from '@/shared/layout/document';
import type { Change } from '@/shared/layout/operation';
import { DistanceEstimator } from './distance-estimator';
import { LiveRoom, type RoomLine } from './live-room';
import { MemoryStore } from './memory-store';
import { TestClock } from './test-clock';
import { vanRoof } from './van-roof';

export type TestEditorOptions = {
  readonly room?: LiveRoom;
  readonly document?: LayoutDocument;
  readonly name?: string;
  readonly memberId?: string;
  readonly store?: MemoryStore | null;
};

/** The real editor with verbs of what a person does; antennas go by their marks. */
export class TestEditor {
  readonly editor: LayoutEditor;
  readonly room: LiveRoom;
  readonly line: RoomLine;
  readonly store: MemoryStore | null;
  readonly estimator = new DistanceEstimator();
  readonly memberId: string;
  readonly name: string;

  constructor(options: TestEditorOptions = {}) {
    this.room = options.room ?? new LiveRoom(options.document ?? vanRoof(), new TestClock());
    this.name = options.name ?? 'Ida';
    this.memberId = options.memberId ?? createId();
    this.line = this.room.line(this.memberId, this.name);
    this.store = options.store === undefined ? new MemoryStore() : options.store;
    this.editor = createLayoutEditor({
      layoutId: this.room.layoutId,
      me: { memberId: this.memberId, name: this.name },
      transport: this.line,
      estimator: this.estimator,
      store: this.store,
      clock: this.room.clock,
    });
  }

  get snapshot(): EditorSnapshot {
    return this.editor.getSnapshot();
  }

  get document(): LayoutDocument {
    return present(this.snapshot.document, 'the layout is not open');
  }

  get messages(): string[] {
    return this.snapshot.notices.map(({ message }) => message);
  }

  get lastNotice(): Notice | undefined {
    return this.snapshot.notices.at(-1);
  }

  antenna(label: string): PlacedAntenna {
    return antennaOf(this.document, label);
  }

  painted(label: string): PlacedAntenna {
    return antennaOf(present(this.snapshot.painted, 'nothing is painted'), label);
  }

  place(label: string): Point {
    const { x, y } = this.antenna(label);
    return { x, y };
  }

  has(label: string): boolean {
    return Object.values(this.document.antennas).some((antenna) => antenna.label === label);
  }

  /** Opens the layout and waits until it is there. */
  async open(): Promise<this> {
    this.editor.start();
    return this.wait();
  }

  close(): this {
    this.editor.stop();
    return this;
  }

  /** Lets time pass: everything under way arrives. */
  async wait(milliseconds = 50): Promise<this> {
    await this.room.clock.advance(milliseconds);
    return this;
  }

  select(...labels: string[]): this {
    this.editor.select(labels.map((label) => this.antenna(label).id));
    return this;
  }

  /** Takes an antenna at its place, or a part from the shelf. */
  grab(what: string | ShelfPart, at?: Point): this {
    if (typeof what === 'string') this.editor.beginDrag(this.antenna(what).id, at ?? this.place(what));
    else this.editor.beginDrag(what, at ?? { x: -5, y: -5 });
    return this;
  }

  /** Moves the finger, without snapping. */
  dragTo(x: number, y: number): this {
    this.editor.dragTo({ x, y }, { snap: false });
    return this;
  }

  /** Moves the finger with snapping to lines within a tolerance. */
  slideTo(x: number, y: number, tolerance?: number): this {
    this.editor.dragTo({ x, y }, tolerance === undefined ? {} : { tolerance });
    return this;
  }

  drop(): this {
    this.editor.drop();
    return this;
  }

  move(label: string, x: number, y: number): this {
    return this.grab(label).dragTo(x, y).drop();
  }

  type(label: string, fields: Readonly<Record<string, unknown>>): this {
    this.editor.commit([{ kind: 'set', collection: 'antennas', id: this.antenna(label).id, fields }]);
    return this;
  }

  commit(...changes: Change[]): this {
    this.editor.commit(changes);
    return this;
  }

  remove(...labels: string[]): this {
    return this.select(...labels).press('Delete');
  }

  undo(): this {
    this.editor.undo();
    return this;
  }

  redo(): this {
    this.editor.redo();
    return this;
  }

  press(key: string, modifiers: Omit<KeyPress, 'key'> = {}): this {
    const command = keyCommand({ key, ...modifiers });
    if (command?.kind === 'move') {
      const { dx, dy } = keyMove(command, gridStep(this.document), 'right');
      this.editor.moveSelected(dx, dy);
    } else if (command?.kind === 'remove') this.editor.removeSelected();
    else if (command?.kind === 'cancel') this.editor.cancel();
    else if (command?.kind === 'undo') this.editor.undo();
    else if (command?.kind === 'redo') this.editor.redo();
    else if (command?.kind === 'edit-numbers') this.editor.settle();
    return this;
  }

  loseTheLine(): this {
    this.line.disconnect();
    return this;
  }

  findTheLine(): this {
    this.line.connect();
    return this;
  }
}

function antennaOf(document: LayoutDocument, label: string): PlacedAntenna {
  const antenna = Object.values(document.antennas).find((one) => one.label === label);
  return present(antenna, `no antenna ${label}`);
}

function present<T>(value: T | null | undefined, message: string): T {
  if (value === null || value === undefined) throw new Error(message);
  return value;
}
