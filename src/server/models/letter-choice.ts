import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { LIST_KINDS, type ListKind } from '#core/notices/letter-kinds.ts';
import { count, id, moment, oneOf, ref, yes } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/**
 * A yes or no to one kind of letters of one workroom: when, by which words, and where it was said. Rows are only added;
 * the newest one holds.
 */
export class LetterChoice extends Model<InferAttributes<LetterChoice>, InferCreationAttributes<LetterChoice>> {
  declare id: CreationOptional<number>;
  declare userId: number;
  declare workroomId: number;
  declare kind: ListKind;
  declare isWanted: boolean;
  /** Gathered in one letter a day; of letters about answers only. */
  declare isDaily: CreationOptional<boolean>;
  /** Number of the words that were agreed to. */
  declare wording: number;
  declare source: 'account' | 'notices' | 'seat' | 'letter';
  declare createdAt: CreationOptional<Date>;
}

LetterChoice.init({
  id: id(),
  userId: ref(),
  workroomId: ref(),
  kind: oneOf(LIST_KINDS),
  isWanted: yes(false),
  isDaily: yes(false),
  wording: count(),
  source: oneOf(['account', 'notices', 'seat', 'letter']),
  createdAt: moment(),
}, { sequelize, tableName: 'letter_choices', updatedAt: false });
