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
import { idColumn } from './columns';
import { Platform } from './platform';

/** The working arrangement of antennas on one platform: the document after its first `sequence` operations. */
export class Layout extends Model<InferAttributes<Layout>, InferCreationAttributes<Layout>> {
  declare id: CreationOptional<string>;
  declare teamId: string;
  declare platformId: string;
  declare name: string;
  declare sequence: CreationOptional<number>;
  /** See `document-codec`. */
  declare document: string;
  /** Number of the newest comment. */
  declare commentCount: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare platform?: NonAttribute<Platform>;

  /** Binds the class to a connection; after `Platform`. */
  static bindTo(sequelize: Sequelize): void {
    Layout.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        platformId: idColumn(),
        name: { type: DataTypes.STRING(120), allowNull: false },
        sequence: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
        document: { type: DataTypes.TEXT('long'), allowNull: false },
        commentCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Layout', tableName: 'layouts' },
    );
    Layout.belongsTo(Platform, { as: 'platform', foreignKey: 'platformId' });
  }
}
