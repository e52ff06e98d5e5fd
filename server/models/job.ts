import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { createId } from '@/shared/ids';
import { idColumn } from './columns';

/** One piece of work for one customer. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: CreationOptional<string>;
  declare teamId: string;
  declare name: string;
  declare customer: string;
  declare archivedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  /** Also moved on by what changes inside the job. */
  declare updatedAt: CreationOptional<Date>;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    Job.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        name: { type: DataTypes.STRING(120), allowNull: false },
        customer: { type: DataTypes.STRING(120), allowNull: false },
        archivedAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Job', tableName: 'jobs' },
    );
  }
}
