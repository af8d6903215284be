/** The things a teacher keeps for her lists: put in, changed, taken out, put back. Lists that have taken a thing's words keep their own. */
import { Op } from 'sequelize';
import type { KeptThingInput, NewKeptThingInput } from '#contracts/workroom.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, fieldError, found } from '#server/errors.ts';
import { KeptThing, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { keepThing, wordsOf } from './_keep-thing.ts';

/** @throws VALIDATION at the name when a thing of this kind and name is kept already. */
export async function addKeptThing(ctx: Context, input: NewKeptThingInput): Promise<KeptThing> {
  authorize(ctx.actor !== null && ctx.actor.workroomId !== null, 'FORBIDDEN');
  const { workroomId } = ctx.actor;
  return inWorkroom(workroomId, async () => {
    await requireOnlyOne(workroomId, input);
    return keepThing(workroomId, wordsOf(input));
  });
}

export async function saveKeptThing(ctx: Context, { thing: publicId, ...input }: KeptThingInput): Promise<KeptThing> {
  const { id, workroomId } = await ownThing(ctx, publicId);
  return inWorkroom(workroomId, async () => {
    const thing = found(await KeptThing.findByPk(id));
    await requireOnlyOne(workroomId, input, id);
    return thing.update(wordsOf(input));
  });
}

export async function takeOutKeptThing(ctx: Context, publicId: string): Promise<KeptThing> {
  const thing = await ownThing(ctx, publicId);
  return thing.takenOutAt === null ? thing.update({ takenOutAt: ctx.clock.now() }) : thing;
}

export async function putBackKeptThing(ctx: Context, publicId: string): Promise<KeptThing> {
  return (await ownThing(ctx, publicId)).update({ takenOutAt: null });
}

async function ownThing(ctx: Context, publicId: string): Promise<KeptThing> {
  const thing = found(await KeptThing.findOne({ where: { publicId } }));
  authorize(mayTeachIn(ctx.actor, thing.workroomId));
  return thing;
}

/** All things of a workroom change under its one lock. */
function inWorkroom<T>(workroomId: number, work: () => Promise<T>): Promise<T> {
  return withTransaction(async () => {
    found(await Workroom.findByPk(workroomId, { lock: true }));
    return work();
  });
}

async function requireOnlyOne(workroomId: number, { kind, name }: Pick<NewKeptThingInput, 'kind' | 'name'>, but = 0): Promise<void> {
  const other = await KeptThing.findOne({ where: { workroomId, kind, name, id: { [Op.ne]: but } } });
  if (other === null) return;
  throw fieldError('name', other.takenOutAt === null ? `“${other.name}” is among your things already. Change it there.` : `“${other.name}” was taken out. Put it back below, or give this another name.`);
}
