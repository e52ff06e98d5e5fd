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
import { Person } from './person';
import { Team } from './team';

/** A person in a team, with a set of roles; ended by deactivation, never removed. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: CreationOptional<string>;
  declare teamId: ForeignKey<string>;
  declare personId: ForeignKey<string>;
  declare roles: readonly Role[];
  declare deactivatedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare person?: NonAttribute<Person>;
  declare team?: NonAttribute<Team>;

  /** Binds the class to a connection; after `Person` and `Team`. */
  static bindTo(sequelize: Sequelize): void {
    Membership.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        personId: idColumn(),
        roles: rolesColumn(),
        deactivatedAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'Membership', tableName: 'memberships' },
    );
    Membership.belongsTo(Person, { as: 'person', foreignKey: 'personId' });
    Membership.belongsTo(Team, { as: 'team', foreignKey: 'teamId' });
  }
}
