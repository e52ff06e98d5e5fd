import {
  LOST,
  type EditorTransport,
  type JoinQuestion,
  type LiveEvent,
  type Lost,
  type MissedOperations,
} from '@/components/api/live-transport';
import type {
  JoinAnswer,
  NudgeMessage,
  OperationAnswer,
  PersonHere,
  PresenceMessage,
} from '@/shared/api/live';
import type { Layout } from '@/shared/api/layouts';
import type { Refusal } from '@/shared/errors';
import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';
import { applyOperation } from '@/shared/layout/operations';
import { createId } from '@/shared/ids';
import type { TestClock } from './test-clock';

/** How the lines of a room behave; every number is drawn anew for each message. */
export type Network = {
  readonly delay: () => number;
  /** How often the server's word arrives, at least once. */
  readonly repeats: () => number;
  /** Whether a message that is under way when the line breaks arrives all the same. */
  readonly survives: () => boolean;
};

const CALM: Network = { delay: () => 1, repeats: () => 1, survives: () => false };

/** The server's side of one layout in memory: one order, first answer kept, as the real one promises. */
export class LiveRoom {
  readonly layoutId = createId();
  readonly committed: CommittedOperation[] = [];
  readonly acknowledged = new Set<string>();
  /** Operations refused before they are looked at, by what the test wants. */
  refuseNext: Refusal | null = null;
  /** When set, joining with `after` is answered with the whole layout. */
  forgetsOperations = false;
  estimate: { readonly sequence: number; readonly result: Estimate } | null = null;
  abilities: Layout['abilities'] = { edit: true, comment: true, saveRevision: true, submitRevision: true };
  joinRefusal: Refusal | null = null;
  arrivals = 0;
  private readonly lines = new Set<RoomLine>();
  private readonly answers = new Map<string, OperationAnswer>();

  constructor(
    public document: LayoutDocument,
    readonly clock: TestClock,
    readonly network: Network = CALM,
  ) {}

  get sequence(): number {
    return this.committed.length;
  }

  get people(): PersonHere[] {
    return [...this.lines].filter((line) => line.isJoined).map((line) => line.person);
  }

  line(memberId: string, name: string): RoomLine {
    return new RoomLine(this, memberId, name);
  }

  connect(line: RoomLine): void {
    this.lines.add(line);
  }

  leave(line: RoomLine): void {
    this.lines.delete(line);
    this.broadcast({ kind: 'people', layoutId: this.layoutId, people: this.people });
  }

  join({ after }: JoinQuestion): JoinAnswer {
    if (this.joinRefusal) return { ok: false, refusal: this.joinRefusal };
    const isWhole = after === null || after > this.sequence || this.forgetsOperations;
    return {
      ok: true,
      layout: isWhole ? this.layout() : null,
      operations: isWhole ? [] : this.committed.slice(after),
      sequence: this.sequence,
      people: this.people,
      estimate: this.estimate,
      abilities: this.abilities,
    };
  }

  commit(operation: Operation, memberId: string, memberName: string): OperationAnswer {
    this.arrivals += 1;
    const first = this.answers.get(operation.id);
    if (first) return first;
    if (this.refuseNext) {
      const refusal = this.refuseNext;
      this.refuseNext = null;
      return { ok: false, refusal };
    }
    const result = applyOperation(this.document, operation);
    const answer: OperationAnswer = result.ok
      ? { ok: true, sequence: this.sequence + 1 }
      : { ok: false, refusal: result.refusal };
    this.answers.set(operation.id, answer);
    if (!result.ok) return answer;
    this.document = result.value;
    const committedAt = '2031-03-04T09:15:00.000Z';
    this.committed.push({ sequence: this.sequence + 1, operation, memberId, memberName, committedAt });
    for (const line of this.lines) {
      if (line.isJoined) line.say({ kind: 'operation', layoutId: this.layoutId, committed: this.newest() });
    }
    return answer;
  }

  broadcast(event: LiveEvent, except: RoomLine | null = null): void {
    for (const line of this.lines) if (line.isJoined && line !== except) line.say(event);
  }

  /** Says an estimate for what is committed now. */
  sendEstimate(result: Estimate): void {
    this.estimate = { sequence: this.sequence, result };
    this.broadcast({ kind: 'estimate', layoutId: this.layoutId, ...this.estimate });
  }

  layout(): Layout {
    return {
      id: this.layoutId,
      name: 'Roof',
      job: { id: createId(), name: 'Patrol van' },
      platform: { id: createId(), name: 'Van' },
      lastLetter: null,
      nextLetter: 'A',
      sequence: this.sequence,
      document: this.document,
      estimate: this.estimate,
      abilities: this.abilities,
    };
  }

