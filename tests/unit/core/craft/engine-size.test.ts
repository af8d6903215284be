/** What a browser loads to reckon a piece, as it comes over the wire. Figures and workings are no part of it. */
import { brotliCompressSync, gzipSync } from 'node:zlib';
import { build } from 'esbuild';
import { expect, test } from 'vitest';

const MOST_BYTES = 25_000;
/** A whole island besides React: its fields and words, and of its craft the engine, amounts, changes and drawing. */
const MOST_BYTES_OF_ISLAND = 72_000;

interface Bundle {
  readonly code: Uint8Array;
  readonly files: readonly string[];
}

/** The module and all it needs before it can begin, as the site's build makes it: what is loaded later, when it is opened, does not count. */
async function bundle(contents: string): Promise<Bundle> {
  const { outputFiles, metafile } = await build({
    stdin: { contents, resolveDir: process.cwd(), loader: 'ts' },
    bundle: true, minify: true, splitting: true, outdir: 'nowhere', jsx: 'automatic', external: ['react', 'react-dom', 'astro:*'], format: 'esm', platform: 'browser', target: 'es2022', write: false, metafile: true,
  });
  const needed = new Set(Object.entries(metafile.outputs).filter(([, { entryPoint }]) => entryPoint === '<stdin>').map(([path]) => path));
  for (const path of needed) for (const { kind, path: next, external } of metafile.outputs[path]?.imports ?? []) if (kind === 'import-statement' && external !== true) needed.add(next);
  const chunks = outputFiles.filter(({ path }) => [...needed].some((one) => path.endsWith(`/${one}`)));
  return { code: Buffer.concat(chunks.map(({ contents: code }) => code)), files: [...needed].flatMap((path) => Object.keys(metafile.outputs[path]?.inputs ?? {})) };
}

test('the engine that plans a piece of any craft comes in less than 25 kB, and draws and explains nothing', async () => {
  const { code, files } = await bundle("export { planPiece } from '#core/craft/plan.ts';");
  const { byteLength } = brotliCompressSync(code);
  expect(byteLength, `${byteLength} bytes`).toBeLessThan(MOST_BYTES);
  expect(files.filter((file) => /craft\/(?:cloth|show-how|figures|amounts)\/|cautions|-words/u.test(file))).toEqual([]);
});

test.each([
  ['weaving', "export { planFrameLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';"],
  ['knotting', "export { planMacrame } from '#core/craft/macrame/plan-macrame.ts';"],
  ['dyeing', "export { planDyeing } from '#core/craft/dyeing/plan-dyeing.ts';"],
  ['weaving on a rigid heddle', "export { planHeddle } from '#core/craft/rigid-heddle/plan-heddle.ts';"],
])('the engine of %s by itself stays below 25 kB in the weakest compression, too', async (_, contents) => {
  const { byteLength } = gzipSync((await bundle(contents)).code);
  expect(byteLength, `${byteLength} bytes`).toBeLessThan(MOST_BYTES);
});

test.each(['piece-form/PieceForm.tsx', 'piece/MyPiece.tsx', 'series/TrialLooms.tsx'])('the island %s loads no figure of a technique, and stays below 72 kB', async (island) => {
  const { code, files } = await bundle(`export * from './src/islands/${island}';`);
  const { byteLength } = brotliCompressSync(code);
  expect(byteLength, `${byteLength} bytes`).toBeLessThan(MOST_BYTES_OF_ISLAND);
  expect(files.filter((file) => /craft\/(?:show-how|figures\/kinds|macrame\/figures)\//u.test(file))).toEqual([]);
});

test.each(['piece-form/PieceForm.tsx', 'piece/MyPiece.tsx'])('the island %s, which knows woven pieces only, loads no other craft', async (island) => {
  const { files } = await bundle(`export * from './src/islands/${island}';`);
  expect(files.filter((file) => /craft\/(?:crafts\.ts|macrame|dyeing|rigid-heddle)/u.test(file))).toEqual([]);
});
