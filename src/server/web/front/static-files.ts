/**
 * The build's own files: scripts, styles, fonts, pictures. The list of them is read once at start, so no request can
 * name anything else; beside a file may lie the same compressed at build time (`.br`, `.gz`).
 */
import { readdirSync, statSync } from 'node:fs';
import type { IncomingMessage, ServerResponse } from 'node:http';
import path from 'node:path';
import send from 'send';
import { acceptedCoding, varyByEncoding } from '#server/web/front/accepted-encoding.ts';
import type { Coding } from '#server/web/front/accepted-encoding.ts';
import type { Handler } from '#server/web/front/handler.ts';
import { pathOf } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';

interface StaticFile {
  /** Below the folder, with a slash in front. */
  readonly name: string;
  readonly codings: readonly Coding[];
}

const SUFFIX: Readonly<Record<Coding, string>> = { br: '.br', gzip: '.gz' };
const HASHED_FOLDER = '/_astro/';
/** Shown by the site with their own status, never asked for by name. */
const ERROR_PAGES = new Set(['/404.html', '/500.html']);
const ERROR_ADDRESSES = new Set(['/404', '/404/', '/500', '/500/']);
const NOWHERE = '/not-a-page';
/** Outlives the pages it fetches: never older than the build, and it reaches nothing but the house. */
const SERVICE_WORKER = '/service-worker.js';
const WORKER_POLICY = "default-src 'none'; connect-src 'self'";
const FOREVER = 'public, max-age=31536000, immutable';
const BRIEFLY = 'public, max-age=3600';

/** Serves the files of `folder`; hands on whatever it does not hold. */
export function staticFiles(folder: string): Handler {
  const root = path.resolve(folder);
  const files = listFiles(root);
  return (request, response, next) => {
    // Asked for by name they are as absent as any other page; the site can only show them in place of another.
    if (ERROR_ADDRESSES.has(pathOf(request))) request.url = NOWHERE;
    const file = request.method === 'GET' || request.method === 'HEAD' ? files.get(pathOf(request)) : undefined;
    if (file === undefined) next();
    else serve(request, response, root, file);
  };
}

function serve(request: IncomingMessage, response: ServerResponse, root: string, file: StaticFile): void {
  response.setHeader('Cache-Control', cacheRuleOf(file.name));
  if (file.name === SERVICE_WORKER) response.setHeader('Content-Security-Policy', WORKER_POLICY);
  let name = file.name;
  if (file.codings.length > 0) {
    response.setHeader('Vary', varyByEncoding(response.getHeader('vary')));
    const header = request.headers['accept-encoding'];
    const coding = acceptedCoding(Array.isArray(header) ? header.join(',') : header, file.codings);
    if (coding !== undefined) {
      response.setHeader('Content-Encoding', coding);
      response.setHeader('Content-Type', typeOf(file.name));
      name = file.name + SUFFIX[coding];
    }
  }
  if (!response.hasHeader('content-type')) response.setHeader('Content-Type', typeOf(file.name));
  send(request, encodeURI(name), { root, cacheControl: false, dotfiles: 'allow', index: false })
    .on('error', () => { refuse(request, response, 404, 'This file is not here.'); })
    .pipe(response);
}

function cacheRuleOf(name: string): string {
  if (name === SERVICE_WORKER) return 'no-cache';
  return name.startsWith(HASHED_FOLDER) ? FOREVER : BRIEFLY;
}

/** All files below `root` by the path they are asked for by. */
function listFiles(root: string): ReadonlyMap<string, StaticFile> {
  const names = readdirSync(root, { recursive: true, encoding: 'utf8' })
    .filter((name) => statSync(path.join(root, name)).isFile())
    .map((name) => `/${name.split(path.sep).join('/')}`);
  const present = new Set(names);
  const files = new Map<string, StaticFile>();
  for (const name of names) {
    if (isCompressedTwin(name, present) || ERROR_PAGES.has(name)) continue;
    const codings = (['br', 'gzip'] as const).filter((coding) => present.has(name + SUFFIX[coding]));
    const file = { name, codings };
    files.set(encodeURI(name), file);
    // A page made at build time is asked for without its file's name.
    if (name.endsWith('/index.html')) {
      const page = name.slice(0, -'/index.html'.length);
      files.set(page === '' ? '/' : page, file);
      files.set(`${page}/`, file);
    }
  }
  return files;
}

function isCompressedTwin(name: string, present: ReadonlySet<string>): boolean {
  return Object.values(SUFFIX).some((suffix) => name.endsWith(suffix) && present.has(name.slice(0, -suffix.length)));
}

const TYPES: Readonly<Record<string, string>> = {
  '.css': 'text/css; charset=utf-8',
  '.html': 'text/html; charset=utf-8',
  '.ico': 'image/x-icon',
  '.jpg': 'image/jpeg',
  '.js': 'text/javascript; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.mjs': 'text/javascript; charset=utf-8',
  '.png': 'image/png',
  '.svg': 'image/svg+xml; charset=utf-8',
  '.txt': 'text/plain; charset=utf-8',
  '.vtt': 'text/vtt; charset=utf-8',
  '.webmanifest': 'application/manifest+json; charset=utf-8',
  '.webp': 'image/webp',
  '.woff': 'font/woff',
  '.woff2': 'font/woff2',
  '.xml': 'application/xml; charset=utf-8',
};

function typeOf(name: string): string {
  return TYPES[path.extname(name).toLowerCase()] ?? 'application/octet-stream';
}
