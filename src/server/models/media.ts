import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, json, maybeJson, maybeRef, maybeText, oneOf, publicId, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { MEDIA_STATES, type MediaDetail, type MediaFiles, type MediaState } from '#contracts/media.ts';

/** A file of a person: its renditions are in the uploads folder, its right to be seen follows from what uses it. */
export class Media extends Model<InferAttributes<Media>, InferCreationAttributes<Media>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare ownerId: number;
  declare kind: 'photo' | 'video' | 'picture';
  declare state: CreationOptional<MediaState>;
  declare originalName: string;
  declare byteCount: CreationOptional<number>;
  /** SHA-256 of a photo's file as it was sent, in hex: the same file sent twice is known by it. */
  declare digest: CreationOptional<string | null>;
  declare width: CreationOptional<number | null>;
  declare height: CreationOptional<number | null>;
  declare durationMs: CreationOptional<number | null>;
  declare files: MediaFiles;
  declare detail: MediaDetail;
  /** What its teacher changed of `detail` since it was published; null when nothing. */
  declare draftDetail: CreationOptional<MediaDetail | null>;
  /** Rises with every change of the draft, so that two windows notice each other. */
  declare revision: CreationOptional<number>;
  /** How much of a video is made ready, in thousandths. */
  declare progressPermille: CreationOptional<number>;
  declare failure: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Media.init({
  id: id(),
  publicId: publicId(),
  ownerId: ref(),
  kind: oneOf(['photo', 'video', 'picture']),
  state: oneOf(MEDIA_STATES, 'created'),
  originalName: text(120),
  byteCount: { type: DataTypes.BIGINT, allowNull: false, defaultValue: 0 },
  digest: maybeText(64),
  width: maybeRef(),
  height: maybeRef(),
  durationMs: maybeRef(),
  files: json(),
  detail: json(),
  draftDetail: maybeJson(),
  revision: count(),
  progressPermille: count(),
  failure: maybeText(200),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'media' });
