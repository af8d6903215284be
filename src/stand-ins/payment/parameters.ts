import { z } from 'astro/zod';
import { badParameter, type ApiError } from './api-error.ts';
import type { FormGroup } from './form-body.ts';

/**
 * Reads a request's parameters by a schema and refuses as the service does: unknown, missing and unreadable ones each have
 * their code, and the parameter is named in its bracketed form.
 */
export function readParameters<T>(form: FormGroup, schema: z.ZodType<T, z.ZodTypeDef, unknown>): T {
  const parsed = schema.safeParse(form);
  if (parsed.success) return parsed.data;
  throw errorFor(parsed.error);
}

/** `line_items[0][price_data][currency]` */
function bracketed(path: readonly (string | number)[]): string {
  const [first = '', ...rest] = path;
  return String(first) + rest.map((step) => `[${step}]`).join('');
}

function errorFor(error: z.ZodError): ApiError {
  const unknown = error.issues.find((issue) => issue.code === 'unrecognized_keys');
  if (unknown !== undefined) {
    const param = bracketed([...unknown.path, unknown.keys[0] ?? '']);
    return badParameter(param, `Received unknown parameter: ${param}`, 'parameter_unknown');
  }
  const issue = error.issues[0];
  const param = bracketed(issue?.path ?? []);
  if (issue?.code === 'invalid_type' && issue.received === 'undefined') return badParameter(param, `Missing required param: ${param}.`, 'parameter_missing');
  if (issue?.code === 'invalid_enum_value') return badParameter(param, `Invalid ${param}: must be one of ${issue.options.join(', ')}`);
  if (issue?.code === 'too_small' && issue.type === 'string') {
    const message = `You passed an empty string for '${param}'. We assume empty values are an attempt to unset a parameter; however '${param}' cannot be unset.`;
    return badParameter(param, message, 'parameter_invalid_empty');
  }
  if (issue?.code === 'custom' && typeof issue.params?.['code'] === 'string') return badParameter(param, issue.message, issue.params['code']);
  return badParameter(param, issue === undefined ? 'Invalid request' : `Invalid ${param}: ${issue.message}`);
}

function refusal(message: string, code: string): { message: string; params: { code: string } } {
  return { message, params: { code } };
}

export function text(longest = 5000): z.ZodString {
  return z.string().min(1).max(longest);
}

/** A whole number within bounds, both included. */
export function whole(least: number, most: number) {
  return z
    .string()
    .refine((value) => /^-?\d{1,15}$/.test(value), refusal('Invalid integer', 'parameter_invalid_integer'))
    .transform(Number)
    .refine((value) => value >= least, refusal(`This value must be greater than or equal to ${least}.`, 'parameter_invalid_integer'))
    .refine((value) => value <= most, refusal(`This value must be less than or equal to ${most}.`, 'parameter_invalid_integer'));
}

export const truth = z.enum(['true', 'false']).transform((word) => word === 'true');

/** Only the value the stand-in can honour; the other one would be a promise it breaks. */
export const neverTrue = truth.refine((value) => !value, refusal('The stand-in does not do this', 'parameter_not_supported'));

export function webAddress() {
  return text(5000).refine((value) => /^https?:\/\/\S+$/.test(value) && URL.canParse(value), refusal('Not a valid URL', 'url_invalid'));
}

export const mailAddress = text(800).refine((value) => /^[^\s@<>,;]+@[^\s@<>,;]+\.[^\s@<>,;]+$/.test(value), refusal('Invalid email address', 'email_invalid'));

const MOST_KEYS = 50;
const LONGEST_KEY = 40;
const LONGEST_VALUE = 500;

/** Keys and texts; a key with an empty text is left out, and empty metadata is none. */
export const metadata = z.preprocess(
  (value) => (value === '' ? {} : value),
  z
    .record(z.string())
    .refine((all) => Object.keys(all).length <= MOST_KEYS, refusal(`You can have up to ${MOST_KEYS} metadata keys`, 'metadata_keys'))
    .refine((all) => Object.keys(all).every((key) => key.length <= LONGEST_KEY && !/[[\]]/.test(key)), refusal(`Metadata keys can be up to ${LONGEST_KEY} characters long`, 'metadata_key_length'))
    .refine((all) => Object.values(all).every((value) => value.length <= LONGEST_VALUE), refusal(`Metadata values must have up to ${LONGEST_VALUE} characters`, 'metadata_value_length'))
    .transform((all) => Object.fromEntries(Object.entries(all).filter(([, value]) => value !== ''))),
);

/** Members every request may have. */
export const expandable = { expand: z.array(text(200)).max(20).optional() };

/** `created` of lists: one moment, or bounds of a range. */
export const moment = whole(0, 99_999_999_999);
export const momentRange = z.union([moment, z.object({ gt: moment.optional(), gte: moment.optional(), lt: moment.optional(), lte: moment.optional() }).strict()]);

export const paging = {
  ...expandable,
  limit: whole(1, 100).optional(),
  starting_after: text(255).optional(),
  ending_before: text(255).optional(),
};
