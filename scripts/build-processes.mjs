// @ts-check
/** Bundles each composition root of src/processes into dist/processes. Packages stay outside and are found in node_modules. */
import { readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = fileURLToPath(new URL('..', import.meta.url));

await build({
  absWorkingDir: root,
  entryPoints: readdirSync(`${root}/src/processes`).filter((name) => name.endsWith('.ts')).map((name) => `src/processes/${name}`),
  outdir: 'dist/processes',
  outExtension: { '.js': '.mjs' },
  bundle: true,
  packages: 'external',
  platform: 'node',
  format: 'esm',
  target: 'node20',
  sourcemap: 'linked',
  logLevel: 'warning',
});
