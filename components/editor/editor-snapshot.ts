import type { PersonHere } from '@/shared/api/live';
import type { Layout } from '@/shared/api/layouts';
import type { Refusal } from '@/shared/errors';
import type { Estimate, Reason } from '@/shared/estimate/estimate-result';
import type { AntennaPart, LayoutDocument, Point } from '@/shared/layout/document';
import type { Change } from '@/shared/layout/operation';

/** How the line to the server stands. Editing goes on while `offline`; nothing is taken while `outdated` or `refused`. */
export type Connection =
  | { readonly kind: 'connecting' }
  | { readonly kind: 'online' }
  | { readonly kind: 'offline' }
  /** This client speaks an older document version: it has to be reloaded. */
  | { readonly kind: 'outdated' }
  /** The server does not let this member in (signed out, layout gone): the refusal says why. */
  | { readonly kind: 'refused'; readonly refusal: Refusal };

/** A part from the shelf on its way onto the plan. */
export type ShelfPart = {
  readonly name: string;
  readonly part: AntennaPart;
  readonly mountHeight?: number;
  readonly radioId?: string | null;
  readonly feederLossDb?: number;
};

/** A line that the dragged antenna has snapped to, for drawing. */
export type Guide = {
  readonly kind: 'grid' | 'antenna' | 'centre-line' | 'mount-point' | 'edge';
  readonly from: Point;
  readonly to: Point;
};

/** A distance while dragging; `wavelengths` is null for an antenna without a radio. */
export type Distance = {
  readonly to: { readonly kind: 'edge' } | { readonly kind: 'antenna'; readonly id: string };
  readonly from: Point;
  readonly end: Point;
  readonly length: number;
  readonly wavelengths: number | null;
};

/** What is under the finger (or moved by keys) at the moment. */
export type Gesture = {
  readonly kind: 'drag' | 'place' | 'keys';
  /** The antenna under the finger; the others that move along are in `ids` too. */
  readonly id: string;
  readonly ids: readonly string[];
  /** Where it is painted; for a part from the shelf also while it is not on the platform yet. */
  readonly point: Point;
  readonly start: Point;
  readonly label: string;
  readonly part: ShelfPart | null;
  /** Why it may not be dropped here. */
  readonly problem: Reason | null;
  readonly guides: readonly Guide[];
  readonly distances: readonly Distance[];
};

/** An antenna that somebody else is dragging at the moment. */
export type OthersNudge = {
  readonly antennaId: string;
  readonly x: number;
  readonly y: number;
  readonly label: string;
  readonly socketId: string;
  readonly name: string;
  readonly initials: string;
  /** False for one that still comes from their shelf: draw it as a ghost, it has no numbers yet. */
  readonly inDocument: boolean;
};

export type NoticeKind = 'refused' | 'dropped' | 'undo' | 'information' | 'storage';

/** Something the member has to know; stays until it is dismissed. */
export type Notice = {
  readonly id: number;
  readonly kind: NoticeKind;
  readonly message: string;
  readonly code: Refusal['code'] | null;
  /** Every problem with its path, where there are some. */
  readonly problems: readonly { readonly path: string; readonly message: string }[];
  /** What was refused or dropped, so that it can be tried again; null when there is nothing to try. */
  readonly changes: readonly Change[] | null;
};

/** How this client's numbers stand to the server's for the same document. */
export type Agreement =
  | { readonly kind: 'waiting' }
  | { readonly kind: 'confirmed'; readonly sequence: number }
  | { readonly kind: 'differs'; readonly sequence: number; readonly message: string };

/** Everything there is to show, immutable: a part that did not change keeps its identity. */
export type EditorSnapshot = {
  readonly layoutId: string;
  /** Null until the layout has arrived. */
  readonly document: LayoutDocument | null;
  /** The document with what is under anybody's finger: this is what to paint. */
  readonly painted: LayoutDocument | null;
  /** The solver's answer for exactly `painted`. */
  readonly estimate: Estimate | null;
  /** The last estimate the server sent, with its sequence number. */
  readonly serverEstimate: { readonly sequence: number; readonly result: Estimate } | null;
  readonly agreement: Agreement;
  readonly sequence: number;
  /** Operations of mine that the server has not answered yet. */
  readonly pendingCount: number;
  readonly selection: readonly string[];
  readonly gesture: Gesture | null;
  readonly connection: Connection;
  readonly abilities: Layout['abilities'] | null;
  /** False for a reader, before the layout is there, and while `outdated` or `refused`. */
  readonly canEdit: boolean;
  readonly people: readonly PersonHere[];
  /** My own entry's `socketId` in `people`. */
  readonly socketId: string | null;
  readonly nudges: readonly OthersNudge[];
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  readonly notices: readonly Notice[];
};
