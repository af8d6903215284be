import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, json, maybeMoment, maybeText, moment, oneOf, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';

/** Work to do outside a request. Claimed by raw SQL in jobs/queue.ts. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: CreationOptional<number>;
  declare type: string;
  declare payload: unknown;
  declare maxAttempts: number;
  declare uniqueKey: CreationOptional<string | null>;
  declare state: CreationOptional<'ready' | 'done' | 'dead'>;
  declare runAt: Date;
  declare attempts: CreationOptional<number>;
  declare leaseOwner: CreationOptional<string | null>;
  declare leaseUntil: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Job.init({
  id: id(),
  type: text(60),
  payload: json(),
  maxAttempts: count(),
  uniqueKey: maybeText(190),
  state: oneOf(['ready', 'done', 'dead'], 'ready'),
  runAt: moment(),
  attempts: count(),
  leaseOwner: maybeText(64),
  leaseUntil: maybeMoment(),
  lastError: maybeText(500),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'jobs' });
