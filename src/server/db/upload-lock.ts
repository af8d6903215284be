/**
 * One writer at a time for each upload, among all web processes: a row says who holds it and until when. Who waits marks
 * the row, and the holder lets go of a connection that went dead; a process that died lets go when its time runs out.
 */
import { randomUUID } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import type { Lock, Locker, RequestRelease } from '@tus/server';
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface UploadLockTimes {
  /** How long a hold lasts that nobody renews. */
  readonly holdMs: number;
  /** How often a holder renews, and looks whether somebody waits. */
  readonly renewMs: number;
  /** How long to wait before saying that it is held. */
  readonly waitMs: number;
}

const TIMES: UploadLockTimes = { holdMs: 15_000, renewMs: 1_000, waitMs: 20_000 };
const ASK_AGAIN_MS = 150;

/** Clients that speak tus try again by themselves after this. */
class UploadHeld extends Error {
  readonly status_code = 423;
  readonly body = 'Another request is writing to this upload\n';
}

/** Rows that say who holds what: one table for each kind of upload, all made alike. */
export type UploadTable = 'video_uploads' | 'photo_uploads';

const BY_UPLOAD = 'media_id = (SELECT id FROM media WHERE public_id = ?)';

export function uploadLocker(table: UploadTable, times: UploadLockTimes = TIMES): Locker {
  return { newLock: (publicId) => new UploadLock(table, publicId, times) };
}

class UploadLock implements Lock {
  readonly #table: UploadTable;
  readonly #publicId: string;
  readonly #times: UploadLockTimes;
  readonly #holder = randomUUID();
  #renewing: NodeJS.Timeout | undefined;

  constructor(table: UploadTable, publicId: string, times: UploadLockTimes) {
    this.#table = table;
    this.#publicId = publicId;
    this.#times = times;
  }

  async lock(signal: AbortSignal, letGo: RequestRelease): Promise<void> {
    const until = Date.now() + this.#times.waitMs;
    while (!(await this.#take())) {
      if (signal.aborted || Date.now() > until) throw new UploadHeld();
      await pause(ASK_AGAIN_MS);
    }
    this.#renewing = setInterval(() => { void this.#renew(letGo).catch(() => undefined); }, this.#times.renewMs);
  }

  async unlock(): Promise<void> {
    clearInterval(this.#renewing);
    await change(`UPDATE ${this.#table} SET held_by = NULL, held_until = NULL, is_wanted = 0 WHERE ${BY_UPLOAD} AND held_by = ?`, [this.#publicId, this.#holder]);
  }

  /** True when it is ours now, or when there is nothing left to hold. */
  async #take(): Promise<boolean> {
    const until = this.#times.holdMs * 1_000;
    const taken = await change(
      `UPDATE ${this.#table} SET held_by = ?, held_until = UTC_TIMESTAMP(3) + INTERVAL ? MICROSECOND, is_wanted = 0
        WHERE ${BY_UPLOAD} AND (held_until IS NULL OR held_until < UTC_TIMESTAMP(3))`,
      [this.#holder, until, this.#publicId],
    );
    if (taken === 1) return true;
    const marked = await sequelize.query<{ n: number }>(`SELECT COUNT(*) AS n FROM ${this.#table} WHERE ${BY_UPLOAD}`, { replacements: [this.#publicId], type: QueryTypes.SELECT });
    if (marked[0]?.n === 0) return true;
    await change(`UPDATE ${this.#table} SET is_wanted = 1 WHERE ${BY_UPLOAD}`, [this.#publicId]);
    return false;
  }

  async #renew(letGo: RequestRelease): Promise<void> {
    await change(`UPDATE ${this.#table} SET held_until = UTC_TIMESTAMP(3) + INTERVAL ? MICROSECOND WHERE ${BY_UPLOAD} AND held_by = ?`, [this.#times.holdMs * 1_000, this.#publicId, this.#holder]);
    const [row] = await sequelize.query<{ isWanted: number }>(`SELECT is_wanted AS isWanted FROM ${this.#table} WHERE ${BY_UPLOAD} AND held_by = ?`, { replacements: [this.#publicId, this.#holder], type: QueryTypes.SELECT });
    if (row?.isWanted === 1) await letGo();
  }
}

async function change(statement: string, replacements: unknown[]): Promise<number> {
  const [, affected] = await sequelize.query(statement, { replacements, type: QueryTypes.UPDATE });
  return affected;
}
