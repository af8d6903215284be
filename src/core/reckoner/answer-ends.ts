/** Ends and nails for a width, and whether the yarn suits their spacing. */
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { dressWarp, type DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import type { Yarn } from '#core/craft/piece.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { adviseSpacing, balancedSett, strandsFor, type SpacingAdvice } from '#core/craft/sett.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { countOf, lengthOf } from '#core/craft/amounts/amount-types.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { NO_ANSWER, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { YARN_FIELDS, type FormReader, type TypedLoom } from '#core/reckoner/read-fields.ts';

/** Height plays no part in the number of ends. */
const ANY_HEIGHT_MM = 100;

const ADVICE: Readonly<Record<SpacingAdvice, string>> = {
  suits: 'It suits them',
  'too-thick': 'Too thick for them',
  'too-thin': 'Too thin by itself',
};

function endLines({ ends, insideWidthNeededMm }: DressedWarp): AnswerLine[] {
  const doubled = ends.count !== ends.working;
  return [
    { label: 'Warp ends', value: countOf(ends.count, 'end', 'ends'), how: 'width on the loom ÷ room for one end, rounded, raised to the number you need', trust: 'formula' },
    ...(doubled ? [{ label: 'Worked as', value: countOf(ends.working, 'end', 'ends'), how: 'two neighbours taken as one', trust: 'formula' } as const] : []),
    { label: 'From end to end', value: lengthOf(ends.spacingMm, 'fine'), how: 'nail spacing ÷ ends at a nail × ends worked together', trust: 'measured' },
    { label: 'Nails above', value: countOf(ends.nailsTop, 'nail', 'nails'), how: 'the way of the warp round the nails, counted', trust: 'formula' },
    { label: 'Nails below', value: countOf(ends.nailsBottom, 'nail', 'nails'), how: 'the way of the warp round the nails, counted', trust: 'formula' },
    { label: 'Width on the loom', value: lengthOf(ends.loomWidthMm, 'size'), how: 'finished width ÷ (1 − draw-in)', trust: 'formula' },
    { label: 'Width of the warp', value: lengthOf(ends.woundWidthMm, 'size'), how: '(ends − 1) × room for one end', trust: 'formula' },
    { label: 'Inside width needed', value: lengthOf(insideWidthNeededMm, 'least'), how: '(nails − 1) × nail spacing + 4 cm for the outer nails', trust: 'formula' },
  ];
}

/** What the yarn of the first section would do between these ends. */
function yarnLines({ ends, workingDiameterMm }: DressedWarp, yarn: Yarn, reader: FormReader): AnswerLine[] {
  const strand = threadOf({ ...yarn, strands: 1 }, ASHENHURST_K.weft);
  const together = threadOf(yarn, ASHENHURST_K.weft);
  const strands = strandsFor(ends.spacingMm, workingDiameterMm, strand.compressedMm);
  const perInch = balancedSett(MM_PER_INCH / together.loftMm, 'plain');
  const balanced = reader.units === 'in' ? { value: perInch, unit: 'to the inch' } : { value: perInch / 2.54, unit: 'to the cm' };
  return [
    {
      label: 'Your yarn between these ends',
      value: { kind: 'words', words: ADVICE[adviseSpacing(ends.spacingMm, workingDiameterMm, together.loftMm)] },
      how: 'warp and yarn lying free, over the room between ends: from a quarter to two thirds beats down well',
      trust: yarn.wrapsPerInch === undefined ? 'formula' : 'measured',
    },
    ...(strands === undefined
      ? []
      : [{ label: 'Strands to take together', value: countOf(strands, 'strand', 'strands'), how: 'as many as fill two fifths of the room, warp included', trust: 'formula' } as const]),
    { label: 'Ends for balanced cloth', value: { kind: 'number', ...balanced }, how: 'half the wraps, for plain weave', trust: yarn.wrapsPerInch === undefined ? 'formula' : 'measured' },
  ];
}

export function answerEnds(typed: TypedLoom | undefined, yarn: Yarn | undefined, reader: FormReader): Section {
  if (typed === undefined || !reader.isSound('width', 'nails', 'warp-tex', 'draw-in', 'together', 'parity')) return NO_ANSWER;
  const settings = settingsOf({ drawIn: typed.drawIn }, 'straight-warp', { picksPerWeftDiameter: 1 });
  const size = { widthMm: typed.widthMm, heightMm: ANY_HEIGHT_MM };
  const dressed = dressWarp(size, { ...typed.loom, insideHeightMm: ANY_HEIGHT_MM }, typed.warp, settings, Findings.in(reader.units));
  if (dressed === undefined) return NO_ANSWER;
  const suits = yarn !== undefined && reader.isSound(...YARN_FIELDS) ? yarnLines(dressed, yarn, reader) : [];
  return { lines: [...endLines(dressed), ...suits], notes: [] };
}
