import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';
import { beforeEach, describe, expect, test } from 'vitest';
import { CertificateForm } from '#contracts/certificate.ts';
import { drawCertificate, type CertificateFacts } from '#server/certificate/draw-certificate.ts';
import { runsOf } from '#server/certificate/lettering.ts';
import { FinishedPiece, LessonVisit } from '#server/models/index.ts';
import { makeCertificate } from '#server/use-cases/finish/make-certificate.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed, type Followed } from '../../support/followed.ts';

const FACTS: CertificateFacts = {
  name: 'Maud Ellery', series: 'Low Tide', seriesRest: 'A woven wall hanging', teacher: 'Ilse Marrow', workroom: 'Saltmarsh Loom Room', day: '1 December 2026',
  at: new Date('2026-12-01T12:00:00Z'), hours: '', size: '40 cm wide', cloth: null, clothWords: '', paper: 'A4',
};

/** As a reader's program opens it. */
async function opened(bytes: Uint8Array) {
  const pdf = await getDocument({ data: new Uint8Array(bytes), useSystemFonts: false, verbosity: 0 }).promise;
  const page = await pdf.getPage(1);
  const { items } = await page.getTextContent();
  const { info } = await pdf.getMetadata();
  return {
    pages: pdf.numPages,
    text: items.map((item) => ('str' in item ? `${item.str}${item.hasEOL ? ' ' : ''}` : '')).join('').replace(/\s+/g, ' '),
    title: (info as { Title?: string }).Title,
    language: (info as { Language?: string }).Language,
    marked: (await pdf.getMarkInfo())?.Marked,
    tree: JSON.stringify(await page.getStructTree()),
    size: page.getViewport({ scale: 1 }),
  };
}

let followed: Followed;
const asked = (fields: Record<string, string> = {}) => CertificateForm.parse({ name: 'Maud Ellery', day: '2026-11-30', ...fields });
beforeEach(async () => { followed = await buildFollowed(); });
async function finish(): Promise<void> {
  for (const { id } of followed.parts) await LessonVisit.create({ enrolmentId: followed.seat.id, lessonId: id, finishedAt: new Date('2026-11-30T10:00:00Z') });
}

describe('a certificate is refused', () => {
  test('to a visitor, without a seat, before every part is done whatever she says, and for a day to come', async () => {
    const { series: { slug }, student } = followed;
    await FinishedPiece.create({ enrolmentId: followed.seat.id, saidAt: new Date() });
    await expect(makeCertificate(contextOf(null), slug, asked())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(makeCertificate(await contextFor(await buildUser()), slug, asked())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(makeCertificate(await contextFor(student), slug, asked())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await finish();
    await expect(makeCertificate(await contextFor(student), slug, asked({ day: '2027-01-01' }))).rejects.toMatchObject({ code: 'VALIDATION' });
    expect(CertificateForm.safeParse({ day: '2026-02-30' }).success).toBe(false);
  });
});

describe('a certificate', () => {
  test('is one tagged page with her piece and her words, the same each time', async () => {
    await finish();
    await FinishedPiece.create({ enrolmentId: followed.seat.id, minutes: 840 });
    const ctx = await contextFor(followed.student);
    const bytes = await makeCertificate(ctx, followed.series.slug, asked({ hours: 'yes' }));
    const { pages, text, title, language, marked, tree, size } = await opened(bytes);
    expect([pages, title, language, marked]).toEqual([1, 'Low Tide, certificate', 'en-GB', true]);
    expect(text).toMatch(/Maud Ellery has made Low Tide .*40 cm wide.*14 h of work with Student .*30 November 2026/);
    expect(text).not.toContain('Wind');
    expect(tree).toContain('In the order it is woven');
    expect([Math.round(size.width), Math.round(size.height)]).toEqual([595, 842]);
    expect(Buffer.compare(bytes, await makeCertificate(ctx, followed.series.slug, asked({ hours: 'yes' })))).toBe(0);
    expect(Buffer.from(bytes).toString('latin1')).toContain('/FontFile2');
  });

  test.each([
    ['a picture in it', 'Maud 🧶 Ellery', /^ ?Maud Ellery has made/],
    ['letters of three alphabets', 'Łucja Nguyễn Нина', /Łucja Nguyễn Нина has made/],
    ['two hundred letters', 'W'.repeat(200), /WWWWWWW/],
    ['markup', '<b>Maud</b> & (Ellery) \\)', /<b>Maud<\/b> & \(Ellery\) \\\)/],
    ['letters our type does not have', 'مود إليري', /^ ?has made/],
    ['nothing but signs nobody sees', '\u202e\u0000\u200b', /^ ?has made/],
  ])('bears a name with %s', async (_what, name, words) => {
    const { pages, text } = await opened(await drawCertificate({ ...FACTS, name }));
    expect(pages).toBe(1);
    expect(text).toMatch(words);
  });

  test('never writes half a name', () => {
    expect(runsOf('Maud مود', 'plain')).toBeNull();
    expect(runsOf('Maud 🧶', 'plain')?.map(({ text }) => text)).toEqual(['Maud']);
  });
});
