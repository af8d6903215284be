/** The schemas of every craft: its piece, told by `craft`, and the plan that answers. A further craft is a further line. */
import { DYEING_SCHEMAS } from '#contracts/reckon-api/dyeing-schemas.ts';
import { FRAME_LOOM_PIECE_SCHEMAS } from '#contracts/reckon-api/frame-loom-piece-schemas.ts';
import { FRAME_LOOM_PLAN_SCHEMAS } from '#contracts/reckon-api/frame-loom-plan-schemas.ts';
import { HEDDLE_SCHEMAS } from '#contracts/reckon-api/heddle-schemas.ts';
import { MACRAME_SCHEMAS } from '#contracts/reckon-api/macrame-schemas.ts';
import { closed, ref, toldBy, type Schema } from '#contracts/reckon-api/schema.ts';
import { SHARED_SCHEMAS } from '#contracts/reckon-api/shared-schemas.ts';
import type { CraftName } from '#core/craft/crafts.ts';

interface CraftSchemas {
  readonly piece: string;
  readonly plan: string;
  readonly schemas: Readonly<Record<string, Schema>>;
}

const OF_CRAFT: Readonly<Record<CraftName, CraftSchemas>> = {
  'frame-loom': { piece: 'FrameLoomPiece', plan: 'FrameLoomPlan', schemas: { ...FRAME_LOOM_PIECE_SCHEMAS, ...FRAME_LOOM_PLAN_SCHEMAS } },
  macrame: { piece: 'MacramePiece', plan: 'MacramePlan', schemas: MACRAME_SCHEMAS },
  dyeing: { piece: 'DyePiece', plan: 'DyePlan', schemas: DYEING_SCHEMAS },
  'rigid-heddle': { piece: 'HeddlePiece', plan: 'HeddlePlan', schemas: HEDDLE_SCHEMAS },
};

export const CRAFT_SCHEMAS: Readonly<Record<string, Schema>> = {
  ...SHARED_SCHEMAS,
  ...Object.fromEntries(Object.values(OF_CRAFT).flatMap(({ schemas }) => Object.entries(schemas))),
  Piece: { description: 'A piece of any craft.', ...toldBy('craft', Object.fromEntries(Object.entries(OF_CRAFT).map(([craft, { piece }]) => [craft, piece]))) },
  // A plan woven on a frame is the one that does not name its craft, so nothing tells them apart by a single key.
  Plan: { description: 'The plan of the piece that was asked about.', oneOf: Object.values(OF_CRAFT).map(({ plan }) => ref(plan)) },
  PieceQuestion: closed('A whole plan.', { what: { const: 'piece' }, piece: ref('Piece') }),
};
