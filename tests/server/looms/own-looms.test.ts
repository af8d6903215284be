import { describe, expect, test } from 'vitest';
import { OwnLoomForm } from '#contracts/own-looms.ts';
import { MyPieceForm } from '#contracts/my-piece.ts';
import { MOST_LOOMS } from '#core/craft/my-piece/own-loom.ts';
import { OwnLoomRow } from '#server/models/index.ts';
import { loomsTakenOut, ownLooms } from '#server/queries/looms/own-looms.ts';
import { keepOwnLoom } from '#server/use-cases/looms/keep-own-loom.ts';
import { takeOutLoom } from '#server/use-cases/looms/take-out-loom.ts';
import { saveMyPiece } from '#server/use-cases/pieces/save-my-piece.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const form = (fields: Record<string, unknown> = {}) => OwnLoomForm.parse({ loomName: 'Kitchen frame', units: 'cm', insideWidthMm: '36', insideHeightMm: '70', nailPitchMm: '8', endsTogether: '2', ...fields });
const namesOf = async (userId: number): Promise<string[]> => (await ownLooms(userId)).map(({ name }) => name);

describe('a person’s looms', () => {
  test('are kept by name, and changed under their own', async () => {
    const person = await buildUser();
    const ctx = await contextFor(person);
    await keepOwnLoom(ctx, form());
    await keepOwnLoom(ctx, form({ loomName: 'Attic', insideWidthMm: '50' }));
    const [attic] = await ownLooms(person.id);
    await keepOwnLoom(ctx, form({ loom: attic?.publicId, loomName: 'Attic, left', insideWidthMm: '52' }));
    expect(await ownLooms(person.id)).toMatchObject([{ name: 'Attic, left', loom: { insideWidthMm: 520 } }, { name: 'Kitchen frame', loom: { insideWidthMm: 360, endsTogether: 2 } }]);
  });

  test('are refused at their fields, and a name twice', async () => {
    const person = await buildUser();
    const ctx = await contextFor(person);
    await keepOwnLoom(ctx, form());
    await keepOwnLoom(ctx, form({ loomName: 'Attic' }));
    const [attic] = await ownLooms(person.id);
    await expect(keepOwnLoom(ctx, form({ insideWidthMm: '3 mm', nailPitchMm: '' }))).rejects.toMatchObject({ code: 'VALIDATION', fields: { insideWidthMm: expect.stringContaining('works'), nailPitchMm: expect.any(String) } });
    await expect(keepOwnLoom(ctx, form({ loom: attic?.publicId, loomName: 'Kitchen frame' }))).rejects.toMatchObject({ fields: { loomName: expect.stringContaining('Another loom') } });
    expect(await namesOf(person.id)).toEqual(['Attic', 'Kitchen frame']);
  });

  test('can be taken out, and put back', async () => {
    const person = await buildUser();
    const ctx = await contextFor(person);
    await keepOwnLoom(ctx, form());
    const [own] = await ownLooms(person.id);
    const loom = own?.publicId ?? '';
    await takeOutLoom(ctx, { loom });
    expect([await namesOf(person.id), (await loomsTakenOut(person.id, ctx.clock.now())).length]).toEqual([[], 1]);
    await takeOutLoom(ctx, { loom, back: 'yes' });
    expect(await namesOf(person.id)).toEqual(['Kitchen frame']);
  });

  test('are nobody else’s to see, change or take out', async () => {
    const [person, other] = [await buildUser(), await buildUser()];
    await keepOwnLoom(await contextFor(person), form());
    const [own] = await ownLooms(person.id);
    const [ctx, loom] = [await contextFor(other), own?.publicId ?? ''];
    expect(await ownLooms(other.id)).toEqual([]);
    await expect(keepOwnLoom(ctx, form({ loom }))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(takeOutLoom(ctx, { loom })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(keepOwnLoom(contextOf(null), form())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
  });

  test('are few, even when many are sent at once', async () => {
    const person = await buildUser();
    const ctx = await contextFor(person);
    const sent = await Promise.allSettled(Array.from({ length: MOST_LOOMS + 2 }, (_, index) => keepOwnLoom(ctx, form({ loomName: `Loom ${String(index)}` }))));
    expect(sent.filter(({ status }) => status === 'fulfilled')).toHaveLength(MOST_LOOMS);
    expect(await OwnLoomRow.count({ where: { userId: person.id } })).toBe(MOST_LOOMS);
  });

  test('one of a piece that is kept goes on the list where it was given a name', async () => {
    const { series, student } = await buildFollowed();
    const ctx = await contextFor(student);
    const piece = { series: series.slug, insideWidthMm: '36', nailPitchMm: '8', widthMm: '30', endsTogether: '2', units: 'cm', shown: 'cm' };
    await saveMyPiece(ctx, MyPieceForm.parse({ ...piece, revision: '0', loomName: 'Kitchen frame' }));
    expect(await ownLooms(student.id)).toMatchObject([{ name: 'Kitchen frame', loom: { insideWidthMm: 360, nailPitchMm: 8, endsTogether: 2 } }]);
    await expect(saveMyPiece(ctx, MyPieceForm.parse({ ...piece, revision: '1', loomName: 'x'.repeat(80) }))).rejects.toMatchObject({ code: 'VALIDATION', fields: { loomName: expect.any(String) } });
    await saveMyPiece(ctx, MyPieceForm.parse({ ...piece, revision: '1', loomName: 'Kitchen frame', insideWidthMm: '40' }));
    expect(await ownLooms(student.id)).toMatchObject([{ name: 'Kitchen frame', loom: { insideWidthMm: 400 } }]);
  });
});
