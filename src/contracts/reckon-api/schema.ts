/** Words for JSON Schema 2020-12, as OpenAPI 3.1 takes it: closed objects, numbers with their limits, a sentence for each. */

export type Schema = Readonly<Record<string, unknown>>;

interface Limits {
  readonly min?: number;
  readonly max?: number;
  /** Greater than this. */
  readonly above?: number;
  /** Less than this. */
  readonly below?: number;
}

const limits = ({ min, max, above, below }: Limits): Schema => ({
  ...(min === undefined ? {} : { minimum: min }),
  ...(above === undefined ? {} : { exclusiveMinimum: above }),
  ...(max === undefined ? {} : { maximum: max }),
  ...(below === undefined ? {} : { exclusiveMaximum: below }),
});

export const number = (description: string, within: Limits = {}): Schema => ({ type: 'number', description, ...limits(within) });
export const whole = (description: string, within: Limits = {}): Schema => ({ type: 'integer', description, ...limits(within) });
export const text = (description: string, more: Schema = {}): Schema => ({ type: 'string', description, ...more });
export const flag = (description: string): Schema => ({ type: 'boolean', description });
export const choice = (description: string, ...values: readonly string[]): Schema => ({ enum: values, description });
export const list = (description: string, items: Schema, more: Schema = {}): Schema => ({ type: 'array', description, items, ...more });
export const ref = (name: string): Schema => ({ $ref: `#/components/schemas/${name}` });

/** An object that has its own keys and no others; all are required but those named in `optional`. */
export function closed(description: string, properties: Readonly<Record<string, Schema>>, optional: readonly string[] = [], more: Schema = {}): Schema {
  return {
    type: 'object',
    description,
    properties,
    required: Object.keys(properties).filter((key) => !optional.includes(key)),
    additionalProperties: false,
    ...more,
  };
}

export const LONGEST_MM = 20_000;
/** A length somebody gives. */
export const lengthMm = (description: string, max = LONGEST_MM): Schema => number(description, { above: 0, max });
/** A length that is answered. */
export const mm = (description: string): Schema => number(description, { min: 0 });
/** A number of things that is answered. */
export const count = (description: string): Schema => whole(description, { min: 0 });
export const role = (description: string): Schema => text(description, { minLength: 1, maxLength: 40 });
/** How lessons call a part of the piece. */
export const partName = (description: string): Schema => text(description, { pattern: '^[a-z0-9-]{1,40}$' });

/** Yarns or cords by their role. */
export const byRole = (value: Schema, more: Schema = {}): Schema => ({
  type: 'object', description: 'By role.', propertyNames: { pattern: '^[A-Za-z][A-Za-z0-9-]{0,39}$' }, additionalProperties: value, ...more,
});

/** One of several schemas, told apart by what stands under `key`. */
export const toldBy = (key: string, names: Readonly<Record<string, string>>): Schema => ({
  oneOf: Object.values(names).map(ref),
  discriminator: { propertyName: key, mapping: Object.fromEntries(Object.entries(names).map(([value, name]) => [value, `#/components/schemas/${name}`])) },
});

/** Exactly one of these groups of keys is there. */
export const exactlyOne = (...groups: readonly (readonly string[])[]): Schema => ({ oneOf: groups.map((required) => ({ required })) });
