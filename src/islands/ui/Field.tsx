import type { ComponentProps, ReactNode } from 'react';
import { describedBy, fieldId } from '#islands/ui/field-id.ts';
import { Wrong } from '#islands/ui/Wrong.tsx';

interface FieldWords {
  name: string;
  label: ReactNode;
  hint?: string | undefined;
  /** What is wrong and what works. */
  error?: string | undefined;
  optional?: boolean | undefined;
  /** Begins the ids, where two forms on a page have fields of one name. */
  form?: string | undefined;
}

interface FieldProps extends FieldWords, Omit<ComponentProps<'input'>, 'name' | 'form'> {
  /** Shown in the box after a rule. */
  unit?: string | undefined;
  /** A button in the box, class `in-box`. */
  inBox?: ReactNode;
}

/** Label, hint, box, and what is wrong below. Other properties go to the input, `ref` and those of a form library too. */
export function Field({ name, label, hint, error, optional, form, unit, inBox, className, ...input }: FieldProps) {
  const id = fieldId(name, form);
  return (
    <FieldFrame {...{ id, label, hint, error, optional, className }}>
      <input type="text" {...input} id={id} name={name} aria-invalid={error !== undefined || undefined} aria-describedby={describedBy(id, hint, error)} />
      {unit !== undefined && <span className="unit">{unit}</span>}
      {inBox}
    </FieldFrame>
  );
}

/** A length, mass or count in its unit. Takes text, so that `12,5` and `4 7/8` can be typed; who uses it reads the text. */
export function UnitField(props: FieldProps & { unit: string }) {
  return <Field inputMode="decimal" autoComplete="off" {...props} />;
}

/** A longer text. */
export function TextField({ name, label, hint, error, optional, form, className, ...area }: FieldWords & Omit<ComponentProps<'textarea'>, 'name' | 'form'>) {
  const id = fieldId(name, form);
  return (
    <FieldFrame {...{ id, label, hint, error, optional, className }}>
      <textarea rows={3} {...area} id={id} name={name} aria-invalid={error !== undefined || undefined} aria-describedby={describedBy(id, hint, error)} />
    </FieldFrame>
  );
}

interface SelectProps extends FieldWords, Omit<ComponentProps<'select'>, 'name' | 'form' | 'children'> {
  options: readonly { value: string; label: string; off?: boolean | undefined }[];
}

/** One of several. More than 15 options: use Combo. */
export function Select({ name, label, hint, error, optional, form, options, className, ...select }: SelectProps) {
  const id = fieldId(name, form);
  return (
    <FieldFrame {...{ id, label, hint, error, optional, className }}>
      <select {...select} id={id} name={name} aria-invalid={error !== undefined || undefined} aria-describedby={describedBy(id, hint, error)}>
        {options.map((option) => <option key={option.value} value={option.value} disabled={option.off}>{option.label}</option>)}
      </select>
    </FieldFrame>
  );
}

interface FrameProps extends Omit<FieldWords, 'name' | 'form'> {
  id: string;
  className?: string | undefined;
  children: ReactNode;
}

function FieldFrame({ id, label, hint, error, optional, className, children }: FrameProps) {
  const classes = ['field', error !== undefined && 'bad', className].filter(Boolean).join(' ');
  return (
    <div className={classes}>
      <label htmlFor={id}>{label}{optional && <span className="optional"> (may stay empty)</span>}</label>
      {hint !== undefined && <span className="hint" id={`${id}-hint`}>{hint}</span>}
      <div className="input">{children}</div>
      {error !== undefined && <Wrong id={`${id}-wrong`} says={error} />}
    </div>
  );
}
