import {
  DataTypes,
  Model,
  type CreationOptional,
  type ForeignKey,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import type { Role } from '@/shared/api/fields';
import { createId } from '@/shared/ids';
import { idColumn, rolesColumn } from './columns';
import { Membership } from './membership';
import { Team } from './team';

/** A way into a team for one e-mail address, once, until it ends; only the hash of its token is kept. */
export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare id: CreationOptional<string>;
  declare teamId: ForeignKey<string>;
  declare email: string;
  declare roles: readonly Role[];
  declare tokenHash: string;
  declare invitedById: ForeignKey<string>;
  declare expiresAt: Date;
  declare acceptedAt: CreationOptional<Date | null>;
  declare withdrawnAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare team?: NonAttribute<Team>;

  /** Binds the class to a connection; after `Team` and `Membership`. */
  static bindTo(sequelize: Sequelize): void {
    Invitation.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        email: { type: DataTypes.STRING(254), allowNull: false },
        roles: rolesColumn(),
        tokenHash: { type: DataTypes.CHAR(64), allowNull: false },
        invitedById: idColumn(),
        expiresAt: { type: DataTypes.DATE(3), allowNull: false },
        acceptedAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        withdrawnAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Invitation', tableName: 'invitations' },
    );
    Invitation.belongsTo(Team, { as: 'team', foreignKey: 'teamId' });
    Invitation.belongsTo(Membership, { as: 'invitedBy', foreignKey: 'invitedById' });
  }
}
