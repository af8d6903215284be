/**
 * The one connection pool of a process. Made lazily in the sense that nothing is read or opened until the first query:
 * the address is asked for by `beforeConnect`, so that a build or a prerendered page needs no database.
 */
import * as mariadb from 'mariadb';
import { Sequelize, type QueryOptions } from 'sequelize';
import { config } from '#server/config.ts';
import { transactionScope } from '#server/db/transaction-scope.ts';

interface RawConnection {
  query(...args: readonly unknown[]): Promise<unknown>;
}

/**
 * The connector marks `meta` on its result rows as undeletable, and Sequelize 6 deletes it.
 * A plain copy with an ordinary `meta` serves both; checked in tests/server/db/driver-contract.test.ts.
 */
function withDeletableMeta(connection: RawConnection): RawConnection {
  const query = connection.query.bind(connection);
  connection.query = async (...args) => {
    const rows = await query(...args);
    return Array.isArray(rows) && 'meta' in rows ? Object.assign([...rows], { meta: rows.meta }) : rows;
  };
  return connection;
}

const dialectModule = {
  ...mariadb,
  createConnection: async (options: mariadb.ConnectionConfig) =>
    withDeletableMeta((await mariadb.createConnection(options)) as unknown as RawConnection),
};

/** Listeners told the text of every statement; tests count statements by them. */
export const statementListeners = new Set<(sql: string) => void>();

function open(): Sequelize {
  Sequelize.useCLS(transactionScope);
  const sequelize = new Sequelize({
    dialect: 'mariadb',
    dialectModule,
    timezone: '+00:00',
    pool: { max: 10, min: 0, acquire: 4_000, idle: 30_000 },
    logging: (sql) => { for (const listener of statementListeners) listener(sql); },
    define: { underscored: true, charset: 'utf8mb4' },
    dialectOptions: {
      // Refuses what the columns cannot hold instead of cutting it off, and never lets a forgotten query hold a row for long.
      initSql: [
        "SET SESSION sql_mode='STRICT_ALL_TABLES,ONLY_FULL_GROUP_BY,NO_ENGINE_SUBSTITUTION', innodb_lock_wait_timeout=5",
        'SET SESSION TRANSACTION ISOLATION LEVEL READ COMMITTED',
      ],
      // Result rows keep their numbers: identifiers stay below 2^53 by column type.
      insertIdAsNumber: true,
      bigIntAsNumber: true,
      checkNumberRange: true,
    },
  });
  sequelize.addHook('beforeConnect', (options) => {
    const { host, port, user, password, name, socket } = config().database;
    const dialectOptions = socket === undefined ? options.dialectOptions : { ...options.dialectOptions, socketPath: socket };
    Object.assign(options, { host, port, username: user, password, database: name, dialectOptions });
  });
  const ask = sequelize.query.bind(sequelize) as (sql: unknown, options?: QueryOptions) => unknown;
  sequelize.query = ((sql: unknown, options?: QueryOptions) => ask(sql, withTimesInUtc(options))) as typeof sequelize.query;
  return sequelize;
}

/** The library writes a time among the replacements in the zone of the process, whatever zone it is told; columns hold UTC. */
function withTimesInUtc(options: QueryOptions | undefined): QueryOptions | undefined {
  const replacements: unknown = options?.replacements;
  if (typeof replacements !== 'object' || replacements === null) return options;
  const inUtc = (value: unknown): unknown => (value instanceof Date ? value.toISOString().replace('T', ' ').replace('Z', '') : value);
  return {
    ...options,
    replacements: Array.isArray(replacements) ? replacements.map(inUtc) : Object.fromEntries(Object.entries(replacements).map(([name, value]) => [name, inUtc(value)])),
  };
}

// The development server loads server modules anew after an edit; the pool must survive that.
const KEY = Symbol.for('fellmark.sequelize');
const shared = globalThis as { [KEY]?: Sequelize | undefined };
export const sequelize: Sequelize = (shared[KEY] ??= open());
