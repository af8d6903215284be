/**
 * Yarn weight classes as shops print them. Their ranges overlap by design, so a
 * yarn belongs to a set of classes, never surely to one.
 *
 * Wraps: the Craft Yarn Council's table as two pages reproduce it. Metres in
 * 100 g: one shop's table. The least trusted source there is: a measurement, the
 * label and a formula all come before it.
 */
import type { YarnClassNumber } from '#core/craft/piece.ts';

export interface YarnClass {
  readonly number: YarnClassNumber;
  readonly name: string;
  readonly wrapsPerInch: { readonly min: number; readonly max: number };
  readonly metresPer100g: { readonly min: number; readonly max: number };
  /** What a yarn is taken to be of which only the class is known: the middle of both ranges, and common yarns where they are open. */
  readonly middle: { readonly wrapsPerInch: number; readonly metresPer100g: number };
}

const NO_LIMIT = Number.POSITIVE_INFINITY;

export const YARN_CLASSES = [
  { number: 0, name: 'lace', wrapsPerInch: { min: 30, max: NO_LIMIT }, metresPer100g: { min: 600, max: NO_LIMIT }, middle: { wrapsPerInch: 35, metresPer100g: 700 } },
  { number: 1, name: 'super fine', wrapsPerInch: { min: 14, max: 30 }, metresPer100g: { min: 350, max: 600 }, middle: { wrapsPerInch: 22, metresPer100g: 475 } },
  { number: 2, name: 'fine', wrapsPerInch: { min: 12, max: 18 }, metresPer100g: { min: 250, max: 350 }, middle: { wrapsPerInch: 15, metresPer100g: 300 } },
  { number: 3, name: 'light', wrapsPerInch: { min: 11, max: 15 }, metresPer100g: { min: 200, max: 250 }, middle: { wrapsPerInch: 13, metresPer100g: 225 } },
  { number: 4, name: 'medium', wrapsPerInch: { min: 9, max: 12 }, metresPer100g: { min: 120, max: 200 }, middle: { wrapsPerInch: 10.5, metresPer100g: 160 } },
  { number: 5, name: 'bulky', wrapsPerInch: { min: 6, max: 9 }, metresPer100g: { min: 100, max: 130 }, middle: { wrapsPerInch: 7.5, metresPer100g: 115 } },
  { number: 6, name: 'super bulky', wrapsPerInch: { min: 5, max: 6 }, metresPer100g: { min: 0, max: 100 }, middle: { wrapsPerInch: 5.5, metresPer100g: 70 } },
  { number: 7, name: 'jumbo', wrapsPerInch: { min: 1, max: 4 }, metresPer100g: { min: 0, max: 100 }, middle: { wrapsPerInch: 2.5, metresPer100g: 40 } },
] as const satisfies readonly YarnClass[];

export function classOf(number: YarnClassNumber): YarnClass {
  return YARN_CLASSES[number];
}

const within = (x: number, range: { readonly min: number; readonly max: number }): boolean => x >= range.min && x <= range.max;

export function classesByWraps(wrapsPerInch: number): readonly YarnClass[] {
  return YARN_CLASSES.filter((yarnClass) => within(wrapsPerInch, yarnClass.wrapsPerInch));
}

export function classesByLength(metresPer100g: number): readonly YarnClass[] {
  return YARN_CLASSES.filter((yarnClass) => within(metresPer100g, yarnClass.metresPer100g));
}
