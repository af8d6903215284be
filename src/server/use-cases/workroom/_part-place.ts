import type { Lesson, Series } from '#server/models/index.ts';

/** Where a part stands after a change. */
export interface PartPlace {
  /** Slug of its series. */
  readonly series: string;
  readonly publicId: string;
  readonly title: string;
  /** 1 for the first part; of one that was taken out, the number it had. */
  readonly number: number;
}

export function placeOf(series: Series, { publicId, title, position }: Lesson): PartPlace {
  return { series: series.slug, publicId, title, number: position };
}
