import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** The name by which a series' lessons speak of a video or picture. */
export class SeriesMedia extends Model<InferAttributes<SeriesMedia>, InferCreationAttributes<SeriesMedia>> {
  declare seriesId: number;
  declare name: string;
  declare mediaId: number;
  declare title: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

SeriesMedia.init({
  seriesId: { ...ref(), primaryKey: true },
  name: { ...text(64), primaryKey: true },
  mediaId: ref(),
  title: { ...text(120), defaultValue: '' },
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'series_media' });
