/** The looms a person keeps, by name. */
import { Op } from 'sequelize';
import type { NamedLoom } from '#core/craft/my-piece/own-loom.ts';
import { OwnLoomRow } from '#server/models/index.ts';

const present = ({ publicId, name, data }: OwnLoomRow): NamedLoom => ({ publicId, name, loom: data });

export async function ownLooms(userId: number): Promise<NamedLoom[]> {
  return (await OwnLoomRow.findAll({ where: { userId, takenOutAt: null }, order: ['name'] })).map(present);
}

const KEPT_DAYS = 30;

/** Those taken out of the list within the last thirty days: they can be put back. */
export async function loomsTakenOut(userId: number, now: Date): Promise<NamedLoom[]> {
  const since = new Date(now.getTime() - KEPT_DAYS * 86_400_000);
  return (await OwnLoomRow.findAll({ where: { userId, takenOutAt: { [Op.gte]: since } }, order: ['name'] })).map(present);
}
