/**
 * Words set in the files of one typeface, each of which holds a part of the letters. A name that no file can write is
 * told as such: half a name would be another one.
 */
import { createRequire } from 'node:module';
import { readFileSync } from 'node:fs';
import { woffToSfnt } from './woff-to-sfnt.ts';

const SUBSETS = ['latin', 'latin-ext', 'cyrillic', 'cyrillic-ext', 'vietnamese'] as const;
const WEIGHTS = { plain: '400-normal', strong: '600-normal' } as const;

export type Weight = keyof typeof WEIGHTS;

/** Of the parts of the typeface, as its maker cuts them: which letters they hold. The first that holds a letter sets it. */
const HOLDS: Readonly<Record<(typeof SUBSETS)[number], RegExp>> = {
  latin: /[\u0020-\u007e\u00a0-\u00ff\u0131\u0152\u0153\u02c6\u02da\u02dc\u2013\u2014\u2018-\u201a\u201c-\u201e\u2022\u2026\u2039\u203a\u20ac\u2122]/u,
  'latin-ext': /[\u0100-\u0130\u0132-\u0151\u0154-\u017f\u0218-\u021b\u1e80-\u1e85\u1e9e]/u,
  cyrillic: /[\u0401\u0404\u0406\u0407\u040e\u0410-\u044f\u0451\u0454\u0456\u0457\u045e\u0490\u0491]/u,
  'cyrillic-ext': /[\u0400\u0402\u0403\u0405\u0408-\u040d\u040f\u0450\u0452\u0453\u0455\u0458-\u045d\u045f]/u,
  vietnamese: /[\u1ea0-\u1ef9\u01a0\u01a1\u01af\u01b0]/u,
};

export interface Run { readonly text: string; readonly font: string }

export const fontName = (subset: string, weight: Weight): string => `${subset}-${weight}`;

/** Every file of the typeface with the name it is used by. */
export function fontFiles(): readonly { readonly name: string; readonly data: Buffer }[] {
  loaded ??= SUBSETS.flatMap((subset) => (Object.keys(WEIGHTS) as Weight[]).map((weight) => ({
    name: fontName(subset, weight),
    data: woffToSfnt(readFileSync(createRequire(import.meta.url).resolve(`@fontsource/lora/files/lora-${subset}-${WEIGHTS[weight]}.woff`))),
  })));
  return loaded;
}
/** Read once a process: they never change. */
let loaded: readonly { readonly name: string; readonly data: Buffer }[] | undefined;

/** Signs that are no letters and may be left away: pictures, control signs, joiners. */
const ORNAMENT = /[\p{Extended_Pictographic}\p{C}\p{Sk}\p{So}\u200d\ufe0f\u{1f3fb}-\u{1f3ff}]/gu;

/** Stretches of `words` by the file that sets them; null when a letter is in none. Pictures are left away. */
export function runsOf(words: string, weight: Weight): Run[] | null {
  const plain = words.normalize('NFC').replace(ORNAMENT, '').replace(/\s+/g, ' ').trim();
  const runs: { text: string; font: string }[] = [];
  for (const letter of plain) {
    const subset = SUBSETS.find((one) => HOLDS[one].test(letter));
    if (subset === undefined) return null;
    const font = fontName(subset, weight);
    const last = runs.at(-1);
    if (last?.font === font) last.text += letter;
    else runs.push({ text: letter, font });
  }
  return runs;
}
