import { describe, expect, test } from 'vitest';
import { Workroom } from '#server/models/index.ts';
import { pagesToKeep } from '#server/queries/kept-pages/pages-to-keep.ts';
import { contextFor } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
const toKeep = async (...person: Parameters<typeof contextFor>) => pagesToKeep((await contextFor(...person)).actor, NOW);

describe('what a device may keep', () => {
  test('is nothing of a visitor, and nothing of who has no seat', async () => {
    await buildFollowed();
    expect(await pagesToKeep(null, NOW)).toEqual({ person: null, pages: [], series: [] });
    const other = await buildUser();
    expect(await toKeep(other)).toEqual({ person: other.publicId, pages: [], series: [] });
  });

  test('are the loom, the lists, and of the open parts the text and each step: the third part waits', async () => {
    const { series: { slug }, student } = await buildFollowed();
    const at = `/series/${slug}`;
    expect(await toKeep(student)).toEqual({ person: student.publicId, pages: ['/loom'], series: [{ slug, pages: [
      `${at}/gather`, `${at}/gather?part=1`, `${at}/gather?part=2`, `${at}/gather?part=3`,
      `${at}/1`, `${at}/1/loomside`, `${at}/2`, `${at}/2/loomside`,
    ] }] });
  });

  test('is nothing any more when the seat has ended', async () => {
    const { student, seat } = await buildFollowed();
    await seat.update({ state: 'closed' });
    expect(await toKeep(student)).toMatchObject({ pages: [], series: [] });
  });

  test('is nothing of a series that she looks after, as those pages show drafts', async () => {
    const { series, student } = await buildFollowed();
    await Workroom.update({ ownerId: student.id }, { where: { id: series.workroomId } });
    expect(await toKeep(student)).toMatchObject({ series: [] });
  });
});
