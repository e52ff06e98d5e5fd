import type { EditorTransport, LiveEvent } from '../api/live-transport';
import type { PendingStore } from '../api/offline-pending-store';
import type { JoinAnswer } from '@/shared/api/live';
import type { Layout } from '@/shared/api/layouts';
import type { ErrorCode, Refusal } from '@/shared/errors';
import { DOCUMENT_VERSION } from '@/shared/layout/document';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';
import type { EditorClock } from './editor-clock';
import type { Connection } from './editor-snapshot';
import { OperationLog, type Arrival } from './operation-log';

/** Wait before asking again what got no answer. */
const RETRY_DELAY = 1000;
/** A number that was announced and whose operation is not here after this long is fetched. */
const MISSING_DELAY = 1500;
/** So long a closed layout waits for the answers that are still out. */
const CLOSING_DELAY = 2000;
/** At most fifty operations a second go out after a long time offline; the server takes sixty. */
const SEND_SPACING = 20;
/** So often the same operation may meet an internal error before it is given up. */
const MOST_FAILURES = 5;

/** Refusals that say nothing about the operation: the same one can be taken later. */
const PASSING: readonly ErrorCode[] = ['too-many', 'unavailable', 'stopping', 'internal'];
/** Refusals that say that this member or this client is not let in. */
const SHUT_OUT: readonly ErrorCode[] = ['not-signed-in', 'expired', 'outdated-client'];

export type SynchronisationOptions = {
  readonly layoutId: string;
  readonly transport: EditorTransport;
  readonly store: PendingStore | null;
  readonly clock: EditorClock;
  /** Something of what is shown changed: documents, connection, abilities. */
  readonly onChange: () => void;
  /** Operations became part of the confirmed document, in order. */
  readonly onCommitted: (committed: readonly CommittedOperation[]) => void;
  /** The server refused an operation of mine, and it is rolled back. */
  readonly onRefused: (operation: Operation, refusal: Refusal) => void;
  /** An operation of mine was never sent and no longer applies. */
  readonly onDropped: (operation: Operation, refusal: Refusal) => void;
  readonly onJoined: (answer: JoinAnswer & { readonly ok: true }) => void;
  /** This device cannot keep pending operations. */
  readonly onStorageTrouble: () => void;
};

/**
 * The protocol's client side: joins, keeps the confirmed document in step with the one ordered stream, and sends my
 * operations one after the other, each when the one before it has its answer, so that their order is mine however
 * often the line breaks. A resent operation keeps its id: the server answers a second arrival as the first.
 */
export class Synchronisation {
  readonly log = new OperationLog();
  connection: Connection = { kind: 'connecting' };
  abilities: Layout['abilities'] | null = null;
  socketId: string | null = null;

  private readonly failures = new Map<string, number>();
  private stopListening: (() => void) | null = null;
  /** Counts connections and losses, so that answers of an earlier line are told apart. */
  private line = 0;
  /** Counts joins: only the answer to the last one says where this client stands. */
  private turn = 0;
  private isJoined = false;
  private isLoaded = false;
  private isStopped = true;
  /** Calls off the end of the line while it stays up for the last answers after `stop`. */
  private closing: (() => void) | null = null;
  /** The highest sequence number the server has spoken of. */
  private announced = 0;
  private inFlight: string | null = null;
  private lastSent = Number.NEGATIVE_INFINITY;
  private isFetching = false;
  private joinRetry: (() => void) | null = null;
  private sendLater: (() => void) | null = null;
  private storing: Promise<void> = Promise.resolve();

  constructor(private readonly options: SynchronisationOptions) {}

  /** Shows a layout that was fetched before the line stands. */
  open(layout: Layout): void {
    this.log.open(layout.document, layout.sequence);
    this.abilities = layout.abilities;
  }

  start(): void {
    this.closing?.();
    this.closing = null;
    if (!this.isStopped) return;
    this.isStopped = false;
    this.stopListening = this.options.transport.listen((event) => this.hear(event));
    void this.load();
    this.options.transport.connect();
  }

  /** Ends the line, after the answers that are still out (for a moment); the rest stays on the device. */
  stop(): void {
    if (this.isStopped || this.closing) return;
    if (this.isJoined && this.hasUnanswered) {
      this.closing = this.options.clock.after(CLOSING_DELAY, () => this.hangUp());
    } else this.hangUp();
  }

  private get hasUnanswered(): boolean {
    return this.log.pending.some(({ acknowledged }) => acknowledged === null);
  }

  private hangUp(): void {
    this.closing?.();
    this.closing = null;
    this.isStopped = true;
    this.breakLine();
    this.stopListening?.();
    this.options.transport.disconnect();
  }

