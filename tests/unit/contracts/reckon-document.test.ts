/**
 * The OpenAPI description against the meta-schema of OpenAPI 3.1, against every answer of the
 * check rows, and against the reader of questions: what the schemas refuse the reader refuses,
 * and whatever is missing, beyond a limit, of another kind or unknown, both refuse.
 */
import { Validator } from '@seriousme/openapi-schema-validator';
import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020.js';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { RECKON_DOCUMENT, SCHEMAS_OF } from '#contracts/reckon-api/document.ts';
import { CRAFT_NAMES, type CraftName } from '#core/craft/crafts.ts';
import { reckon, type Question } from '#core/craft/reckon.ts';
import { withCautions } from '#core/craft/with-cautions.ts';
import { answerQuestion } from '#server/web/answer-question.ts';
import { faultsOf, WIRE_ROWS } from '../../reference/wire-rows.ts';

const { components } = RECKON_DOCUMENT as { readonly components: { readonly schemas: Readonly<Record<string, object>> } };
// Two words are OpenAPI's, not JSON Schema's.
const ajv = new Ajv2020({ strict: true, strictRequired: false, strictTypes: false, keywords: ['discriminator', 'components'] });
ajv.addSchema({ $id: 'reckon', components }, undefined, undefined, false);

const compiled = new Map<string, ValidateFunction>();
function schemaNamed(name: string): ValidateFunction {
  const known = compiled.get(name) ?? ajv.compile({ $ref: `reckon#/components/schemas/${name}` });
  compiled.set(name, known);
  return known;
}
const fits = (name: string, value: unknown): string[] => (schemaNamed(name)(value) ? [] : (schemaNamed(name).errors ?? []).map((error) => `${error.instancePath} ${error.message ?? ''}`));

type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };
const isRecord = (value: Json): value is Readonly<Record<string, Json>> => typeof value === 'object' && value !== null && !Array.isArray(value);
const whatOf = (question: unknown): Question => (question as { what: Question }).what;

test('is an OpenAPI 3.1 document', async () => {
  const result = await new Validator().validate(structuredClone(RECKON_DOCUMENT) as Record<string, unknown>);
  expect(result).toEqual({ valid: true });
});

test('names nothing it does not define, and defines nothing it does not name', () => {
  const text = JSON.stringify(RECKON_DOCUMENT);
  const named = new Set([...text.matchAll(/"#\/components\/schemas\/(\w+)"/gu)].map(([, name]) => name));
  expect([...named].sort()).toEqual(Object.keys(components.schemas).sort());
});

describe('the check rows', () => {
  test.each(WIRE_ROWS.map((row) => [row.row, row] as const))('%s: answered right, and question and answer fit their schemas', async (_, row) => {
    const { question, refused } = row;
    const response = answerQuestion(JSON.stringify(question), 'a-request');
    const body: unknown = await response.json();
    const schemas = SCHEMAS_OF[whatOf(question)];
    expect(faultsOf(row, { status: response.status, body })).toEqual([]);
    if (refused !== undefined) {
      expect(fits('Refusal', body)).toEqual([]);
      return;
    }
    expect(fits(schemas.question, question)).toEqual([]);
    expect(fits(schemas.answer, body)).toEqual([]);
  });

  test('ask every question', () => {
    expect([...new Set(WIRE_ROWS.map(({ question }) => whatOf(question)))].sort()).toEqual(Object.keys(SCHEMAS_OF).sort());
  });
});

test('the examples of the document are answered', () => {
  const text = RECKON_DOCUMENT as { paths: { '/api/reckon': { post: { requestBody: { content: { 'application/json': { examples: Record<string, { value: unknown }> } } } } } } };
  for (const { value } of Object.values(text.paths['/api/reckon'].post.requestBody.content['application/json'].examples)) {
    expect(fits(SCHEMAS_OF[whatOf(value)].question, value)).toEqual([]);
    expect(reckon(value).ok).toBe(true);
  }
});

