/** Ticks in the outbox: how they are put in, and what they make of a page that was drawn before them. Knows no screen. */
import type { TickInput, TicksTaken } from '#contracts/ticks.ts';
import type { Entry } from '#islands/keeping/outbox-store.ts';
import { isWaiting, type Outbox, type OutboxState } from '#islands/keeping/outbox.ts';

const KIND = 'tick';

type Told = Omit<Extract<TickInput, { subject: 'gather' }>, 'seen'> | Omit<Extract<TickInput, { subject: 'step' }>, 'seen'>;

/** Keys as the house has them: a thing's public id; a part's, colon, the step's. */
const keysOf = (told: Told): readonly string[] => (told.subject === 'gather' ? told.items : [`${told.lesson}:${told.item}`]);
const nameOf = (told: Told): string => `${told.series}/${told.subject}/${keysOf(told).join('.')}`;
const isOf = (entry: Entry, series: string): boolean => entry.kind === KIND && entry.name.startsWith(`${series}/`);
const answerOf = ({ answer }: Entry): TicksTaken => answer as TicksTaken;

export interface TicksHere {
  /** By subject and key (`gather abc`), where it is otherwise than the page may have been drawn. */
  readonly ticked: ReadonlyMap<string, boolean>;
  /** What the house does not have yet. */
  readonly unsent: ReadonlySet<string>;
  readonly waits: OutboxState['waits'];
  /** How many the house would not take since the page was opened. */
  readonly refused: number;
}

/**
 * What a page of a series shows differently than it was drawn: what this device told and heard since.
 * @param asOf revision of the seat's ticks the page was drawn with
 */
export function ticksHere({ entries, waits, refused }: OutboxState, series: string, asOf: number): TicksHere {
  const own = entries.filter((entry) => isOf(entry, series));
  const heard = own.filter((entry) => !isWaiting(entry)).flatMap((entry) => answerOf(entry).ticks).filter(({ revision }) => revision > asOf).sort((a, b) => a.revision - b.revision);
  const told = own.filter(isWaiting).flatMap(({ body }) => ('json' in body ? [body.json as Told] : [])).flatMap((one) => keysOf(one).map((key) => ({ key: `${one.subject} ${key}`, ticked: one.ticked })));
  return {
    ticked: new Map([...heard.map(({ subject, key, ticked }): [string, boolean] => [`${subject} ${key}`, ticked]), ...told.map(({ key, ticked }): [string, boolean] => [key, ticked])]),
    unsent: new Set(told.map(({ key }) => key)),
    waits,
    refused: refused.filter(({ entry }) => isOf(entry, series)).length,
  };
}

/**
 * Tells the house of a tick, with the newest revision this device knows. The answer stays until the thing is ticked again:
 * a page kept on the device may be older than it.
 */
export function putTick(outbox: Outbox, told: Told, asOf: number): void {
  const heard = outbox.current().entries.filter((entry) => isOf(entry, told.series) && !isWaiting(entry)).map((entry) => answerOf(entry).revision);
  void outbox.put({ kind: KIND, name: nameOf(told), address: '/api/ticks', body: { json: { ...told, seen: Math.max(asOf, ...heard) } }, keepsAnswer: true });
}
