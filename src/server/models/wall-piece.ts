import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeRef, moment, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/**
 * What somebody agreed to show of her finished piece, one for each seat. It is kept when she takes it back, as the record of what she
 * agreed to and until when. Whether it is seen is judged by `isOnWall` alone.
 */
export class WallPiece extends Model<InferAttributes<WallPiece>, InferCreationAttributes<WallPiece>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare enrolmentId: number;
  /** The photo she agreed to show: another one needs her word anew. */
  declare mediaId: number | null;
  /** As she wants to be called there. */
  declare shownName: string;
  declare words: string;
  declare agreedAt: Date;
  /** Which wording of the consent she ticked. */
  declare agreedTo: string;
  declare withdrawnAt: CreationOptional<Date | null>;
  declare hiddenAt: CreationOptional<Date | null>;
  declare hiddenWhy: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

WallPiece.init({
  id: id(),
  publicId: publicId(),
  enrolmentId: ref(),
  mediaId: maybeRef(),
  shownName: text(80),
  words: { ...text(500), defaultValue: '' },
  agreedAt: moment(),
  agreedTo: text(20),
  withdrawnAt: maybeMoment(),
  hiddenAt: maybeMoment(),
  hiddenWhy: { ...text(300), defaultValue: '' },
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'wall_pieces' });
