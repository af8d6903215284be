// Pins that came back with a form: what a browser sent, so nothing is taken for granted.
import type { NoteInput } from '#contracts/bench.ts';

/** The notes of a hidden field's text; none when it does not hold any. */
export function readTypedNotes(text: string): NoteInput[] {
  let data: unknown;
  try {
    data = text === '' ? [] : JSON.parse(text);
  } catch {
    return [];
  }
  return Array.isArray(data) ? data.flatMap(noteOf).slice(0, 20) : [];
}

function noteOf(item: unknown): NoteInput[] {
  if (typeof item !== 'object' || item === null || !('words' in item) || typeof item.words !== 'string') return [];
  const place = (name: 'xPermille' | 'yPermille'): number | null => {
    const value: unknown = name in item ? Object.entries(item).find(([key]) => key === name)?.[1] : null;
    return typeof value === 'number' && value >= 0 && value <= 1_000 ? value : null;
  };
  const shot = 'shot' in item && typeof item.shot === 'number' && Number.isInteger(item.shot) && item.shot >= 1 ? { shot: item.shot } : {};
  return [{ words: item.words.slice(0, 600), xPermille: place('xPermille'), yPermille: place('yPermille'), ...shot }];
}
