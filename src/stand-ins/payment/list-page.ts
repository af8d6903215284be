import type Stripe from 'stripe';
import { badParameter } from './api-error.ts';

export interface PageAsked {
  readonly limit?: number | undefined;
  readonly starting_after?: string | undefined;
  readonly ending_before?: string | undefined;
}

const DEFAULT_LIMIT = 10;

/**
 * One page of a list that is newest first. `starting_after` gives what is older than a thing, `ending_before` the ones just
 * newer than it, still newest first.
 */
export function listPage<T extends { readonly id: string }>(all: readonly T[], url: string, asked: PageAsked): Stripe.ApiList<T> {
  const { limit = DEFAULT_LIMIT, starting_after: after, ending_before: before } = asked;
  if (after !== undefined && before !== undefined) {
    throw badParameter('ending_before', 'You cannot parameterize both starting_after and ending_before.');
  }
  if (before !== undefined) {
    const newer = all.slice(0, placeOf(all, before, 'ending_before'));
    return { object: 'list', data: newer.slice(-limit), has_more: newer.length > limit, url };
  }
  const older = after === undefined ? all : all.slice(placeOf(all, after, 'starting_after') + 1);
  return { object: 'list', data: older.slice(0, limit), has_more: older.length > limit, url };
}

function placeOf(all: readonly { readonly id: string }[], id: string, param: string): number {
  const place = all.findIndex((thing) => thing.id === id);
  if (place < 0) throw badParameter(param, `No such object: '${id}'`, 'resource_missing');
  return place;
}

export type Moments = number | { readonly gt?: number | undefined; readonly gte?: number | undefined; readonly lt?: number | undefined; readonly lte?: number | undefined };

export function within(created: number, asked: Moments | undefined): boolean {
  if (asked === undefined) return true;
  if (typeof asked === 'number') return created === asked;
  const { gt = -1, gte = 0, lt = Infinity, lte = Infinity } = asked;
  return created > gt && created >= gte && created < lt && created <= lte;
}
