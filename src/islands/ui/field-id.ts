// Ids that tie a field's label, hint and sentence together, and the list of errors on top to its fields.

/** The id of the field called `name`; `form` keeps two forms on one page apart. */
export function fieldId(name: string, form = 'f'): string {
  return `${form}-${name.replace(/[^A-Za-z0-9_-]+/g, '-')}`;
}

/** What `aria-describedby` of a field names: its hint and its sentence, as far as they are there. */
export function describedBy(id: string, hint: string | undefined, error: string | undefined): string | undefined {
  const ids = [hint === undefined ? [] : [`${id}-hint`], error === undefined ? [] : [`${id}-wrong`]].flat();
  return ids.length === 0 ? undefined : ids.join(' ');
}
