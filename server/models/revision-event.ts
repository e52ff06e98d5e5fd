import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { REVISION_EVENTS } from '@/shared/api/revisions';
import type { RevisionState } from '@/shared/api/jobs';
import { assertNever } from '@/shared/errors';
import { idColumn } from './columns';

/** What can happen to a revision. */
export type RevisionEventKind = (typeof REVISION_EVENTS)[number];

/** One thing that happened to a revision; the table only grows, and each kind happens at most once. */
export class RevisionEvent extends Model<
  InferAttributes<RevisionEvent>,
  InferCreationAttributes<RevisionEvent>
> {
  declare id: CreationOptional<number>;
  declare revisionId: string;
  declare kind: RevisionEventKind;
  declare memberId: string;
  /** As it was at the time. */
  declare memberName: string;
  declare reason: CreationOptional<string | null>;
  declare at: Date;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    RevisionEvent.init(
      {
        id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
        revisionId: idColumn(),
        kind: { type: DataTypes.STRING(20), allowNull: false },
        memberId: idColumn(),
        memberName: { type: DataTypes.STRING(120), allowNull: false },
        reason: { type: DataTypes.STRING(1000), allowNull: true, defaultValue: null },
        at: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, modelName: 'RevisionEvent', tableName: 'revision_events', timestamps: false },
    );
  }
}

/** The state that a revision is in after this event. */
export function stateAfter(kind: RevisionEventKind): RevisionState {
  switch (kind) {
    case 'saved':
      return 'saved';
    case 'submitted':
      return 'in review';
    case 'returned':
      return 'returned';
    case 'frozen':
      return 'frozen';
    case 'superseded':
      return 'superseded';
    default:
      return assertNever(kind);
  }
}
