import type { LiveEvent } from '../api/live-transport';
import { accept, refuse, type Refusal, type Result } from '@/shared/errors';
import { createId } from '@/shared/ids';
import { DOCUMENT_VERSION, type LayoutDocument, type Point } from '@/shared/layout/document';
import type { Change, CommittedOperation, Operation } from '@/shared/layout/operation';
import { applyOperation } from '@/shared/layout/operations';
import { describeOperation } from './describe-operation';
import { EditHistory, type StepBack } from './edit-history';
import { createSystemClock, type EditorClock } from './editor-clock';
import type { DragOptions, LayoutEditor, LayoutEditorOptions } from './editor-contract';
import type { EditorSnapshot, ShelfPart } from './editor-snapshot';
import { Finger } from './finger';
import { freeSpot } from './free-spot';
import { freshAntenna } from './gesture';
import { HereNow } from './here-now';
import { NoticeBoard } from './notice-board';
import { OutgoingPresence } from './outgoing-presence';
import { SnapshotMaker } from './snapshot-maker';
import { Synchronisation } from './synchronisation';

export type { DragOptions, LayoutEditor, LayoutEditorOptions };

/** Opens a layout; nothing goes over the line before `start`. */
export function createLayoutEditor(options: LayoutEditorOptions): LayoutEditor {
  return new OpenLayout(options);
}

class OpenLayout implements LayoutEditor {
  private readonly clock: EditorClock;
  private readonly sync: Synchronisation;
  private readonly here: HereNow;
  private readonly outgoing: OutgoingPresence;
  private readonly finger: Finger;
  private readonly history = new EditHistory();
  private readonly board = new NoticeBoard();
  private readonly maker: SnapshotMaker;
  private readonly listeners = new Set<() => void>();
  private selection: readonly string[] = [];
  private serverEstimate: EditorSnapshot['serverEstimate'];
  private snapshot: EditorSnapshot;
  private followed: LayoutDocument | null = null;
  private frame: (() => void) | null = null;
  private stopListening: (() => void) | null = null;

  constructor(private readonly options: LayoutEditorOptions) {
    const { layoutId, transport, layout = null, store = null } = options;
    this.clock = options.clock ?? createSystemClock();
    this.sync = new Synchronisation({
      layoutId,
      transport,
      store,
      clock: this.clock,
      onChange: () => this.refreshSoon(),
      onCommitted: (committed) => this.witness(committed),
      onRefused: (operation, refusal) => this.rollBack('refused', operation, refusal),
      onDropped: (operation, refusal) => this.rollBack('dropped', operation, refusal),
      onJoined: ({ people, estimate }) => {
        this.here.arrive(people);
        if (estimate) this.serverEstimate = estimate;
        this.outgoing.repeat();
      },
      onStorageTrouble: () => {
        this.board.add('storage', 'This device cannot keep changes that are not sent yet: do not reload.');
        this.refreshSoon();
      },
    });
    this.here = new HereNow(this.clock, () => this.refreshSoon());
    this.outgoing = new OutgoingPresence(layoutId, transport, this.clock);
    this.finger = new Finger({
      clock: this.clock,
      outgoing: this.outgoing,
      document: () => this.sync.log.shown,
      reservedLabels: () => this.snapshot.nudges.map(({ label }) => label),
      commit: (changes) => this.make(changes),
      onRest: () => void this.settle(),
    });
    this.maker = new SnapshotMaker(options.estimator);
    if (layout) this.sync.open(layout);
    this.serverEstimate = layout?.estimate ?? null;
    this.snapshot = this.makeSnapshot();
  }

  getSnapshot = (): EditorSnapshot => this.snapshot;

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  subscribeTo<T>(
    select: (snapshot: EditorSnapshot) => T,
    listener: (value: T) => void,
    isSame: (a: T, b: T) => boolean = Object.is,
  ): () => void {
    let last = select(this.snapshot);
    return this.subscribe(() => {
      const value = select(this.snapshot);
      if (isSame(value, last)) return;
      last = value;
      listener(value);
    });
  }

  start(): void {
    this.stopListening ??= this.options.transport.listen((event) => this.hear(event));
    this.sync.start();
  }

  stop(): void {
    this.settle();
    this.finger.cancel();
    this.outgoing.stop();
    this.stopListening?.();
    this.stopListening = null;
    this.sync.stop();
    this.frame?.();
    this.frame = null;
  }

  reconnect(): void {
    this.sync.reconnect();
  }

