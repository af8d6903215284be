import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { YarnSaid } from '#core/finish/yarns-in-piece.ts';
import { json, maybeMoment, maybeRef, moment, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A piece that is off the loom, with what its maker writes down of it for herself. */
export class FinishedPiece extends Model<InferAttributes<FinishedPiece>, InferCreationAttributes<FinishedPiece>> {
  declare enrolmentId: number;
  declare mediaId: CreationOptional<number | null>;
  /** When she said that it is made though a part is not marked as done. */
  declare saidAt: CreationOptional<Date | null>;
  /** It took; null while she said nothing. */
  declare minutes: CreationOptional<number | null>;
  declare note: CreationOptional<string>;
  /** By the key of the amount that speaks of the yarn. */
  declare yarns: CreationOptional<Readonly<Record<string, YarnSaid>>>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

FinishedPiece.init({
  enrolmentId: { ...ref(), primaryKey: true },
  mediaId: maybeRef(),
  saidAt: maybeMoment(),
  minutes: maybeRef(),
  note: { ...text(2000), defaultValue: '' },
  yarns: { ...json(), defaultValue: {} },
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'finished_pieces' });
