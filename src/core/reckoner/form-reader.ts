/** Reading what was typed, field by field. Errors are kept by field, the first one of each. */
import type { FieldErrors } from '#core/reckoner/answer-line.ts';
import { lengthUnit, weightUnit, type LengthField, type WeightField } from '#core/reckoner/measured-fields.ts';
import { unitsOf, type ReckonerField, type ReckonerForm } from '#core/reckoner/reckoner-form.ts';
import { parseLength } from '#core/units/parse-length.ts';
import { parseMass } from '#core/units/parse-mass.ts';
import type { Units } from '#core/units/units.ts';

export class FormReader {
  readonly errors: FieldErrors = {};
  readonly units: Units;

  constructor(readonly form: ReckonerForm) {
    this.units = unitsOf(form);
  }

  /** Keeps what is wrong with a field: the first thing found. */
  refuse(field: ReckonerField, says: string): void {
    this.errors[field] ??= says;
  }

  isSound(...fields: readonly ReckonerField[]): boolean {
    return fields.every((field) => this.errors[field] === undefined);
  }

  text(field: ReckonerField): string {
    return this.form[field].trim();
  }

  isEmpty(field: ReckonerField): boolean {
    return this.text(field) === '';
  }

  /** A length in mm; undefined if it cannot be read, and then the field says why. */
  length(field: LengthField, name: string): number | undefined {
    const unit = lengthUnit(field, this.units);
    const parsed = parseLength(this.form[field], unit);
    if (parsed.ok) return parsed.mm;
    this.refuse(field, this.isEmpty(field) ? `${name} is missing. Type it in ${unit}.` : parsed.reason);
    return undefined;
  }

  optionalLength(field: LengthField, name: string): number | undefined {
    return this.isEmpty(field) ? undefined : this.length(field, name);
  }

  /** A weight in grams. */
  weight(field: WeightField, name: string): number | undefined {
    const unit = weightUnit(field, this.units);
    const parsed = parseMass(this.form[field], unit);
    if (parsed.ok) return parsed.grams;
    this.refuse(field, this.isEmpty(field) ? `${name} is missing. Type it in ${unit}.` : parsed.reason);
    return undefined;
  }

  /** A plain number; comma and point are both decimal marks. */
  number(field: ReckonerField, name: string): number | undefined {
    const typed = this.text(field);
    if (/^\d{1,9}(?:[.,]\d{1,9})?$/u.test(typed)) return Number(typed.replace(',', '.'));
    this.refuse(field, typed === '' ? `${name} is missing. Type a number.` : `${name} is not a number. Type it like 12 or 12.5.`);
    return undefined;
  }

  optionalNumber(field: ReckonerField, name: string): number | undefined {
    return this.isEmpty(field) ? undefined : this.number(field, name);
  }

  choice<const T extends string>(field: ReckonerField, options: readonly [T, ...T[]]): T {
    return options.find((option) => option === this.form[field]) ?? options[0];
  }
}
