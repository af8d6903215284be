import { AppError } from '#server/errors.ts';
import { KeptThing } from '#server/models/index.ts';

const MOST_THINGS = 300;

/** What is kept of a thing, whatever list it stands on. */
export interface ThingWords {
  readonly kind: KeptThing['kind'];
  readonly name: string;
  readonly lookOut: string | null;
  readonly getFrom: string | null;
  readonly standIn: string | null;
}

/** Only the words of a thing, of a line that says more. */
export const wordsOf = ({ kind, name, lookOut, getFrom, standIn }: ThingWords): ThingWords => ({ kind, name, lookOut, getFrom, standIn });

/** Keeps a thing, within the caller's transaction; one of this kind and name that is kept already takes these words, and comes back if it was taken out. */
export async function keepThing(workroomId: number, words: ThingWords): Promise<KeptThing> {
  const known = await KeptThing.findOne({ where: { workroomId, kind: words.kind, name: words.name }, lock: true });
  if (known !== null) return known.update({ ...words, takenOutAt: null });
  if ((await KeptThing.count({ where: { workroomId } })) >= MOST_THINGS) throw new AppError('CONFLICT', { says: `A workroom keeps at most ${MOST_THINGS} things. Change one that you no longer need.` });
  return KeptThing.create({ workroomId, ...words });
}
