/**
 * What was typed into a form before its script woke: fields that no longer hold what the server drew. React takes the
 * form over as it stands and would write its own text over these at the next letter.
 */

/** The text that stands in the control where it differs from what was drawn. */
function changedText(control: Element): string | undefined {
  if (control instanceof HTMLSelectElement) {
    const drawn = [...control.options].find((option) => option.defaultSelected) ?? control.options[0];
    return drawn?.value === control.value ? undefined : control.value;
  }
  if (control instanceof HTMLTextAreaElement) return control.value === control.defaultValue ? undefined : control.value;
  if (!(control instanceof HTMLInputElement) || control.type === 'hidden') return undefined;
  if (control.type === 'radio') return control.checked && !control.defaultChecked ? control.value : undefined;
  if (control.type === 'checkbox') return control.checked === control.defaultChecked ? undefined : control.checked ? control.value : '';
  return control.value === control.defaultValue ? undefined : control.value;
}

/** Names and texts, in the order of the form; an unticked box is empty text. */
export function typedBefore(form: HTMLFormElement): readonly (readonly [name: string, text: string])[] {
  return [...form.elements].flatMap((control) => {
    const name = control.getAttribute('name');
    const text = name === null ? undefined : changedText(control);
    return name === null || text === undefined ? [] : [[name, text] as const];
  });
}
