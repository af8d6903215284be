/** Small things the worker does now and then. */
import { sessionAdapter } from '#server/auth/lucia.ts';
import type { WorkerOptions } from '#server/jobs/worker.ts';
import { lookAtOldOrders } from '#server/use-cases/checkout/look-at-old-orders.ts';
import { tellOpenings } from '#server/use-cases/openings/tell-openings.ts';
import { forgetOldLinks } from '#server/use-cases/people/forget-old-links.ts';
import { lookAfterPhotoUploads } from '#server/use-cases/photos/look-after-photo-uploads.ts';
import { forgetTakenOutWords } from '#server/use-cases/questions/forget-taken-out-words.ts';
import { drawSharePictures } from '#server/use-cases/shop/draw-share-pictures.ts';
import { lookAfterUploads } from '#server/use-cases/videos/look-after-uploads.ts';
import { forgetOldCounters } from '#server/web/rate-limit.ts';

const HOUR = 3_600;
const FIVE_MINUTES = 300;
const MINUTE = 60;

export const CHORES: WorkerOptions['chores'] = [
  { everySeconds: MINUTE, run: tellOpenings },
  { everySeconds: MINUTE, run: drawSharePictures },
  { everySeconds: FIVE_MINUTES, run: lookAtOldOrders },
  { everySeconds: FIVE_MINUTES, run: lookAfterUploads },
  { everySeconds: FIVE_MINUTES, run: lookAfterPhotoUploads },
  { everySeconds: HOUR, run: () => sessionAdapter.deleteExpiredSessions() },
  { everySeconds: HOUR, run: forgetOldLinks },
  { everySeconds: HOUR, run: forgetTakenOutWords },
  { everySeconds: HOUR, run: () => forgetOldCounters() },
];
