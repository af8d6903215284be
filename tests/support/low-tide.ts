/** The pattern of the demo series, as it ships. */
import { readFile } from 'node:fs/promises';
import type { FrameLoomPiece } from '#core/craft/piece.ts';

/** Tests run from the root of the house, in Node as well as in a browser's clothes. */
export async function lowTide(): Promise<FrameLoomPiece> {
  return JSON.parse(await readFile('content/series/low-tide/piece.json', 'utf8')) as FrameLoomPiece;
}
