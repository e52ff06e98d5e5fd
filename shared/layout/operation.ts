import type { CollectionName, ObjectOf, Platform } from './document';

/** One change of a document; values are absolute, identifiers are made by the client. */
export type Change =
  | { readonly kind: 'add'; readonly collection: CollectionName; readonly value: ObjectOf<CollectionName> }
  | { readonly kind: 'remove'; readonly collection: CollectionName; readonly id: string }
  | {
      readonly kind: 'set';
      readonly collection: CollectionName;
      readonly id: string;
      /** Top-level fields of the object with their new values; never `id`. */
      readonly fields: Readonly<Record<string, unknown>>;
    }
  | { readonly kind: 'set-platform'; readonly fields: Readonly<Partial<Platform>> };

/** Changes that hold whole or not at all. */
export type Operation = {
  /** Made by the client, unique among all operations: a second arrival gets the first answer. */
  readonly id: string;
  /** Version of the document that the client speaks. */
  readonly version: number;
  readonly changes: readonly Change[];
};

/** An operation that has its place in the one order of its layout. */
export type CommittedOperation = {
  readonly sequence: number;
  readonly operation: Operation;
  readonly memberId: string;
  readonly memberName: string;
  readonly committedAt: string;
};
