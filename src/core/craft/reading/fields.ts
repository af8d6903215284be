/**
 * Reading an object a person sent, key by key. Nothing is coerced: text that looks
 * like a number, a boolean or a null is refused. A key that is not asked for is refused
 * as well, so a misspelt setting cannot silently do nothing.
 *
 * Readers always answer a value of the right type; where the input was wrong it is only
 * a stand-in, and `Findings.soundly` tells the two apart.
 */
import { below, type ErrorCode, type Findings } from '#core/craft/reading/findings.ts';

/** What a number may be, and what it is called in messages. */
export interface NumberRule {
  /** As in `Width is missing.` */
  readonly name: string;
  /** Least and greatest value that works. A `min` of `'over-zero'` takes everything above 0. */
  readonly min: number | 'over-zero';
  readonly max: number;
  /** The greatest value itself does not work any more. */
  readonly maxIsOut?: true;
  readonly unit?: 'mm' | 'share' | 'g' | 'm' | 'tex';
  readonly whole?: true;
}

export interface TextRule {
  readonly name: string;
  readonly maxLength: number;
}

type JsonRecord = Readonly<Record<string, unknown>>;

function isRecord(value: unknown): value is JsonRecord {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function describeLimit(value: number, rule: NumberRule, findings: Findings, round: 'up' | 'down'): string {
  if (rule.unit === 'mm') return findings.length(value, value === 0 ? 'nearest' : round);
  if (rule.unit === 'share') return `${String(value * 100)} %`;
  return rule.unit === undefined ? String(value) : `${String(value)} ${rule.unit}`;
}

function rangeMessage(rule: NumberRule, findings: Findings): string {
  const max = describeLimit(rule.max, rule, findings, 'down');
  if (rule.min === 'over-zero') return `${rule.name}: anything above 0, up to ${max}, works.`;
  const min = describeLimit(rule.min, rule, findings, 'up');
  return rule.maxIsOut === true ? `${rule.name}: from ${min} to less than ${max} works.` : `${rule.name}: between ${min} and ${max} works.`;
}

function isInRange(value: number, { min, max, maxIsOut }: NumberRule): boolean {
  const isOverMin = min === 'over-zero' ? value > 0 : value >= min;
  return isOverMin && (maxIsOut === true ? value < max : value <= max);
}

/** The number at a path, or 0 after a problem has been reported. */
export function checkNumber(value: unknown, path: string, rule: NumberRule, findings: Findings): number {
  if (value === undefined) {
    findings.reject('E_NUM', path, `${rule.name} is missing. Give it as a number.`);
  } else if (typeof value !== 'number' || !Number.isFinite(value)) {
    findings.reject('E_NUM', path, `${rule.name} is not a number. Give it as a plain number, such as 12.5.`);
  } else if (!isInRange(value, rule)) {
    findings.reject('E_RANGE', path, rangeMessage(rule, findings));
  } else if (rule.whole === true && !Number.isInteger(value)) {
    findings.reject('E_COUNT', path, `${rule.name} must be a whole number.`);
  } else {
    return value === 0 ? 0 : value;
  }
  return 0;
}

export class Fields {
  readonly #record: JsonRecord;
  readonly #asked = new Set<string>();
  /** Set when the object itself was refused: its keys are then not complained about. */
  readonly #refused: boolean;

  private constructor(
    record: JsonRecord | undefined,
    readonly path: string,
    readonly findings: Findings,
  ) {
    this.#record = record ?? {};
    this.#refused = record === undefined;
  }

  /** `name` says what is expected, as in `Loom is missing.` */
  static of(value: unknown, path: string, name: string, findings: Findings): Fields {
    if (isRecord(value)) return new Fields(value, path, findings);
    const message = value === undefined ? `${name} is missing.` : `${name} must be a group of named values.`;
    findings.reject('E_ENUM', path, message);
    return new Fields(undefined, path, findings);
  }

  /** Whether the key was given at all. */
  has(key: string): boolean {
    return Object.hasOwn(this.#record, key) && this.#record[key] !== undefined;
  }

  /** The raw value, to be checked by the caller. */
  take(key: string): unknown {
    this.#asked.add(key);
    return this.has(key) ? this.#record[key] : undefined;
  }

  pathOf(key: string): string {
    return below(this.path, key);
  }

  /** Refuses the value of a key, unless the whole object was refused already. */
  reject(code: ErrorCode, key: string, message: string): void {
    if (!this.#refused) this.findings.reject(code, this.pathOf(key), message);
  }

  /** Refuses the object itself. */
  rejectWhole(code: ErrorCode, message: string): void {
    if (!this.#refused) this.findings.reject(code, this.path, message);
  }

  number(key: string, rule: NumberRule): number {
    const value = this.take(key);
    return this.#refused ? 0 : checkNumber(value, this.pathOf(key), rule, this.findings);
  }

  optionalNumber(key: string, rule: NumberRule): number | undefined {
    const value = this.take(key);
    return value === undefined ? undefined : checkNumber(value, this.pathOf(key), rule, this.findings);
  }

  choice<const T extends string>(key: string, name: string, options: readonly [T, ...T[]]): T {
    const value = this.take(key);
    const found = options.find((option) => option === value);
    if (found !== undefined) return found;
    const what = value === undefined ? `${name} is missing.` : `${name} is not one we know.`;
    this.reject('E_ENUM', key, `${what} One of these works: ${options.join(', ')}.`);
    return options[0];
  }

  optionalChoice<const T extends string>(key: string, name: string, options: readonly [T, ...T[]]): T | undefined {
    return this.take(key) === undefined ? undefined : this.choice(key, name, options);
  }

  optionalFlag(key: string, name: string): boolean | undefined {
    return this.take(key) === undefined ? undefined : this.flag(key, name);
  }

  flag(key: string, name: string): boolean {
    const value = this.take(key);
    if (typeof value === 'boolean') return value;
    this.reject('E_ENUM', key, `${name} is either true or false.`);
    return false;
  }

  text(key: string, { name, maxLength }: TextRule): string {
    const value = this.take(key);
    if (typeof value !== 'string' || value === '') {
      this.reject('E_ENUM', key, `${name} is missing. Give it as text.`);
      return '';
    }
    if (value.length > maxLength) this.reject('E_RANGE', key, `${name} may be ${String(maxLength)} characters long at most.`);
    return value;
  }

  optionalText(key: string, rule: TextRule): string | undefined {
    return this.take(key) === undefined ? undefined : this.text(key, rule);
  }

  group(key: string, name: string): Fields {
    const value = this.take(key);
    if (this.#refused) return new Fields(undefined, this.pathOf(key), this.findings);
    return Fields.of(value, this.pathOf(key), name, this.findings);
  }

  optionalGroup(key: string, name: string): Fields | undefined {
    return this.take(key) === undefined ? undefined : this.group(key, name);
  }

  /** A list of at least one and at most `max` things; a longer one is refused unread. */
  list(key: string, name: string, max: number): readonly unknown[] {
    const value = this.take(key);
    if (!Array.isArray(value) || value.length === 0) {
      this.reject('E_ENUM', key, `${name}: at least one is needed, as a list.`);
      return [];
    }
    if (value.length > max) {
      this.reject('E_RANGE', key, `${name}: ${String(value.length)} are too many. Up to ${String(max)} work.`);
      return [];
    }
    return value;
  }

  /** Every key with its value, all of them taken as asked for. */
  entries(): readonly (readonly [string, unknown])[] {
    const entries = Object.entries(this.#record);
    for (const [key] of entries) this.#asked.add(key);
    return entries;
  }

  /** Refuses every key nobody asked for. Call it when the last one has been read. */
  end(): void {
    for (const key of Object.keys(this.#record)) {
      if (this.#asked.has(key)) continue;
      this.reject('E_ENUM', key, `“${key.slice(0, 40)}” is not known here. Known are: ${[...this.#asked].join(', ')}.`);
    }
  }
}
