import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, json, longText, maybeJson, maybeMoment, maybeRef, publicId, ref, text, yes, moment } from '#server/db/columns.ts';
import type { LessonText, RefusedText } from '#core/lesson-text/parse-lesson-text.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { Checkpoint } from '#contracts/lesson.ts';
import type { OpeningRule } from '#core/timetable/opening.ts';

/** One part of a series. `opensAt` is derived from an on-date rule; the text students read is the published version. */
export class Lesson extends Model<InferAttributes<Lesson>, InferCreationAttributes<Lesson>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare seriesId: number;
  declare position: number;
  declare title: string;
  declare minutes: CreationOptional<number>;
  declare isPreview: CreationOptional<boolean>;
  declare opens: OpeningRule;
  declare opensAt: CreationOptional<Date | null>;
  /** Rises whenever its number, its title or the rule of its opening changes. */
  declare timetableRevision: CreationOptional<number>;
  declare checkpoint: CreationOptional<Checkpoint | null>;
  declare draftSource: CreationOptional<string>;
  /** How the draft was read when it was saved: the tree, or the reasons why there is none. */
  declare draftReading: CreationOptional<LessonText | RefusedText>;
  declare draftRevision: CreationOptional<number>;
  declare publishedVersionId: CreationOptional<number | null>;
  declare takenOutAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Lesson.init({
  id: id(),
  publicId: publicId(),
  seriesId: ref(),
  position: count(),
  title: text(120),
  minutes: count(30),
  isPreview: yes(false),
  opens: json(),
  opensAt: maybeMoment(),
  timetableRevision: count(),
  checkpoint: maybeJson(),
  draftSource: longText(),
  draftReading: { ...json(), defaultValue: { ok: false, problems: [] } },
  draftRevision: count(),
  publishedVersionId: maybeRef(),
  takenOutAt: maybeMoment(),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'lessons' });
