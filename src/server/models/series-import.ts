import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { BroughtIn, FolderRefusal } from '#contracts/series-folder.ts';
import { count, id, json, maybeJson, maybeRef, moment, oneOf, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A series folder on its way in. Its zip lies among the temporary files, under the public id, as long as it waits. */
export class SeriesImport extends Model<InferAttributes<SeriesImport>, InferCreationAttributes<SeriesImport>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare ownerId: number;
  declare workroomId: number;
  /** Of the form it came with: one that is pressed twice comes in once. */
  declare pressKey: string;
  declare fileName: string;
  declare byteCount: number;
  declare state: CreationOptional<'waiting' | 'done' | 'refused'>;
  /** How often a worker has begun with it. Only the last one may end it. */
  declare round: CreationOptional<number>;
  declare filesDone: CreationOptional<number>;
  declare filesAll: CreationOptional<number>;
  /** Public ids under which this round puts pictures and films, so that the next one finds what a dead worker left. */
  declare mediaIds: CreationOptional<readonly string[]>;
  declare seriesId: CreationOptional<number | null>;
  declare told: CreationOptional<BroughtIn | FolderRefusal | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

SeriesImport.init({
  id: id(),
  publicId: publicId(),
  ownerId: ref(),
  workroomId: ref(),
  pressKey: text(36),
  fileName: text(200),
  byteCount: count(),
  state: oneOf(['waiting', 'done', 'refused'], 'waiting'),
  round: count(),
  filesDone: count(),
  filesAll: count(),
  mediaIds: { ...json(), defaultValue: [] },
  seriesId: maybeRef(),
  told: maybeJson(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'series_imports' });
