import type { Context } from '#server/context.ts';
import { WallPiece } from '#server/models/index.ts';

/** Ends what she agreed to, now. Called inside the transaction of whatever ends it. */
export async function offWall({ clock }: Context, enrolmentId: number): Promise<void> {
  await WallPiece.update({ withdrawnAt: clock.now() }, { where: { enrolmentId, withdrawnAt: null } });
}
