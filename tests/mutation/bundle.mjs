// @ts-check
/**
 * Bundles the tests of the craft, each beside its source as `.test.mjs`, and what they share in chunks, with `collect.ts`
 * in Vitest's place. The mutation run calls it in its own copy of the tree, in which the sources carry every change.
 */
import { readdirSync } from 'node:fs';
import { build } from 'esbuild';

/** One draws threads tight in small steps, as long as all others take together; the other weighs bundles of the sources. */
const LEFT_OUT = ['reference/thread-length.test.ts', 'unit/core/craft/engine-size.test.ts'];
/**
 * Only the tests whose path this finds, all without it: what a folder's own tests notice is soon known, and is the least
 * of what all of them would.
 */
const WANTED = new RegExp(process.env.FELLMARK_MUTATION_TESTS ?? '', 'u');

const tests = readdirSync('tests', { recursive: true, encoding: 'utf8' })
  .filter((file) => /^(?:reference|unit\/core\/craft)\/.*\.test\.ts$/u.test(file) && !LEFT_OUT.includes(file) && WANTED.test(file));

await build({
  entryPoints: ['mutation/collect.ts', ...tests].map((file) => `tests/${file}`),
  outdir: '.',
  outbase: '.',
  outExtension: { '.js': '.mjs' },
  chunkNames: 'tests/mutation/chunks/[hash]',
  alias: { vitest: './tests/mutation/collect.ts' },
  bundle: true,
  splitting: true,
  format: 'esm',
  platform: 'node',
  target: 'node20',
  external: ['mathjs'],
  // For packages that ask for Node's own modules in the old way.
  banner: { js: "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);" },
});
