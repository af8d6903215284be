/** Ends and nails for a width, how even they stand, and whether the yarn suits their spacing. */
import { countOf, lengthOf } from '#core/craft/amounts/amount-types.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { dressWarp, type DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import { holderStep, loomKind } from '#core/craft/looms/looms.ts';
import { spacingRows, usedPitch, zigzagGaps } from '#core/craft/nails.ts';
import { offeredSpacings, type OfferedSpacing } from '#core/craft/offered-spacings.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { adviseSpacing, balancedSett, strandsFor, type SpacingAdvice } from '#core/craft/sett.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { loud, NO_ANSWER, named, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { workingsOf } from '#core/reckoner/answer-cloth.ts';
import type { Made } from '#core/reckoner/small-piece.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { SETT_FIELDS, type TypedLoom } from '#core/reckoner/read-fields.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';

export interface SettSection extends Section {
  /** Every spacing this loom has, with what the yarn does there. */
  readonly offered?: readonly OfferedSpacing[];
  /** The warp itself, for what is woven on it. */
  readonly dressed?: DressedWarp;
}

const capital = (word: string): string => `${word.charAt(0).toUpperCase()}${word.slice(1)}`;

/** Height plays no part in the number of ends. */
const ANY_HEIGHT_MM = 100;

export const ADVICE: Readonly<Record<SpacingAdvice, string>> = {
  suits: 'It suits them',
  'too-thick': 'Too thick for them',
  'too-thin': 'Too thin by itself',
};

/** Share of the height from a rail at which the gaps of a zigzag are told. */
const NEAR_A_RAIL = 0.1;

/** How uneven bare ends stand near the rails, and what sets them even. */
function evenLines({ loom }: TypedLoom): AnswerLine[] {
  const { most, fewest } = spacingRows(loom.warping);
  if (most === 0) return [{ label: 'Bare ends stand', value: { kind: 'words', words: 'Even from rail to rail' }, how: 'one end leaves each, so they lie side by side all the way', trust: 'formula' }];
  const pitchMm = usedPitch(holderStep(loom), loom.everyNthNail ?? 1);
  const { first, second } = zigzagGaps(NEAR_A_RAIL, pitchMm);
  return [
    { label: 'Gaps near the rails, by turns', value: { kind: 'size', widthMm: first, heightMm: second, use: 'fine' }, how: 'ends meet in pairs at every nail: a tenth of the height from a rail the gaps are a tenth and nine tenths of a nail’s', trust: 'formula' },
    { label: 'Spacing rows at each edge', value: { kind: 'words', words: `${String(fewest)} to ${String(most)}` }, how: 'twining or scrap yarn that sets the ends even before you weave; only half way up do they stand even by themselves', trust: 'practice' },
  ];
}

function endLines({ ends, insideWidthNeededMm }: DressedWarp, { loom }: TypedLoom): AnswerLine[] {
  const { one, many } = loomKind(loom).holder;
  const doubled = ends.count !== ends.working;
  return [
    loud({ label: 'Warp ends', value: countOf(ends.count, 'end', 'ends'), how: 'width on the loom ÷ room for one end, rounded, raised to the number you need', trust: 'formula' }),
    ...(doubled ? [loud({ label: 'Worked as', value: countOf(ends.working, 'end', 'ends'), how: 'two neighbours taken as one', trust: 'formula' })] : []),
    loud({ label: 'From end to end', value: lengthOf(ends.spacingMm, 'fine'), how: 'nail spacing ÷ ends at a nail × ends worked together', trust: 'measured' }),
    { label: `${capital(many)} above`, value: countOf(ends.nailsTop, one, many), how: 'the way of the warp, counted', trust: 'formula' },
    { label: `${capital(many)} below`, value: countOf(ends.nailsBottom, one, many), how: 'the way of the warp, counted', trust: 'formula' },
    { label: 'Width on the loom', value: lengthOf(ends.loomWidthMm, 'size'), how: 'finished width ÷ (1 − draw-in)', trust: 'formula' },
    { label: 'Width of the warp', value: lengthOf(ends.woundWidthMm, 'size'), how: '(ends − 1) × room for one end', trust: 'formula' },
    { label: 'Inside width needed', value: lengthOf(insideWidthNeededMm, 'least'), how: '(nails − 1) × nail spacing, and room beyond the outer ones', trust: 'formula' },
  ];
}

