/** Zips written byte by byte (PKWARE APPNOTE 4.3), so that a test can make them say what no program would write. */
import { crc32, deflateRawSync } from 'node:zlib';

export interface MadeEntry {
  readonly name: string;
  readonly bytes: Buffer;
  readonly packed?: boolean;
  readonly method?: number;
  readonly unixMode?: number;
  /** General purpose flags; 1 is encrypted. */
  readonly flags?: number;
  /** A length other than the true one. */
  readonly saysBytes?: number;
  /** The same, in the long form of ZIP64. */
  readonly saysLongBytes?: bigint;
  /** Points at the place of an earlier entry, by its number. */
  readonly sharesPlaceOf?: number;
}

const DAY_1980 = 0x21;
const MADE_ON_UNIX = 0x0314;

export function makeZip(entries: readonly MadeEntry[]): Buffer {
  const bodies: Buffer[] = [];
  const directory: Buffer[] = [];
  const places: number[] = [];
  let at = 0;
  for (const entry of entries) {
    const data = entry.packed === true ? deflateRawSync(entry.bytes) : entry.bytes;
    const common = commonFields(entry, data);
    if (entry.sharesPlaceOf === undefined) {
      places.push(at);
      const local = Buffer.concat([Buffer.from('PK\x03\x04', 'latin1'), common, Buffer.from(entry.name)]);
      bodies.push(local, data);
      at += local.length + data.length;
    } else {
      places.push(places[entry.sharesPlaceOf] ?? 0);
    }
    directory.push(directoryLine(entry, common, places.at(-1) ?? 0));
  }
  const all = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.write('PK\x05\x06', 0, 'latin1');
  end.writeUInt16LE(entries.length, 8);
  end.writeUInt16LE(entries.length, 10);
  end.writeUInt32LE(all.length, 12);
  end.writeUInt32LE(at, 16);
  return Buffer.concat([...bodies, all, end]);
}

/** The 26 bytes that stand in a file's own header and, all but the last two in the same order, in the directory. */
function commonFields({ name, bytes, packed, method, flags = 0, saysBytes, saysLongBytes }: MadeEntry, data: Buffer): Buffer {
  const fields = Buffer.alloc(26);
  fields.writeUInt16LE(20, 0);
  fields.writeUInt16LE(flags, 2);
  fields.writeUInt16LE(method ?? (packed === true ? 8 : 0), 4);
  fields.writeUInt16LE(DAY_1980, 8);
  fields.writeUInt32LE(crc32(bytes), 10);
  fields.writeUInt32LE(data.length, 14);
  fields.writeUInt32LE(saysLongBytes === undefined ? (saysBytes ?? bytes.length) : 0xffffffff, 18);
  fields.writeUInt16LE(Buffer.byteLength(name), 22);
  return fields;
}

function directoryLine({ name, unixMode, saysLongBytes }: MadeEntry, common: Buffer, place: number): Buffer {
  const extra = Buffer.alloc(saysLongBytes === undefined ? 0 : 12);
  if (saysLongBytes !== undefined) {
    extra.writeUInt16LE(1, 0);
    extra.writeUInt16LE(8, 2);
    extra.writeBigUInt64LE(saysLongBytes, 4);
  }
  const head = Buffer.alloc(6);
  head.write('PK\x01\x02', 0, 'latin1');
  head.writeUInt16LE(unixMode === undefined ? 20 : MADE_ON_UNIX, 4);
  const tail = Buffer.alloc(14);
  tail.writeUInt32LE(((unixMode ?? 0) << 16) >>> 0, 6);
  tail.writeUInt32LE(place, 10);
  const fields = Buffer.from(common);
  fields.writeUInt16LE(extra.length, 24);
  return Buffer.concat([head, fields, tail, Buffer.from(name), extra]);
}
