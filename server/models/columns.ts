import { DataTypes, type Model, type ModelAttributeColumnOptions } from 'sequelize';
import { ROLES, type Role } from '@/shared/api/fields';

/** A column that holds an identifier of `shared/ids`. New each time: Sequelize writes into what it is given. */
export function idColumn() {
  return { type: DataTypes.CHAR(26), allowNull: false };
}

/** A column that may hold an identifier of `shared/ids`. */
export function optionalIdColumn() {
  return { type: DataTypes.CHAR(26), allowNull: true };
}

/** A set of roles, stored as their names in the order of `ROLES`, joined by commas. */
export function rolesColumn(): ModelAttributeColumnOptions {
  return {
    type: DataTypes.STRING(120),
    allowNull: false,
    // Undefined while a row is built only to say what an update changes.
    get(this: Model): readonly Role[] | undefined {
      const text = this.getDataValue('roles') as string | undefined;
      return text === undefined ? undefined : parseRoles(text);
    },
    set(this: Model, roles: readonly Role[]) {
      this.setDataValue('roles', formatRoles(roles));
    },
  };
}

function parseRoles(text: string): readonly Role[] {
  const names = new Set(text.split(','));
  return ROLES.filter((role) => names.has(role));
}

function formatRoles(roles: readonly Role[]): string {
  return ROLES.filter((role) => roles.includes(role)).join(',');
}
