// @ts-check
/**
 * Walks the graph of imports of src, types included, and says where it goes against the layers or in a circle.
 * Lint tells single imports as they are written; this sees the whole.
 */
import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const src = fileURLToPath(new URL('../src', import.meta.url));
const IMPORT = /(?:^|[;}\n])\s*(?:import|export)\s(?:[^'";]*?\sfrom\s)?\s*['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]\s*\)/g;

/** Which folders of src a folder may import, beside itself. A key with a slash is the more exact one and counts first. */
const MAY_IMPORT = {
  'core': [],
  'contracts': ['core'],
  'server/policies': ['core', 'contracts', 'server/context.ts', 'server/errors.ts'],
  'server/models': ['core', 'contracts', 'server/db'],
  'server/queries': ['core', 'contracts', 'server/models', 'server/db', 'server/policies', 'server/auth', 'server/errors.ts', 'server/context.ts'],
  'server/presenters': ['core', 'contracts', 'server/models', 'server/context.ts'],
  'server': ['core', 'contracts', 'server'],
  'stand-ins': ['core'],
  'processes': ['server', 'stand-ins', 'core', 'contracts', 'processes'],
  'islands': ['core', 'contracts', 'components'],
  'service-worker': ['core', 'contracts'],
  'components': ['core', 'contracts', 'islands', 'server/context.ts', 'server/web', 'server/presenters', 'server/queries'],
  'layouts': ['core', 'contracts', 'islands', 'components', 'server/web', 'server/presenters', 'styles'],
  'pages': ['core', 'contracts', 'islands', 'components', 'layouts', 'server', 'styles', 'actions'],
  'actions': ['core', 'contracts', 'server'],
  'middleware.ts': ['core', 'contracts', 'server'],
  'live.config.ts': ['core', 'contracts', 'server'],
  'content.config.ts': ['core', 'contracts'],
  'env.d.ts': ['core', 'contracts', 'server', 'components'],
  'styles': [],
};

const files = readdirSync(src, { recursive: true, encoding: 'utf8' }).filter((name) => /\.(?:ts|tsx|astro)$/.test(name)).sort();
const graph = new Map(files.map((name) => [name, importsOf(name)]));
const faults = [...graph].flatMap(([from, tos]) => tos.flatMap((to) => faultOf(from, to) ?? []));
faults.push(...circles());

for (const fault of faults) console.error(fault);
console.log(`${files.length} files, ${[...graph.values()].flat().length} imports, ${faults.length} against the layers`);
process.exitCode = faults.length === 0 ? 0 : 1;

/** Files of src that `name` imports. @param {string} name @returns {string[]} */
function importsOf(name) {
  const text = readFileSync(path.join(src, name), 'utf8').replace(/\/\*[\s\S]*?\*\//g, '');
  const found = [];
  for (const match of text.matchAll(IMPORT)) {
    const asked = match[1] ?? match[2] ?? '';
    if (asked.startsWith('#')) found.push(asked.slice(1));
    else if (asked.startsWith('.')) found.push(path.join(path.dirname(name), asked));
  }
  return found.map((to) => to.split('?', 1)[0] ?? to);
}

/** @param {string} from @param {string} to @returns {string | undefined} */
function faultOf(from, to) {
  if (to.startsWith('..')) return undefined;
  const layer = layerOf(from);
  if (layer === undefined) return `${from} lies in no layer: give it a place in src that scripts/check-imports.mjs knows`;
  if (from.startsWith('server/use-cases/') && to.startsWith('server/use-cases/') && !/\/_[a-z-]+\.ts$/.test(to)) {
    return `${from} -> ${to}: a use-case never calls another; lift what both need into core or a private _step.ts beside them`;
  }
  if (isWithin(to, layer) || MAY_IMPORT[layer].some((allowed) => isWithin(to, allowed))) return undefined;
  return `${from} -> ${to}: ${layer} may import ${['itself', ...MAY_IMPORT[layer]].join(', ')}`;
}

/** @param {string} name @returns {keyof typeof MAY_IMPORT | undefined} */
function layerOf(name) {
  const layers = /** @type {(keyof typeof MAY_IMPORT)[]} */ (Object.keys(MAY_IMPORT));
  return layers.filter((layer) => isWithin(name, layer)).sort((a, b) => b.length - a.length)[0];
}

/** @param {string} name @param {string} folder */
function isWithin(name, folder) {
  return name === folder || name.startsWith(`${folder}/`);
}

/** Circles among files, each told once. @returns {string[]} */
function circles() {
  /** @type {Map<string, 'open' | 'done'>} */
  const state = new Map();
  /** @type {string[]} */
  const found = [];
  /** @param {string} name @param {readonly string[]} way */
  const visit = (name, way) => {
    if (state.get(name) === 'done') return;
    if (state.get(name) === 'open') {
      found.push(`a circle: ${[...way.slice(way.indexOf(name)), name].join(' -> ')}`);
      return;
    }
    state.set(name, 'open');
    for (const next of graph.get(name) ?? []) visit(next, [...way, name]);
    state.set(name, 'done');
  };
  for (const name of graph.keys()) visit(name, []);
  return found;
}
