/**
 * What the house relies on of this pair of Sequelize and MariaDB connector. The pair is not one that its makers test
 * together, so these tests are the guarantee; they are run first when either version changes.
 */
import { QueryTypes, UniqueConstraintError } from 'sequelize';
import { describe, expect, test } from 'vitest';
import { sequelize } from '#server/db/sequelize.ts';
import { afterCommit, errnoOf, withTransaction } from '#server/db/transaction.ts';
import { inTransaction } from '#server/db/transaction-scope.ts';
import * as models from '#server/models/index.ts';
import { claimDue, finishDone } from '#server/jobs/leases.ts';
import { buildUser } from '../../support/factories.ts';

const { Job, User } = models;

describe('rows', () => {
  test('an untyped raw query returns its rows instead of tripping over the connector’s own field', async () => {
    const [rows] = await sequelize.query('SELECT 1 AS one');
    expect(rows).toEqual([{ one: 1 }]);
  });

  test('JSON comes back as data, also when it holds a string that looks like JSON', async () => {
    const job = await Job.create({ type: 'x', payload: { text: '{"a":1}', list: [1, 'é'] }, maxAttempts: 1, runAt: new Date() });
    expect((await Job.findByPk(job.id))?.payload).toEqual({ text: '{"a":1}', list: [1, 'é'] });
  });

  test('a moment handed to a statement of ours is written in UTC, by place and by name', async () => {
    const at = new Date('2026-10-25T00:30:00.123Z');
    const asked = { type: QueryTypes.SELECT } as const;
    expect(await sequelize.query('SELECT CAST(? AS CHAR) AS at', { ...asked, replacements: [at] })).toEqual([{ at: '2026-10-25 00:30:00.123' }]);
    expect(await sequelize.query('SELECT CAST(:at AS CHAR) AS at', { ...asked, replacements: { at } })).toEqual([{ at: '2026-10-25 00:30:00.123' }]);
  });

  test('moments keep their milliseconds and do not depend on the zone of the process', async () => {
    const user = await buildUser({ emailConfirmedAt: new Date('2026-10-25T00:30:00.123Z') });
    expect((await User.findByPk(user.id))?.emailConfirmedAt?.toISOString()).toBe('2026-10-25T00:30:00.123Z');
    const [raw] = await sequelize.query<{ at: Date }>('SELECT email_confirmed_at AS at FROM users WHERE id = ?', { replacements: [user.id], type: QueryTypes.SELECT });
    expect(raw?.at.toISOString()).toBe('2026-10-25T00:30:00.123Z');
  });

  test('whole money up to 2^53 − 1 comes back as a number', async () => {
    const [row] = await sequelize.query<{ n: number }>('SELECT CAST(9007199254740991 AS SIGNED) AS n', { type: QueryTypes.SELECT });
    expect(row?.n).toBe(Number.MAX_SAFE_INTEGER);
  });

  test('a broken unique key is reported by the name of its index', async () => {
    const user = await buildUser();
    const again = buildUser({ email: user.email, emailKey: user.emailKey });
    await expect(again).rejects.toBeInstanceOf(UniqueConstraintError);
    await again.catch((error: unknown) => { expect(error instanceof UniqueConstraintError && Object.keys(error.fields)).toEqual(['uq_users_email_key']); });
  });

  test('outside ids that differ by case or by a blank at the end are different', async () => {
    for (const id of ['evt_1', 'EVT_1', 'evt_1 ']) {
      await models.PaymentEvent.create({ id, type: 't', apiVersion: 'v', isLive: false, objectId: 'o', payload: {} });
    }
    expect(await models.PaymentEvent.count()).toBe(3);
  });

  test('a text that is too long is refused, not cut', async () => {
    await expect(buildUser({ name: 'a'.repeat(81) })).rejects.toThrow();
  });
});

