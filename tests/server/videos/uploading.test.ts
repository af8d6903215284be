import { randomBytes } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Job, Media, SeriesMedia, VideoUpload, type Lesson, type Series } from '#server/models/index.ts';
import { User } from '#server/models/index.ts';
import { services } from '#server/services.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { beginning, going, openVideoDoor, type UploadDoor } from '../../support/upload-door.ts';

const MIB = 1_048_576;
let door: UploadDoor;
let teacher: User;
let series: Series;
let lesson: Lesson;

beforeEach(async () => {
  const workroom = await buildWorkroom();
  teacher = await User.findByPk(workroom.ownerId, { rejectOnEmpty: true });
  series = await buildSeries({ workroomId: workroom.id });
  lesson = await buildLesson({ seriesId: series.id, title: 'Rya fringe' });
  door = await openVideoDoor(await contextFor(teacher));
});
afterEach(() => door.stop());

async function begin(byteCount: number, told: Record<string, string> = {}): Promise<string> {
  const answer = await door.send(beginning(lesson.publicId, byteCount, told));
  expect(answer?.status).toBe(201);
  return answer?.headers.location ?? '';
}
const offsetOf = async (path: string): Promise<number> => Number((await door.send({ method: 'HEAD', path }))?.headers['upload-offset']);
const bytesAt = async (path: string): Promise<Buffer> => readFile(join(await services().media.temporaryFolder('videos'), path.split('/').at(-1) ?? ''));
/** The time of the upload's beginning, moved back. */
const age = (hours: number) => sequelize.query(`UPDATE video_uploads SET created_at = created_at - INTERVAL ${hours} HOUR`);

describe('a video on its way', () => {
  test('goes on where it was after being cut three times, with a restarted server in between, and arrives byte for byte', async () => {
    const film = randomBytes(6 * MIB);
    const path = await begin(film.length);
    let offset = 0;
    for (const [cut, whenRestarted] of [[MIB, false], [2 * MIB, true], [MIB, false]] as const) {
      const before = offset;
      await door.send(going(path, offset, film.subarray(offset), { after: cut, hasArrived: async () => (await bytesAt(path)).length > before }));
      if (whenRestarted) {
        await door.stop();
        door = await openVideoDoor(await contextFor(teacher));
      }
      const reached = await offsetOf(path);
      expect(reached).toBeGreaterThan(offset);
      expect(reached).toBeLessThanOrEqual(offset + cut);
      offset = reached;
    }
    const last = await door.send(going(path, offset, film.subarray(offset)));
    expect([last?.status, last?.headers['upload-offset']]).toEqual([204, String(film.length)]);
    expect((await bytesAt(path)).equals(film)).toBe(true);
    expect((await Media.findOne())?.state).toBe('uploaded');
    expect(await Job.count({ where: { type: 'process-video' } })).toBe(1);
  });

  test('is known to its part from the first byte, under a name made of the title, and no student’s yet', async () => {
    await begin(MIB);
    await begin(MIB);
    const rows = await SeriesMedia.findAll({ order: ['name'] });
    expect(rows.map(({ name, mediaId, lessonId }) => [name, mediaId, lessonId])).toEqual([['rya-fringe', null, lesson.id], ['rya-fringe-2', null, lesson.id]]);
  });

  test('that shall replace another leaves the published one in its place', async () => {
    const old = await Media.create({ ownerId: teacher.id, kind: 'video', state: 'ready', originalName: 'old.mp4', files: {}, detail: {} });
    await SeriesMedia.create({ seriesId: series.id, name: 'rya-fringe', mediaId: old.id });
    await begin(MIB, { name: 'rya-fringe' });
    const kept = await SeriesMedia.findOne({ rejectOnEmpty: true });
    expect(kept.mediaId).toBe(old.id);
    expect(kept.draftMediaId).not.toBeNull();
  });

  test('is sent on once only, however often its sender asks how far it is', async () => {
    const film = randomBytes(MIB);
    const path = await begin(film.length);
    await door.send(going(path, 0, film));
    expect(await offsetOf(path)).toBe(film.length);
    await door.send(going(path, film.length, Buffer.alloc(0)));
    expect(await Job.count()).toBe(1);
  });

  test('that came whole just before the server died is sent on when its sender asks', async () => {
    const film = randomBytes(MIB);
    const path = await begin(film.length);
    await door.send(going(path, 0, film));
    await Job.destroy({ where: {} });
    await Media.update({ state: 'created' }, { where: {} });
    await offsetOf(path);
    expect(await Job.count()).toBe(1);
  });

  test('can be taken back until it is whole, and leaves nothing behind', async () => {
    const path = await begin(MIB);
    await door.send(going(path, 0, randomBytes(1_000)));
    expect((await door.send({ method: 'DELETE', path }))?.status).toBe(204);
    expect([await Media.count(), await VideoUpload.count(), await SeriesMedia.count()]).toEqual([0, 0, 0]);
    expect((await door.send({ method: 'HEAD', path }))?.status).toBe(404);
    const whole = await begin(4);
    await door.send(going(whole, 0, Buffer.from('film')));
    expect((await door.send({ method: 'DELETE', path: whole }))?.status).toBe(400);
    expect(await Media.count()).toBe(1);
  });

  test('is written by one request at a time: of two that send the same piece one is told where the upload stands', async () => {
    const film = randomBytes(MIB);
    const path = await begin(film.length);
    const answers = await Promise.all([door.send(going(path, 0, film)), door.send(going(path, 0, film))]);
    expect(answers.map((answer) => answer?.status).sort()).toEqual([204, 409]);
    expect((await bytesAt(path)).equals(film)).toBe(true);
  });
});

