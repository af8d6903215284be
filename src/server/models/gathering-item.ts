import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, maybeMoment, maybeRef, maybeText, oneOf, publicId, ref, text, moment } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A line of a lesson's gathering list. `amountKey` names a number of the plan; `amountText` is for what no plan gives. */
export class GatheringItem extends Model<InferAttributes<GatheringItem>, InferCreationAttributes<GatheringItem>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare lessonId: number;
  declare position: number;
  declare kind: 'tool' | 'yarn' | 'material';
  declare name: string;
  declare amountKey: CreationOptional<string | null>;
  declare amountText: CreationOptional<string | null>;
  declare standIn: CreationOptional<string | null>;
  declare untilPart: CreationOptional<number | null>;
  declare note: CreationOptional<string | null>;
  declare lookOut: CreationOptional<string | null>;
  declare getFrom: CreationOptional<string | null>;
  declare takenOutAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

GatheringItem.init({
  id: id(),
  publicId: publicId(),
  lessonId: ref(),
  position: count(),
  kind: oneOf(['tool', 'yarn', 'material']),
  name: text(120),
  amountKey: maybeText(80),
  amountText: maybeText(80),
  standIn: maybeText(200),
  untilPart: maybeRef(),
  note: maybeText(300),
  lookOut: maybeText(300),
  getFrom: maybeText(200),
  takenOutAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'gathering_items' });
