/** What a browser loads to reckon a piece. The drawing of cloth and the showing of workings are not part of it. */
import { gzipSync } from 'node:zlib';
import { build } from 'esbuild';
import { expect, test } from 'vitest';

const MOST_BYTES = 25_000;

/** The module and all it needs, as the site's build makes it. */
async function bundle(specifier: string): Promise<{ readonly compressed: number; readonly files: readonly string[] }> {
  const { outputFiles, metafile } = await build({
    stdin: { contents: `export { planPiece } from '${specifier}';`, resolveDir: process.cwd(), loader: 'ts' },
    bundle: true, minify: true, format: 'esm', platform: 'browser', target: 'es2022', write: false, metafile: true,
  });
  return { compressed: gzipSync(outputFiles[0]?.contents ?? '', { level: 9 }).byteLength, files: Object.keys(metafile.inputs) };
}

test('the engine that plans a piece weighs less than 25 kB compressed, and draws and explains nothing', async () => {
  const { compressed, files } = await bundle('#core/craft/plan.ts');
  expect(compressed, `${compressed} bytes`).toBeLessThan(MOST_BYTES);
  expect(files.filter((file) => /craft\/(?:cloth|show-how|figures|amounts)\//u.test(file))).toEqual([]);
});
