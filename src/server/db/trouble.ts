/** Whether an error means that the database is away, rather than that something was wrong with what it was asked. */
import { BaseError, ConnectionError, DatabaseError } from 'sequelize';

/** As this driver reports lost connections: not by Sequelize's own classes but by the code below them. */
const AWAY = new Set(['ECONNRESET', 'ECONNREFUSED', 'EPIPE', 'ENOENT', 'ER_CMD_CONNECTION_CLOSED', 'ER_SOCKET_UNEXPECTED_CLOSE', 'ER_CONNECTION_TIMEOUT', 'ER_SERVER_SHUTDOWN']);

export function databaseIsAway(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  if (error instanceof DatabaseError) {
    const { code } = error.parent as { code?: unknown };
    return typeof code === 'string' && AWAY.has(code);
  }
  return error instanceof BaseError && error.name === 'SequelizeConnectionAcquireTimeoutError';
}
