/** Brings the schema to its newest state, one runner at a time. */
import { QueryTypes, type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { migrations } from '#server/db/migrations/index.ts';
import { sequelize } from '#server/db/sequelize.ts';

const LOCK_NAME = 'fellmark-migrate';
const LOCK_SECONDS = 60;

function umzugOver(database: Sequelize): Umzug<Sequelize> {
  return new Umzug({
    migrations: migrations.map(({ name, statements }) => ({
      name,
      up: async () => { for (const statement of statements) await database.query(statement); },
    })),
    context: database,
    storage: new SequelizeStorage({ sequelize: database, tableName: 'schema_steps' }),
    logger: undefined,
  });
}

/**
 * Runs every step that has not run yet and returns their names.
 * The transaction only keeps one connection for all of it, so that the lock and the steps share it
 * (table changes commit by themselves); a second runner waits, then finds nothing to do.
 */
export async function migrate(): Promise<string[]> {
  return sequelize.transaction(async (transaction) => {
    const [lock] = await sequelize.query<{ got: number | null }>('SELECT GET_LOCK(?, ?) AS got', { replacements: [LOCK_NAME, LOCK_SECONDS], transaction, type: QueryTypes.SELECT });
    if (lock?.got !== 1) throw new Error('Another process is changing the tables and did not finish within a minute.');
    try {
      const done = await umzugOver(sequelize).up();
      return done.map(({ name }) => name);
    } finally {
      await sequelize.query('SELECT RELEASE_LOCK(?)', { replacements: [LOCK_NAME], transaction, type: QueryTypes.SELECT });
    }
  });
}

/** Names of the steps still to run. */
export async function pendingMigrations(): Promise<string[]> {
  return (await umzugOver(sequelize).pending()).map(({ name }) => name);
}
