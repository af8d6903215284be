/** The picture that goes along where a series is passed on: its piece as it hangs, its name, who teaches it. Day colours. */
import type { ClothPiece } from '#core/craft/cloth/cloth-piece.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { drawnInto, fitInto, type Box } from '#core/craft/cloth/fit-into.ts';
import { escapeWords } from '#core/craft/cloth/markup.ts';

export const SHARE_PICTURE = { width: 1200, height: 630 } as const;

export interface ShareWords {
  readonly name: string;
  /** Second half of the title; may be empty. */
  readonly rest: string;
  readonly teacherName: string;
  readonly workroomName: string;
}

const GROUND = '#dce1df';
const INK = '#111e33';
const QUIET = '#4a545f';
const BEAM = '#203d66';
const WARP = '#c5ccca';
const SERIF = "Lora,Georgia,'Liberation Serif','DejaVu Serif',serif";
const SANS = "'Sofia Sans','Liberation Sans','DejaVu Sans',sans-serif";

const LEFT = 64;
/** Where the piece hangs, from the beam on. */
const ROOM: Box = { x: 700, y: 10, width: 440, height: 600 };
/** A letter's width is taken as so much of its size: no font is asked, and none is wider in the mean. */
const LETTER_WIDTH = 0.5;
const WORDS_WIDTH = 590;

interface Style { readonly size: number; readonly leading: number; readonly most: number; readonly family: string; readonly weight: number; readonly fill: string }

const NAME: Style = { size: 76, leading: 84, most: 3, family: SERIF, weight: 500, fill: INK };
const LONG_NAME: Style = { ...NAME, size: 54, leading: 62, most: 4 };
const REST: Style = { size: 32, leading: 42, most: 2, family: SERIF, weight: 400, fill: INK };
const TEACHER: Style = { size: 30, leading: 40, most: 1, family: SANS, weight: 600, fill: INK };
const WORKROOM: Style = { ...TEACHER, weight: 400, fill: QUIET };

/** SVG of 1200 by 630. @param cloth null where no piece is described: then only words are on it */
export function drawSharePicture(cloth: ClothPiece | null, { name, rest, teacherName, workroomName }: ShareWords): string {
  const { width, height } = SHARE_PICTURE;
  const nameStyle = linesOf(name, NAME).length > 2 ? LONG_NAME : NAME;
  const blocks: readonly [words: string, style: Style, gap: number][] = [[name, nameStyle, 0], [rest, REST, 10], [teacherName, TEACHER, 40], [workroomName, WORKROOM, 0]];
  let y = 96;
  const words = blocks.filter(([text]) => text !== '').map(([text, style, gap]) => {
    y += gap;
    const drawn = linesOf(text, style).map((line, index) => textLine(line, y + style.size + index * style.leading, style)).join('');
    y += linesOf(text, style).length * style.leading;
    return drawn;
  });
  const picture = cloth === null ? '' : fitInto(drawnInto(ROOM, (px) => drawCloth(cloth, { id: 'shared', as: 'hanging', width: px, decorative: true })), ROOM);
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" fill="none">` +
    `<path d="M0 0H${width}V${height}H0z" fill="${GROUND}"/>${warpEnds()}<path d="M0 0H${width}V12H0z" fill="${BEAM}"/>${words.join('')}` +
    `${textLine('Fellmark', height - 44, { ...WORKROOM, size: 26, family: SERIF, weight: 500 })}${picture}</svg>`
  );
}

function textLine(words: string, y: number, { size, family, weight, fill }: Style): string {
  return `<text x="${LEFT}" y="${y}" font-family="${family}" font-size="${size}" font-weight="${weight}" fill="${fill}">${escapeWords(words)}</text>`;
}

/** Broken between words; what does not fit the last line is cut with an ellipsis. */
function linesOf(text: string, { size, most }: Style): string[] {
  const room = Math.floor(WORDS_WIDTH / (size * LETTER_WIDTH));
  const lines: string[] = [''];
  for (const word of text.split(/\s+/u)) {
    const line = lines.at(-1) ?? '';
    if (line === '') lines[lines.length - 1] = word;
    else if (line.length + 1 + word.length <= room) lines[lines.length - 1] = `${line} ${word}`;
    else lines.push(word);
  }
  const kept = lines.slice(0, most).map((line) => (line.length > room ? `${line.slice(0, room - 1)}…` : line));
  if (lines.length > most) kept[most - 1] = `${(kept[most - 1] ?? '').slice(0, room - 1).replace(/[\s.,…]+$/u, '')}…`;
  return kept;
}

/** Bare warp behind the piece. */
function warpEnds(): string {
  let d = '';
  for (let x = ROOM.x - 20; x <= SHARE_PICTURE.width; x += 22) d += `M${x} 12V${SHARE_PICTURE.height}`;
  return `<path d="${d}" stroke="${WARP}" stroke-width="1"/>`;
}
