import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, maybeJson, maybeRef, moment, ref } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { FormTexts } from '#core/craft/piece-form/field-names.ts';

/** Texts that others took the place of, kept so that nothing described is lost. `writtenAt` is ISO 8601. */
export interface AsideTexts {
  readonly texts: FormTexts;
  readonly writtenAt: string;
}

/** The form of a series' pattern piece as it is being filled in. Its revision counts drafts and saved pieces alike. */
export class PieceDraft extends Model<InferAttributes<PieceDraft>, InferCreationAttributes<PieceDraft>> {
  declare seriesId: number;
  /** Null while the piece stands as it was saved. */
  declare texts: CreationOptional<FormTexts | null>;
  declare setAside: CreationOptional<AsideTexts | null>;
  declare authorId: CreationOptional<number | null>;
  declare writtenAt: Date;
  declare revision: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

PieceDraft.init({
  seriesId: { ...ref(), primaryKey: true },
  texts: maybeJson(),
  setAside: maybeJson(),
  authorId: maybeRef(),
  writtenAt: moment(),
  revision: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'piece_drafts' });
