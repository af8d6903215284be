/** Puts a job in the queue; part of the caller's transaction, so that a job exists exactly when its reason does. */
import { UniqueConstraintError } from 'sequelize';
import type { JobDefinition } from '#server/jobs/definition.ts';
import { Job } from '#server/models/index.ts';

export interface EnqueueOptions {
  readonly runAt?: Date;
  /** At most one job with this key ever exists. */
  readonly uniqueKey?: string;
}

/** @returns false when a job with the same key was there already. */
export async function enqueue<P>(definition: JobDefinition<P>, payload: P, options: EnqueueOptions = {}): Promise<boolean> {
  try {
    await Job.create({
      type: definition.type,
      payload: definition.payload.parse(payload),
      maxAttempts: definition.maxAttempts,
      runAt: options.runAt ?? new Date(),
      uniqueKey: options.uniqueKey ?? null,
    });
    return true;
  } catch (error) {
    if (error instanceof UniqueConstraintError) return false;
    throw error;
  }
}
