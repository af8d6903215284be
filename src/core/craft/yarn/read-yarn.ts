/** Reading a yarn: exactly one way of saying how thick it is, and what else the label tells. */
import type { CountSystem, Yarn, YarnClassNumber, YarnCount, YarnGrist, YarnTraits } from '#core/craft/piece.ts';
import { classOf, classesByLength, YARN_CLASSES } from '#core/craft/yarn/classes.ts';
import { COUNT_SYSTEMS, metresPer100gFromTex, TEX_RANGE, texFromBall } from '#core/craft/yarn/count.ts';
import { readCount, type ReadCount } from '#core/craft/yarn/count-text.ts';
import { gristOf, isKnownByClass, threadOf } from '#core/craft/yarn/thread.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { present } from '#core/craft/reading/present.ts';

const SYSTEM_NAMES = [
  'ne-cotton', 'spun-silk', 'ne-worsted', 'nm', 'lea', 'run', 'denier', 'dtex', 'jute', 'yorkshire', 'grain',
] as const satisfies readonly CountSystem[];

const TEX: NumberRule = { name: 'Tex', min: TEX_RANGE.min, max: TEX_RANGE.max, unit: 'tex' };
const METRES_PER_100G: NumberRule = { name: 'Metres in 100 g', min: 0.5, max: 100_000, unit: 'm' };
export const STRANDS: NumberRule = { name: 'Strands together', min: 1, max: 100, whole: true };
const ASHENHURST: NumberRule = { name: 'Ashenhurst’s K', min: 0.75, max: 1 };
const WRAPS: NumberRule = { name: 'Wraps in an inch', min: 1, max: 60 };
const FREE_DIAMETER: NumberRule = { name: 'Thickness, lying free', min: 'over-zero', max: 200, unit: 'mm' };
const CLASS: NumberRule = { name: 'Weight class', min: 0, max: 7, whole: true };
const BALL_METRES: NumberRule = { name: 'Metres in a ball', min: 'over-zero', max: 1_000_000, unit: 'm' };
const BALL_GRAMS: NumberRule = { name: 'Grams of a ball', min: 'over-zero', max: 1_000_000, unit: 'g' };
const COLOUR = /^#[0-9a-f]{6}$/i;

/** Labels and notations rarely agree closer than this. */
const LABEL_AGREES_WITHIN = 0.1;

/** Loft over compressed diameter that yarns are known to have. */
const LOFT_RATIO_RANGE = { min: 1, max: 3 } as const;

/** Keys of a yarn that say how thick it is. */
const GRIST_KEYS = ['tex', 'metresPer100g', 'count', 'class'] as const;

export function readColour(fields: Fields): string | undefined {
  const colour = fields.optionalText('colour', { name: 'Colour', maxLength: 7 });
  if (colour === undefined || COLOUR.test(colour)) return colour;
  fields.reject('E_ENUM', 'colour', 'A colour is written as # and six figures or letters a to f, such as #6d93bc.');
  return undefined;
}

/** Two measures of the same thing would not agree. */
function readFreeDiameter(fields: Fields): number | undefined {
  if (fields.has('freeDiameterMm') && fields.has('wrapsPerInch')) {
    fields.take('freeDiameterMm');
    fields.reject('E_ENUM', 'freeDiameterMm', 'Wraps tell already how thick it lies. Give one of the two.');
    return undefined;
  }
  return fields.optionalNumber('freeDiameterMm', FREE_DIAMETER);
}

export function readBall(fields: Fields): { readonly metres: number; readonly grams: number } | undefined {
  const ball = fields.optionalGroup('ball', 'Ball');
  if (ball === undefined) return undefined;
  const size = { metres: ball.number('metres', BALL_METRES), grams: ball.number('grams', BALL_GRAMS) };
  ball.end();
  return size;
}

function readCountGroup(fields: Fields): YarnCount {
  const group = fields.group('count', 'Count');
  const count = {
    text: group.text('text', { name: 'Count', maxLength: 20 }),
    system: group.choice('system', 'Count system', SYSTEM_NAMES),
  };
  group.end();
  return count;
}

function readTraits(fields: Fields): YarnTraits {
  return present({
    label: fields.optionalText('label', { name: 'Label', maxLength: 120 }),
    colour: readColour(fields),
    strands: fields.optionalNumber('strands', STRANDS),
    ashenhurstK: fields.optionalNumber('ashenhurstK', ASHENHURST),
    wrapsPerInch: fields.optionalNumber('wrapsPerInch', WRAPS),
    freeDiameterMm: readFreeDiameter(fields),
    ball: readBall(fields),
    fibre: fields.optionalText('fibre', { name: 'Fibre', maxLength: 60 }),
  });
}

function readClass(fields: Fields): YarnClassNumber {
  const number = fields.number('class', CLASS);
  return YARN_CLASSES.find((yarnClass) => yarnClass.number === number)?.number ?? 0;
}

/** Exactly one of the ways; a second one is refused where it stands. */
function readGrist(fields: Fields): YarnGrist {
  const [first, ...more] = GRIST_KEYS.filter((key) => fields.has(key));
  for (const key of more) {
    fields.take(key);
    fields.reject('E_ENUM', key, 'Say how thick the yarn is in one way only: tex, metres in 100 g, a count, or its class.');
  }
  switch (first) {
    case 'tex':
      return { tex: fields.number('tex', TEX) };
    case 'metresPer100g':
      return { metresPer100g: fields.number('metresPer100g', METRES_PER_100G) };
    case 'count':
      return { count: readCountGroup(fields) };
    case 'class':
      return { class: readClass(fields) };
    default:
      fields.rejectWhole('E_NUM', 'How thick is the yarn? Give its tex, its metres in 100 g, a count, or at least its weight class.');
      return { tex: 1 };
  }
}

