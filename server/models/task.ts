import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { createId } from '@/shared/ids';
import { idColumn, optionalIdColumn } from './columns';

/** Where a task stands. */
export type TaskState = 'waiting' | 'running' | 'done' | 'failed' | 'cancelled';

/** Work for later, written in the transaction of what caused it. */
export class Task extends Model<InferAttributes<Task>, InferCreationAttributes<Task>> {
  declare id: CreationOptional<string>;
  declare teamId: CreationOptional<string | null>;
  declare kind: string;
  /** JSON. */
  declare payload: string;
  declare state: CreationOptional<TaskState>;
  declare attempts: CreationOptional<number>;
  declare runAt: Date;
  declare lease: CreationOptional<string | null>;
  declare leaseUntil: CreationOptional<Date | null>;
  /** From 0 to 1. */
  declare progress: CreationOptional<number>;
  /** JSON. */
  declare result: CreationOptional<string | null>;
  declare problem: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    Task.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: optionalIdColumn(),
        kind: { type: DataTypes.STRING(40), allowNull: false },
        payload: { type: DataTypes.TEXT('long'), allowNull: false },
        state: { type: DataTypes.STRING(20), allowNull: false, defaultValue: 'waiting' },
        attempts: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
        runAt: { type: DataTypes.DATE(3), allowNull: false },
        lease: { type: DataTypes.STRING(26), allowNull: true, defaultValue: null },
        leaseUntil: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        progress: { type: DataTypes.DOUBLE, allowNull: false, defaultValue: 0 },
        result: { type: DataTypes.TEXT('long'), allowNull: true, defaultValue: null },
        problem: { type: DataTypes.STRING(500), allowNull: true, defaultValue: null },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Task', tableName: 'tasks' },
    );
  }
}
