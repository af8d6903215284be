// @ts-check
/**
 * Bundles each composition root of src/processes into dist/processes, where packages stay outside and are found in
 * node_modules; and the service worker into one file beside the built site, whose whole folder it stands for.
 */
import { createHash } from 'node:crypto';
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

// Named by the built files, so that browsers find a new worker with each build and it tidies up after the one before.
const builtFiles = readdirSync(`${root}/dist/client`, { recursive: true, encoding: 'utf8' }).filter((name) => !/^service-worker|\.(?:br|gz)$/.test(name)).sort();
await build({
  absWorkingDir: root,
  entryPoints: ['src/service-worker/service-worker.ts'],
  outfile: 'dist/client/service-worker.js',
  banner: { js: `// Build ${createHash('sha256').update(builtFiles.join('\n')).digest('hex').slice(0, 16)}` },
  bundle: true,
  platform: 'browser',
  format: 'iife',
  target: 'es2022',
  minify: true,
  logLevel: 'warning',
});