describe('the door refuses', () => {
  test('somebody else at every verb, as if there were nothing, and a visitor', async () => {
    const path = await begin(MIB);
    const stranger = await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true });
    door.ctx = await contextFor(stranger);
    for (const method of ['HEAD', 'DELETE']) expect((await door.send({ method, path }))?.status).toBe(404);
    expect((await door.send(going(path, 0, randomBytes(10))))?.status).toBe(404);
    expect((await door.send(beginning(lesson.publicId, MIB)))?.status).toBe(404);
    door.ctx = contextOf(null);
    expect((await door.send({ method: 'HEAD', path }))?.status).toBe(401);
    door.ctx = await contextFor(teacher);
    expect(await offsetOf(path)).toBe(0);
  });

  test('a part of another teacher, and a student', async () => {
    const other = await buildLesson();
    expect((await door.send(beginning(other.publicId, MIB)))?.status).toBe(404);
    door.ctx = await contextFor(await buildUser());
    expect((await door.send(beginning(lesson.publicId, MIB)))?.status).toBe(404);
    expect(await Media.count()).toBe(0);
  });

  test.each([
    ['an empty file', 0, {}, 415, 'empty'],
    ['a length that is none', '-1', {}, 400, 'upload-length'],
    ['a length in another form', '1e3', {}, 400, 'upload-length'],
    ['a kind that we do not read', MIB, { filename: 'film.avi' }, 415, 'MP4, MOV, MKV or WebM'],
    ['a type that does not agree with the name', MIB, { filetype: 'text/html' }, 415, 'MP4, MOV, MKV or WebM'],
    ['more than the most', VIDEO_LIMITS.maxBytes + 1, {}, 413, ''],
    ['a part that cannot be one', MIB, { lesson: '../../etc' }, 422, ''],
  ])('%s', async (_what, byteCount, told, status, words) => {
    const answer = await door.send(beginning(lesson.publicId, byteCount, told));
    expect(answer?.status).toBe(status);
    expect(answer?.text).toContain(words);
    expect(await Media.count()).toBe(0);
  });

  test('an upload of unknown length', async () => {
    const { headers } = beginning(lesson.publicId, 0);
    const { 'Upload-Length': _, ...rest } = headers ?? {};
    expect((await door.send({ method: 'POST', headers: { ...rest, 'Upload-Defer-Length': '1' } }))?.status).toBe(422);
  });

  test('a wrong place with 409, and a byte more than was promised with 413, and moves nothing', async () => {
    const path = await begin(1_000);
    await door.send(going(path, 0, randomBytes(600)));
    expect((await door.send(going(path, 500, randomBytes(100))))?.status).toBe(409);
    expect((await door.send(going(path, 600, randomBytes(401))))?.status).toBe(413);
    expect(await offsetOf(path)).toBe(600);
  });

  test('what was not finished in a week with 410, and addresses that were never given with 404', async () => {
    const path = await begin(1_000);
    await age(VIDEO_LIMITS.uploadHours + 1);
    expect((await door.send({ method: 'HEAD', path }))?.status).toBe(410);
    expect((await door.send(going(path, 0, randomBytes(10))))?.status).toBe(410);
    expect((await door.send({ method: 'HEAD', path: '/api/videos/..%2f..%2fetc%2fpasswd' }))?.status).toBe(404);
  });

  test('to give a file back', async () => {
    const path = await begin(1_000);
    expect((await door.send({ method: 'GET', path }))?.status).toBe(405);
  });

  test('what goes beyond a teacher’s room, exactly, however many begin at once', async () => {
    const most = VIDEO_LIMITS.maxBytesOfTeacher;
    await Media.create({ ownerId: teacher.id, kind: 'video', state: 'ready', originalName: 'old.mp4', byteCount: most - 3 * MIB, files: {}, detail: {} });
    const answers = await Promise.all(Array.from({ length: 6 }, () => door.send(beginning(lesson.publicId, MIB))));
    expect(answers.map((answer) => answer?.status).sort()).toEqual([201, 201, 201, 409, 409, 409]);
  });
});
