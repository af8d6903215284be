/** Whose piece and units a preview is drawn with: the pattern's, or those of one student of the series. */
import type { MyPiece } from '#core/craft/fit.ts';
import type { Units } from '#core/units/units.ts';
import { Enrolment, MyPieceRow, User } from '#server/models/index.ts';

export interface SeenAs {
  /** Public id of the seat; `pattern` for the teacher's own piece. */
  readonly as: string;
  /** Null for the pattern. */
  readonly studentName: string | null;
  readonly mine: MyPiece;
  readonly units: Units;
}

/** A seat of another series, or one that ended, is seen as the pattern. */
export async function seenAs(seriesId: number, as: string | null, units: Units): Promise<SeenAs> {
  const pattern: SeenAs = { as: 'pattern', studentName: null, mine: {}, units };
  if (as === null || as === 'pattern') return pattern;
  const seat = await Enrolment.findOne({ where: { publicId: as, seriesId, state: 'active' } });
  if (seat === null) return pattern;
  const [student, mine] = await Promise.all([User.findByPk(seat.userId, { rejectOnEmpty: true }), MyPieceRow.findByPk(seat.id)]);
  return { as, studentName: student.name, mine: mine?.data ?? {}, units: student.units };
}