  reconnect(): void {
    if (this.isStopped) return;
    this.options.transport.disconnect();
    this.breakLine();
    this.become({ kind: 'connecting' });
    this.options.transport.connect();
  }

  /** Takes an operation that applies to what is shown: kept on the device, sent when its turn comes. */
  submit(operation: Operation): void {
    this.log.append(operation);
    this.keep((store) => store.add(operation));
    this.sendNext();
  }

  private async load(): Promise<void> {
    const { store } = this.options;
    if (store && !this.isLoaded) {
      try {
        this.log.restore(await store.load());
      } catch {
        // The editor works without; the member is told that a reload would lose what is pending.
        this.options.onStorageTrouble();
      }
    }
    this.isLoaded = true;
    this.options.onChange();
    this.sendNext();
  }

  private hear(event: LiveEvent): void {
    switch (event.kind) {
      case 'connected':
        this.breakLine();
        this.socketId = event.socketId;
        this.become({ kind: 'connecting' });
        void this.join(this.line);
        return;
      case 'disconnected':
        this.breakLine();
        if (this.connection.kind === 'connecting' || this.connection.kind === 'online') {
          this.become({ kind: 'offline' });
        }
        return;
      case 'refused':
        if (!PASSING.includes(event.refusal.code)) this.shutOut(event.refusal);
        return;
      case 'operation':
        if (event.layoutId === this.options.layoutId) this.arrive(event.committed);
        return;
      case 'estimate':
        if (event.layoutId === this.options.layoutId) this.expect(event.sequence);
        return;
      case 'layout-changed':
        if (event.layoutId === this.options.layoutId && this.connection.kind === 'online') {
          void this.join(this.line);
        }
        return;
      default:
        // Crosshairs, comments and revisions are heard by those whom they concern.
        return;
    }
  }

  private async join(line: number, isWhole = false): Promise<void> {
    const { transport, layoutId } = this.options;
    // While the server puts this client into the room anew it takes no operations from it.
    this.isJoined = false;
    this.turn += 1;
    const { turn } = this;
    const after = this.log.isOpen && !isWhole ? this.log.sequence : null;
    const answer = await transport.join({ layoutId, after, version: DOCUMENT_VERSION });
    if (line !== this.line || turn !== this.turn || this.isStopped) return;
    if (answer.ok === 'lost' || (!answer.ok && PASSING.includes(answer.refusal.code))) {
      this.joinRetry?.();
      this.joinRetry = this.options.clock.after(RETRY_DELAY, () => void this.join(line, isWhole));
      return;
    }
    if (!answer.ok) {
      this.shutOut(answer.refusal);
      return;
    }
    this.adopt(answer, after, line);
  }

  private adopt(answer: JoinAnswer & { readonly ok: true }, after: number | null, line: number): void {
    // A server that was restored from an older backup holds less than this client: it is the one that counts.
    const isBehind = after !== null && answer.sequence < after;
    if (isBehind && !answer.layout) {
      void this.join(line, true);
      return;
    }
    if (answer.layout && (isBehind || !this.log.isOpen || answer.layout.sequence >= this.log.sequence)) {
      this.settle(this.log.open(answer.layout.document, answer.layout.sequence));
    }
    for (const committed of answer.operations) this.settle(this.log.receive(committed));
    this.abilities = answer.abilities;
    this.isJoined = true;
    this.options.onJoined(answer);
    this.become({ kind: 'online' });
    this.rebase();
    this.announced = isBehind ? answer.sequence : Math.max(this.announced, answer.sequence);
    if (this.isMissing) void this.fetchMissing();
    this.sendNext();
  }

  private arrive(committed: CommittedOperation): void {
    if (committed.operation.version > DOCUMENT_VERSION) {
      this.become({ kind: 'outdated' });
      return;
    }
    this.settle(this.log.receive(committed));
    this.expect(committed.sequence);
    this.rebase();
    this.options.onChange();
  }

  private settle(arrival: Arrival): void {
    switch (arrival.kind) {
      case 'applied':
        this.forget(arrival.committed.map(({ operation }) => operation.id));
        this.options.onCommitted(arrival.committed);
        return;
      case 'unreadable':
        this.forget(arrival.committed.map(({ operation }) => operation.id));
        this.options.onCommitted(arrival.committed);
        // Only a whole document helps; it holds the operation that this client could not follow.
        void this.join(this.line, true);
        return;
      case 'known':
      case 'gap':
        return;
    }
  }

  /** Lets go of what was never sent and no longer applies. */
  private rebase(): void {
    for (const { operation, refusal } of this.log.dropInapplicable()) {
      this.forget([operation.id]);
      this.options.onDropped(operation, refusal);
    }
  }

