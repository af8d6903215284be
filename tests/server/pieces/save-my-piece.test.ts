import { describe, expect, test } from 'vitest';
import { MyPieceForm } from '#contracts/my-piece.ts';
import { CRAFTS } from '#core/craft/crafts.ts';
import { madeFor } from '#core/craft/made-for.ts';
import { MyPieceRow, PatternPiece, User } from '#server/models/index.ts';
import { rowCounts } from '#server/queries/following/row-counts.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { saveMyPiece } from '#server/use-cases/pieces/save-my-piece.ts';
import { sayRows } from '#server/use-cases/progress/count-rows.ts';
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

  test('half way is kept with what is woven, and told so; what is not woven is kept as nothing', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    expect(await saveMyPiece(ctx, form(series.slug, FITS))).toEqual({ revision: 1, isBegun: false });
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ woven: null });
    const woven = { 'woven.bandsDone': '6', 'woven.rows': '30', 'woven.heightMm': '13,5', 'woven.left.water': '60' };
    expect(await saveMyPiece(ctx, form(series.slug, { ...FITS, ...woven, revision: '1' }))).toEqual({ revision: 2, isBegun: true });
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ woven: { bandsDone: 6, rows: 30, heightMm: 135, leftG: { water: 60 } } });
  });

  test('half way is where the row counter goes on from, until she counts on; what is saved besides leaves the rows as they are', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    const at = { 'woven.bandsDone': '6', 'woven.rows': '30' };
    await saveMyPiece(ctx, form(series.slug, { ...FITS, ...at }));
    expect(await rowCounts(seat.id)).toMatchObject({ dunes: 30 });
    await sayRows(ctx, { series: series.slug, part: 1, step: 1, band: 'dunes', rows: 34 });
    await saveMyPiece(ctx, form(series.slug, { ...FITS, ...at, revision: '1', 'yarns.ridge.by': 'tex', 'yarns.ridge.grist': '330' }));
    expect(await rowCounts(seat.id)).toMatchObject({ dunes: 34 });
    await saveMyPiece(ctx, form(series.slug, { ...FITS, 'woven.bandsDone': '0', revision: '2' }));
    expect(Object.values(await rowCounts(seat.id)).every((rows) => rows === 0)).toBe(true);
  });

  test('half way is refused what can no longer change, at the field, and keeps what was kept', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    const woven = { 'woven.bandsDone': '6' };
    await saveMyPiece(ctx, form(series.slug, { ...FITS, ...woven }));
    const refused = (fields: Record<string, string>) => expect(saveMyPiece(ctx, form(series.slug, { ...FITS, ...woven, revision: '1', ...fields }))).rejects;
    await refused({ widthMm: '25' }).toMatchObject({ code: 'VALIDATION', fields: { widthMm: expect.stringContaining('the piece keeps its width') } });
    await refused({ endsTogether: '1' }).toMatchObject({ fields: { endsTogether: expect.stringContaining('The cloth is begun') } });
    await refused({ nailPitchMm: '10' }).toMatchObject({ fields: { nailPitchMm: expect.stringContaining('stay as far apart as they are') } });
    await refused({ 'warp.yarn.by': 'tex', 'warp.yarn.grist': '200' }).toMatchObject({ fields: { 'warp.yarn.grist': expect.stringContaining('stays the yarn it is') } });
    await refused({ asPattern: 'yes' }).toMatchObject({ code: 'VALIDATION' });
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ revision: 1, data: { widthMm: 300 }, woven: { bandsDone: 6 } });
  });

  test('half way may still change its yarns; and everything, once nothing of it is woven any more', async () => {
    const { series, student, seat } = await buildFollowed();
    const ctx = await contextFor(student);
    const woven = { 'woven.bandsDone': '6' };
    await saveMyPiece(ctx, form(series.slug, { ...FITS, ...woven }));
    await saveMyPiece(ctx, form(series.slug, { ...FITS, ...woven, revision: '1', 'yarns.ridge.by': 'tex', 'yarns.ridge.grist': '330' }));
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ data: { yarns: { ridge: { tex: 330 } } }, woven: { bandsDone: 6 } });
    await saveMyPiece(ctx, form(series.slug, { ...FITS, widthMm: '25', 'woven.bandsDone': '0', revision: '2' }));
    expect(await MyPieceRow.findByPk(seat.id)).toMatchObject({ data: { widthMm: 250 }, woven: null });
  });

  test.each([
    ['woven.bandsDone', { 'woven.bandsDone': '99' }, 'This piece has'],
    ['woven.rows', { 'woven.bandsDone': '6', 'woven.rows': 'some' }, 'is no number'],
    ['woven.rows', { 'woven.rows': '2' }, 'no rows to count'],
    ['woven.heightMm', { 'woven.heightMm': '12' }, 'Say above how far you are'],
    ['woven.heightMm', { 'woven.bandsDone': '7', 'woven.heightMm': '2' }, 'measure'],
    ['woven.left.water', { 'woven.left.water': '-3' }, 'below 0'],
  ])('of what is woven, %s %o is refused at its field', async (field, fields, says) => {
    const { series, student } = await buildFollowed();
    await expect(saveMyPiece(await contextFor(student), form(series.slug, { ...FITS, ...fields }))).rejects.toMatchObject({ code: 'VALIDATION', fields: { [field]: expect.stringContaining(says) } });
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

describe('a student’s own cord for a knotted piece', () => {
  const THICK = { 'cords.main.diameterMm': '3', 'cords.main.label': 'Harbour, thin', 'rod.diameterMm': '25', units: 'cm', shown: 'cm' };

  async function buildKnotted() {
    const followed = await buildFollowed();
    await PatternPiece.update({ data: CRAFTS.macrame.example }, { where: { seriesId: followed.series.id } });
    return followed;
  }

  test('is kept with her rod, in the units she typed', async () => {
    const { series, student, seat } = await buildKnotted();
    await saveMyPiece(await contextFor(student), form(series.slug, THICK));
    expect((await MyPieceRow.findByPk(seat.id))?.data).toEqual({ cords: { main: { diameterMm: 3, label: 'Harbour, thin' } }, rod: { diameterMm: 25 } });
  });

  test('is reckoned with wherever the series tells amounts', async () => {
    const { series, student, seat } = await buildKnotted();
    await saveMyPiece(await contextFor(student), form(series.slug, THICK));
    const { pattern, mine } = await piecesOf(series.id, seat.id);
    const made = madeFor(pattern, mine, 'cm');
    expect(made?.isOwn).toBe(true);
    expect(made?.piece).toMatchObject({ rod: { diameterMm: 25 }, yarns: { main: { diameterMm: 3 } } });
  });

  test('is not kept when it cannot be knotted: every field says why', async () => {
    const { series, student, seat } = await buildKnotted();
    const bad = form(series.slug, { ...THICK, 'cords.main.diameterMm': 'thin', 'rod.diameterMm': '' });
    await expect(saveMyPiece(await contextFor(student), bad)).rejects.toMatchObject({ code: 'VALIDATION', fields: { 'cords.main.diameterMm': expect.any(String) } });
    await expect(saveMyPiece(await contextFor(student), form(series.slug, { ...THICK, 'cords.main.diameterMm': '90' }))).rejects.toMatchObject({ code: 'VALIDATION', fields: { 'cords.main.diameterMm': expect.stringContaining('works') } });
    expect(await MyPieceRow.findByPk(seat.id)).toBeNull();
  });

  test('goes back to the pattern in one press', async () => {
    const { series, student, seat } = await buildKnotted();
    await saveMyPiece(await contextFor(student), form(series.slug, THICK));
    await saveMyPiece(await contextFor(student), form(series.slug, { ...THICK, revision: '1', asPattern: 'yes' }));
    expect((await MyPieceRow.findByPk(seat.id))?.data).toEqual({});
  });
});