describe('transactions', () => {
  test('a refusal takes back everything that was written inside, nested parts too', async () => {
    await expect(withTransaction(async () => {
      await buildUser();
      await withTransaction(() => buildUser());
      throw new Error('no');
    })).rejects.toThrow('no');
    expect(await User.count()).toBe(0);
  });

  test('three transactions at once stay apart, and code outside is in none', async () => {
    const counts = await Promise.all([1, 2, 3].map((n) => withTransaction(async () => {
      for (let i = 0; i < n; i += 1) await buildUser();
      expect(inTransaction()).toBe(true);
      return User.count({ where: {} });
    })));
    expect(inTransaction()).toBe(false);
    expect(counts).toHaveLength(3);
    expect(await User.count()).toBe(6);
  });

  test('a deadlock is tried again until both are done', async () => {
    const [a, b] = [await buildUser(), await buildUser()];
    const lockBoth = (first: number, second: number): Promise<void> => withTransaction(async () => {
      await sequelize.query('SELECT id FROM users WHERE id = ? FOR UPDATE', { replacements: [first], type: QueryTypes.SELECT });
      await new Promise((resolve) => { setTimeout(resolve, 50); });
      await sequelize.query('UPDATE users SET name = CONCAT(name, ?) WHERE id = ?', { replacements: ['+', second], type: QueryTypes.UPDATE });
    });
    await Promise.all([lockBoth(a.id, b.id), lockBoth(b.id, a.id)]);
    const names = await User.findAll({ order: ['id'] });
    expect(names.map(({ name }) => name.endsWith('+'))).toEqual([true, true]);
  });

  test('what is left for after the commit happens only then, and its failure does not undo the rows', async () => {
    const said: string[] = [];
    const shout = console.error;
    console.error = (...words: unknown[]) => { said.push(words.join(' ')); };
    await withTransaction(async () => {
      await afterCommit(() => { said.push(`after, in transaction: ${String(inTransaction())}`); return Promise.resolve(); });
      await afterCommit(() => Promise.reject(new Error('mail tray full')));
      await buildUser();
      expect(said).toEqual([]);
    });
    console.error = shout;
    expect(said[0]).toContain('after');
    expect(said[1]).toContain('mail tray full');
    expect(await User.count()).toBe(1);
  });

  test('errors of the server carry their number', async () => {
    await sequelize.query('SELECT nothing FROM nowhere').catch((error: unknown) => { expect(errnoOf(error)).toBe(1146); });
    expect.assertions(1);
  });
});

describe('queue', () => {
  test('two workers that claim at once never get the same job', async () => {
    for (let i = 0; i < 20; i += 1) await Job.create({ type: 'x', payload: {}, maxAttempts: 3, runAt: new Date(Date.now() - 1_000) });
    const claims = (await Promise.all(['a', 'b', 'c', 'd'].map((owner) => claimDue('jobs', owner, 5, 60)))).flat();
    expect(new Set(claims.map(({ id }) => id)).size).toBe(claims.length);
    expect(claims.length).toBe(20);
  });

  test('a worker whose lease ran out cannot end the job of the one that took it over', async () => {
    await Job.create({ type: 'x', payload: {}, maxAttempts: 3, runAt: new Date(Date.now() - 1_000) });
    const [first] = await claimDue('jobs', 'slow', 1, 60);
    await sequelize.query("UPDATE jobs SET lease_until = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND");
    const [second] = await claimDue('jobs', 'quick', 1, 60);
    expect(second).toEqual({ id: first?.id, attempts: 2 });
    expect(await finishDone('jobs', 'slow', first?.id ?? 0)).toBe(false);
    expect(await finishDone('jobs', 'quick', second?.id ?? 0)).toBe(true);
  });
});

describe('models', () => {
  const all = Object.values(sequelize.models);

  test.each(all.map((model) => [model.name, model] as const))('%s: fields are declared only, so that none hides a column', (_name, model) => {
    const row = model.build({}, { isNewRecord: true });
    const hidden = Object.keys(model.getAttributes()).filter((attribute) => Object.hasOwn(row, attribute));
    expect(hidden).toEqual([]);
  });

  test.each(all.map((model) => [model.name, model] as const))('%s: has the same columns as its table', async (_name, model) => {
    const table = await sequelize.getQueryInterface().describeTable(String(model.getTableName()));
    const columns = Object.values(model.getAttributes()).map(({ field }) => field);
    expect(columns.toSorted()).toEqual(Object.keys(table).toSorted());
    for (const attribute of Object.values(model.getAttributes())) {
      expect([attribute.field, attribute.allowNull ?? !attribute.primaryKey]).toEqual([attribute.field, table[attribute.field ?? '']?.allowNull]);
    }
  });
});
