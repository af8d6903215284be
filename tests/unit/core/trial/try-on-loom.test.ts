import { describe, expect, test } from 'vitest';
import { inOtherUnits, loomFields, readTypedLoom, typedLoomOf, type TypedLoom } from '#core/trial/typed-loom.ts';
import { tryOnLoom } from '#core/trial/try-on-loom.ts';
import { lowTide } from '../../../support/low-tide.ts';

const typed = (change: Partial<TypedLoom> = {}): TypedLoom => ({ inside: '50', spacing: '10', ends: 1, units: 'cm', narrower: false, ...change });
const inches = (change: Partial<TypedLoom> = {}): TypedLoom => typed({ inside: '20', spacing: '3/8', units: 'in', ...change });

describe('reading what was typed', () => {
  test.each([
    ['12,5', 125], ['12.5', 125], [' 36 cm ', 360], ['360 mm', 360], ['14 3/16 in', 360.3625], ['1 m', 1_000],
  ])('an inside width of "%s" is %f mm', (inside, mm) => {
    const read = readTypedLoom(typed({ inside }));
    expect(read.ok && read.loom.insideWidthMm).toBeCloseTo(mm);
  });

  test('bare numbers are centimetres and millimetres, or inches for who thinks in them', () => {
    expect(readTypedLoom(typed({ inside: '36', spacing: '8' }))).toEqual({ ok: true, loom: { insideWidthMm: 360, nailPitchMm: 8 } });
    const read = readTypedLoom(inches({ inside: '4 7/8', spacing: '1/4' }));
    expect(read.ok && read.loom.insideWidthMm).toBeCloseTo(123.825);
    expect(read.ok && read.loom.nailPitchMm).toBeCloseTo(6.35);
  });

  test.each([
    ['inside', '', 'Inside width is missing. Type it in cm.'],
    ['inside', '3 mm', 'Too narrow for a frame. Between 5 and 300 cm works.'],
    ['inside', '30 m', 'Too wide for a frame. Between 5 and 300 cm works.'],
    ['inside', 'wide', 'Write one length, like 12.5 or 4 7/8.'],
    ['inside', '-5', 'A length cannot be below 0.'],
    ['spacing', '', 'Nail spacing is missing. Type it in mm.'],
    ['spacing', '0.5', 'Too close for nails. Between 2 and 25 mm works.'],
    ['spacing', '8 cm', 'Too far apart to weave on. Between 2 and 25 mm works.'],
  ] as const)('a wrong %s, "%s", is answered by a sentence', (field, text, says) => {
    const read = readTypedLoom(typed({ [field]: text }));
    expect(read).toEqual({ ok: false, fields: { [field]: says } });
  });

  test('both fields are told of at once', () => {
    expect(readTypedLoom(inches({ inside: 'x', spacing: '2' }))).toEqual({
      ok: false, fields: { inside: 'Write one length, like 12.5 or 4 7/8.', spacing: 'Too far apart to weave on. Between 1/16 and 1 in works.' },
    });
  });
});

describe('the loom in an address', () => {
  const from = (query: string) => typedLoomOf((name) => new URLSearchParams(query).get(name));

  test('comes back as it went', () => {
    const loom = typed({ inside: '12,5', spacing: '8', ends: 2, narrower: true });
    expect(from(new URLSearchParams(loomFields(loom).map((pair) => [...pair])).toString())).toEqual(loom);
  });

  test('is nothing when nobody typed any', () => {
    expect(from('paying=stopped')).toBeNull();
  });

  test('nonsense becomes text to be shown again, never longer than a length', () => {
    expect(from(`inside=${'9'.repeat(400)}&ends=7&units=ell`)).toEqual(typed({ inside: '9'.repeat(40), spacing: '' }));
  });

  test('units chosen together with the sending turn what was typed into them', () => {
    expect(from('inside=36&spacing=8&units=in&shown=cm')).toMatchObject({ inside: '14 3/16', spacing: '5/16', units: 'in' });
    expect(from('inside=abc&spacing=8&units=in&shown=cm')).toMatchObject({ inside: 'abc', spacing: '8', units: 'in' });
  });

  test('there and back again keeps a loom to a sixteenth of an inch', () => {
    const back = inOtherUnits(inOtherUnits(typed({ inside: '36', spacing: '8' }), 'in'), 'cm');
    expect(back).toMatchObject({ inside: '36', spacing: '7.9', units: 'cm' });
  });
});

describe('a pattern on another loom', () => {
  test('fits its own loom with its own numbers', async () => {
    const trial = tryOnLoom(await lowTide(), 'Low Tide', typed());
    expect(trial).toMatchObject({ ok: true, fits: true, narrowed: false, fitted: { plan: { ends: { count: 82 } } } });
    expect(trial.ok && trial.fits && trial.freeMm).toBeCloseTo((500 - 405) / 2);
  });

  test('on a loom too small, says what it needs, and how wide it would be', async () => {
    const trial = tryOnLoom(await lowTide(), 'Low Tide', typed({ inside: '36', spacing: '8', ends: 2 }));
    expect(trial).toMatchObject({ ok: true, fits: false, says: 'Your loom is 36\u00a0cm inside. Low Tide needs 45.6\u00a0cm. With nails at 8\u00a0mm it would be 31\u00a0cm wide.' });
  });

  test('woven narrower, it fits, and its width goes into her own piece', async () => {
    const trial = tryOnLoom(await lowTide(), 'Low Tide', typed({ inside: '36', spacing: '8', ends: 2, narrower: true }));
    expect(trial).toMatchObject({ ok: true, fits: true, narrowed: true, mine: { widthMm: 310, endsTogether: 2, loom: { insideWidthMm: 360, nailPitchMm: 8 } } });
  });

  test('in inches every sentence is in inches', async () => {
    const trial = tryOnLoom(await lowTide(), 'Low Tide', inches({ inside: '11', spacing: '3/8' }));
    expect(trial.ok && !trial.fits ? trial.says : '').toMatch(/^Your loom is 11\u00a0in inside\. Low Tide needs 17.*in\. With nails at 3\/8\u00a0in it would be .*in wide\.$/);
  });

  test('a loom on which nothing fits is told so, without a promise', async () => {
    const trial = tryOnLoom(await lowTide(), 'Low Tide', typed({ inside: '6', spacing: '25', narrower: true }));
    expect(trial).toMatchObject({ ok: true, fits: false, widest: null });
    expect(trial.ok && !trial.fits ? trial.says : '').toMatch(/too narrow for this piece\.$/);
  });

  test('whatever loom is typed, wide or narrow, there is an answer, and what is promised fits', async () => {
    const pattern = await lowTide();
    for (let inside = 5; inside <= 50; inside += 8.5) {
      for (const spacing of ['2', '6.35', '8', '25']) {
        for (const ends of [1, 2] as const) {
          const trial = tryOnLoom(pattern, 'Low Tide', typed({ inside: String(inside), spacing, ends }));
          if (!trial.ok) throw new Error('typed well');
          if (trial.fits || trial.widest === null) continue;
          expect(tryOnLoom(pattern, 'Low Tide', typed({ inside: String(inside), spacing, ends, narrower: true }))).toMatchObject({ fits: true, mine: { widthMm: trial.widest.piece.size.widthMm } });
        }
      }
    }
  }, 20_000);
});
