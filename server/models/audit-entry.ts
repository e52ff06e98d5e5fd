import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
  type Transaction,
} from 'sequelize';
import { optionalIdColumn } from './columns';

/** What is written down for good. Others' actions may be added at the end. */
export type AuditAction =
  | 'signed-in'
  | 'sign-in-refused'
  | 'signed-out-everywhere'
  | 'password-set'
  | 'team-made'
  | 'invited'
  | 'invitation-withdrawn'
  | 'invitation-accepted'
  | 'roles-changed'
  | 'deactivated'
  | 'reactivated';

/** One thing that happened; the table only grows. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare id: CreationOptional<number>;
  declare teamId: string | null;
  declare personId: string | null;
  declare action: AuditAction;
  declare subjectId: string | null;
  /** JSON; never a password or a token. */
  declare details: string;
  declare createdAt: CreationOptional<Date>;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    AuditEntry.init(
      {
        id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
        teamId: optionalIdColumn(),
        personId: optionalIdColumn(),
        action: { type: DataTypes.STRING(60), allowNull: false },
        subjectId: optionalIdColumn(),
        details: { type: DataTypes.TEXT, allowNull: false },
        createdAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'AuditEntry', tableName: 'audit', updatedAt: false },
    );
  }
}

/** What `recordAudit` writes. */
export interface AuditRecord {
  readonly action: AuditAction;
  readonly teamId?: string | null;
  readonly personId?: string | null;
  readonly subjectId?: string | null;
  readonly details?: Readonly<Record<string, unknown>>;
}

/** Adds a row to the audit, in the transaction of what it tells of. */
export async function recordAudit(record: AuditRecord, transaction?: Transaction): Promise<void> {
  await AuditEntry.create(
    {
      action: record.action,
      teamId: record.teamId ?? null,
      personId: record.personId ?? null,
      subjectId: record.subjectId ?? null,
      details: JSON.stringify(record.details ?? {}),
    },
    transaction ? { transaction } : {},
  );
}
