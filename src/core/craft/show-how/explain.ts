/**
 * Show how: every number of an answer with its formula, what went in, where that comes
 * from and how far to trust it, in the order in which one number needs the other. The
 * values are the engine's own; the formulas are text a person can follow and a program
 * can evaluate.
 *
 * Only what shows workings imports this folder: what plans does without it.
 */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { notePiece } from '#core/craft/show-how/explainers.ts';
import { noteRya, noteShapeQuestion, noteSoumak, noteTakeUp } from '#core/craft/show-how/explain-questions.ts';
import { noteRod, type AnsweredRod, type AskedRod } from '#core/craft/show-how/note-rod.ts';
import { noteCounts, notePlies, noteThread } from '#core/craft/show-how/explain-thread.ts';
import { Notebook } from '#core/craft/show-how/notebook.ts';
import type { Working } from '#core/craft/show-how/working.ts';
import { readYarn } from '#core/craft/yarn/read-yarn.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export type * from '#core/craft/show-how/working.ts';

/** Writes down the workings of what the fields ask; false, with a problem among their findings, if it cannot be reckoned. */
type Explainer = (book: Notebook, fields: Fields) => boolean;

function explain(question: unknown, name: string, units: Units, explainer: Explainer): Outcome<readonly Working[]> {
  const findings = Findings.in(units);
  const book = new Notebook();
  const fields = Fields.of(question, '', name, findings);
  return findings.outcome(explainer(book, fields) ? book.workings : undefined);
}

/** A question may name itself by `what`, as the reckoner's do. */
function explainQuestion(explainer: Explainer): (question: unknown, units?: Units) => Outcome<readonly Working[]> {
  return (question, units = 'cm') =>
    explain(question, 'A question', units, (book, fields) => {
      fields.take('what');
      return explainer(book, fields);
    });
}

/** The workings of a yarn; ids as in the reckoner's answer: `tex`, `nm`, `compressedDiameterMm` … */
export function explainYarn(yarn: unknown, units: Units = 'cm'): Outcome<readonly Working[]> {
  return explain(yarn, 'Yarn', units, (book, fields) => {
    const read = readYarn(fields);
    if (read === undefined) return false;
    const { tex } = noteThread(book, { prefix: '', path: '', yarn: read, defaultK: ASHENHURST_K.warp });
    noteCounts(book, tex);
    notePlies(book, read);
    return true;
  });
}

/** Ids as in the answer: `weft.lengthMm`, `warp.crimp` … */
export const explainTakeUp = explainQuestion(noteTakeUp);
/** Ids as in the answer: `stitchMm`, `rowMm` … */
export const explainSoumak = explainQuestion(noteSoumak);
/** Ids as in the answer: `cutMm`, `cardMm` … */
export const explainRya = explainQuestion(noteRya);
/** Ids as in the answer: `rows`, `areaMm2` … */
export const explainShape = explainQuestion(noteShapeQuestion);

/** What was asked and answered is known already; ids as in the answer: `minDiameterMm`, `cordMm` … */
export function explainRod(asked: AskedRod, rod: AnsweredRod): readonly Working[] {
  const book = new Notebook();
  noteRod(book, asked, rod);
  return book.workings;
}

/**
 * The workings of a whole piece of any craft. Ids are paths in the plan where it has the number
 * (`ends.count`, `weft.pickMm`, `yarns.A.netMm`, `bands.3.cutMm`), and lie beside these
 * where it has not. Problems and warnings are those of the plan.
 */
export function explainPiece(piece: unknown, units: Units = 'cm'): Outcome<readonly Working[]> {
  return explain(piece, 'A piece', units, notePiece);
}
