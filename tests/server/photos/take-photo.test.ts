/** The table of hostile and odd files: each is cleaned and taken, or refused with a sentence and nothing left behind. */
import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { deflateSync } from 'node:zlib';
import sharp, { type Sharp } from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { takePhoto } from '#server/media/photo.ts';
import { DiskMediaStore } from '#server/media/store.ts';

let folder = '';
let store: DiskMediaStore;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'fellmark-photo-'));
  store = new DiskMediaStore(join(folder, 'uploads'));
});
afterEach(() => rm(folder, { recursive: true }));

const picture = (width = 640, height = 480): Sharp => sharp({ create: { width, height, channels: 3, background: '#7a8f99' } });

async function take(bytes: Buffer): Promise<Awaited<ReturnType<typeof takePhoto>>> {
  const path = join(folder, 'upload');
  await writeFile(path, bytes);
  return takePhoto(store, path, 'photos/one');
}

/** A PNG whose header claims `width` by `height`, over one compressed row or so. */
function claimedPng(width: number, height: number, rows = 1): Buffer {
  const crcTable = Array.from({ length: 256 }, (_, n) => { let c = n; for (let k = 0; k < 8; k += 1) c = c & 1 ? 0xedb88320 ^ (c >>> 1) : c >>> 1; return c >>> 0; });
  const crc = (data: Buffer): number => { let c = 0xffffffff; for (const byte of data) c = (crcTable[(c ^ byte) & 0xff] ?? 0) ^ (c >>> 8); return (c ^ 0xffffffff) >>> 0; };
  const chunk = (type: string, data: Buffer): Buffer => {
    const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
    const out = Buffer.alloc(8);
    out.writeUInt32BE(data.length, 0);
    out.writeUInt32BE(crc(body), 4);
    return Buffer.concat([out.subarray(0, 4), body, out.subarray(4)]);
  };
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header.set([1, 0, 0, 0, 0], 8);
  const data = deflateSync(Buffer.alloc((Math.ceil(width / 8) + 1) * rows));
  return Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), chunk('IHDR', header), chunk('IDAT', data), chunk('IEND', Buffer.alloc(0))]);
}

const SVG = '<svg xmlns="http://www.w3.org/2000/svg" width="99" height="99"><script>alert(1)</script></svg>';

describe('taken', () => {
  test('a photo becomes two WebP files, large and thumb, and nothing else is kept', async () => {
    const photo = await take(await picture(3_000, 2_000).jpeg().toBuffer());
    expect(photo).toMatchObject({ width: 3_000, height: 2_000 });
    expect(photo.files).toMatchObject({ large: { width: 2_048, height: 1_365, contentType: 'image/webp' }, thumb: { width: 320 } });
    expect(await readdir(join(folder, 'uploads', 'photos', 'one'))).toEqual(['large.webp', 'thumb.webp']);
    expect(await readdir(join(folder, 'uploads', 'temporary'))).toEqual([]);
  });

  test.each([1, 2, 3, 4, 5, 6, 7, 8])('orientation %i is turned upright', async (orientation) => {
    const photo = await take(await picture(400, 200).withMetadata({ orientation }).jpeg().toBuffer());
    expect([photo.width, photo.height]).toEqual(orientation >= 5 ? [200, 400] : [400, 200]);
  });

  test('place, camera and colour profile do not leave with the picture', async () => {
    const exif = { IFD0: { Copyright: 'secret', ImageDescription: '<script>' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } };
    await take(await picture().withExif(exif).withIccProfile('p3').jpeg().toBuffer());
    const metadata = await sharp(join(folder, 'uploads', 'photos', 'one', 'large.webp')).metadata();
    expect([metadata.exif, metadata.xmp, metadata.icc]).toEqual([undefined, undefined, undefined]);
  });

  test('what hangs behind the picture is cut off', async () => {
    await take(Buffer.concat([await picture().jpeg().toBuffer(), Buffer.from('PK\x03\x04<?php system($_GET[0]); ?>')]));
    expect((await readFile(join(folder, 'uploads', 'photos', 'one', 'large.webp'))).includes('php')).toBe(false);
  });

  test('CMYK becomes colours a screen has', async () => {
    await take(await picture().toColourspace('cmyk').jpeg().toBuffer());
    expect((await sharp(join(folder, 'uploads', 'photos', 'one', 'large.webp')).metadata()).space).toBe('srgb');
  });

  test('of a moving picture the first frame is taken', async () => {
    const frames = await sharp(Buffer.alloc(64 * 128 * 3, 90), { raw: { width: 64, height: 128, channels: 3, pageHeight: 64 } }).webp({ loop: 0 }).toBuffer();
    expect(await take(frames)).toMatchObject({ width: 64, height: 64 });
  });
});

describe('refused', () => {
  const cases: [string, () => Promise<Buffer> | Buffer, string][] = [
    ['an empty file', () => Buffer.alloc(0), 'UNSUPPORTED'],
    ['a web page called .jpg', () => Buffer.from('<html><script>alert(1)</script>'), 'UNSUPPORTED'],
    ['an SVG', () => Buffer.from(SVG), 'UNSUPPORTED'],
    ['an SVG behind a byte order mark and a comment', () => Buffer.from(`\ufeff<!-- a photo -->${SVG}`), 'UNSUPPORTED'],
    ['a GIF that is also a script', () => Buffer.from('GIF89a/*\x00\x00*/=1;alert(1)'), 'UNSUPPORTED'],
    ['a moving GIF', () => picture(32, 32).gif().toBuffer(), 'UNSUPPORTED'],
    ['a TIFF', () => picture(32, 32).tiff().toBuffer(), 'UNSUPPORTED'],
    ['a PDF', () => Buffer.from('%PDF-1.4\n1 0 obj<<>>endobj'), 'UNSUPPORTED'],
    ['PostScript', () => Buffer.from('%!PS-Adobe-3.0 EPSF-3.0'), 'UNSUPPORTED'],
    ['a drawing script', () => Buffer.from('push graphic-context\nimage over 0,0 0,0 "file:///etc/passwd"'), 'UNSUPPORTED'],
    ['a phone’s HEIC', () => Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic\0\0\0\0mif1heic')]), 'UNSUPPORTED'],
    ['a JPEG cut off in the middle', async () => { const whole = await picture(900, 900).jpeg().toBuffer(); return whole.subarray(0, Math.floor(whole.length * 0.6)); }, 'UNSUPPORTED'],
    ['a PNG of 60,000 by 60,000 points', () => claimedPng(60_000, 60_000), 'TOO_LARGE'],
    ['a PNG of 16,000 by 16,000 points', () => claimedPng(16_000, 16_000), 'TOO_LARGE'],
    ['a header that claims two thousand million points', () => claimedPng(2_000_000_000, 1), 'UNSUPPORTED'],
    ['a PNG of 200,000 by 1', () => claimedPng(200_000, 1), 'TOO_LARGE'],
    ['a single point', () => picture(1, 1).png().toBuffer(), 'UNSUPPORTED'],
    ['random bytes behind a JPEG’s first three', () => Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), Buffer.alloc(500, 7)]), 'UNSUPPORTED'],
  ];
  test.each(cases)('%s', async (_words, bytes, code) => {
    await expect(take(await bytes())).rejects.toMatchObject({ code, says: expect.stringMatching(/\./) });
    expect(await readdir(join(folder, 'uploads')).catch(() => [])).not.toContain('photos');
    expect(await readdir(join(folder, 'uploads', 'temporary')).catch(() => [])).toEqual([]);
  });
});
