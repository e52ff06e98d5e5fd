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
import { RevisionEvent } from './revision-event';

/** A lettered, saved state of a layout; its row never changes, its state is its last event. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare id: CreationOptional<string>;
  declare teamId: string;
  declare layoutId: string;
  declare letter: string;
  /** SHA-256 of `content`, hexadecimal. */
  declare hash: string;
  /** Canonical JSON (RFC 8785) of layout id, letter, document, results and solver version. */
  declare content: string;
  declare sequence: number;
  declare note: string;
  /** Names as they were when it was saved. */
  declare jobName: string;
  declare platformName: string;
  declare layoutName: string;
  declare savedById: string;
  declare savedByName: string;
  declare savedAt: Date;
  declare events?: NonAttribute<RevisionEvent[]>;

  /** Binds the class to a connection; after `RevisionEvent`. */
  static bindTo(sequelize: Sequelize): void {
    Revision.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        layoutId: idColumn(),
        letter: { type: DataTypes.STRING(4), allowNull: false },
        hash: { type: DataTypes.CHAR(64), allowNull: false },
        content: { type: DataTypes.TEXT('long'), allowNull: false },
        sequence: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        note: { type: DataTypes.STRING(1000), allowNull: false },
        jobName: { type: DataTypes.STRING(120), allowNull: false },
        platformName: { type: DataTypes.STRING(120), allowNull: false },
        layoutName: { type: DataTypes.STRING(120), allowNull: false },
        savedById: idColumn(),
        savedByName: { type: DataTypes.STRING(120), allowNull: false },
        savedAt: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, modelName: 'Revision', tableName: 'revisions', timestamps: false },
    );
    Revision.hasMany(RevisionEvent, { as: 'events', foreignKey: 'revisionId' });
  }
}
