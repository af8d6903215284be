/** Whose piece and units a preview is drawn with: the pattern's, those of an example loom, or of one student of the series. */
import type { Piece } from '#core/craft/crafts.ts';
import { exampleLooms } from '#core/craft/fitting/example-looms.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { Units } from '#core/units/units.ts';
import { Enrolment, MyPieceRow, User } from '#server/models/index.ts';

export interface SeenAs {
  /** Public id of the seat or name of the loom; `pattern` for the teacher's own piece. */
  readonly as: string;
  /** Null for the pattern and for a loom. */
  readonly studentName: string | null;
  /** What the loom is called; null otherwise. */
  readonly loom: string | null;
  readonly mine: MyPiece;
  readonly woven: WovenSoFar;
  readonly units: Units;
}

/** A seat of another series, or one that ended, is seen as the pattern. */
export async function seenAs(series: { readonly id: number; readonly pattern: Piece | null }, as: string | null, units: Units): Promise<SeenAs> {
  const pattern: SeenAs = { as: 'pattern', studentName: null, loom: null, mine: {}, woven: NOTHING_WOVEN, units };
  if (as === null || as === 'pattern') return pattern;
  const example = exampleLooms(series.pattern, units).find(({ name }) => name === as);
  if (example !== undefined) return { as, studentName: null, loom: example.label, mine: example.mine, woven: NOTHING_WOVEN, units: example.units };
  const seat = await Enrolment.findOne({ where: { publicId: as, seriesId: series.id, state: 'active' } });
  if (seat === null) return pattern;
  const [student, mine] = await Promise.all([User.findByPk(seat.userId, { rejectOnEmpty: true }), MyPieceRow.findByPk(seat.id)]);
  return { as, studentName: student.name, loom: null, mine: mine?.data ?? {}, woven: mine?.woven ?? NOTHING_WOVEN, units: student.units };
}
