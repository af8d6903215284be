import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, moment, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Where a student stopped in a video of her series, and how far she ever was. */
export class VideoPlace extends Model<InferAttributes<VideoPlace>, InferCreationAttributes<VideoPlace>> {
  declare enrolmentId: number;
  /** The video's name in the series: a replaced video keeps her place. */
  declare name: string;
  declare placeMs: CreationOptional<number>;
  declare furthestMs: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

VideoPlace.init({
  enrolmentId: { ...ref(), primaryKey: true },
  name: { ...text(64), primaryKey: true },
  placeMs: count(),
  furthestMs: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'video_places' });
