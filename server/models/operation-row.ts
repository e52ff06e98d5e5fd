import {
  DataTypes,
  Model,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { CommittedOperation, Operation } from '@/shared/layout/operation';
import { idColumn } from './columns';

/** One operation in the one order of its layout; the table only grows. */
export class OperationRow extends Model<
  InferAttributes<OperationRow>,
  InferCreationAttributes<OperationRow>
> {
  declare layoutId: string;
  declare sequence: number;
  declare id: string;
  declare memberId: string;
  /** As it was at the time. */
  declare memberName: string;
  declare version: number;
  /** JSON of the changes, as they came. */
  declare changes: string;
  declare committedAt: Date;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    OperationRow.init(
      {
        layoutId: { ...idColumn(), primaryKey: true },
        sequence: { type: DataTypes.INTEGER.UNSIGNED, primaryKey: true },
        id: idColumn(),
        memberId: idColumn(),
        memberName: { type: DataTypes.STRING(120), allowNull: false },
        version: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        changes: { type: DataTypes.TEXT('long'), allowNull: false },
        committedAt: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, modelName: 'OperationRow', tableName: 'operations', timestamps: false },
    );
  }

  /** The operation as it travels. */
  toCommitted(): CommittedOperation {
    return {
      sequence: this.sequence,
      operation: {
        id: this.id,
        version: this.version,
        changes: JSON.parse(this.changes) as Operation['changes'],
      },
      memberId: this.memberId,
      memberName: this.memberName,
      committedAt: this.committedAt.toISOString(),
    };
  }
}
