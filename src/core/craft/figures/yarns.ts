/** Which yarn a figure shows: the one this piece uses for the technique, or a plain colour if it does not use it. */
import { yarnColour } from '#core/craft/cloth/colour.ts';
import type { FigureInput } from '#core/craft/figures/figure.ts';
import type { Band, TechniqueName } from '#core/craft/piece.ts';

const FALLBACK: Readonly<Record<TechniqueName, string>> = {
  tabby: '#93a8a6',
  soumak: '#2f5366',
  rya: '#e6e4d8',
  roving: '#ddd3bb',
  'hem-stitch': '#2f5366',
  'loop-pile': '#a99a5e',
  twining: '#a0664a',
};

/** First band of a technique in the piece, in the order of weaving. */
export function bandOf<T extends TechniqueName>(input: FigureInput, technique: T): Extract<Band, { technique: T }> | undefined {
  return input.piece.bands.find((band): band is Extract<Band, { technique: T }> => band.technique === technique);
}

export function roleColour(input: FigureInput, role: string | undefined, fallback: string): string {
  const yarn = role !== undefined && Object.hasOwn(input.piece.yarns, role) ? input.piece.yarns[role] : undefined;
  return yarn?.colour === undefined ? fallback : yarnColour(yarn.colour);
}

export function techniqueColour(input: FigureInput, technique: TechniqueName): string {
  return roleColour(input, bandOf(input, technique)?.yarn, FALLBACK[technique]);
}

/** Ground and shape of the first tabby band that has shapes. */
export function shapeColours(input: FigureInput): { readonly ground: string; readonly first: string; readonly second: string } {
  const band = input.piece.bands.find((each) => each.technique === 'tabby' && (each.shapes?.length ?? 0) > 0);
  const shapes = band?.technique === 'tabby' ? (band.shapes ?? []) : [];
  return {
    ground: roleColour(input, band?.yarn, '#93a8a6'),
    first: roleColour(input, shapes[0]?.yarn, '#cdbb94'),
    second: roleColour(input, shapes.at(-1)?.yarn, '#7d854f'),
  };
}

/** What the plan says of the first band of a technique. */
export function bandPlanOf(input: FigureInput, technique: TechniqueName): FigureInput['plan']['bands'][number] | undefined {
  return input.plan.bands.find((band) => band.technique === technique);
}
