import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import { optionalIdColumn } from './columns';

/** One browser's session, with the person it belongs to so that all of theirs can be ended at once. */
export class SessionRecord extends Model<
  InferAttributes<SessionRecord>,
  InferCreationAttributes<SessionRecord>
> {
  declare sid: string;
  declare personId: CreationOptional<string | null>;
  declare expires: Date;
  declare data: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    SessionRecord.init(
      {
        sid: { type: DataTypes.STRING(64), primaryKey: true },
        personId: optionalIdColumn(),
        expires: { type: DataTypes.DATE(3), allowNull: false },
        data: { type: DataTypes.TEXT('medium'), allowNull: false },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'SessionRecord', tableName: 'sessions' },
    );
  }
}
