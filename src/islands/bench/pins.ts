/** Notes on a photo while they are being set: a list and what can happen to it, apart from any screen. */
import type { NoteInput } from '#contracts/bench.ts';

export interface Pins {
  readonly notes: readonly NoteInput[];
  /** Index of the pin that moves by the arrow keys; -1 for none. */
  readonly chosen: number;
}

export type PinEvent =
  | { readonly kind: 'put'; readonly xPermille: number; readonly yPermille: number }
  | { readonly kind: 'nudge'; readonly dx: number; readonly dy: number }
  | { readonly kind: 'choose'; readonly index: number }
  | { readonly kind: 'write'; readonly index: number; readonly words: string }
  | { readonly kind: 'take-out'; readonly index: number };

export const NO_PINS: Pins = { notes: [], chosen: -1 };
export const MOST_PINS = 20;

const within = (permille: number): number => Math.max(0, Math.min(1_000, Math.round(permille)));

export function pinsAfter(pins: Pins, event: PinEvent): Pins {
  const { notes, chosen } = pins;
  switch (event.kind) {
    case 'put':
      if (notes.length >= MOST_PINS) return pins;
      return { notes: [...notes, { words: '', xPermille: within(event.xPermille), yPermille: within(event.yPermille) }], chosen: notes.length };
    case 'choose':
      return { notes, chosen: event.index };
    case 'write':
      return { chosen, notes: notes.map((note, index) => (index === event.index ? { ...note, words: event.words } : note)) };
    case 'nudge':
      return {
        chosen,
        notes: notes.map((note, index) => (index === chosen && note.xPermille !== null && note.yPermille !== null
          ? { ...note, xPermille: within(note.xPermille + event.dx), yPermille: within(note.yPermille + event.dy) }
          : note)),
      };
    case 'take-out':
      return { notes: notes.filter((_note, index) => index !== event.index), chosen: -1 };
  }
}
