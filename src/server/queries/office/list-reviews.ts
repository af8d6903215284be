import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { paged, type Paged } from './paging.ts';

export interface ReviewInOffice {
  readonly publicId: string;
  readonly words: string;
  readonly shownName: string;
  readonly answer: string;
  readonly writtenAt: Date;
  /** Null while it is shown. */
  readonly hiddenAt: Date | null;
  readonly hiddenWhy: string;
  /** Who wrote it, whatever name is shown. */
  readonly writer: string;
  readonly writerPublicId: string;
  readonly seriesTitle: string;
  readonly seriesSlug: string;
}

/** Every review, the newest first; only hidden ones when asked. */
export async function listReviews(onlyHidden: boolean, page: number): Promise<Paged<ReviewInOffice>> {
  const where = onlyHidden ? 'WHERE r.hidden_at IS NOT NULL' : '';
  const [count] = await sequelize.query<{ total: number }>(`SELECT COUNT(*) AS total FROM reviews r ${where}`, { type: QueryTypes.SELECT });
  return paged(page, count?.total ?? 0, (limit, offset) => sequelize.query<ReviewInOffice>(
    `SELECT r.public_id AS publicId, r.words, r.shown_name AS shownName, r.answer, r.created_at AS writtenAt, r.hidden_at AS hiddenAt, r.hidden_why AS hiddenWhy,
            u.name AS writer, u.public_id AS writerPublicId, s.title AS seriesTitle, s.slug AS seriesSlug
       FROM reviews r
       JOIN enrolments e ON e.id = r.enrolment_id
       JOIN users u ON u.id = e.user_id
       JOIN series s ON s.id = r.series_id
       ${where}
      ORDER BY r.created_at DESC, r.id DESC LIMIT ? OFFSET ?`,
    { replacements: [limit, offset], type: QueryTypes.SELECT },
  ));
}
