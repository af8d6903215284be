/**
 * Forms that work without JavaScript: what was typed comes back with a sentence at each field that does not work yet.
 * Astro's actions carry these answers; nothing here knows Astro.
 */
import type { z } from 'astro/zod';
import { AppError, type ErrorCode } from '#server/errors.ts';

export type TypedValues = Readonly<Record<string, string | readonly string[]>>;

export type FormAnswer =
  /** Done: go to `to`, where `said` is shown once. */
  | { readonly ok: true; readonly to: string; readonly said?: string }
  /** Not yet: `fields` by name, `summary` for what belongs to no field, `values` as they were typed, `status` of the page drawn again. */
  | { readonly ok: false; readonly status: number; readonly retryAfterSeconds?: number; readonly summary: string; readonly fields: Readonly<Record<string, string>>; readonly values: TypedValues }
  /** No change of the form would cure it. */
  | { readonly ok: 'refused'; readonly code: ErrorCode; readonly says: string };

/** Names whose values never come back to a page. */
const SECRET = /password|secret|token|code$/i;

/** Text fields of a form as typed; a name ending in `[]`, or one that occurs more than once, becomes a list. Files are left out. */
export function typedValues(form: FormData): Record<string, string | string[]> {
  const values: Record<string, string | string[]> = {};
  for (const name of new Set(form.keys())) {
    const texts = form.getAll(name).filter((value): value is string => typeof value === 'string');
    if (name.endsWith('[]')) values[name.slice(0, -2)] = texts;
    else if (texts.length === 1 && texts[0] !== undefined) values[name] = texts[0];
    else if (texts.length > 1) values[name] = texts;
  }
  return values;
}

/** The first sentence for each field of a failed parse, by dotted path. */
export function fieldSentences(error: z.ZodError): Record<string, string> {
  const fields: Record<string, string> = {};
  for (const issue of error.issues) {
    const name = issue.path.join('.');
    fields[name] ??= issue.message;
  }
  return fields;
}

/**
 * Parses a form by `schema`, hands it to `work`, and turns refusals into an answer that keeps what was typed.
 * Errors that no change of the form would cure (not found, forbidden) become `refused`; bugs pass through.
 */
export async function answerForm<T>(schema: z.ZodType<T, z.ZodTypeDef, unknown>, form: FormData, work: (input: T) => Promise<{ to: string; said?: string }>): Promise<FormAnswer> {
  const typed = typedValues(form);
  const values = Object.fromEntries(Object.entries(typed).filter(([name]) => !SECRET.test(name)));
  const parsed = schema.safeParse(typed);
  if (!parsed.success) return { ok: false, status: 422, summary: '', fields: fieldSentences(parsed.error), values };
  try {
    return { ok: true, ...(await work(parsed.data)) };
  } catch (error) {
    if (!(error instanceof AppError) || error.code === 'BUG') throw error;
    if (!FORM_CODES.has(error.code)) return { ok: 'refused', code: error.code, says: error.says };
    const hasFields = Object.keys(error.fields).length > 0;
    const { status, fields, retryAfterSeconds } = error;
    return { ok: false, status, ...(retryAfterSeconds === undefined ? {} : { retryAfterSeconds }), summary: hasFields ? '' : error.says, fields, values };
  }
}

/** The answer for a button that saves nothing: the page is drawn again with everything that stood in the form. */
export function drawnAgain(form: FormData): FormAnswer {
  return { ok: false, status: 200, summary: '', fields: {}, values: typedValues(form) };
}

const FORM_CODES: ReadonlySet<string> = new Set(['VALIDATION', 'CONFLICT', 'GONE', 'RATE_LIMITED', 'UPSTREAM', 'UNAVAILABLE', 'TOO_LARGE', 'PAYMENT_REQUIRED']);

export interface FormState {
  readonly summary: string;
  /** The sentences in order, for the list on top; empty before the form was sent. */
  readonly problems: readonly { readonly field: string; readonly says: string }[];
  /** What was typed, else `otherwise`. */
  value(name: string, otherwise?: string): string;
  values(name: string, otherwise?: readonly string[]): readonly string[];
  error(name: string): string | undefined;
  /** Whether `name` is the first field that does not work: it takes the focus, without script. */
  isFirst(name: string): boolean;
}

/** What a page needs to draw a form again: `data` is the answer of its action, or undefined when it was not sent. */
export function formState(data: FormAnswer | undefined): FormState {
  const failed = data?.ok === false ? data : undefined;
  return {
    summary: failed?.summary ?? '',
    problems: Object.entries(failed?.fields ?? {}).map(([field, says]) => ({ field, says })),
    value: (name, otherwise = '') => {
      const value = failed?.values[name];
      return failed === undefined || value === undefined ? otherwise : typeof value === 'string' ? value : (value[0] ?? '');
    },
    values: (name, otherwise = []) => {
      if (failed === undefined) return otherwise;
      const value = failed.values[name];
      return value === undefined ? [] : typeof value === 'string' ? [value] : value;
    },
    error: (name) => failed?.fields[name],
    isFirst: (name) => Object.keys(failed?.fields ?? {})[0] === name,
  };
}
