import { LOOM_NAME, MOST_LOOMS, type OwnLoom } from '#core/craft/my-piece/own-loom.ts';
import { AppError } from '#server/errors.ts';
import { OwnLoomRow, User } from '#server/models/index.ts';

interface ToWrite {
  readonly name: string;
  readonly loom: OwnLoom;
  /** Of the loom that is changed; without it the loom of that name is, or a new one is put on the list. */
  readonly publicId?: string | undefined;
}

const refuse = (says: string): never => { throw new AppError('VALIDATION', { fields: { [LOOM_NAME]: says } }); };

/**
 * Within a transaction, under the lock of the person. A loom that was taken out comes back under its name.
 * @throws VALIDATION at the name: another loom has it, or the list is full; NOT_FOUND for a loom that is not hers.
 */
export async function writeLoom(userId: number, { name, loom, publicId }: ToWrite): Promise<OwnLoomRow> {
  await User.findByPk(userId, { lock: true, rejectOnEmpty: true });
  const all = await OwnLoomRow.findAll({ where: { userId } });
  const sameName = await OwnLoomRow.findOne({ where: { userId, name } });
  const own = publicId === undefined ? sameName : all.find((one) => one.publicId === publicId);
  if (publicId !== undefined && own === undefined) throw new AppError('NOT_FOUND');
  if (sameName !== null && own?.id !== sameName.id) refuse('Another loom of yours is called so. Choose another name.');
  const isNew = own === null || own === undefined || own.takenOutAt !== null;
  if (isNew && all.filter(({ takenOutAt }) => takenOutAt === null).length >= MOST_LOOMS) refuse(`${String(MOST_LOOMS)} looms are on your list, and it holds no more. Take one out first.`);
  return own === null || own === undefined ? OwnLoomRow.create({ userId, name, data: loom }) : own.update({ name, data: loom, takenOutAt: null });
}
