import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { EmailToken, HelperInvitation } from '#server/models/index.ts';

const DAY_MS = 86_400_000;
/** So long a teacher reads whom she invited who never came. */
const INVITED_DAYS = 90;

/** Forgets links sent by mail that work no longer, and the addresses of those who never accepted an invitation. */
export async function forgetOldLinks(ctx: Context): Promise<void> {
  const now = ctx.clock.now();
  await EmailToken.destroy({ where: { expiresAt: { [Op.lt]: now } } });
  await HelperInvitation.destroy({ where: { acceptedAt: null, expiresAt: { [Op.lt]: new Date(now.getTime() - INVITED_DAYS * DAY_MS) } } });
}
