import type { Logger } from 'pino';
import type { z } from 'zod';
import { findLayout } from '../commands/load-layout';
import { readOperations } from '../commands/read-operations';
import { findLastLetter } from '../commands/save-revision';
import { can, decide, explainRefusal, type Actor } from '../policies/policy';
import { presentLayout, presentLayoutAbilities } from '../presenters/layout';
import { initialsOf } from '../presenters/person';
import {
  joinMessage,
  nudgeMessage,
  operationMessage,
  presenceMessage,
  type JoinAnswer,
  type NudgeMessage,
  type OperationAnswer,
  type PresenceMessage,
} from '@/shared/api/live';
import { accept, refuse, type Refusal, type Result } from '@/shared/errors';
import { DOCUMENT_VERSION } from '@/shared/layout/document';
import { FrameRelay } from './frame-relay';
import type { LiveLayouts } from './live-layouts';
import { layoutRoom, type LiveServer, type LiveSocket } from './live-socket';
import type { CurrentMember, MemberAccess } from './member-access';
import { MessageBudget, type MessageKind } from './message-budget';
import type { PeopleHere } from './people-here';
import { readMessage } from './read-message';

const FRAME_MS = 15;
const PRESENCE_EVERY_MS = 50;
const MOST_CAUGHT_UP = 500;
const KNOWN_EVENTS = new Set(['join', 'leave', 'operation', 'nudge', 'presence']);

/** What a socket shares with the others. */
export interface LayoutSocketContext {
  readonly io: LiveServer;
  readonly live: LiveLayouts;
  readonly access: MemberAccess;
  readonly people: PeopleHere;
  readonly log: Logger;
  readonly phase: { readonly stopping: boolean };
}

/**
 * One connection: watches at most one layout at a time. What asks for an answer and does not hold is answered
 * with a refusal; what cannot be answered and does not hold ends the connection.
 */
export class LayoutSocket {
  private readonly budget = new MessageBudget();
  private readonly nudges: FrameRelay<NudgeMessage>;
  private readonly presence: FrameRelay<PresenceMessage>;
  private joining = 0;

  constructor(
    private readonly socket: LiveSocket,
    private readonly context: LayoutSocketContext,
  ) {
    this.nudges = new FrameRelay(FRAME_MS, (nudge) => this.sendNudge(nudge));
    this.presence = new FrameRelay(PRESENCE_EVERY_MS, (presence) => this.sendPresence(presence));
  }

  /** Starts taking messages. */
  listen(): void {
    const { socket } = this;
    socket.use(([event], next) => {
      const kind: MessageKind = event === 'nudge' || event === 'presence' ? 'volatile' : 'operation';
      if (!this.budget.take(kind, performance.now())) {
        this.end({
          code: 'too-many',
          message: 'Too many messages in a second. The connection is closed for now.',
        });
      } else if (!KNOWN_EVENTS.has(event)) {
        this.end({ code: 'invalid', message: 'This message is not known here.' });
      } else next();
    });
    socket.on('join', (message, answer) => {
      this.answer<JoinAnswer>(answer, () => this.join(message));
    });
    socket.on('operation', (message, answer) => {
      this.answer<OperationAnswer>(answer, () => this.operate(message));
    });
    socket.on('leave', () => this.leave());
    socket.on('nudge', (message) => this.takeNudge(message));
    socket.on('presence', (message) => this.takePresence(message));
    socket.on('disconnect', () => this.leave());
  }

  private answer<A extends { readonly ok: boolean }>(
    respond: unknown,
    work: () => Promise<A | { readonly ok: false; readonly refusal: Refusal }>,
  ): void {
    if (typeof respond !== 'function') {
      this.end({ code: 'invalid', message: 'This message needs a way to answer it.' });
      return;
    }
    work().then(
      (answer) => respond(answer),
      (error: unknown) => {
        this.context.log.error({ err: error, layout: this.socket.data.layoutId }, 'a live message failed');
        respond(refuse('internal', 'Something went wrong here. It has been written down; try again.'));
      },
    );
  }

  private async join(message: unknown): Promise<JoinAnswer> {
    const { socket } = this;
    const { live, people } = this.context;
    const parsed = readMessage(joinMessage, message);
    if (!parsed.ok) return parsed;
    const { layoutId, after, version } = parsed.value;
    if (version !== DOCUMENT_VERSION) {
      return refused('outdated-client', 'This window speaks another version of the layout. Reload it.');
    }
    this.leave();
    const turn = (this.joining += 1);
    const member = await this.findMember();
    if (!member.ok) return member;
    const { actor, name } = member.value;
    const layout = await findLayout(actor.teamId, layoutId);
    if (layout === null || !can(actor, 'see-layouts', layout)) {
      return refused('not-found', explainRefusal('not-found'));
    }
    const writer = await live.open(layoutId);
    const lastLetter = await findLastLetter(layoutId);
    // A later join or a leave came in the meantime: this one no longer counts.
    if (turn !== this.joining || !socket.connected)
      return refused('conflict', 'Another layout was opened meanwhile.');
    // In the room first, then the state: what is committed from here on comes as events.
    socket.data.layoutId = layoutId;
    void socket.join(layoutRoom(layoutId));
    const { state } = writer;
    people.put(layoutId, {
      socketId: socket.id,
      memberId: actor.memberId,
      name,
      initials: initialsOf(name),
      roles: [...actor.roles],
      cursor: null,
      selection: [],
    });
    const estimate = live.estimates.latest(layoutId);
    const catchesUp = after !== null && after <= state.sequence && state.sequence - after <= MOST_CAUGHT_UP;
    const answer: JoinAnswer = {
      ok: true,
      layout: catchesUp ? null : presentLayout(actor, layout, { state, lastLetter, estimate }),
      operations: catchesUp ? await readOperations(layoutId, after, state.sequence) : [],
      sequence: state.sequence,
      people: people.list(layoutId),
      estimate,
      abilities: presentLayoutAbilities(actor, layout),
    };
    this.sayWhoIsHere(layoutId);
    return answer;
  }

