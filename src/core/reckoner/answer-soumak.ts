/** Ridges of soumak in the yarn of the page, on its ends. */
import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { pickSpacing } from '#core/craft/picks.ts';
import { explainSoumak } from '#core/craft/show-how/explain.ts';
import { soumakRatio } from '#core/craft/techniques/soumak.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { workingsOf, yarnInHand } from '#core/reckoner/answer-cloth.ts';
import { loud, NO_ANSWER, stepped, written, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { SOUMAK_KEYS } from '#core/reckoner/field-of-path.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { ROW_FIELDS, SETT_FIELDS, YARN_FIELDS } from '#core/reckoner/read-fields.ts';
import { makePiece, type Cloth, type Made } from '#core/reckoner/small-piece.ts';

const NEEDS = [...YARN_FIELDS, ...SETT_FIELDS, ...ROW_FIELDS, 'over', 'back', 'soumak-rows', 'between'] as const;
/** Of the cloth beside the ridges, which is not told. */
const BESIDE_MM = 20;

/** A cloth high enough for the ridges. */
function roomFor({ rows, tabbyBetween }: Band, { yarn, rows: { beat } }: Cloth): number {
  const { loftMm, compressedMm } = threadOf(yarn, ASHENHURST_K.weft);
  return rows * (loftMm + tabbyBetween * pickSpacing(beat, compressedMm)) + BESIDE_MM;
}

function readBand(reader: FormReader) {
  const over = reader.number('over', 'Ends passed over');
  const back = reader.number('back', 'Ends gone back under');
  const rows = reader.number('soumak-rows', 'Rows of soumak');
  const tabbyBetween = reader.number('between', 'Rows of tabby between');
  if (over === undefined || back === undefined || rows === undefined || tabbyBetween === undefined) return undefined;
  return { technique: 'soumak', name: 'ridges', yarn: 'ridge', over, back, rows, tabbyBetween, tabbyYarn: 'ground' } as const;
}

type Band = NonNullable<ReturnType<typeof readBand>>;

function lines(made: Made, band: Band, cloth: Cloth, diameterSumMm: number): AnswerLine[] {
  const { plan } = made;
  const ridge = plan.bands[0];
  if (ridge === undefined) return [];
  const loftTrust = cloth.yarn.wrapsPerInch === undefined ? 'formula' : 'measured';
  return [
    ...yarnInHand(made, 'ridge'),
    stepped('stitches', loud({ label: 'Stitches in a row', value: { kind: 'count', count: (ridge.stitches ?? 0) / band.rows, one: 'stitch', many: 'stitches' }, how: '(ends − over) ÷ (over − back), whole ones, and the first', trust: 'formula' })),
    { label: 'Yarn of one row', value: lengthOf((ridge.yarnMm['ridge'] ?? 0) / band.rows, 'yarn'), how: 'stitches × yarn of one stitch, and two tails', trust: loftTrust },
    stepped('ratio', { label: 'Yarn over width covered', value: { kind: 'number', value: soumakRatio({ ...band, spacingMm: plan.ends.spacingMm, diameterSumMm }), unit: 'times' }, how: 'forward on the face, back behind, and two half turns round the ends', trust: loftTrust }),
    stepped('bands.0.heightMm', { label: 'Height of the ridges', value: lengthOf(ridge.heightMm, 'fine'), how: 'rows × thickness lying free, and the tabby between', trust: loftTrust }),
  ];
}

export function answerSoumak(cloth: Cloth | undefined, dressed: DressedWarp | undefined, reader: FormReader): Section {
  const band = readBand(reader);
  if (cloth === undefined || dressed === undefined || band === undefined || !reader.isSound(...NEEDS)) return { ...NO_ANSWER, needs: NEEDS };
  const making = { bands: [band, { technique: 'tabby', yarn: 'ground', fill: true } as const], yarns: { ridge: { ...cloth.yarn, label: 'Ridge yarn' } }, heightMm: roomFor(band, cloth) };
  const made = makePiece(cloth, making, reader, SOUMAK_KEYS);
  if (made === undefined || !reader.isSound(...NEEDS)) return { ...NO_ANSWER, needs: NEEDS };
  const diameterSumMm = dressed.workingDiameterMm + threadOf(cloth.yarn, ASHENHURST_K.weft).loftMm;
  const { ends } = made.plan;
  const row = { over: band.over, back: band.back, spacingMm: ends.spacingMm, diameterSumMm, ends: ends.working };
  const ofPiece = workingsOf(made, reader.units);
  return {
    lines: lines(made, band, cloth, diameterSumMm),
    notes: made.notes,
    needs: NEEDS,
    asked: [row, ofPiece.asked],
    workings: () => [...written(explainSoumak(row, reader.units)), ...ofPiece.workings()],
  };
}
