/** Every step of the schema, oldest first. A static list, so that bundles carry them all. */
import type { Migration } from '#server/db/migration.ts';
import { createPeople } from './0001-create-people.ts';
import { createWorkrooms } from './0002-create-workrooms.ts';
import { createSeries } from './0003-create-series.ts';
import { createMedia } from './0004-create-media.ts';
import { createSeats } from './0005-create-seats.ts';
import { createProgress } from './0006-create-progress.ts';
import { createQueues } from './0007-create-queues.ts';
import { createVideos } from './0008-create-videos.ts';
import { addWovenSoFar } from './0009-add-woven-so-far.ts';
import { createOpenings } from './0010-create-openings.ts';
import { createEarlierDrafts } from './0011-create-earlier-drafts.ts';
import { createCalendars } from './0012-create-calendars.ts';
import { createPieceDrafts } from './0013-create-piece-drafts.ts';
import { createBench } from './0014-create-bench.ts';
import { createReviews } from './0015-create-reviews.ts';
import { createNotices } from './0016-create-notices.ts';
import { createQuestions } from './0018-create-questions.ts';
import { createHelperInvitations } from './0019-create-helper-invitations.ts';
import { createKeptThings } from './0020-create-kept-things.ts';
import { createLessonReads } from './0021-create-lesson-reads.ts';
import { createSeriesImports } from './0022-create-series-imports.ts';
import { mergeTicks } from './0024-merge-ticks.ts';
import { createStashes } from './0025-create-stashes.ts';
import { createRowTallies } from './0026-create-row-tallies.ts';
import { createWeavingTimes } from './0027-create-weaving-times.ts';
import { createPhotoUploads } from './0028-create-photo-uploads.ts';
import { addWhatToSee } from './0029-add-what-to-see.ts';
import { createSharePictures } from './0030-create-share-pictures.ts';
import { createOwnLooms } from './0032-create-own-looms.ts';
import { createFinishedPieces } from './0034-create-finished-pieces.ts';
import { createWallPieces } from './0035-create-wall-pieces.ts';
import { addAnswerLetters } from './0040-add-answer-letters.ts';
import { addPhotoOfQuestion } from './0041-add-photo-of-question.ts';

export const migrations: readonly Migration[] = [
  createPeople,
  createWorkrooms,
  createSeries,
  createMedia,
  createSeats,
  createProgress,
  createQueues,
  createVideos,
  addWovenSoFar,
  createOpenings,
  createEarlierDrafts,
  createCalendars,
  createPieceDrafts,
  createBench,
  createReviews,
  createNotices,
  createQuestions,
  createHelperInvitations,
  createKeptThings,
  createLessonReads,
  createSeriesImports,
  mergeTicks,
  createStashes,
  createRowTallies,
  createWeavingTimes,
  createPhotoUploads,
  addWhatToSee,
  createSharePictures,
  createOwnLooms,
  createFinishedPieces,
  createWallPieces,
  addAnswerLetters,
  addPhotoOfQuestion,
];
