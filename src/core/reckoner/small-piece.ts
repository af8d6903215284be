/** The pieces the page makes of its fields: one stretch of cloth in one yarn, with a band of something else perhaps. */
import { planPiece } from '#core/craft/plan.ts';
import type { Band, Dowel, FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Problem } from '#core/outcome.ts';
import { fieldOfPath, type FieldsOfKeys } from '#core/reckoner/field-of-path.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import type { TypedLoom, TypedRows } from '#core/reckoner/read-fields.ts';

/** Colours of the picture only. */
const PICTURE = { warp: '#d8d2c1', ground: '#93a8a6' } as const;

/** Where the frame is not asked about, it is as high as any. */
const ANY_FRAME_MM = 20_000;

/** What is typed of a cloth, as far as the page's parts share it. */
export interface Cloth {
  readonly yarn: Yarn;
  readonly loom: TypedLoom;
  readonly rows: TypedRows;
}

export interface Making {
  readonly bands: readonly Band[];
  /** `ground` and what else the bands name. */
  readonly yarns?: Readonly<Record<string, Yarn>>;
  readonly heightMm?: number;
  readonly frame?: { readonly heightMm: number; readonly widthMm?: number };
  readonly dowel?: Dowel;
}

export interface Made {
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
  readonly notes: readonly Problem[];
}

function pieceOf({ yarn, loom, rows }: Cloth, { bands, yarns = {}, heightMm = rows.heightMm, frame, dowel }: Making): FrameLoomPiece {
  return {
    craft: 'frame-loom',
    size: { widthMm: loom.widthMm, heightMm },
    loom: { ...loom.loom, insideHeightMm: frame?.heightMm ?? ANY_FRAME_MM, ...(frame?.widthMm === undefined ? {} : { insideWidthMm: frame.widthMm }) },
    warp: { ...loom.warp, yarn: { ...loom.warp.yarn, colour: PICTURE.warp } },
    beat: rows.beat,
    mode: rows.mode,
    allowances: { drawIn: loom.drawIn },
    ...(dowel === undefined ? {} : { dowel }),
    yarns: { ground: { ...yarn, label: 'Weft yarn', colour: PICTURE.ground }, ...yarns },
    bands,
  };
}

/** The piece with its plan, or undefined once every refused value is told at its field. */
export function makePiece(cloth: Cloth, making: Making, reader: FormReader, ofBand: FieldsOfKeys = {}): Made | undefined {
  const piece = pieceOf(cloth, making);
  const planned = planPiece(piece, reader.units);
  if (planned.ok) return { piece, plan: planned.value, notes: planned.warnings };
  for (const { path, message } of planned.problems) reader.refuse(fieldOfPath(path, ofBand), message);
  return undefined;
}