/** What the yarn of the first part would do between these ends. */
function yarnLines({ ends, workingDiameterMm }: DressedWarp, yarn: Yarn, reader: FormReader): AnswerLine[] {
  const strand = threadOf({ ...yarn, strands: 1 }, ASHENHURST_K.weft);
  const together = threadOf(yarn, ASHENHURST_K.weft);
  const strands = strandsFor(ends.spacingMm, workingDiameterMm, strand.compressedMm);
  const perInch = balancedSett(MM_PER_INCH / together.loftMm, 'plain');
  const balanced = reader.units === 'in' ? { value: perInch, unit: 'to the inch' } : { value: perInch / 2.54, unit: 'to the cm' };
  return [
    loud({
      label: 'Your yarn between these ends',
      value: { kind: 'words', words: ADVICE[adviseSpacing(ends.spacingMm, workingDiameterMm, together.loftMm)] },
      how: 'warp and yarn lying free, over the room between ends: from a quarter to two thirds beats down well',
      trust: yarn.wrapsPerInch === undefined ? 'formula' : 'measured',
    }),
    ...(strands === undefined
      ? []
      : [{ label: 'Strands to take together', value: countOf(strands, 'strand', 'strands'), how: 'as many as fill two fifths of the room, warp included', trust: 'formula' } as const]),
    { label: 'Ends for balanced cloth', value: { kind: 'number', ...balanced }, how: 'half the wraps, for plain weave', trust: yarn.wrapsPerInch === undefined ? 'formula' : 'measured' },
  ];
}

const STEPS: Readonly<Record<string, string>> = {
  'Warp ends': 'ends.count', 'Worked as': 'ends.working', 'From end to end': 'ends.spacingMm', 'Nails above': 'ends.nailsTop', 'Nails below': 'ends.nailsBottom', 'Notches above': 'ends.nailsTop', 'Notches below': 'ends.nailsBottom',
  'Width on the loom': 'ends.loomWidthMm', 'Width of the warp': 'ends.woundWidthMm', 'Inside width needed': 'loom.insideWidthNeededMm',
};

const FIELD_OF_PATH: Readonly<Record<string, (typeof SETT_FIELDS)[number]>> = { '/size/widthMm': 'width', '/warp/parity': 'parity' };

/** `yarn` only if it can be used; `plain` is the cloth whose workings tell those of its ends. */
export function answerSett(typed: TypedLoom | undefined, yarn: Yarn | undefined, plain: Made | undefined, reader: FormReader): SettSection {
  const none = { ...NO_ANSWER, needs: SETT_FIELDS };
  if (typed === undefined || !reader.isSound(...SETT_FIELDS)) return none;
  const settings = settingsOf({ drawIn: typed.drawIn }, 'straight-warp', { picksPerWeftDiameter: 1 });
  const size = { widthMm: typed.widthMm, heightMm: ANY_HEIGHT_MM };
  const findings = Findings.in(reader.units);
  const dressed = dressWarp(size, { ...typed.loom, insideHeightMm: ANY_HEIGHT_MM }, typed.warp, settings, findings);
  if (dressed === undefined) {
    const outcome = findings.outcome(undefined);
    if (!outcome.ok) for (const { path, message } of outcome.problems) reader.refuse(FIELD_OF_PATH[path] ?? 'width', message);
    return none;
  }
  const suits = yarn === undefined ? [] : yarnLines(dressed, yarn, reader);
  const offered = yarn === undefined ? {} : { offered: offeredSpacings(typed.loom, dressed.thread, threadOf(yarn, ASHENHURST_K.weft)) };
  const workings = plain === undefined ? {} : workingsOf(plain, reader.units);
  return { ...workings, lines: [...endLines(dressed, typed), ...suits, ...evenLines(typed)].map((line) => named(line, STEPS)), notes: findings.warnings, needs: SETT_FIELDS, dressed, ...offered };
}