  private async operate(message: unknown): Promise<OperationAnswer> {
    const parsed = readMessage(operationMessage, message);
    if (!parsed.ok) return parsed;
    const { layoutId, operation } = parsed.value;
    if (this.context.phase.stopping)
      return refused('stopping', 'The server is stopping. The change is sent again.');
    if (this.socket.data.layoutId !== layoutId) {
      return refused('not-found', 'Open the layout before changing it.');
    }
    const member = await this.findMember();
    if (!member.ok) return member;
    const { actor, name } = member.value;
    const decision = decide(actor, 'edit-layouts', actor);
    if (decision !== 'allowed') return refused(decision, explainRefusal(decision));
    const writer = await this.context.live.writers.open(layoutId);
    const answer = await writer.submit(operation, { id: actor.memberId, name });
    return answer.ok ? { ok: true, sequence: answer.value } : answer;
  }

  private takeNudge(message: unknown): void {
    const nudge = this.readVolatile(nudgeMessage, message);
    if (nudge === null) return;
    if (nudge.done) this.nudges.pass(nudge);
    else this.nudges.push(nudge);
  }

  private takePresence(message: unknown): void {
    const presence = this.readVolatile(presenceMessage, message);
    if (presence !== null) this.presence.push(presence);
  }

  // Late ones, for a layout that was left, are nothing to complain about.
  private readVolatile<T extends z.ZodType<{ layoutId: string }>>(
    schema: T,
    message: unknown,
  ): z.infer<T> | null {
    const parsed = readMessage(schema, message);
    if (!parsed.ok) {
      this.end(parsed.refusal);
      return null;
    }
    return parsed.value.layoutId === this.socket.data.layoutId ? parsed.value : null;
  }

  // Only who may edit moves antennas, in others' view as well.
  private sendNudge(nudge: NudgeMessage): void {
    const { id, data } = this.socket;
    if (data.layoutId !== nudge.layoutId || !can(data.actor, 'edit-layouts', data.actor)) return;
    const message = { ...nudge, socketId: id, memberId: data.memberId };
    const others = this.socket.to(layoutRoom(nudge.layoutId));
    if (nudge.done) others.emit('nudge', message);
    else others.volatile.emit('nudge', message);
  }

  private sendPresence({ layoutId, cursor, selection }: PresenceMessage): void {
    const { people } = this.context;
    const person = people.find(layoutId, this.socket.id);
    if (person === undefined) return;
    const moved = { ...person, cursor, selection };
    people.put(layoutId, moved);
    this.socket.to(layoutRoom(layoutId)).volatile.emit('presence', { layoutId, person: moved });
  }

  private leave(): void {
    const { socket } = this;
    const { layoutId } = socket.data;
    this.joining += 1;
    this.nudges.stop();
    this.presence.stop();
    if (layoutId === null) return;
    socket.data.layoutId = null;
    void socket.leave(layoutRoom(layoutId));
    if (this.context.people.remove(layoutId, socket.id)) this.sayWhoIsHere(layoutId);
  }

  private sayWhoIsHere(layoutId: string): void {
    const { io, people } = this.context;
    io.to(layoutRoom(layoutId)).emit('people', { layoutId, people: people.list(layoutId) });
  }

  /** The membership as it is now; without one, or after the session's end, the connection ends. */
  private async findMember(): Promise<Result<CurrentMember>> {
    const { data } = this.socket;
    const member = Date.now() < data.sessionEndsAt ? await this.context.access.find(data.memberId) : null;
    if (member === null) {
      const refusal: Refusal = {
        code: 'not-signed-in',
        message: 'Your access ended. Sign in again to go on.',
      };
      this.end(refusal);
      return { ok: false, refusal };
    }
    data.actor = member.actor satisfies Actor;
    return accept(member);
  }

  private end(refusal: Refusal): void {
    this.context.log.info({ code: refusal.code, member: this.socket.data.memberId }, 'a socket was refused');
    this.socket.emit('refused', refusal);
    this.socket.disconnect(true);
  }
}

function refused(code: Refusal['code'], message: string): { readonly ok: false; readonly refusal: Refusal } {
  return { ok: false, refusal: { code, message } };
}
