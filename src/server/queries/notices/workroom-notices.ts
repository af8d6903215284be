/** What was written to students from one workroom: drafts, what waits, what is out, with how many it reached. */
import { QueryTypes } from 'sequelize';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { Notice } from '#server/models/index.ts';
import { paged, type Paged } from '#server/queries/office/paging.ts';

export interface NoticeInList {
  readonly publicId: string;
  readonly kind: Notice['kind'];
  readonly state: Notice['state'];
  readonly title: string;
  readonly seriesTitle: string;
  readonly seriesSlug: string;
  readonly seriesId: number;
  readonly atLessonId: number | null;
  readonly stillDays: number | null;
  /** The one a nudge went to. */
  readonly toName: string | null;
  readonly writtenAt: Date;
  readonly sendAt: Date | null;
  readonly sentAt: Date | null;
  readonly reached: number;
  readonly byLetter: number;
  readonly read: number;
}

export interface NoticeInHand extends NoticeInList {
  readonly workroomId: number;
  readonly source: string;
  readonly tree: LessonTree;
}

const COLUMNS = `
  n.public_id AS publicId, n.kind, n.state, n.title, n.series_id AS seriesId, s.title AS seriesTitle, s.slug AS seriesSlug, n.at_lesson_id AS atLessonId, n.still_days AS stillDays,
  n.created_at AS writtenAt, n.send_at AS sendAt, n.sent_at AS sentAt,
  (SELECT MIN(u.name) FROM notice_receipts r JOIN users u ON u.id = r.user_id WHERE r.notice_id = n.id AND n.kind = 'nudge') AS toName,
  (SELECT COUNT(*) FROM notice_receipts r WHERE r.notice_id = n.id) AS reached,
  (SELECT COUNT(*) FROM notice_receipts r WHERE r.notice_id = n.id AND r.by_letter = 1) AS byLetter,
  (SELECT COUNT(*) FROM notice_receipts r WHERE r.notice_id = n.id AND r.read_at IS NOT NULL) AS \`read\``;

/** Newest first. */
export async function noticesOf(workroomId: number, page: number): Promise<Paged<NoticeInList>> {
  const [count] = await sequelize.query<{ total: number }>('SELECT COUNT(*) AS total FROM notices WHERE workroom_id = ?', { replacements: [workroomId], type: QueryTypes.SELECT });
  return paged(page, count?.total ?? 0, (limit, offset) => sequelize.query<NoticeInList>(
    `SELECT ${COLUMNS} FROM notices n JOIN series s ON s.id = n.series_id WHERE n.workroom_id = :workroomId ORDER BY n.id DESC LIMIT :limit OFFSET :offset`,
    { replacements: { workroomId, limit, offset }, type: QueryTypes.SELECT },
  ));
}

/** One of them with its words; null for another workroom's. */
export async function noticeInHand(workroomId: number, publicId: string): Promise<NoticeInHand | null> {
  const [notice] = await sequelize.query<NoticeInHand>(
    `SELECT ${COLUMNS}, n.workroom_id AS workroomId, n.source, n.tree FROM notices n JOIN series s ON s.id = n.series_id WHERE n.workroom_id = :workroomId AND n.public_id = :publicId`,
    { replacements: { workroomId, publicId }, type: QueryTypes.SELECT },
  );
  return notice ?? null;
}
