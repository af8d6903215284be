import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, json, maybeRef, maybeText, oneOf, publicId, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { MediaDetail, MediaFiles } from '#contracts/media.ts';

/** A file of a person: its renditions are in the uploads folder, its right to be seen follows from what uses it. */
export class Media extends Model<InferAttributes<Media>, InferCreationAttributes<Media>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare ownerId: number;
  declare kind: 'photo' | 'video' | 'picture';
  declare state: CreationOptional<'created' | 'processing' | 'ready' | 'failed'>;
  declare originalName: string;
  declare byteCount: CreationOptional<number>;
  declare width: CreationOptional<number | null>;
  declare height: CreationOptional<number | null>;
  declare durationMs: CreationOptional<number | null>;
  declare files: MediaFiles;
  declare detail: MediaDetail;
  declare failure: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Media.init({
  id: id(),
  publicId: publicId(),
  ownerId: ref(),
  kind: oneOf(['photo', 'video', 'picture']),
  state: oneOf(['created', 'processing', 'ready', 'failed'], 'created'),
  originalName: text(120),
  byteCount: { type: DataTypes.BIGINT, allowNull: false, defaultValue: 0 },
  width: maybeRef(),
  height: maybeRef(),
  durationMs: maybeRef(),
  files: json(),
  detail: json(),
  failure: maybeText(200),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'media' });
