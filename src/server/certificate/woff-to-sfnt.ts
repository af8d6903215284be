/** A WOFF 1 file as the plain font file inside it (W3C, WOFF File Format 1.0, 2012): the PDF library would unpack it anew for every page, slowly. */
import { inflateSync } from 'node:zlib';

const WOFF = 0x774f4646;
const HEADER = 44;
const ENTRY = 20;

/** Throws `RangeError` for what is no WOFF 1 file. */
export function woffToSfnt(woff: Buffer): Buffer {
  if (woff.readUInt32BE(0) !== WOFF) throw new RangeError('no WOFF file');
  const count = woff.readUInt16BE(12);
  const head = Buffer.alloc(12 + 16 * count);
  woff.copy(head, 0, 4, 8);
  head.writeUInt16BE(count, 4);
  const power = 2 ** Math.floor(Math.log2(count));
  head.writeUInt16BE(power * 16, 6);
  head.writeUInt16BE(Math.log2(power), 8);
  head.writeUInt16BE((count - power) * 16, 10);
  const parts = [head];
  let offset = head.length;
  for (let index = 0; index < count; index += 1) {
    const at = HEADER + ENTRY * index;
    const [from, packed, length] = [woff.readUInt32BE(at + 4), woff.readUInt32BE(at + 8), woff.readUInt32BE(at + 12)];
    const bytes = woff.subarray(from, from + packed);
    const table = packed === length ? bytes : inflateSync(bytes);
    const entry = 12 + 16 * index;
    woff.copy(head, entry, at, at + 4);
    woff.copy(head, entry + 4, at + 16, at + 20);
    head.writeUInt32BE(offset, entry + 8);
    head.writeUInt32BE(length, entry + 12);
    const padded = Buffer.alloc(Math.ceil(length / 4) * 4);
    table.copy(padded);
    parts.push(padded);
    offset += padded.length;
  }
  return Buffer.concat(parts);
}
