import { z } from 'zod';
import type { Estimate } from '../estimate/estimate-result';
import type { Refusal } from '../errors';
import type { CommittedOperation } from '../layout/operation';
import { operationSchema } from '../layout/schema';
import type { Comment } from './comments';
import { idField } from './fields';
import type { Layout } from './layouts';
import type { Revision } from './revisions';

/**
 * Live events over Socket.IO (path `/socket.io`, cookie session). The client sends the messages of `ClientEvents`,
 * the server those of `ServerEvents`. A socket watches at most one layout at a time.
 */

const coordinate = z.number().min(-10_000).max(10_000);

/** `join`: watch a layout. With `after` the server answers with the operations since, when it can. */
export const joinMessage = z.strictObject({
  layoutId: idField,
  after: z.number().int().min(0).nullable().default(null),
  /** Document version the client speaks; an older one is told to reload. */
  version: z.number().int(),
});

/** `operation`: commit or refuse. */
export const operationMessage = z.strictObject({ layoutId: idField, operation: operationSchema });

/** `nudge` (volatile): where antennas are under the finger; `done` ends the gesture. */
export const nudgeMessage = z.strictObject({
  layoutId: idField,
  antennas: z
    .array(
      z.strictObject({
        id: idField,
        x: coordinate,
        y: coordinate,
        /** Set for an antenna that is being dragged from the shelf and is not in the document yet. */
        label: z.string().max(120).optional(),
      }),
    )
    .max(16),
  done: z.boolean(),
});
export type NudgeMessage = z.infer<typeof nudgeMessage>;

/** `presence` (volatile): where my crosshair is and what I have selected; null when the pointer left the plan. */
export const presenceMessage = z.strictObject({
  layoutId: idField,
  cursor: z.strictObject({ x: coordinate, y: coordinate }).nullable(),
  selection: z.array(idField).max(16),
});
export type PresenceMessage = z.infer<typeof presenceMessage>;

/** Somebody who looks at this layout now; one entry per socket. */
export type PersonHere = {
  readonly socketId: string;
  readonly memberId: string;
  readonly name: string;
  readonly initials: string;
  readonly roles: readonly string[];
  readonly cursor: { readonly x: number; readonly y: number } | null;
  readonly selection: readonly string[];
};

export type JoinAnswer =
  | {
      readonly ok: true;
      /** Whole state, or null when `operations` suffice to catch up from `after`. */
      readonly layout: Layout | null;
      readonly operations: readonly CommittedOperation[];
      readonly sequence: number;
      readonly people: readonly PersonHere[];
      readonly estimate: LayoutEstimate | null;
      readonly abilities: Layout['abilities'];
    }
  | { readonly ok: false; readonly refusal: Refusal };

export type OperationAnswer =
  { readonly ok: true; readonly sequence: number } | { readonly ok: false; readonly refusal: Refusal };

export type LayoutEstimate = { readonly sequence: number; readonly result: Estimate };

export interface ClientEvents {
  join(message: z.input<typeof joinMessage>, answer: (answer: JoinAnswer) => void): void;
  leave(): void;
  operation(message: z.input<typeof operationMessage>, answer: (answer: OperationAnswer) => void): void;
  nudge(message: NudgeMessage): void;
  presence(message: PresenceMessage): void;
}

export interface ServerEvents {
  /** Every committed operation of the layout, one's own included, in order. */
  operation(message: { layoutId: string; committed: CommittedOperation }): void;
  nudge(message: NudgeMessage & { socketId: string; memberId: string }): void;
  presence(message: { layoutId: string; person: PersonHere }): void;
  /** Everybody here, after someone came or went. */
  people(message: { layoutId: string; people: readonly PersonHere[] }): void;
  estimate(message: LayoutEstimate & { layoutId: string }): void;
  /** A comment that is new or changed (whole thread). */
  comment(message: { layoutId: string; comment: Comment }): void;
  /** A revision that is new or changed its state. */
  revision(message: { layoutId: string; revision: Revision }): void;
  /** Name or abilities of the layout changed: fetch it again. */
  'layout-changed'(message: { layoutId: string }): void;
  /** Said before the server disconnects a socket. */
  refused(refusal: Refusal): void;
}
