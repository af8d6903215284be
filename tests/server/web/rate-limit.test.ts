import { describe, expect, test } from 'vitest';
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { countUse, forgetOldCounters, forgetUses, networkOf, noteUse, takeBackUse } from '#server/web/rate-limit.ts';

const rule = { name: 'a costly thing', limit: 3, windowSeconds: 60 };
const times = async (count: number, who = 'maud'): Promise<void> => {
  for (let n = 0; n < count; n += 1) await countUse(rule, who);
};

describe('a costly thing', () => {
  test('may be done so often, then is refused with the seconds to wait', async () => {
    await times(3);
    await expect(countUse(rule, 'maud')).rejects.toMatchObject({ code: 'RATE_LIMITED', retryAfterSeconds: expect.toSatisfy((seconds: number) => seconds > 0 && seconds <= 60) });
    await expect(countUse(rule, 'jonas')).resolves.toBeUndefined();
  });

  test('may be done exactly so often when many ask at once', async () => {
    const answers = await Promise.allSettled(Array.from({ length: 20 }, () => countUse(rule, 'maud')));
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(3);
  });

  test('may be done again when the time is over', async () => {
    await times(3);
    await sequelize.query('UPDATE rate_windows SET ends_at = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND', { type: QueryTypes.UPDATE });
    expect(await noteUse(rule, 'maud')).toMatchObject({ within: true, count: 1 });
  });

  test('that turned out harmless is taken back, or all of them are forgotten', async () => {
    await times(3);
    await takeBackUse(rule, 'maud');
    expect(await noteUse(rule, 'maud')).toMatchObject({ within: true, count: 3 });
    await forgetUses(rule, 'maud');
    expect(await noteUse(rule, 'maud')).toMatchObject({ count: 1 });
    for (let n = 0; n < 3; n += 1) await takeBackUse(rule, 'maud');
    expect(await noteUse(rule, 'maud')).toMatchObject({ count: 1 });
  });

  test('is kept without the name of who did it, and not for ever', async () => {
    await times(1, 'maud@weavers.example');
    const [row] = await sequelize.query<{ id: string }>('SELECT id FROM rate_windows', { type: QueryTypes.SELECT });
    expect(row?.id).not.toContain('maud');
    await sequelize.query('UPDATE rate_windows SET ends_at = UTC_TIMESTAMP(3) - INTERVAL 2 DAY', { type: QueryTypes.UPDATE });
    await forgetOldCounters();
    expect(await sequelize.query('SELECT id FROM rate_windows', { type: QueryTypes.SELECT })).toEqual([]);
  });
});

test.each([
  ['203.0.113.7', '203.0.113'],
  ['::ffff:203.0.113.7', '203.0.113'],
  ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2'],
])('the network of %s is %s', (ip, network) => {
  expect(networkOf(ip)).toBe(network);
});

test('two addresses of one household are one network, written short or long', () => {
  expect(networkOf('2001:db8::1')).toBe(networkOf('2001:db8:0:0:9:9:9:9'));
  expect(networkOf('2001:db8::1')).not.toBe(networkOf('2001:db8:1::1'));
  expect(networkOf('::1')).toBe(networkOf('0:0:0:0:0:0:0:1'));
});
