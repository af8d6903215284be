/**
 * Several devices tick one seat's lists, some of them without a connection and with clocks that are wrong. The house
 * counts the changes of a seat (its revision), and a device says which of them it knew; a time is asked last, and then
 * only for how long a change had waited.
 */

/** A tick as the house has it. */
export interface KeptTick {
  /** Of the seat, when this was changed last. */
  readonly revision: number;
  readonly changedAt: Date;
  /** Where that came from; both null for a page without script. */
  readonly device: string | null;
  readonly sequence: number | null;
}

export interface ToldTick {
  /** The newest revision of the seat this device knew as it was changed; null for a page that was made just now. */
  readonly seen: number | null;
  /** By the house's clock: now, less the time it had waited. */
  readonly madeAt: Date;
  readonly device: string | null;
  /** Counts this device's changes. */
  readonly sequence: number | null;
}

/**
 * `take`: it is the newer one. `known`: this device told it before, or something newer since. `older`: another one said
 * something later that this one did not know of.
 */
export type TickJudgement = 'take' | 'known' | 'older';

export function judgeTick(kept: KeptTick | null, told: ToldTick): TickJudgement {
  if (kept === null) return 'take';
  if (kept.device !== null && kept.device === told.device) return (told.sequence ?? 0) > (kept.sequence ?? 0) ? 'take' : 'known';
  if (told.seen === null || told.seen >= kept.revision) return 'take';
  return told.madeAt >= kept.changedAt ? 'take' : 'older';
}
