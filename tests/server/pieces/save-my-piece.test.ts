import { describe, expect, test } from 'vitest';
import { MyPieceForm } from '#contracts/my-piece.ts';
import { MyPieceRow, PatternPiece, User } from '#server/models/index.ts';
import { saveMyPiece } from '#server/use-cases/pieces/save-my-piece.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const form = (series: string, fields: Record<string, unknown> = {}) => MyPieceForm.parse({ series, revision: '0', ...fields });
const FITS = { insideWidthMm: '36', nailPitchMm: '8', widthMm: '30', endsTogether: '2', warping: 'zigzag', units: 'cm', shown: 'cm' };

describe('a student’s own piece', () => {
  test('is kept, with the units she chose', async () => {
    const { series, student, seat } = await buildFollowed();
    await saveMyPiece(await contextFor(student), form(series.slug, { ...FITS, units: 'in', 'yarns.water.by': 'tex', 'yarns.water.grist': '330' }));
    expect((await MyPieceRow.findByPk(seat.id))?.data).toEqual({ loom: { insideWidthMm: 360, nailPitchMm: 8 }, widthMm: 300, endsTogether: 2, yarns: { water: { tex: 330 } } });
    expect((await User.findByPk(student.id))?.units).toBe('in');
  });

  test('is not kept when it cannot be woven: every field says why, and what was kept stays', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    await saveMyPiece(ctx, form(series.slug, FITS));
    const bad = form(series.slug, { revision: '1', insideWidthMm: '3 mm', nailPitchMm: 'eight' });
    await expect(saveMyPiece(ctx, bad)).rejects.toMatchObject({ code: 'VALIDATION', fields: { insideWidthMm: expect.stringContaining('works'), nailPitchMm: expect.any(String) } });
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ revision: 1, data: { widthMm: 300 } });
  });

  test('of two windows the second is told, and may keep hers once more', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    await saveMyPiece(ctx, form(series.slug, FITS));
    const other = { ...FITS, widthMm: '25' };
    await expect(saveMyPiece(ctx, form(series.slug, other))).rejects.toMatchObject({ code: 'CONFLICT' });
    await saveMyPiece(ctx, form(series.slug, { ...other, revision: '1' }));
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ revision: 2, data: { widthMm: 250 } });
  });

  test('two at the same moment: one is kept, one is told', async () => {
    const { series, student } = await buildFollowed();
    const ctx = await contextFor(student);
    const results = await Promise.allSettled([saveMyPiece(ctx, form(series.slug, FITS)), saveMyPiece(ctx, form(series.slug, { ...FITS, widthMm: '25' }))]);
    expect(results.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  });

  test('goes back to the pattern in one press, whatever stands in the fields', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    await saveMyPiece(ctx, form(series.slug, FITS));
    await saveMyPiece(ctx, form(series.slug, { insideWidthMm: 'nonsense', revision: '1', asPattern: 'yes' }));
    expect((await MyPieceRow.findByPk(seat.id))?.data).toEqual({});
  });

  test('is refused to a visitor, without a seat, and where there is no pattern', async () => {
    const { series, student } = await buildFollowed();
    await expect(saveMyPiece(contextOf(null), form(series.slug, FITS))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(saveMyPiece(await contextFor(await buildUser()), form(series.slug, FITS))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await PatternPiece.destroy({ where: { seriesId: series.id } });
    await expect(saveMyPiece(await contextFor(student), form(series.slug, FITS))).rejects.toMatchObject({ code: 'CONFLICT' });
  });

  test('a form with lists, numbers or strange names where texts belong is read as empty there', async () => {
    const { series, student, seat } = await buildFollowed();
    await saveMyPiece(await contextFor(student), form(series.slug, { ...FITS, insideHeightMm: ['64', '65'], constructor: 'x', 'yarns.constructor.by': 'tex' }));
    expect((await MyPieceRow.findByPk(seat.id))?.data.loom).toEqual({ insideWidthMm: 360, nailPitchMm: 8 });
  });
});
