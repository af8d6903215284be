import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { EmailToken } from '#server/models/index.ts';

/** Forgets links sent by mail that work no longer. */
export async function forgetOldLinks(ctx: Context): Promise<void> {
  await EmailToken.destroy({ where: { expiresAt: { [Op.lt]: ctx.clock.now() } } });
}
