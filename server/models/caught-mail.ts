import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A message that the local mail catcher kept instead of sending it on. */
export class CaughtMail extends Model<InferAttributes<CaughtMail>, InferCreationAttributes<CaughtMail>> {
  declare id: CreationOptional<number>;
  declare recipient: string;
  declare subject: string;
  declare body: string;
  declare receivedAt: Date;

  /** Binds the class to a connection. */
  static bindTo(sequelize: Sequelize): void {
    CaughtMail.init(
      {
        id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
        recipient: { type: DataTypes.STRING(254), allowNull: false },
        subject: { type: DataTypes.STRING(250), allowNull: false },
        body: { type: DataTypes.TEXT('medium'), allowNull: false },
        receivedAt: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, modelName: 'CaughtMail', tableName: 'caught_mails', timestamps: false },
    );
  }
}
