/** Everything the reckoner's page answers to what was typed. */
import { dequal } from 'dequal/lite';
import { answerCloth, plainCloth } from '#core/reckoner/answer-cloth.ts';
import { NO_ANSWER, type FieldErrors, type Section } from '#core/reckoner/answer-line.ts';
import { answerPiece, type PieceSection } from '#core/reckoner/answer-piece.ts';
import { answerRod } from '#core/reckoner/answer-rod.ts';
import { answerRya, readTypedRya } from '#core/reckoner/answer-rya.ts';
import { answerSett, type SettSection } from '#core/reckoner/answer-sett.ts';
import { answerShape, type ShapeGround, type ShapeSection } from '#core/reckoner/answer-shape.ts';
import { answerSoumak } from '#core/reckoner/answer-soumak.ts';
import { answerYarn } from '#core/reckoner/answer-yarn.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { pickSpacing } from '#core/craft/picks.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { FormReader } from '#core/reckoner/form-reader.ts';
import { readTypedLoom, readTypedRows, readTypedYarn, type TypedRows } from '#core/reckoner/read-fields.ts';
import type { ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import type { Cloth } from '#core/reckoner/small-piece.ts';

export interface ReckonerAnswer {
  readonly errors: FieldErrors;
  readonly yarn: Section;
  readonly sett: SettSection;
  readonly cloth: Section;
  readonly soumak: Section;
  readonly rya: Section;
  readonly shape: ShapeSection;
  readonly rod: Section;
  readonly piece: PieceSection;
}

/** Stands in for a yarn that cannot be used, so that everything else is checked all the same. */
const ANY_YARN = { tex: 400 } as const;
/** Stand in for rows that cannot be read. */
const ANY_ROWS: TypedRows = { heightMm: 100, beat: { picksPerWeftDiameter: 1 }, mode: 'straight-warp' };

/**
 * Only a mistake of ours makes a part throw. It then says so, and the others answer on:
 * a page that somebody weaves by never goes blank.
 */
function orFailed<S extends Section>(answer: () => S): S | Section {
  try {
    return answer();
  } catch {
    return { ...NO_ANSWER, needs: [], failed: true };
  }
}

/** A note is read once, where it first stands. */
function tellOnce(sections: Omit<ReckonerAnswer, 'errors'>): Omit<ReckonerAnswer, 'errors'> {
  const told = new Set<string>();
  const once = <S extends Section>(section: S): S => {
    const notes = section.notes.filter(({ message }) => {
      const isNew = !told.has(message);
      told.add(message);
      return isNew;
    });
    return { ...section, notes };
  };
  return {
    yarn: once(sections.yarn),
    sett: once(sections.sett),
    cloth: once(sections.cloth),
    soumak: once(sections.soumak),
    rya: once(sections.rya),
    shape: once(sections.shape),
    rod: once(sections.rod),
    piece: once(sections.piece),
  };
}

/** What says the same as before stays the very same, so that who draws it sees at once that nothing is to be done. */
function asBefore<T extends object>(now: T, before: T | undefined): T {
  const data = (of: T): T => ({ ...of, workings: undefined });
  return before !== undefined && dequal(data(now), data(before)) ? before : now;
}

function keepWhatStands(now: ReckonerAnswer, before: ReckonerAnswer): ReckonerAnswer {
  return {
    errors: asBefore(now.errors, before.errors),
    yarn: asBefore(now.yarn, before.yarn),
    sett: asBefore(now.sett, before.sett),
    cloth: asBefore(now.cloth, before.cloth),
    soumak: asBefore(now.soumak, before.soumak),
    rya: asBefore(now.rya, before.rya),
    shape: asBefore(now.shape, before.shape),
    rod: asBefore(now.rod, before.rod),
    piece: asBefore(now.piece, before.piece),
  };
}

/**
 * Yarn, ends and rows feed what is woven of them; each part answers as far as its own fields can be used.
 * @param before What was answered last: parts that answer the same are handed back from it.
 */
export function answerForm(form: ReckonerForm, before?: ReckonerAnswer): ReckonerAnswer {
  const reader = new FormReader(form);
  const typedYarn = readTypedYarn(reader);
  const yarn = orFailed(() => answerYarn(typedYarn, reader));
  const soundYarn = yarn.lines.length > 0 ? typedYarn : undefined;
  const loom = readTypedLoom(reader);
  const rows = readTypedRows(reader);
  const rya = readTypedRya(reader);
  const cloth: Cloth | undefined = loom && { yarn: soundYarn ?? ANY_YARN, loom, rows: rows ?? ANY_ROWS };
  const plain = cloth && plainCloth(cloth, reader);
  const sett: SettSection = orFailed(() => answerSett(loom, soundYarn, plain, reader));
  const { dressed } = sett;
  const ground: ShapeGround | undefined = cloth && dressed && { dressed, pickSpacingMm: pickSpacing(cloth.rows.beat, threadOf(cloth.yarn, ASHENHURST_K.weft).compressedMm) };
  const sections = tellOnce({
    yarn,
    sett,
    cloth: orFailed(() => answerCloth(plain, dressed, reader)),
    soumak: orFailed(() => answerSoumak(cloth, dressed, reader)),
    rya: orFailed(() => answerRya(rya, cloth?.yarn, dressed, reader)),
    shape: orFailed(() => answerShape(ground, reader)),
    rod: orFailed(() => answerRod(reader)),
    piece: orFailed(() => answerPiece(cloth, rya, reader)),
  });
  const answer = { errors: reader.errors, ...sections };
  return before === undefined ? answer : keepWhatStands(answer, before);
}
