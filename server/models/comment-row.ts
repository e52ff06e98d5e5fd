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
import { idColumn, optionalIdColumn } from './columns';
import { CommentReplyRow } from './comment-reply-row';
import { Membership } from './membership';
import { Revision } from './revision';

/** A numbered thread on a spot or an antenna of a layout, or of one of its revisions. */
export class CommentRow extends Model<InferAttributes<CommentRow>, InferCreationAttributes<CommentRow>> {
  declare id: CreationOptional<string>;
  declare teamId: string;
  declare layoutId: string;
  declare revisionId: CreationOptional<string | null>;
  declare number: number;
  /** JSON of a `CommentTarget`. */
  declare target: string;
  declare text: string;
  declare authorId: string;
  declare resolvedAt: CreationOptional<Date | null>;
  declare resolvedById: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare author?: NonAttribute<Membership>;
  declare resolvedBy?: NonAttribute<Membership | null>;
  declare revision?: NonAttribute<Revision | null>;
  declare replies?: NonAttribute<CommentReplyRow[]>;

  /** Binds the class to a connection; after `Revision`, `CommentReplyRow` and `Membership`. */
  static bindTo(sequelize: Sequelize): void {
    CommentRow.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        teamId: idColumn(),
        layoutId: idColumn(),
        revisionId: optionalIdColumn(),
        number: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        target: { type: DataTypes.TEXT, allowNull: false },
        text: { type: DataTypes.STRING(1000), allowNull: false },
        authorId: idColumn(),
        resolvedAt: { type: DataTypes.DATE(3), allowNull: true, defaultValue: null },
        resolvedById: optionalIdColumn(),
        createdAt: DataTypes.DATE(3),
        updatedAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'CommentRow', tableName: 'comments' },
    );
    CommentRow.belongsTo(Membership, { as: 'author', foreignKey: 'authorId' });
    CommentRow.belongsTo(Membership, { as: 'resolvedBy', foreignKey: 'resolvedById' });
    CommentRow.belongsTo(Revision, { as: 'revision', foreignKey: 'revisionId' });
    CommentRow.hasMany(CommentReplyRow, { as: 'replies', foreignKey: 'commentId' });
  }
}
