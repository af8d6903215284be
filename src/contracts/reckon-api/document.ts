/**
 * The OpenAPI 3.1 description of the reckoner for programs. What is asked is read by core's
 * own checks, which speak a weaver's language; this says the same in schemas, and tests hold
 * the two together from both sides, at every limit.
 */
import { CRAFT_SCHEMAS } from '#contracts/reckon-api/craft-schemas.ts';
import { QUESTION_SCHEMAS } from '#contracts/reckon-api/question-schemas.ts';
import { closed, list, ref, text, toldBy, type Schema } from '#contracts/reckon-api/schema.ts';
import { YARN_SCHEMAS } from '#contracts/reckon-api/yarn-schemas.ts';
import type { Question } from '#core/craft/reckon.ts';

/** Names of the schemas of each question and of its answer. */
export const SCHEMAS_OF: Readonly<Record<Question, { readonly question: string; readonly answer: string }>> = {
  yarn: { question: 'YarnQuestion', answer: 'YarnAnswer' },
  'take-up': { question: 'TakeUpQuestion', answer: 'TakeUpAnswer' },
  soumak: { question: 'SoumakQuestion', answer: 'SoumakAnswer' },
  rya: { question: 'RyaQuestion', answer: 'RyaAnswer' },
  shape: { question: 'ShapeQuestion', answer: 'ShapeAnswer' },
  'length-text': { question: 'LengthTextQuestion', answer: 'LengthTextAnswer' },
  piece: { question: 'PieceQuestion', answer: 'Plan' },
};

const PROBLEM_SCHEMAS: Readonly<Record<string, Schema>> = {
  Finding: closed('One thing that is wrong, or worth knowing, about one place of the question.', {
    code: text('A stable name: `E_NUM` no number, `E_RANGE` out of range, `E_COUNT` not whole, `E_ENUM` not a known choice or key, `E_JAM` yarns too thick for their room, `E_FIT` does not fit, `E_PARITY` a fixed number of ends that cannot be; `W_…` comes along with an answer.', { pattern: '^[EW]_[A-Z_]+$' }),
    path: text('JSON pointer (RFC 6901) into the question.', { pattern: '^(?:/.*)?$' }),
    message: text('A plain sentence for the person: what is wrong and what works.'),
  }),
  Warnings: list('What is worth knowing about the answer.', ref('Finding')),
  Refusal: closed('Problem details (RFC 9457) with every value that was refused.', {
    type: { const: 'about:blank' },
    title: text('What happened.'),
    status: { enum: [400, 413, 422] },
    requestId: text('To tell us, should it be our fault.'),
    problems: list('One for each refused value; none where the whole was refused.', ref('Finding')),
  }),
  Trouble: {
    type: 'object',
    description: 'Problem details (RFC 9457) where the question was never looked at.',
    properties: { type: { const: 'about:blank' }, title: text('What happened, and what to do.'), status: { type: 'integer' }, code: text('A stable name.'), requestId: text('To tell us.') },
    required: ['type', 'title', 'status'],
  },
};

/** Questions that can be tried as they stand. */
const EXAMPLES: Readonly<Record<string, { readonly summary: string; readonly value: unknown }>> = {
  yarn: { summary: 'Two-ply cotton of count 8', value: { what: 'yarn', yarn: { count: { text: '8/2', system: 'ne-cotton' } } } },
  takeUp: { summary: 'Weft on straight warp', value: { what: 'take-up', warpDiameterMm: 0.8, weftDiameterMm: 1, warpSpacingMm: 5, weftSpacingMm: 1.45 } },
  soumak: { summary: 'Over four, back under two', value: { what: 'soumak', over: 4, back: 2, spacingMm: 5, diameterSumMm: 4.2, ends: 62 } },
  shape: { summary: 'A triangle', value: { what: 'shape', shape: 'triangle', baseMm: 150, heightMm: 100, spacingMm: 5, pickSpacingMm: 1.45, ends: 62, symmetric: true } },
  dyeing: { summary: 'Wool dyed with weld', value: { what: 'piece', piece: { craft: 'dyeing', fibre: { kind: 'wool', massG: 250 }, mordant: { agent: 'alum' }, tartar: {}, dye: { percent: 100 } } } },
  lengthText: { summary: 'For a rule with sixteenths', value: { what: 'length-text', mm: 138.1125, system: 'imperial', round: 'nearest' } },
};

const answer = (description: string, schema: Schema): Schema => ({ description, content: { 'application/json': { schema } } });
const refusal = (description: string, schema: string, more: Schema = {}): Schema => ({ description, ...more, content: { 'application/problem+json': { schema: ref(schema) } } });
const RETRY_AFTER: Schema = { headers: { 'Retry-After': { description: 'Seconds to wait.', schema: { type: 'integer' } } } };

const RECKON: Schema = {
  operationId: 'reckon',
  summary: 'Answer one question',
  description: 'Told by its `what`. Numbers are not rounded; lengths are millimetres, masses grams, yarn tex. Keys that are not known are refused. At most 64 KiB.',
  requestBody: {
    required: true,
    content: {
      'application/json': {
        schema: toldBy('what', Object.fromEntries(Object.entries(SCHEMAS_OF).map(([what, { question }]) => [what, question]))),
        examples: EXAMPLES,
      },
    },
  },
  responses: {
    200: answer('The answer to that question.', { anyOf: Object.values(SCHEMAS_OF).map((schemas) => ref(schemas.answer)) }),
    400: refusal('The body is no JSON.', 'Refusal'),
    413: refusal('The question is larger than 64 KiB.', 'Trouble'),
    422: refusal('Something in the question does not work, each value with its reason.', 'Refusal'),
    429: refusal('Too many questions from one network in a minute.', 'Trouble', RETRY_AFTER),
    503: refusal('The house is busy; try again.', 'Trouble', RETRY_AFTER),
  },
};

export const RECKON_DOCUMENT: Schema = {
  openapi: '3.1.0',
  info: {
    title: 'Fellmark reckoner',
    version: '1.0.0',
    summary: 'The arithmetic of weaving, knotting and dyeing.',
    description: 'The same reckoning as the page at /reckoner and as every plan. No account is needed. What it gives is reckoned from what it is told: a swatch of one’s own beats it.',
  },
  servers: [{ url: '/' }],
  paths: { '/api/reckon': { post: RECKON } },
  components: { schemas: { ...YARN_SCHEMAS, ...QUESTION_SCHEMAS, ...CRAFT_SCHEMAS, ...PROBLEM_SCHEMAS } },
};
