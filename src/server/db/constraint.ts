/** Turns a broken unique key into a sentence at the field that caused it. */
import { UniqueConstraintError } from 'sequelize';
import { fieldError } from '#server/errors.ts';

/**
 * Runs `work`; when the unique key `index` stops it, throws VALIDATION with `says` at `field`.
 * Index names, not column names, are what the server reports.
 */
export async function orFieldError<T>(index: string, field: string, says: string, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof UniqueConstraintError && Object.keys(error.fields).includes(index)) throw fieldError(field, says);
    throw error;
  }
}
