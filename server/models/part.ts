import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { createId } from '@/shared/ids';
import type { PartContent } from '@/shared/api/parts';
import { idColumn } from './columns';

/** An antenna or a radio on the team's shelf. */
export class Part extends Model<InferAttributes<Part>, InferCreationAttributes<Part>> {
  declare id: CreationOptional<string>;
  declare teamId: string;
  declare kind: PartContent['kind'];
  /** The name in its content, for sorting and searching. */
  declare name: string;
  /** JSON; see `part-codec`. */
  declare content: string;
  declare archivedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    Part.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        kind: { type: DataTypes.STRING(20), allowNull: false },
        name: { type: DataTypes.STRING(120), allowNull: false },
        content: { type: DataTypes.TEXT('long'), allowNull: false },
        archivedAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Part', tableName: 'parts' },
    );
  }
}
