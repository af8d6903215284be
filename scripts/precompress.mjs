// @ts-check
/** Lays a `.br` and a `.gz` beside each text file of the build, as small as they get, so that no request has to. */
import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { brotliCompressSync, constants, gzipSync } from 'node:zlib';

const folder = fileURLToPath(new URL('../dist/client', import.meta.url));
const TEXT = /\.(?:css|html|js|json|mjs|svg|txt|vtt|webmanifest|xml)$/;
const SMALLEST_BYTES = 1_024;

for (const name of readdirSync(folder, { recursive: true, encoding: 'utf8' })) {
  const file = `${folder}/${name}`;
  if (!TEXT.test(name) || !statSync(file).isFile()) continue;
  const bytes = readFileSync(file);
  if (bytes.length < SMALLEST_BYTES) continue;
  writeFileSync(`${file}.br`, brotliCompressSync(bytes, { params: { [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length } }));
  writeFileSync(`${file}.gz`, gzipSync(bytes, { level: 9 }));
}
