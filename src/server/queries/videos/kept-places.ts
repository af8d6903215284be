import { VideoPlace } from '#server/models/index.ts';

export interface KeptPlace {
  readonly placeMs: number;
  readonly furthestMs: number;
}

/** Where a student stopped in the videos of her series, by their names. */
export async function keptPlaces(enrolmentId: number): Promise<Readonly<Record<string, KeptPlace>>> {
  const rows = await VideoPlace.findAll({ where: { enrolmentId } });
  return Object.fromEntries(rows.map(({ name, placeMs, furthestMs }) => [name, { placeMs, furthestMs }]));
}