  commit(changes: readonly Change[], { isQuiet = false } = {}): Result<void> {
    this.settle();
    const result = this.make(changes);
    if (!result.ok && !isQuiet) this.board.add('refused', result.refusal.message, result.refusal, changes);
    this.refresh();
    return result;
  }

  undo(): void {
    this.takeBack('undo');
  }

  redo(): void {
    this.takeBack('redo');
  }

  select(antennaIds: readonly string[]): void {
    const isSame =
      antennaIds.length === this.selection.length && antennaIds.every((id) => this.selection.includes(id));
    if (isSame) return;
    this.settle();
    this.selection = [...antennaIds];
    this.outgoing.select(this.selection);
    this.refresh();
  }

  removeSelected(): Result<void> {
    this.settle();
    const changes = this.selection.map((id): Change => ({ kind: 'remove', collection: 'antennas', id }));
    return changes.length > 0 ? this.commit(changes) : accept(undefined);
  }

  beginDrag(what: string | ShelfPart, pointer: Point): boolean {
    this.settle();
    this.finger.cancel();
    const isHeld = this.canEdit && this.finger.hold(what, this.selection, pointer);
    if (isHeld && typeof what === 'string' && !this.selection.includes(what)) {
      this.selection = [what];
      this.outgoing.select(this.selection);
    }
    this.refresh();
    return isHeld;
  }

  dragTo(pointer: Point, { tolerance, snap }: DragOptions = {}): void {
    this.finger.moveTo(pointer, { tolerance, snap });
    this.refresh();
  }

  drop(): Result<void> {
    const fresh = this.finger.gesture?.fresh?.id;
    const result = this.finger.release();
    if (!result.ok) this.board.add('refused', result.refusal.message, result.refusal);
    else if (fresh && Object.hasOwn(this.sync.log.shown?.antennas ?? {}, fresh)) this.select([fresh]);
    this.refresh();
    return result;
  }

  cancel(): void {
    this.finger.cancel();
    this.refresh();
  }

  place(part: ShelfPart): Result<string> {
    this.settle();
    const document = this.sync.log.shown;
    if (!document) return refuse('unavailable', 'The layout is not there yet.');
    const reserved = this.snapshot.nudges.map(({ label }) => label);
    const antenna = freshAntenna(document, part, { x: 0, y: 0 }, reserved);
    const spot = freeSpot(document, antenna);
    if (!spot) {
      const refusal = refuse('not-placeable', `There is no free place for ${part.name} on this platform.`);
      return this.say(refusal);
    }
    const value = { ...antenna, ...spot };
    const result = this.commit([{ kind: 'add', collection: 'antennas', value }]);
    if (!result.ok) return result;
    this.select([value.id]);
    return accept(value.id);
  }

  moveSelected(dx: number, dy: number): Result<void> {
    const refusal = this.refusalToEdit();
    if (refusal) return this.say({ ok: false, refusal });
    const result = this.finger.step(this.selection, dx, dy);
    if (!result.ok) return this.say(result);
    this.refresh();
    return result;
  }

  settle(): Result<void> {
    if (this.finger.gesture?.shown.kind !== 'keys') return accept(undefined);
    return this.drop();
  }

  pointAt(cursor: Point | null): void {
    this.outgoing.pointAt(cursor);
  }

  dismissNotice(noticeId: number): void {
    this.board.dismiss(noticeId);
    this.refresh();
  }

  retryNotice(noticeId: number): Result<void> {
    const changes = this.board.notices.find(({ id }) => id === noticeId)?.changes;
    this.board.dismiss(noticeId);
    return this.commit(changes ?? []);
  }

  private get canEdit(): boolean {
    return this.refusalToEdit() === null;
  }

  private refusalToEdit(): Refusal | null {
    const { connection, abilities, log } = this.sync;
    if (!log.isOpen || !abilities) return { code: 'unavailable', message: 'The layout is not there yet.' };
    if (connection.kind === 'refused') return connection.refusal;
    if (connection.kind === 'outdated') {
      return { code: 'outdated-client', message: 'Reload this page first: the layout has a newer form.' };
    }
    if (abilities.edit) return null;
    return { code: 'forbidden', message: 'You may look at this layout but not change it.' };
  }

  /** Applies and submits one operation; remembers it for undo unless it is one of the two itself. */
  private make(
    changes: readonly Change[],
    remember: (operation: Operation, before: LayoutDocument) => void = (operation, before) =>
      this.history.record(operation, before),
  ): Result<void> {
    const refusal = this.refusalToEdit();
    const before = this.sync.log.shown;
    if (refusal) return { ok: false, refusal };
    if (!before || changes.length === 0) return accept(undefined);
    const operation: Operation = { id: createId(), version: DOCUMENT_VERSION, changes };
    const applied = applyOperation(before, operation);
    if (!applied.ok) return applied;
    remember(operation, before);
    this.sync.submit(operation);
    return accept(undefined);
  }

