import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { createId } from '@/shared/ids';
import type { PlatformKind } from '@/shared/layout/document';
import { idColumn } from './columns';
import { Job } from './job';

/** The thing that antennas go on, as it was surveyed. */
export class Platform extends Model<InferAttributes<Platform>, InferCreationAttributes<Platform>> {
  declare id: CreationOptional<string>;
  declare teamId: string;
  declare jobId: string;
  declare name: string;
  declare kind: PlatformKind;
  /** The survey, which each new layout starts from; see `document-codec`. */
  declare document: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare job?: NonAttribute<Job>;

  /** Binds the class to a connection; after `Job`. */
  static bindTo(sequelize: Sequelize): void {
    Platform.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        jobId: idColumn(),
        name: { type: DataTypes.STRING(120), allowNull: false },
        kind: { type: DataTypes.STRING(20), allowNull: false },
        document: { type: DataTypes.TEXT('long'), allowNull: false },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Platform', tableName: 'platforms' },
    );
    Platform.belongsTo(Job, { as: 'job', foreignKey: 'jobId' });
  }
}
