// Every column of a series is taken along, or left behind for a reason.
import { describe, expect, test } from 'vitest';
import { GatheringItem, Lesson, Media, PatternPiece, Series, SeriesMedia } from '#server/models/index.ts';

const OF_THE_HOUSE = 'given anew by the house that takes it in';
const COUNTED = 'counts changes of this row';
const PUBLISHED = 'a series comes in as a draft; texts and words as published stay with those who have a seat';
const MADE = 'made anew from the file';

const COLUMNS = [
  {
    model: Series,
    taken: ['title', 'craft', 'level', 'summary', 'story', 'techniques', 'priceMinor', 'currency'],
    left: { id: OF_THE_HOUSE, publicId: OF_THE_HOUSE, workroomId: OF_THE_HOUSE, slug: 'an address that is free there', state: PUBLISHED, publishedAt: PUBLISHED, revision: COUNTED },
  },
  {
    model: Lesson,
    taken: ['position', 'title', 'minutes', 'isPreview', 'opens', 'opensAt', 'checkpoint', 'draftSource', 'draftReading'],
    left: { id: OF_THE_HOUSE, publicId: OF_THE_HOUSE, seriesId: OF_THE_HOUSE, draftRevision: COUNTED, timetableRevision: COUNTED, publishedVersionId: PUBLISHED, takenOutAt: 'parts that were taken out stay' },
  },
  {
    model: GatheringItem,
    taken: ['position', 'kind', 'name', 'amountKey', 'amountText', 'standIn', 'untilPart', 'note', 'lookOut', 'getFrom'],
    left: { id: OF_THE_HOUSE, publicId: OF_THE_HOUSE, lessonId: OF_THE_HOUSE, takenOutAt: 'lines that were taken out stay' },
  },
  { model: PatternPiece, taken: ['data'], left: { seriesId: OF_THE_HOUSE, revision: COUNTED } },
  { model: SeriesMedia, taken: ['name', 'title', 'lessonId'], left: { seriesId: OF_THE_HOUSE, mediaId: PUBLISHED, draftMediaId: OF_THE_HOUSE } },
  {
    model: Media,
    taken: ['kind', 'files', 'detail', 'draftDetail', 'durationMs'],
    left: { id: OF_THE_HOUSE, publicId: OF_THE_HOUSE, ownerId: OF_THE_HOUSE, state: MADE, originalName: 'the name in the zip takes its place', byteCount: MADE, digest: 'of photos of people only', width: MADE, height: MADE, revision: COUNTED, progressPermille: MADE, failure: MADE },
  },
];

describe.each(COLUMNS.map((one) => [one.model.name, one] as const))('of %s', (_name, { model, taken, left }) => {
  test('every column is taken along or left behind for a reason', () => {
    const columns = Object.keys((model as typeof Series).getAttributes()).filter((column) => column !== 'createdAt' && column !== 'updatedAt');
    expect([...taken, ...Object.keys(left)].toSorted()).toEqual(columns.toSorted());
  });
});
