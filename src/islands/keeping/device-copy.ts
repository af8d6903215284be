/** What was typed and could not be sent yet, kept on this device until it is: it survives a reload and a lost line. */

export interface DeviceCopy {
  /** Of the kept draft it was written over. */
  readonly revision: number;
  readonly source: string;
}

const keyOf = (name: string): string => `fellmark-draft-${name}`;

/** @param name of the draft, its own in this house. Null when nothing waits, or when the browser keeps nothing. */
export function readCopy(name: string): DeviceCopy | null {
  try {
    const copy: unknown = JSON.parse(localStorage.getItem(keyOf(name)) ?? 'null');
    if (typeof copy !== 'object' || copy === null || !('revision' in copy) || !('source' in copy)) return null;
    const { revision, source } = copy;
    return typeof revision === 'number' && typeof source === 'string' ? { revision, source } : null;
  } catch {
    return null;
  }
}

/** @returns false when the browser would not keep it. */
export function writeCopy(name: string, copy: DeviceCopy | null): boolean {
  try {
    if (copy === null) localStorage.removeItem(keyOf(name));
    else localStorage.setItem(keyOf(name), JSON.stringify(copy));
    return true;
  } catch {
    return false;
  }
}