describe('reader and schemas', () => {
  /** Every key that any schema knows, so that each is tried somewhere. */
  const FULL_PIECE = {
    what: 'piece',
    piece: {
      craft: 'frame-loom', size: { widthMm: 300, heightMm: 400 }, mode: 'straight-warp', hangs: 'turned', seed: 7,
      loom: { kind: 'two-row-frame', nailRows: 'inner', nailPitchMm: 10, warping: 'zigzag', everyNthNail: 1, nailDiameterMm: 1.6, insideHeightMm: 900, insideWidthMm: 900 },
      warp: { yarn: { tex: 400, label: 'Warp', colour: '#aabbcc' }, endsTogether: 1, parity: 'even', endCount: 62, tieMm: 150 },
      beat: { picksPerCm: 6 },
      allowances: { drawIn: 0.02, relaxation: 0.02, wetShrinkage: 0, topMm: 40, bottomMm: 60, tailMm: 50, loadMm: 8000, marginWeft: 0.15, marginWarp: 0.1 },
      dowel: { diameterMm: 12, lengthMm: 380 },
      yarns: { a: { metresPer100g: 180, strands: 1, ashenhurstK: 0.84, wrapsPerInch: 10.5, ball: { metres: 180, grams: 100 }, fibre: 'wool' }, b: { count: { text: '2/16', system: 'nm' } }, c: { class: 4, freeDiameterMm: 3 } },
      bands: [
        { technique: 'hem-stitch', yarn: 'a', bundleEnds: 2, reachPicks: 2 },
        { technique: 'rya', name: 'fringe', yarn: 'a', strands: 3, legEnds: 1, pileMm: 100, trimMm: 10, rows: 1, heightMm: 6 },
        { technique: 'tabby', name: 'dunes', yarn: 'a', heightMm: 120, shapes: [
          { shape: 'triangle', yarn: 'b', baseMm: 50, heightMm: 50, centreMm: 60, bottomMm: 5, leanMm: 5, symmetric: false, join: 'slit' },
          { shape: 'circle', yarn: 'b', radiusMm: 20, centreMm: 200, bottomMm: 10 },
          { shape: 'points', yarn: 'b', points: [{ xMm: 0, yMm: -4 }, { xMm: 40, yMm: 0 }, { xMm: 20, yMm: 30 }], centreMm: 250 }] },
        { technique: 'soumak', yarn: 'a', over: 4, back: 2, rows: 2, tabbyBetween: 2, tabbyYarn: 'a' },
        { technique: 'roving', yarn: 'a', over: 4, bulgeMm: 5, heightMm: 20, passes: 1 },
        { technique: 'loop-pile', yarn: 'a', rodMm: 8, rows: 2, heightMm: 12 },
        { technique: 'loop-pile', yarn: 'a', loopMm: 8, rows: 2, heightMm: 12 },
        { technique: 'twining', yarn: 'c', rows: 1 },
        { technique: 'tabby', yarn: 'a', fill: true },
      ],
    },
  };
  const BALL = { metres: 180, grams: 100 };
  const FULL_MACRAME = {
    what: 'piece',
    piece: {
      craft: 'macrame', rod: { kind: 'rod', diameterMm: 20, lengthMm: 400 }, seed: 7,
      yarns: { main: { diameterMm: 4, tex: 9000, label: 'Cord', colour: '#ddd3bb', ball: BALL, fibre: 'cotton' }, wrap: { tex: 2000, strands: 1 } },
      columns: [
        { name: 'net', yarn: 'main', cords: 4, sections: [
          { technique: 'half-hitches', name: 'head', rows: 1, slant: 'left' },
          { technique: 'alternating', rows: 3, gapMm: 10 },
          { technique: 'square-knots', knots: 4, gapMm: 5, spiral: true },
          { technique: 'plain', heightMm: 40 }] },
        { yarn: 'main', cords: 2, sections: [{ technique: 'square-knots', heightMm: 100 }, { technique: 'gathering', name: 'neck', wraps: 5, yarn: 'wrap' }] },
      ],
      foot: [{ technique: 'plain', heightMm: 20 }, { technique: 'gathering', wraps: 6 }, { technique: 'fringe', heightMm: 100 }],
      takes: { squareKnot: 15, squareRise: 3, doubleHalfHitch: 14 }, allowances: { margin: 0.1, tailMm: 60 },
    },
  };
  const RING = { what: 'piece', piece: { ...FULL_MACRAME.piece, rod: { kind: 'ring', diameterMm: 120, thickMm: 8 } } };
  const FULL_DYEING = {
    what: 'piece',
    piece: { craft: 'dyeing', fibre: { kind: 'wool', massG: 250, label: 'Skeins', colour: '#eeeeee' }, mordant: { agent: 'alum', percent: 15 }, tartar: { percent: 6 }, tannin: { percent: 8 }, dye: { percent: 100, label: 'Weld', colour: '#c9a83a' }, iron: { percent: 2 }, liquorRatio: 30 },
  };
  const FULL_HEDDLE = {
    what: 'piece',
    piece: {
      craft: 'rigid-heddle', size: { widthMm: 200, lengthMm: 1500 }, heddle: { spacingMm: 2.54, widthMm: 500 }, picksPerCm: 4, pieces: 2,
      yarns: { warp: { tex: 250, ball: BALL }, weft: { metresPer100g: 400, label: 'Wool' } },
      allowances: { drawIn: 0.08, widthShrinkage: 0.05, lengthShrinkage: 0.05, takeUp: 0.1, fringeMm: 200, gapMm: 50, wasteMm: 610, margin: 0.1 },
    },
  };
  const FULL: readonly (readonly [CraftName, Json])[] = [['frame-loom', FULL_PIECE], ['macrame', FULL_MACRAME], ['macrame', RING], ['dyeing', FULL_DYEING], ['rigid-heddle', FULL_HEDDLE]];
  const POINTS = { what: 'shape', shape: 'points', points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 0 }, { xMm: 20, yMm: 30 }], spacingMm: 5, pickSpacingMm: 2, ends: 62, symmetric: false };
  const { beat: _, ...closeAsEnds } = FULL_PIECE.piece;
  /** The other ways of bending, each with all its numbers. */
  const BENT_OTHERWISE = [
    { ...FULL_PIECE, piece: { ...FULL_PIECE.piece, mode: 'given', weftWaveMm: 1.8 } },
    { ...FULL_PIECE, piece: { ...FULL_PIECE.piece, mode: 'measured', takeUp: 0.08, warpTakeUp: 0.01 } },
    { ...FULL_PIECE, piece: { ...closeAsEnds, mode: 'balanced' } },
  ];
  const SOUND = [...FULL.map(([, question]) => question), POINTS, ...WIRE_ROWS.filter(({ refused }) => refused === undefined).map(({ question }) => question)] as readonly Json[];

  test('there is a full piece of every craft', () => {
    expect([...new Set(FULL.map(([craft]) => craft))].sort()).toEqual([...CRAFT_NAMES].sort());
  });

  test.each(FULL)('the fullest piece of %s is answered, and its plan fits its schema', (_, question) => {
    const answer = reckon(question);
    expect(answer).toMatchObject({ ok: true });
    expect(fits('PieceQuestion', question)).toEqual([]);
    expect(answer.ok ? fits('Plan', withCautions(answer.value)) : []).toEqual([]);
  });

  /** Places of a question, as lists of keys. */
  const placesOf = (value: Json, path: readonly string[] = []): readonly (readonly string[])[] => {
    const below = Array.isArray(value) ? value.map((item, index) => [String(index), item as Json] as const) : isRecord(value) ? Object.entries(value) : [];
    return [path, ...below.flatMap(([key, item]) => placesOf(item, [...path, key]))];
  };
  const atPlace = (value: Json, path: readonly string[]): Json => path.reduce<Json>((now, key) => (now as Readonly<Record<string, Json>>)[key] ?? null, value);
  /** The question with one place changed; `undefined` takes it out. */
  const changed = (value: Json, [key, ...rest]: readonly string[], to: Json | undefined): Json => {
    if (key === undefined) return to ?? null;
    if (Array.isArray(value)) return value.map((item: Json, index) => (String(index) === key ? changed(item, rest, to) : item));
    const record = value as Readonly<Record<string, Json>>;
    if (rest.length > 0) return { ...record, [key]: changed(record[key] ?? null, rest, to) };
    const { [key]: _, ...others } = record;
    return to === undefined ? others : { ...others, [key]: to };
  };

  /** Every limit that stands in the document. */
  const LIMITS = [...new Set([...JSON.stringify(RECKON_DOCUMENT).matchAll(/"(?:exclusive)?(?:minimum|maximum|Minimum|Maximum)":(-?[\d.e+]+)/gu)].map(([, limit]) => Number(limit)))];
  const BESIDE_LIMITS = [...new Set(LIMITS.flatMap((limit) => [limit - 1, limit, limit + 1]))];
  const OTHER_KINDS: readonly (Json | undefined)[] = [undefined, null, true, 'red', '', 12.5, [], {}, 'x'.repeat(200)];
  const othersFor = (value: Json): readonly (Json | undefined)[] => (typeof value === 'number' ? [...OTHER_KINDS, ...BESIDE_LIMITS] : OTHER_KINDS);

  /** Refusals of one value alone; that things do not go together is no matter of schemas. */
  const WRONG_BY_ITSELF = /^(?!A soumak stitch).*: (?:between|anything above|from) .* works\.$|is missing|is not a number|must be a whole number|is not one we know|is not known here|must be a group|either true or false/u;

  const agree = (question: Json): void => {
    const { question: name } = SCHEMAS_OF[whatOf(question)];
    const schemaRefuses = fits(name, question).length > 0;
    const answer = reckon(question);
    const readerRefuses = !answer.ok && answer.problems.some(({ message }) => WRONG_BY_ITSELF.test(message));
    if (schemaRefuses) expect(answer.ok, `the schema refuses what is answered: ${JSON.stringify(fits(name, question))}`).toBe(false);
    if (readerRefuses) expect(schemaRefuses, `the schema takes what is refused: ${JSON.stringify(answer.problems)}`).toBe(true);
  };

  test.each(FULL)('refuse the same missing values, kinds and limits, at every place of a piece of %s', (_, question) => {
    for (const place of placesOf(question).filter((path) => path.length > 0 && path.join() !== 'what')) {
      for (const value of othersFor(atPlace(question, place))) agree(changed(question, place, value));
    }
  }, 300_000);

  test.each(BENT_OTHERWISE.map((question) => [question.piece.mode, question]))('refuse the same where the bend is %s', (_mode, question) => {
    for (const key of ['mode', 'beat', 'weftWaveMm', 'takeUp', 'warpTakeUp']) {
      for (const value of othersFor(0.5)) agree(changed(question as unknown as Json, ['piece', key], value));
    }
  });

  test('refuse the same in the short questions', () => {
    fc.assert(
      fc.property(fc.constantFrom(...SOUND.slice(FULL.length)), fc.nat(), fc.constantFrom(...OTHER_KINDS, ...BESIDE_LIMITS), (question, pick, value) => {
        const places = placesOf(question).filter((path) => path.length > 0 && path.join() !== 'what');
        agree(changed(question, places[pick % places.length] ?? ['what'], value));
      }),
      { numRuns: 2000, seed: 31 },
    );
  });

  test('know no key that the other does not', () => {
    for (const question of SOUND) {
      for (const place of placesOf(question)) {
        const value = atPlace(question, place);
        if (!isRecord(value) || place.at(-1) === 'yarns') continue;
        const more = changed(question, [...place, 'colourful'], 1);
        expect(reckon(more).ok).toBe(false);
        expect(fits(SCHEMAS_OF[whatOf(question)].question, more)).not.toEqual([]);
      }
    }
  });
});
