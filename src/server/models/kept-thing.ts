import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { id, maybeMoment, maybeText, moment, oneOf, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** A tool, yarn or material a teacher asks for again and again: its words, to be put on the list of any part. */
export class KeptThing extends Model<InferAttributes<KeptThing>, InferCreationAttributes<KeptThing>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare workroomId: number;
  declare kind: 'tool' | 'yarn' | 'material';
  declare name: string;
  declare lookOut: CreationOptional<string | null>;
  declare getFrom: CreationOptional<string | null>;
  declare standIn: CreationOptional<string | null>;
  declare takenOutAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

KeptThing.init({
  id: id(),
  publicId: publicId(),
  workroomId: ref(),
  kind: oneOf(['tool', 'yarn', 'material']),
  name: text(120),
  lookOut: maybeText(300),
  getFrom: maybeText(200),
  standIn: maybeText(200),
  takenOutAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'kept_things' });
