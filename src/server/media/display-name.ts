/** A file's name as a person gave it, made fit to be shown. It never becomes a path. */
export function displayName(name: string): string {
  const last = name.normalize('NFC').split(/[/\\]/).at(-1) ?? '';
  const clean = last.replace(/[\p{C}\u2028\u2029]/gu, '').trim();
  return (clean === '' ? 'photo' : clean).slice(0, 120);
}
