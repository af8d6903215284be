import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { CRAFT_NAMES, type CraftName } from '#core/craft/crafts.ts';
import { count, id, json, longText, maybeMoment, oneOf, publicId, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** What is sold: an ordered run of lessons that makes one piece. Its row is the lock of everything below it. */
export class Series extends Model<InferAttributes<Series>, InferCreationAttributes<Series>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare workroomId: number;
  declare slug: string;
  declare title: string;
  declare craft: CreationOptional<CraftName>;
  declare level: CreationOptional<'beginner' | 'some-practice' | 'sure-hand'>;
  declare summary: CreationOptional<string>;
  declare story: CreationOptional<string>;
  declare techniques: CreationOptional<string[]>;
  declare priceMinor: CreationOptional<number | null>;
  declare currency: CreationOptional<string>;
  declare state: CreationOptional<'draft' | 'published'>;
  declare publishedAt: CreationOptional<Date | null>;
  declare revision: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Series.init({
  id: id(),
  publicId: publicId(),
  workroomId: ref(),
  slug: text(64),
  title: text(120),
  craft: oneOf(CRAFT_NAMES, 'frame-loom'),
  level: oneOf(['beginner', 'some-practice', 'sure-hand'], 'beginner'),
  summary: { ...text(400), defaultValue: '' },
  story: longText(),
  techniques: { ...json(), defaultValue: [] },
  priceMinor: { type: DataTypes.BIGINT, allowNull: true, defaultValue: null },
  currency: { ...text(3), defaultValue: 'EUR' },
  state: oneOf(['draft', 'published'], 'draft'),
  publishedAt: maybeMoment(),
  revision: count(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'series' });
