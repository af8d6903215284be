/** Brings the database to its newest schema, then ends. */
import { migrate } from '#server/db/migrator.ts';
import { sequelize } from '#server/db/sequelize.ts';

const done = await migrate();
console.log(done.length === 0 ? 'tables are up to date' : `tables changed: ${done.join(', ')}`);
await sequelize.close();
