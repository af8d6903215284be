import { openingFaults, type OpeningFault } from '#core/series/opening-faults.ts';
import { AppError, fieldError } from '#server/errors.ts';
import { Lesson, type Series } from '#server/models/index.ts';
import { partOpenings } from '#server/queries/series/part-openings.ts';

/**
 * Refuses a change after which a part of an open series could never open, or would open before an earlier one. Called
 * after the change is written, inside its transaction, so that a refusal undoes it. A draft may be in any order.
 * @param fieldOf names the field of the form at which the refusal stands; without it, it stands above the form.
 * @throws CONFLICT, or VALIDATION at a field.
 */
export async function requireOpenable(series: Series, fieldOf?: (fault: OpeningFault) => string): Promise<void> {
  if (series.state !== 'published') return;
  const [fault] = openingFaults(partOpenings(await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'] })));
  if (fault === undefined) return;
  const says = `People follow this series, so nothing was changed. Part ${fault.part} would be stuck: ${fault.says}`;
  throw fieldOf === undefined ? new AppError('CONFLICT', { says }) : fieldError(fieldOf(fault), says);
}