  /** A sequence number was announced: its operation is on its way, or lost and to be fetched. */
  private expect(sequence: number): void {
    this.announced = Math.max(this.announced, sequence);
    if (this.isJoined && this.isMissing) this.fetchAfter(MISSING_DELAY);
  }

  private get isMissing(): boolean {
    return this.announced > this.log.sequence;
  }

  private fetchAfter(milliseconds: number): void {
    const line = this.line;
    this.options.clock.after(milliseconds, () => {
      if (line === this.line && this.isJoined && this.isMissing) void this.fetchMissing();
    });
  }

  private async fetchMissing(): Promise<void> {
    if (this.isFetching) return;
    this.isFetching = true;
    const before = this.log.sequence;
    const answer = await this.options.transport.fetchOperations(this.options.layoutId, before);
    this.isFetching = false;
    if (this.isStopped) return;
    if (answer.ok === 'lost') {
      this.fetchAfter(RETRY_DELAY);
      return;
    }
    for (const committed of answer.items) this.settle(this.log.receive(committed));
    this.announced = Math.max(this.announced, answer.sequence);
    this.rebase();
    this.options.onChange();
    if (!this.isMissing) return;
    if (this.log.sequence > before) void this.fetchMissing();
    // The server no longer has these operations one by one.
    else if (this.isJoined) void this.join(this.line, true);
  }

  private sendNext(): void {
    if (!this.isJoined || !this.isLoaded || this.inFlight !== null || this.sendLater) return;
    const next = this.log.pending.find(({ acknowledged }) => acknowledged === null);
    if (!next) return;
    const now = this.options.clock.now();
    const wait = this.lastSent + SEND_SPACING - now;
    if (wait > 0) {
      this.waitToSend(wait);
      return;
    }
    this.lastSent = now;
    this.inFlight = next.operation.id;
    next.sent = true;
    void this.send(next.operation, this.line);
  }

  private waitToSend(milliseconds: number): void {
    this.sendLater?.();
    this.sendLater = this.options.clock.after(milliseconds, () => {
      this.sendLater = null;
      this.sendNext();
    });
  }

  private async send(operation: Operation, line: number): Promise<void> {
    const answer = await this.options.transport.sendOperation(this.options.layoutId, operation);
    if (this.isStopped) return;
    const isCurrent = line === this.line && this.inFlight === operation.id;
    if (isCurrent) this.inFlight = null;
    if (answer.ok === 'lost') {
      if (isCurrent) this.waitToSend(RETRY_DELAY);
      return;
    }
    if (answer.ok) {
      this.failures.delete(operation.id);
      this.log.acknowledge(operation.id, answer.sequence);
      this.forget([operation.id]);
      this.expect(answer.sequence);
    } else if (SHUT_OUT.includes(answer.refusal.code)) {
      this.shutOut(answer.refusal);
    } else if (this.isPassing(operation, answer.refusal)) {
      if (isCurrent) this.waitToSend(RETRY_DELAY);
    } else if (this.log.refuse(operation.id)) {
      this.forget([operation.id]);
      this.options.onRefused(operation, answer.refusal);
      this.rebase();
    }
    this.options.onChange();
    if (this.closing && !this.hasUnanswered) this.hangUp();
    else this.sendNext();
  }

  private isPassing(operation: Operation, refusal: Refusal): boolean {
    if (!PASSING.includes(refusal.code)) return false;
    if (refusal.code !== 'internal') return true;
    const failures = (this.failures.get(operation.id) ?? 0) + 1;
    this.failures.set(operation.id, failures);
    return failures < MOST_FAILURES;
  }

  private shutOut(refusal: Refusal): void {
    this.breakLine();
    this.become(refusal.code === 'outdated-client' ? { kind: 'outdated' } : { kind: 'refused', refusal });
  }

  private breakLine(): void {
    this.line += 1;
    this.isJoined = false;
    this.inFlight = null;
    this.joinRetry?.();
    this.joinRetry = null;
    this.sendLater?.();
    this.sendLater = null;
  }

  private become(connection: Connection): void {
    this.connection = connection;
    this.options.onChange();
  }

  private forget(operationIds: readonly string[]): void {
    this.keep((store) => store.remove(operationIds));
  }

  /** One write after the other: an operation is never removed from the device before it was put there. */
  private keep(write: (store: PendingStore) => Promise<void>): void {
    const { store, onStorageTrouble } = this.options;
    if (store) this.storing = this.storing.then(() => write(store)).catch(onStorageTrouble);
  }
}
