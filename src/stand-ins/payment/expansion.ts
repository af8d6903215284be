import { badParameter } from './api-error.ts';

/** What of each kind of thing may be asked for whole instead of by its id. */
const EXPANDABLE: Readonly<Record<string, readonly string[]>> = {
  'checkout.session': ['payment_intent', 'line_items'],
  payment_intent: ['latest_charge'],
  charge: ['payment_intent', 'balance_transaction', 'refunds'],
  refund: ['charge', 'payment_intent', 'balance_transaction', 'failure_balance_transaction'],
  balance_transaction: ['source'],
};

const DEEPEST = 4;

export interface ThingFinder {
  /** The thing an id names, by its prefix. */
  byId(id: string): object | undefined;
  /** A list that belongs to a thing and is left out unless asked for. */
  listOf(kind: string, id: string, field: string): object | undefined;
}

type Group = Record<string, unknown>;

/** A copy of `thing` in which each path of `asked` (`payment_intent.latest_charge`, `data.line_items`) is shown whole. */
export function expanded(thing: object, asked: readonly string[] | undefined, find: ThingFinder): object {
  if (asked === undefined || asked.length === 0) return thing;
  const copy: Group = structuredClone({ ...thing });
  for (const [index, path] of asked.entries()) {
    const steps = path.split('.');
    const deepest = steps[0] === 'data' ? DEEPEST + 1 : DEEPEST;
    if (steps.length > deepest) throw badParameter(`expand[${index}]`, `You cannot expand more than ${DEEPEST} levels of a property: ${path}`);
    expandPath(copy, steps, path, find);
  }
  return copy;
}

function expandPath(group: Group, [step = '', ...rest]: readonly string[], path: string, find: ThingFinder): void {
  if (step === 'data' && group['object'] === 'list' && Array.isArray(group['data'])) {
    if (rest.length === 0) throw notExpandable(path);
    for (const member of group['data'].filter(isGroup)) expandPath(member, rest, path, find);
    return;
  }
  const kind = String(group['object']);
  if (!EXPANDABLE[kind]?.includes(step)) throw notExpandable(path);
  const value = group[step];
  if (value === undefined) {
    const list = find.listOf(kind, String(group['id']), step);
    if (list) group[step] = structuredClone({ ...list });
  } else if (typeof value === 'string') {
    const whole = find.byId(value);
    if (whole) group[step] = structuredClone({ ...whole });
  }
  const next = group[step];
  if (rest.length > 0 && isGroup(next)) expandPath(next, rest, path, find);
}

function isGroup(value: unknown): value is Group {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function notExpandable(path: string): Error {
  return badParameter('expand', `This property cannot be expanded (${path}).`);
}
