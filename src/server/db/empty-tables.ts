/** Takes every row out of every table: for tests between each other, and for a demo world that was cut off. */
import { sequelize } from '#server/db/sequelize.ts';
import { withTransaction } from '#server/db/transaction.ts';

export async function emptyAllTables(): Promise<void> {
  const tables = Object.values(sequelize.models).map((model) => model.tableName);
  await withTransaction(async () => {
    await sequelize.query('SET FOREIGN_KEY_CHECKS = 0');
    for (const table of new Set([...tables, 'rate_windows'])) if (table !== 'schema_steps') await sequelize.query(`DELETE FROM ${table}`);
    await sequelize.query('UPDATE receipt_counters SET last_number = 0');
    await sequelize.query('SET FOREIGN_KEY_CHECKS = 1');
  });
}
