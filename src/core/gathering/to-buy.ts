/**
 * What is still to be bought of each yarn: all its roles together, less what she has, rounded up to whole balls. Two lines
 * of a list that speak of one yarn are one purchase here.
 */
import type { Material } from '#core/craft/craft.ts';
import { ballsFor } from '#core/craft/purchase.ts';
import type { Stash } from '#core/gathering/stash.ts';

export interface YarnToBuy {
  /** Tells one yarn from another: name, colour and put-up. */
  readonly key: string;
  readonly name: string;
  readonly colour: string | undefined;
  /** To have in hand, margins included. Length is missing for what is only weighed. */
  readonly lengthMm: number | undefined;
  readonly grams: number;
  /** How it is sold, where that is told. */
  readonly ball: { readonly metres: number; readonly grams: number } | undefined;
  readonly stash: Stash | null;
  /** Of length and mass, what the stash does not cover; 0 to 1. */
  readonly shareToBuy: number;
  /** Whole balls of what is missing; undefined where no put-up is told. */
  readonly balls: { readonly count: number; readonly leftOverMm: number; readonly tight: boolean } | undefined;
}

const LONGEST_KEY = 160;

/** What makes two materials one to buy. */
export function purchaseKey({ label, name, colour, yarn }: Material): string {
  const ball = yarn?.ball;
  return [label ?? name, colour ?? '', ball === undefined ? '' : `${String(ball.metres)}/${String(ball.grams)}`].join('|').toLowerCase().slice(0, LONGEST_KEY);
}

/** In the order of the materials; yarn that is used up already is left out. */
export function yarnsToBuy(materials: readonly Material[], stashes: ReadonlyMap<string, Stash>): YarnToBuy[] {
  const together = new Map<string, Material[]>();
  for (const material of materials) {
    if (material.lengthMm === 0 || material.grams === 0) continue;
    const key = purchaseKey(material);
    together.set(key, [...(together.get(key) ?? []), material]);
  }
  return [...together].flatMap(([key, same]) => {
    const [first] = same;
    return first === undefined ? [] : [purchaseOf(key, first, same, stashes.get(key) ?? null)];
  });
}

function purchaseOf(key: string, first: Material, same: readonly Material[], stash: Stash | null): YarnToBuy {
  const grams = same.reduce((sum, one) => sum + one.grams, 0);
  const lengthMm = same.every((one) => one.lengthMm !== undefined) ? same.reduce((sum, one) => sum + (one.lengthMm ?? 0), 0) : undefined;
  const ball = first.yarn?.ball;
  const had = stash === null ? 0 : shareHad(stash, { grams, lengthMm, ballMetres: ball?.metres });
  const shareToBuy = Math.max(0, 1 - had);
  const balls = ball === undefined || lengthMm === undefined ? undefined : boughtFor(lengthMm * had, lengthMm, ball.metres);
  return { key, name: first.label ?? first.name, colour: first.colour, lengthMm, grams, ball, stash, shareToBuy, balls };
}

/** Share of the need that the stash covers; above 1 where there is more of it. None where its unit says nothing of this yarn. */
function shareHad({ amount, unit }: Stash, { grams, lengthMm, ballMetres }: { grams: number; lengthMm: number | undefined; ballMetres: number | undefined }): number {
  if (unit === 'g') return amount / grams;
  if (lengthMm === undefined || (unit === 'balls' && ballMetres === undefined)) return 0;
  return (unit === 'mm' ? amount : amount * (ballMetres ?? 0) * 1_000) / lengthMm;
}

/** What is left over counts what she has too: it lies in the same basket. */
function boughtFor(hadMm: number, neededMm: number, ballMetres: number): NonNullable<YarnToBuy['balls']> {
  if (hadMm >= neededMm) return { count: 0, leftOverMm: hadMm - neededMm, tight: false };
  return ballsFor(neededMm - hadMm, ballMetres);
}
