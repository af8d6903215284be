/**
 * A dyeing as a person describes it, and the plan that comes of it. Everything goes by the mass of the dry fibre, weighed
 * before it is wetted: `percent` is of that mass. Masses are grams, baths litres.
 */
import type { PlanCore } from '#core/craft/craft.ts';

export type FibreKind = 'wool' | 'silk' | 'other-protein' | 'cotton' | 'linen' | 'other-cellulose';

export interface DyePiece {
  readonly craft: 'dyeing';
  readonly fibre: { readonly kind: FibreKind; readonly massG: number; readonly label?: string; readonly colour?: string };
  /** Potash alum (15 % when not said) for protein, aluminium acetate (8 %) for cellulose. */
  readonly mordant: { readonly agent: 'alum' | 'aluminium-acetate' | 'none'; readonly percent?: number };
  /** Cream of tartar beside alum, protein only; 6 % when not said. */
  readonly tartar?: { readonly percent?: number };
  /** Before the mordant, for cellulose; 8 % when not said. */
  readonly tannin?: { readonly percent?: number };
  /** Fresh plants: 100 to 200 %. */
  readonly dye: { readonly percent: number; readonly label?: string; readonly colour?: string };
  /** Ferrous sulphate, last of all and in a pot of its own; 2 % when not said. */
  readonly iron?: { readonly percent?: number };
  /** Litres of bath for a kilogram of fibre, 10 to 100; 30 when missing. */
  readonly liquorRatio?: number;
}

export type DyeAgent = 'alum' | 'tartar' | 'aluminium-acetate' | 'tannin' | 'dye' | 'iron';

/** One bath. */
export interface DyeStep {
  readonly step: 'scour' | 'tannin' | 'mordant' | 'dye' | 'iron';
  readonly agents: readonly { readonly agent: DyeAgent; readonly percent: number; readonly massG: number }[];
  readonly bathLitres: number;
}

export interface DyePlan extends PlanCore {
  readonly craft: 'dyeing';
  /** In the order in which they are done. */
  readonly steps: readonly DyeStep[];
  /** Of one bath. */
  readonly bathLitres: number;
}