  private newest(): CommittedOperation {
    const newest = this.committed.at(-1);
    if (!newest) throw new Error('nothing is committed');
    return newest;
  }
}

/** One client's line into a room; the test breaks and mends it. */
export class RoomLine implements EditorTransport {
  isJoined = false;
  isUp = false;
  /** How many of the server's words get lost from now on. */
  losesEvents = 0;
  /** The server does the next operation, but its answer gets lost. */
  losesNextAnswer = false;
  readonly nudges: NudgeMessage[] = [];
  readonly presences: PresenceMessage[] = [];
  person: PersonHere;
  private life = 0;
  private readonly listeners = new Set<(event: LiveEvent) => void>();
  private waiting = new Set<() => void>();

  constructor(
    private readonly room: LiveRoom,
    private readonly memberId: string,
    private readonly name: string,
  ) {
    const initials = name.slice(0, 2).toUpperCase();
    this.person = {
      socketId: '',
      memberId,
      name,
      initials,
      roles: ['integrator'],
      cursor: null,
      selection: [],
    };
  }

  connect(): void {
    if (this.isUp) return;
    this.isUp = true;
    this.life += 1;
    const socketId = `${this.memberId}-${this.life}`;
    this.person = { ...this.person, socketId };
    this.room.connect(this);
    this.later(() => this.tell({ kind: 'connected', socketId }));
  }

  disconnect(): void {
    if (!this.isUp) return;
    this.isUp = false;
    this.isJoined = false;
    this.life += 1;
    this.room.leave(this);
    const waiting = [...this.waiting];
    this.waiting.clear();
    for (const lose of waiting) lose();
    this.tell({ kind: 'disconnected' });
  }

  join(question: JoinQuestion): Promise<JoinAnswer | Lost> {
    return this.ask(() => {
      const isFirst = !this.isJoined;
      const answer = this.room.join(question);
      this.isJoined = answer.ok;
      if (isFirst && answer.ok) {
        const people = this.room.people;
        this.room.broadcast({ kind: 'people', layoutId: this.room.layoutId, people }, this);
      }
      return answer.ok ? { ...answer, people: this.room.people } : answer;
    });
  }

  async sendOperation(_layoutId: string, operation: Operation): Promise<OperationAnswer | Lost> {
    const answer = await this.ask(() => {
      const given = this.room.commit(operation, this.memberId, this.name);
      return this.losesNextAnswer ? LOST : given;
    });
    if (answer.ok === 'lost') this.losesNextAnswer = false;
    if (answer.ok === true) this.room.acknowledged.add(operation.id);
    return answer;
  }

  fetchOperations(_layoutId: string, after: number): Promise<MissedOperations | Lost> {
    return this.ask(() => ({
      ok: true as const,
      items: this.room.forgetsOperations ? [] : this.room.committed.slice(after, after + 500),
      sequence: this.room.sequence,
    }));
  }

  nudge(message: NudgeMessage): void {
    if (!this.isJoined) return;
    this.nudges.push(message);
    const { socketId } = this.person;
    this.room.broadcast({ kind: 'nudge', ...message, socketId, memberId: this.memberId }, this);
  }

  presence(message: PresenceMessage): void {
    this.presences.push(message);
    if (!this.isJoined) return;
    this.person = { ...this.person, cursor: message.cursor, selection: message.selection };
    this.room.broadcast({ kind: 'presence', layoutId: this.room.layoutId, person: this.person }, this);
  }

  listen(listener: (event: LiveEvent) => void): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  /** The server's word on its way to this client. */
  say(event: LiveEvent): void {
    if (this.losesEvents > 0) {
      this.losesEvents -= 1;
      return;
    }
    for (let count = this.room.network.repeats(); count > 0; count -= 1) this.later(() => this.tell(event));
  }

  private tell(event: LiveEvent): void {
    for (const listener of [...this.listeners]) listener(event);
  }

  private later(action: () => void): void {
    const { life } = this;
    this.room.clock.after(this.room.network.delay(), () => {
      if (life === this.life) action();
    });
  }

  /** A question reaches the server after a while and its answer comes back after another, if the line holds. */
  private ask<T>(answer: () => T): Promise<T | Lost> {
    if (!this.isUp) return Promise.resolve(LOST);
    const { life, room } = this;
    return new Promise((resolve) => {
      const lose = () => resolve(LOST);
      this.waiting.add(lose);
      room.clock.after(room.network.delay(), () => {
        if (life !== this.life && !room.network.survives()) return;
        const given = answer();
        room.clock.after(room.network.delay(), () => {
          if (life !== this.life) return;
          this.waiting.delete(lose);
          resolve(given);
        });
      });
    });
  }
}