const DOUBTS: Readonly<Record<NonNullable<ReadCount['doubt']>, { readonly code: 'W_AMBIGUOUS' | 'W_SILK'; readonly words: string }>> = {
  'which-is-plies': { code: 'W_AMBIGUOUS', words: 'Sellers write this either way round' },
  silk: { code: 'W_SILK', words: 'Spun silk is counted by two rules' },
};

/** Whether the count can be used. */
function checkCount(fields: Fields, yarn: Yarn, { text, system }: YarnCount): boolean {
  const path = `${fields.path}/count/text`;
  const read = readCount(text, system, yarn.fibre);
  if (read === undefined) {
    fields.findings.reject('E_NUM', path, `“${text}” is not a count. Write it like 16, 8/2 or 2/16.`);
    return false;
  }
  if (read.tex < TEX_RANGE.min || read.tex > TEX_RANGE.max) {
    const { label } = COUNT_SYSTEMS[system];
    fields.findings.reject('E_RANGE', path, `“${text}” in ${label} is no yarn one can weave with. Is it another system?`);
    return false;
  }
  if (read.doubt !== undefined && yarn.ball === undefined) {
    const doubt = DOUBTS[read.doubt];
    const taken = `${String(read.plies)} ${read.plies === 1 ? 'ply' : 'plies'}, together ${read.tex.toPrecision(4)} tex`;
    fields.findings.warn(doubt.code, path, `${doubt.words}. We read “${text}” as ${taken}. Check it against metres and grams on the label.`);
  }
  return true;
}

/** A class is the least that can be known, and its yarns differ much. */
function warnOfClass(fields: Fields, number: YarnClassNumber): void {
  const { name, metresPer100g: { min, max } } = classOf(number);
  const run = max === Number.POSITIVE_INFINITY ? `from ${String(min)} m in 100 g upwards` : `${min === 0 ? 'up' : `from ${String(min)}`} to ${String(max)} m in 100 g`;
  fields.findings.warn('W_CLASS', fields.pathOf('class'), `Class ${String(number)}, ${name}, goes ${run}, so every amount is a rough guess. Read the label, or wrap the yarn round a ruler.`);
}

/** A label whose metres no yarn of that class has is about another yarn. */
function checkBallOfClass(fields: Fields, number: YarnClassNumber, ballTex: number): void {
  const metres = metresPer100gFromTex(ballTex);
  if (classesByLength(metres).some((yarnClass) => yarnClass.number === number)) return;
  fields.findings.warn('W_LABEL', fields.pathOf('ball'), `Metres and grams of the ball come to ${metres.toPrecision(3)} m in 100 g, which is no yarn of class ${String(number)}. The ball is used.`);
}

/** Metres and grams of a ball come to a tex of their own, which should agree with what else is said. */
function checkBall(fields: Fields, yarn: Yarn, ball: NonNullable<Yarn['ball']>): void {
  const ballTex = texFromBall(ball);
  if (ballTex < TEX_RANGE.min || ballTex > TEX_RANGE.max) {
    fields.reject('E_RANGE', 'ball', 'So many metres do not weigh so many grams. Check both against the label.');
    return;
  }
  if (yarn.class !== undefined) {
    checkBallOfClass(fields, yarn.class, ballTex);
    return;
  }
  const { ball: _, ...withoutBall } = yarn;
  const saidTex = gristOf(withoutBall).tex;
  if (Math.abs(ballTex / saidTex - 1) <= LABEL_AGREES_WITHIN) return;
  const used = yarn.count === undefined ? `The ${saidTex.toPrecision(4)} tex given are used.` : 'The ball is used.';
  fields.findings.warn('W_LABEL', fields.pathOf('ball'), `Metres and grams of the ball come to ${ballTex.toPrecision(4)} tex, which is another yarn. ${used}`);
}

/** Wraps that no yarn of this weight can have were most likely miscounted. */
function checkWraps(fields: Fields, yarn: Yarn): void {
  const { compressedMm, loftMm } = threadOf(yarn, ASHENHURST_K.weft);
  const ratio = loftMm / compressedMm;
  if (ratio >= LOFT_RATIO_RANGE.min && ratio <= LOFT_RATIO_RANGE.max) return;
  const which = ratio < LOFT_RATIO_RANGE.min ? 'more wraps than so heavy a yarn can have' : 'very few wraps for so light a yarn';
  fields.findings.warn('W_LOFT', fields.pathOf('wrapsPerInch'), `These are ${which}. Wind it snugly, without pulling, over 5 cm and count again.`);
}

/** Reads a yarn whole; undefined if anything in it was refused. */
export function readYarn(fields: Fields): Yarn | undefined {
  const { findings } = fields;
  const yarn = findings.soundly((): Yarn => {
    const read = { ...readTraits(fields), ...readGrist(fields) };
    fields.end();
    return read;
  });
  if (yarn === undefined) return undefined;
  return findings.soundly(() => {
    if (yarn.count !== undefined && !checkCount(fields, yarn, yarn.count)) return yarn;
    if (yarn.ball !== undefined) checkBall(fields, yarn, yarn.ball);
    if (yarn.class !== undefined && isKnownByClass(yarn)) warnOfClass(fields, yarn.class);
    else if (yarn.wrapsPerInch !== undefined) checkWraps(fields, yarn);
    return yarn;
  });
}
