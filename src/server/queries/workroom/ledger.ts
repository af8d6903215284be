/** What moved on a workroom's account: months with their sums, and the entries of one of them. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export type EntryKind = 'sale' | 'fee' | 'refund' | 'fee-refund';

export interface LedgerLine {
  readonly kind: EntryKind;
  readonly amountMinor: number;
  readonly currency: string;
  readonly at: Date;
  readonly seriesTitle: string;
  readonly buyerName: string;
  readonly receiptNumber: number | null;
}

/** All entries since `from`, newest first. Months are told apart by the caller, on the teacher's own clock. */
export async function ledgerSince(workroomId: number, from: Date): Promise<LedgerLine[]> {
  return sequelize.query<LedgerLine>(
    `SELECT e.kind, e.amount_minor AS amountMinor, e.currency, e.created_at AS at, s.title AS seriesTitle, u.name AS buyerName, o.receipt_number AS receiptNumber
       FROM ledger_entries e
       JOIN orders o ON o.id = e.order_id
       JOIN series s ON s.id = o.series_id
       JOIN users u ON u.id = o.user_id
      WHERE e.workroom_id = ? AND e.created_at >= ?
      ORDER BY e.created_at DESC, e.id DESC`,
    { replacements: [workroomId, from], type: QueryTypes.SELECT },
  );
}
