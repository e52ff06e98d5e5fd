import {
  DataTypes,
  Model,
  type CreationOptional,
  type ForeignKey,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { createId } from '@/shared/ids';
import { idColumn } from './columns';
import { Person } from './person';

/** A way to a new password, once, until it ends; only the hash of its token is kept. */
export class PasswordReset extends Model<
  InferAttributes<PasswordReset>,
  InferCreationAttributes<PasswordReset>
> {
  declare id: CreationOptional<string>;
  declare personId: ForeignKey<string>;
  declare tokenHash: string;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  /** Binds the class to a connection; after `Person`. */
  static bindTo(sequelize: Sequelize): void {
    PasswordReset.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        personId: idColumn(),
        tokenHash: { type: DataTypes.CHAR(64), allowNull: false },
        expiresAt: { type: DataTypes.DATE(3), allowNull: false },
        usedAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'PasswordReset', tableName: 'password_resets' },
    );
    PasswordReset.belongsTo(Person, { as: 'person', foreignKey: 'personId' });
  }
}
