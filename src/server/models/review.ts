import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, moment, publicId, ref, text, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What somebody who finished a series says of it, at most one for each seat, and what the teacher answers. A hidden one is kept. */
export class Review extends Model<InferAttributes<Review>, InferCreationAttributes<Review>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare enrolmentId: number;
  declare seriesId: number;
  /** As she wants to be called there. */
  declare shownName: string;
  declare words: string;
  declare wouldMakeAgain: boolean;
  declare answer: CreationOptional<string>;
  declare answeredAt: CreationOptional<Date | null>;
  declare hiddenAt: CreationOptional<Date | null>;
  declare hiddenWhy: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Review.init({
  id: id(),
  publicId: publicId(),
  enrolmentId: ref(),
  seriesId: ref(),
  shownName: text(80),
  words: text(2000),
  wouldMakeAgain: yes(false),
  answer: { ...text(2000), defaultValue: '' },
  answeredAt: maybeMoment(),
  hiddenAt: maybeMoment(),
  hiddenWhy: { ...text(300), defaultValue: '' },
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'reviews' });
