import { describe, expect, test } from 'vitest';
import { judgeTick, type KeptTick, type ToldTick } from '#core/following/judge-tick.ts';

const at = (time: string): Date => new Date(`2026-12-01T${time}Z`);
const kept: KeptTick = { revision: 7, changedAt: at('10:00'), device: 'phone', sequence: 3 };
const told = (given: Partial<ToldTick>): ToldTick => ({ seen: 2, madeAt: at('09:00'), device: 'laptop', sequence: 1, ...given });

describe('a tick that is told', () => {
  test.each([
    ['is taken where there was none', null, told({}), 'take'],
    ['is taken from who had seen the one before, whatever the clocks say', kept, told({ seen: 7 }), 'take'],
    ['is taken from a page that was made just now', kept, told({ seen: null, device: null, sequence: null }), 'take'],
    ['is taken where both did not know of each other and it was made later', kept, told({ madeAt: at('10:00') }), 'take'],
    ['gives way where both did not know of each other and it was made earlier', kept, told({ madeAt: at('09:59') }), 'older'],
    ['is taken as the next change of the same device, though its clock was set back', kept, told({ device: 'phone', sequence: 4, madeAt: at('03:00') }), 'take'],
    ['is known when the same device sends it again', kept, told({ device: 'phone', sequence: 3, seen: 9 }), 'known'],
    ['is known when the same device said something newer since', kept, told({ device: 'phone', sequence: 2 }), 'known'],
    ['of a device is no page’s own', { ...kept, device: null, sequence: null }, told({ device: null, sequence: null, madeAt: at('09:00') }), 'older'],
  ] as const)('%s', (_what, before, now, judgement) => {
    expect(judgeTick(before, now)).toBe(judgement);
  });
});