  private takeBack(direction: 'undo' | 'redo'): void {
    this.settle();
    this.finger.cancel();
    const document = this.sync.log.shown;
    const refusal = this.refusalToEdit();
    if (!document || refusal) {
      if (refusal) this.board.add('refused', refusal.message, refusal);
      this.refresh();
      return;
    }
    const step = direction === 'undo' ? this.history.takeUndo(document) : this.history.takeRedo(document);
    if (step) this.makeStepBack(step, direction);
    this.refresh();
  }

  private makeStepBack({ changes, left }: StepBack, direction: 'undo' | 'redo'): void {
    const result = this.make(changes, (operation, before) =>
      direction === 'undo'
        ? this.history.recordUndo(operation, before)
        : this.history.recordRedo(operation, before),
    );
    const done = direction === 'undo' ? 'undone' : 'redone';
    if (!result.ok)
      this.board.add('undo', `This could not be ${done}: ${result.refusal.message}`, result.refusal);
    if (left.length === 0) return;
    const part = changes.length > 0 ? `Only part was ${done}` : `Nothing was ${done}`;
    this.board.add('undo', `${part}: ${left.join('; ')}.`);
  }

  private hear(event: LiveEvent): void {
    const { layoutId } = this.options;
    switch (event.kind) {
      case 'nudge':
        if (event.layoutId !== layoutId || event.socketId === this.sync.socketId) return;
        this.here.nudge(event.socketId, event.memberId, event);
        return;
      case 'presence':
        if (event.layoutId === layoutId) this.here.update(event.person);
        return;
      case 'people':
        if (event.layoutId === layoutId) this.here.arrive(event.people);
        return;
      case 'estimate':
        if (event.layoutId !== layoutId || event.sequence < (this.serverEstimate?.sequence ?? 0)) return;
        this.serverEstimate = { sequence: event.sequence, result: event.result };
        this.refreshSoon();
        return;
      case 'disconnected':
        this.here.clear();
        this.refreshSoon();
        return;
      default:
        return;
    }
  }

  private witness(committed: readonly CommittedOperation[]): void {
    this.history.witness(committed);
    this.here.settle(committed);
  }

  private rollBack(kind: 'refused' | 'dropped', operation: Operation, refusal: Refusal): void {
    this.history.forget(operation.id);
    const what = describeOperation(this.sync.log.shown, operation);
    const verb = kind === 'refused' ? 'The server refused' : 'No longer possible:';
    this.board.add(kind, `${verb} ${what}. ${refusal.message}`, refusal, operation.changes);
    this.refreshSoon();
  }

  private say<T>(result: Result<T>): Result<T> {
    if (!result.ok) this.board.add('refused', result.refusal.message, result.refusal);
    this.refresh();
    return result;
  }

  /** What comes from outside is painted with the next frame, together with its numbers. */
  private refreshSoon(): void {
    this.frame ??= this.clock.nextFrame(() => this.refresh());
  }

  private refresh(): void {
    this.frame?.();
    this.frame = null;
    this.snapshot = this.makeSnapshot();
    for (const listener of [...this.listeners]) listener();
  }

  private makeSnapshot(): EditorSnapshot {
    const { log, connection, abilities, socketId } = this.sync;
    const document = log.shown;
    if (document && document !== this.followed) this.follow(document);
    return this.maker.make({
      layoutId: this.options.layoutId,
      document,
      serverEstimate: this.serverEstimate,
      sequence: log.sequence,
      pendingCount: log.pending.length,
      selection: this.selection,
      gesture: this.finger.gesture,
      connection,
      abilities,
      canEdit: this.canEdit,
      people: this.here.people,
      socketId,
      nudges: document ? this.here.nudges(document) : [],
      canUndo: this.history.canUndo,
      canRedo: this.history.canRedo,
      notices: this.board.notices,
    });
  }

  private follow(document: LayoutDocument): void {
    this.followed = document;
    const lost = this.finger.follow(document);
    if (lost) this.board.add('information', `${lost} was removed while you held it.`);
    if (this.selection.some((id) => !Object.hasOwn(document.antennas, id))) {
      this.selection = this.selection.filter((id) => Object.hasOwn(document.antennas, id));
      this.outgoing.select(this.selection);
    }
  }
}
