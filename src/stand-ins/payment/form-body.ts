import { badParameter } from './api-error.ts';

/** A decoded form: texts, lists and groups of them. */
export type FormValue = string | FormValue[] | FormGroup;
export interface FormGroup { [name: string]: FormValue }

const DEEPEST = 8;
const LONGEST_LIST = 200;

/**
 * Decodes `a[b][0][c]=x&list[]=y` as the service does: names in brackets are members, numbers in brackets are places of a
 * list, empty brackets add to a list. Everything is text; `+` and `%20` are spaces.
 */
export function decodeForm(text: string): FormGroup {
  const root: FormGroup = Object.create(null) as FormGroup;
  for (const [name, value] of new URLSearchParams(text)) {
    const path = pathOf(name);
    if (path.length > DEEPEST) throw badParameter(name, `Parameter is nested too deeply: ${name}`);
    put(root, path, value, name);
  }
  return asGroup(tidy(root));
}

function pathOf(name: string): string[] {
  const open = name.indexOf('[');
  if (open < 0) return [name];
  const rest = name.slice(open);
  if (!/^(?:\[[^[\]]*\])+$/.test(rest)) return [name];
  return [name.slice(0, open), ...[...rest.matchAll(/\[([^[\]]*)\]/g)].map((match) => match[1] ?? '')];
}

function put(group: FormGroup, path: readonly string[], value: string, name: string): void {
  const [step = '', ...rest] = path;
  const key = step === '' ? String(Object.keys(group).length) : step;
  const present = group[key];
  if (rest.length === 0) {
    if (typeof present === 'object') throw badParameter(name, `Invalid parameter: ${name} is given as a value and as a group`);
    group[key] = value;
    return;
  }
  if (typeof present === 'string') throw badParameter(name, `Invalid parameter: ${name} is given as a value and as a group`);
  const next = present === undefined || Array.isArray(present) ? (Object.create(null) as FormGroup) : present;
  group[key] = next;
  put(next, rest, value, name);
}

/** Groups whose names are all numbers become lists, in the order of the numbers. */
function tidy(value: FormValue): FormValue {
  if (typeof value === 'string' || Array.isArray(value)) return value;
  const names = Object.keys(value);
  if (names.length > 0 && names.length <= LONGEST_LIST && names.every((name) => /^\d{1,4}$/.test(name))) {
    return names
      .map(Number)
      .sort((a, b) => a - b)
      .map((index) => tidy(value[String(index)] ?? ''));
  }
  for (const name of names) value[name] = tidy(value[name] ?? '');
  return value;
}

function asGroup(value: FormValue): FormGroup {
  return typeof value === 'object' && !Array.isArray(value) ? value : {};
}

/** The same form in one fixed writing, so that two requests can be compared. */
export function canonicalForm(value: FormValue): string {
  if (typeof value === 'string') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(canonicalForm).join(',')}]`;
  const members = Object.keys(value)
    .sort()
    .map((name) => `${JSON.stringify(name)}:${canonicalForm(value[name] ?? '')}`);
  return `{${members.join(',')}}`;
}
