import type { Comment } from '@/shared/api/comments';
import type {
  JoinAnswer,
  LayoutEstimate,
  NudgeMessage,
  OperationAnswer,
  PersonHere,
  PresenceMessage,
} from '@/shared/api/live';
import type { Revision } from '@/shared/api/revisions';
import type { Refusal } from '@/shared/errors';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';

/** The question reached nobody, or its answer got lost: what became of it is unknown. */
export type Lost = { readonly ok: 'lost' };
export const LOST: Lost = { ok: 'lost' };

/** What the line tells: its own state, and whatever the server says. */
export type LiveEvent =
  | { readonly kind: 'connected'; readonly socketId: string }
  | { readonly kind: 'disconnected' }
  /** The server does not let us in, or said why before it hung up. */
  | { readonly kind: 'refused'; readonly refusal: Refusal }
  | { readonly kind: 'operation'; readonly layoutId: string; readonly committed: CommittedOperation }
  | ({ readonly kind: 'nudge'; readonly socketId: string; readonly memberId: string } & NudgeMessage)
  | { readonly kind: 'presence'; readonly layoutId: string; readonly person: PersonHere }
  | { readonly kind: 'people'; readonly layoutId: string; readonly people: readonly PersonHere[] }
  | ({ readonly kind: 'estimate'; readonly layoutId: string } & LayoutEstimate)
  | { readonly kind: 'comment'; readonly layoutId: string; readonly comment: Comment }
  | { readonly kind: 'revision'; readonly layoutId: string; readonly revision: Revision }
  | { readonly kind: 'layout-changed'; readonly layoutId: string };

export type JoinQuestion = {
  readonly layoutId: string;
  readonly after: number | null;
  readonly version: number;
};

export type MissedOperations = {
  readonly ok: true;
  readonly items: readonly CommittedOperation[];
  readonly sequence: number;
};

/** The editor's line to the server; questions are answered with a value or `LOST`, never by throwing. */
export interface EditorTransport {
  /** Starts connecting, and connects again by itself after a loss until `disconnect`. */
  connect(): void;
  disconnect(): void;
  join(question: JoinQuestion): Promise<JoinAnswer | Lost>;
  sendOperation(layoutId: string, operation: Operation): Promise<OperationAnswer | Lost>;
  /** What was committed after a sequence number; at most 500, oldest first. */
  fetchOperations(layoutId: string, after: number): Promise<MissedOperations | Lost>;
  nudge(message: NudgeMessage): void;
  presence(message: PresenceMessage): void;
  /** Any number of listeners; returns how to stop listening. */
  listen(listener: (event: LiveEvent) => void): () => void;
}
