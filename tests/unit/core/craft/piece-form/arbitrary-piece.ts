/** Pieces of every make, whether or not they could be woven: a form must hold them all. */
import fc from 'fast-check';
import type { Allowances, Band, Beat, Finish, FrameLoomPiece, Shape, Yarn } from '#core/craft/piece.ts';
import { present } from '#core/craft/reading/present.ts';

/** Lengths as people write them, and as sums and inches leave them behind. */
const mm = fc.oneof(
  fc.integer({ min: 1, max: 20_000 }),
  fc.integer({ min: 1, max: 200_000 }).map((tenths) => tenths / 10),
  fc.integer({ min: 1, max: 4_000 }).map((sixteenths) => (sixteenths / 16) * 25.4),
  fc.double({ min: 0.001, max: 20_000, noNaN: true }),
);
const share = fc.oneof(fc.integer({ min: 0, max: 100 }).map((percent) => percent / 100), fc.double({ min: 0.0001, max: 1, noNaN: true }));
const count = fc.integer({ min: 1, max: 500 });
const number = fc.oneof(fc.integer({ min: 1, max: 90_000 }), fc.double({ min: 0.01, max: 90_000, noNaN: true }));
const perhaps = <T>(some: fc.Arbitrary<T>): fc.Arbitrary<T | undefined> => fc.option(some, { nil: undefined });
const words = fc.string({ minLength: 1, maxLength: 30 }).filter((text) => text.trim() === text && text !== '');
const roleName = fc.stringMatching(/^[a-z][a-z0-9-]{0,8}$/);
const bandName = fc.stringMatching(/^[a-z0-9-]{1,12}$/);
const colour = fc.stringMatching(/^#[0-9a-f]{6}$/);

const grist = fc.oneof(
  number.map((tex) => ({ tex })),
  number.map((metresPer100g) => ({ metresPer100g })),
  fc.constantFrom(0, 1, 2, 3, 4, 5, 6, 7).map((number) => ({ class: number })),
  fc.record({ text: fc.constantFrom('8/2', '2/16', '16', '4,5'), system: fc.constantFrom('nm', 'ne-cotton', 'spun-silk', 'dtex', 'ne-worsted', 'lea', 'run', 'denier', 'jute', 'yorkshire', 'grain') }).map((counted) => ({ count: counted })),
);
const yarn: fc.Arbitrary<Yarn> = fc.tuple(grist, fc.record({
  label: perhaps(words), colour: perhaps(colour), strands: perhaps(count), ashenhurstK: perhaps(fc.double({ min: 0.75, max: 1, noNaN: true })),
  wrapsPerInch: perhaps(number), freeDiameterMm: perhaps(mm), ball: perhaps(fc.record({ metres: number, grams: number })), fibre: perhaps(words),
})).map(([thick, traits]): Yarn => ({ ...present(traits), ...thick }));

const shapeOf = (role: fc.Arbitrary<string>): fc.Arbitrary<Shape> => {
  const either = fc.oneof(mm, mm.map((length) => -length));
  const placing = fc.record({
    yarn: role, centreMm: perhaps(mm), bottomMm: perhaps(mm), leanMm: perhaps(either),
    symmetric: perhaps(fc.boolean()), join: perhaps(fc.constantFrom('slit', 'dovetail', 'interlock')),
  }).map(({ yarn: own, ...rest }) => ({ yarn: own, ...present(rest) }));
  return fc.oneof(
    fc.tuple(placing, fc.constantFrom('triangle', 'rectangle'), mm, mm).map(([at, shape, baseMm, heightMm]): Shape => ({ ...at, shape, baseMm, heightMm })),
    fc.tuple(placing, mm).map(([at, radiusMm]): Shape => ({ ...at, shape: 'circle', radiusMm })),
    fc.tuple(placing, fc.array(fc.record({ xMm: either, yMm: either }), { minLength: 3, maxLength: 6 })).map(([{ symmetric: _, ...at }, points]): Shape => ({ ...at, shape: 'points', points })),
  );
};

const bandOf = (role: fc.Arbitrary<string>): fc.Arbitrary<Band> => {
  const named = perhaps(bandName).map((name) => present({ name }));
  const high = fc.oneof(mm.map((heightMm) => ({ heightMm })), fc.constant({ fill: true } as const));
  const loop = fc.oneof(mm.map((rodMm) => ({ rodMm })), mm.map((loopMm) => ({ loopMm })));
  const woven = fc.record({ strands: perhaps(count), basket: perhaps(fc.constant(true)) }).map((ways) => present(ways));
  const edges = perhaps(count).map((edgeEnds) => present({ edgeEnds }));
  const twists = perhaps(count).map((endsPerTwist) => present({ endsPerTwist }));
  const passes = perhaps(count).map((many) => present({ passes: many }));
  const shapes = fc.array(shapeOf(role), { maxLength: 3 }).map((all) => (all.length === 0 ? {} : { shapes: all }));
  return fc.oneof(
    fc.tuple(named, role, high, shapes, woven).map(([name, own, height, all, ways]): Band => ({ technique: 'tabby', ...name, yarn: own, ...ways, ...height, ...all })),
    fc.tuple(named, fc.record({ yarn: role, over: count, back: count, rows: count, tabbyBetween: fc.nat(20), tabbyYarn: role })).map(([name, rest]): Band => ({ technique: 'soumak', ...name, ...rest })),
    fc.tuple(named, fc.record({ yarn: role, strands: count, legEnds: count, pileMm: mm, trimMm: fc.oneof(fc.constant(0), mm), rows: count, heightMm: mm }), edges).map(([name, rest, edge]): Band => ({ technique: 'rya', ...name, ...rest, ...edge })),
    fc.tuple(named, fc.record({ yarn: role, over: count, bulgeMm: mm, heightMm: mm }), passes).map(([name, rest, more]): Band => ({ technique: 'roving', ...name, ...rest, ...more })),
    fc.tuple(named, fc.record({ yarn: role, bundleEnds: count, reachPicks: count })).map(([name, rest]): Band => ({ technique: 'hem-stitch', ...name, ...rest })),
    fc.tuple(named, fc.record({ yarn: role, rows: count, heightMm: mm }), loop).map(([name, rest, size]): Band => ({ technique: 'loop-pile', ...name, ...rest, ...size })),
    fc.tuple(named, fc.record({ yarn: role, rows: count }), twists).map(([name, rest, twist]): Band => ({ technique: 'twining', ...name, ...rest, ...twist })),
  );
};

const beat: fc.Arbitrary<Beat> = fc.oneof(
  fc.constantFrom(0.7, 1.1, 1.45).map((picksPerWeftDiameter) => ({ picksPerWeftDiameter })),
  fc.double({ min: 0.2, max: 2, noNaN: true }).map((picksPerWeftDiameter) => ({ picksPerWeftDiameter })),
  fc.double({ min: 0.1, max: 200, noNaN: true }).map((picksPerCm) => ({ picksPerCm })),
);

const allowances: fc.Arbitrary<Allowances | undefined> = fc.record({
  drawIn: perhaps(share), relaxation: perhaps(share), wetShrinkage: perhaps(share), topMm: perhaps(mm), bottomMm: perhaps(mm),
  tailMm: perhaps(mm), loadMm: perhaps(mm), marginWeft: perhaps(share), marginWarp: perhaps(share),
}).map((all) => { const given = present(all); return Object.keys(given).length === 0 ? undefined : given; });

const loomKind = fc.oneof(
  fc.constant({}),
  fc.constantFrom('nailed-frame', 'notched-frame').map((kind) => ({ kind })),
  perhaps(fc.constantFrom('both', 'inner')).map((nailRows) => ({ kind: 'two-row-frame', ...present({ nailRows }) } as const)),
);
const once = fc.record({
  size: fc.record({ widthMm: mm, heightMm: mm }),
  loom: fc.record({
    nailPitchMm: mm, warping: fc.constantFrom('zigzag', 'two-nail'), insideHeightMm: mm,
    more: fc.record({ everyNthNail: perhaps(count), nailDiameterMm: perhaps(mm), insideWidthMm: perhaps(mm) }),
  }).chain(({ more, ...loom }) => loomKind.map((kind) => ({ ...kind, ...loom, ...present(more) }))),
  warp: fc.record({
    yarn,
    more: fc.record({ endsTogether: perhaps(fc.constantFrom(1, 2)), parity: perhaps(fc.constantFrom('any', 'even', 'odd')), endCount: perhaps(count), tieMm: perhaps(mm) }),
  }).map(({ more, ...warp }) => ({ ...warp, ...present(more) })),
});
/** How the cloth bends, with what each way asks; rows of a balanced one may lie like its ends. */
const weave = fc.oneof(
  fc.tuple(perhaps(fc.constantFrom('straight-warp', 'balanced')), beat).map(([mode, own]) => ({ ...present({ mode }), beat: own })),
  fc.constant({ mode: 'balanced' } as const),
  fc.tuple(mm, beat).map(([weftWaveMm, own]) => ({ mode: 'given' as const, weftWaveMm, beat: own })),
  fc.tuple(perhaps(share), perhaps(share), beat).map(([takeUp, warpTakeUp, own]) => ({ mode: 'measured' as const, ...present({ takeUp, warpTakeUp }), beat: own })),
);
const finish: fc.Arbitrary<Finish> = fc.oneof(
  fc.constant({ bottom: 'tucked' } as const),
  perhaps(mm).map((fringeMm) => ({ bottom: 'plain', ...present({ fringeMm }) } as const)),
  fc.tuple(fc.constantFrom('knotted', 'twisted'), perhaps(mm), perhaps(count)).map(([bottom, fringeMm, bundleEnds]) => ({ bottom, ...present({ fringeMm, bundleEnds }) })),
);
const more = fc.record({
  allowances,
  dowel: perhaps(fc.record({ diameterMm: mm, lengthMm: perhaps(mm), fixing: perhaps(fc.constantFrom('slipped', 'tied', 'lashed')) }).map(({ diameterMm, ...rest }) => ({ diameterMm, ...present(rest) }))),
  finish: perhaps(finish),
  hangs: perhaps(fc.constantFrom('as-woven', 'turned')), seed: perhaps(fc.nat()),
});

/** Optional parts come and go; empty groups and lists, which say nothing, do not occur. */
export const arbitraryPiece: fc.Arbitrary<FrameLoomPiece> = fc.uniqueArray(roleName, { minLength: 1, maxLength: 4 }).chain((roles) =>
  fc.tuple(once, weave, more, fc.tuple(...roles.map(() => yarn)), fc.array(bandOf(fc.constantFrom(...roles)), { minLength: 1, maxLength: 6 }))
    .map(([needed, bent, optional, yarns, bands]): FrameLoomPiece => ({
      craft: 'frame-loom', ...needed, ...bent, ...present(optional), bands,
      yarns: Object.fromEntries(roles.flatMap((role, index) => { const own = yarns[index]; return own === undefined ? [] : [[role, own]]; })),
    })));
