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

/** Somebody with one account, whatever teams they belong to. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>;
  /** Lower case; see `normalizeEmail`. */
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    Person.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        email: { type: DataTypes.STRING(254), allowNull: false },
        name: { type: DataTypes.STRING(120), allowNull: false },
        passwordHash: { type: DataTypes.STRING(80), allowNull: false },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Person', tableName: 'people' },
    );
  }
}

/** The one way an e-mail address is stored and compared. */
export function normalizeEmail(email: string): string {
  return email.trim().toLowerCase();
}
