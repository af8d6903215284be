/** How it stands with a seat somebody came back from paying for. Only what we know ourselves; coming back proves nothing. */
import { QueryTypes } from 'sequelize';
import type { OrderState } from '#core/checkout/settle.ts';
import type { SeatStanding } from '#contracts/checkout.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';

interface Row { readonly hasSeat: number; readonly state: OrderState | null; readonly receiptNumber: number | null }

export interface SeatNews {
  readonly standing: SeatStanding;
  readonly receiptNumber: number | null;
}

const OF_STATE = { pending: 'waits', refused: 'refused', expired: 'ended', review: 'looked-at', paid: 'unknown' } as const satisfies Record<OrderState, SeatStanding>;

/**
 * One statement. `checkoutId` names the payment she comes from, if she says any; another person's is as good as none.
 * A paid order whose seat was given back is `unknown`.
 */
export async function seatStanding(actor: Actor, slug: string, checkoutId: string | null): Promise<SeatNews> {
  const [row] = await sequelize.query<Row>(
    `SELECT (e.id IS NOT NULL) AS hasSeat, o.state, o.receipt_number AS receiptNumber
       FROM series s
       LEFT JOIN enrolments e ON e.series_id = s.id AND e.user_id = :userId AND e.state = 'active'
       LEFT JOIN orders o ON o.series_id = s.id AND o.user_id = :userId AND (o.session_id = :checkoutId OR (:checkoutId = '' AND o.id = e.order_id))
      WHERE s.slug = :slug`,
    { replacements: { userId: actor.userId, slug, checkoutId: checkoutId ?? '' }, type: QueryTypes.SELECT },
  );
  if (row === undefined) return { standing: 'unknown', receiptNumber: null };
  if (row.hasSeat === 1) return { standing: 'yours', receiptNumber: row.receiptNumber };
  return { standing: row.state === null ? 'unknown' : OF_STATE[row.state], receiptNumber: null };
}
