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
import { Membership } from './membership';

/** An answer in a comment's thread. */
export class CommentReplyRow extends Model<
  InferAttributes<CommentReplyRow>,
  InferCreationAttributes<CommentReplyRow>
> {
  declare id: CreationOptional<string>;
  declare commentId: string;
  declare text: string;
  declare authorId: string;
  declare createdAt: CreationOptional<Date>;
  declare author?: NonAttribute<Membership>;

  /** Binds the class to a connection; after `Membership`. */
  static bindTo(sequelize: Sequelize): void {
    CommentReplyRow.init(
      {
        id: { ...idColumn(), primaryKey: true, defaultValue: createId },
        commentId: idColumn(),
        text: { type: DataTypes.STRING(1000), allowNull: false },
        authorId: idColumn(),
        createdAt: DataTypes.DATE(3),
      },
      { sequelize, modelName: 'CommentReplyRow', tableName: 'comment_replies', updatedAt: false },
    );
    CommentReplyRow.belongsTo(Membership, { as: 'author', foreignKey: 'authorId' });
  }
}
