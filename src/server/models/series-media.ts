import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { maybeRef, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** The name by which a series' lessons speak of a video or picture. */
export class SeriesMedia extends Model<InferAttributes<SeriesMedia>, InferCreationAttributes<SeriesMedia>> {
  declare seriesId: number;
  declare name: string;
  /** What students see; null before it was published. */
  declare mediaId: CreationOptional<number | null>;
  /** What takes its place when the series is published next. */
  declare draftMediaId: CreationOptional<number | null>;
  /** The part it was put in for. */
  declare lessonId: CreationOptional<number | null>;
  declare title: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

SeriesMedia.init({
  seriesId: { ...ref(), primaryKey: true },
  name: { ...text(64), primaryKey: true },
  mediaId: maybeRef(),
  draftMediaId: maybeRef(),
  lessonId: maybeRef(),
  title: { ...text(120), defaultValue: '' },
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'series_media' });
