/** The things a teacher keeps for her gathering lists. */
import { col, fn, Op } from 'sequelize';
import type { ThingKept } from '#contracts/workroom.ts';
import { KeptThing } from '#server/models/index.ts';

const shown = ({ publicId, kind, name, lookOut, getFrom, standIn }: KeptThing): ThingKept => ({ publicId, kind, name, lookOut, getFrom, standIn });

/** Those she can put on a list, by kind and name. */
export async function keptThings(workroomId: number): Promise<ThingKept[]> {
  return (await KeptThing.findAll({ where: { workroomId, takenOutAt: null }, order: [[fn('FIELD', col('kind'), 'yarn', 'tool', 'material'), 'ASC'], 'name'] })).map(shown);
}

/** Those that were taken out, newest first. */
export async function thingsTakenOut(workroomId: number): Promise<ThingKept[]> {
  return (await KeptThing.findAll({ where: { workroomId, takenOutAt: { [Op.ne]: null } }, order: [['takenOutAt', 'DESC']] })).map(shown);
}
