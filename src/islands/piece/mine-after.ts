// What can be done to the typed form, apart from any screen.
import { LEAVE_OUT, WARP_YARN, WAY_KEY } from '#core/craft/my-piece/asked-of-mine.ts';
import type { WayId } from '#core/craft/fitting/ways-to-fit.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { OwnLoom } from '#core/craft/my-piece/own-loom.ts';
import { asPattern, inOtherUnits, withLoom, yarnOf, type TypedMine } from '#core/craft/my-piece/typed-mine.ts';
import type { Units } from '#core/units/units.ts';

export type MineEvent =
  | { readonly kind: 'type'; readonly key: string; readonly text: string }
  | { readonly kind: 'leave-out'; readonly key: string; readonly isOut: boolean }
  /** `role` is null for the warp. */
  | { readonly kind: 'type-yarn'; readonly role: string | null; readonly key: string; readonly text: string }
  | { readonly kind: 'loom'; readonly loom: OwnLoom }
  | { readonly kind: 'units'; readonly units: Units }
  | { readonly kind: 'as-pattern'; readonly pattern: FrameLoomPiece };

/** What stands in the field of that name now, as an event. Texts belong to the units that were shown: those come last. */
export function eventOfField(typed: TypedMine, name: string, text: string): MineEvent {
  if (name === 'units') return { kind: 'units', units: text === 'in' ? 'in' : 'cm' };
  if (name.startsWith(LEAVE_OUT)) return { kind: 'leave-out', key: name, isOut: text !== '' };
  if (name.startsWith(WARP_YARN)) return { kind: 'type-yarn', role: null, key: name.slice(WARP_YARN.length), text };
  const role = Object.keys(typed.yarns).find((one) => name.startsWith(`yarns.${one}.`));
  return role === undefined ? { kind: 'type', key: name, text } : { kind: 'type-yarn', role, key: name.slice(`yarns.${role}.`.length), text };
}

export function mineAfter(typed: TypedMine, event: MineEvent): TypedMine {
  switch (event.kind) {
    case 'type':
      return { ...typed, texts: { ...typed.texts, [event.key]: event.text } };
    case 'leave-out':
      // Who ticks a band means to choose for herself.
      return { ...typed, texts: { ...typed.texts, [WAY_KEY]: 'leave-chosen' satisfies WayId, [event.key]: event.isOut ? 'yes' : '' } };
    case 'type-yarn':
      if (event.role === null) return { ...typed, warpYarn: { ...typed.warpYarn, [event.key]: event.text } };
      return { ...typed, yarns: { ...typed.yarns, [event.role]: { ...yarnOf(typed, event.role), [event.key]: event.text } } };
    case 'loom':
      return withLoom(typed, event.loom);
    case 'units':
      return inOtherUnits(typed, event.units);
    case 'as-pattern':
      return asPattern(typed, event.pattern);
  }
}
