/** The pattern of the demo series, as it ships. */
import { readFile } from 'node:fs/promises';
import type { Piece } from '#core/craft/piece.ts';

export async function lowTide(): Promise<Piece> {
  return JSON.parse(await readFile(new URL('../../content/series/low-tide/piece.json', import.meta.url), 'utf8')) as Piece;
}
