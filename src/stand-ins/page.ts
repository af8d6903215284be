import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { html, type Html } from './html.ts';
import type { Answerer, Reply } from './http.ts';
import { LOOK } from './look.ts';

/** Nothing runs and nothing is fetched from elsewhere; forms go where `formTargets` says. */
export function pagePolicy(formTargets: readonly string[] = []): string {
  return `default-src 'none'; style-src 'self'; font-src 'self'; img-src data:; frame-src 'self'; form-action 'self' ${formTargets.join(' ')}; base-uri 'none'; frame-ancestors 'none'`;
}

/** The frame of every page. */
export function page(title: string, body: Html): Html {
  return html`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${title} · Fellmark stand-ins</title>
<link rel="icon" href="data:,">
<link rel="stylesheet" href="/stand-ins/look.css">
</head>
<body>
<div class="page">
<header class="head">
<span><strong>Stand-ins</strong> for trials and demonstrations</span>
<nav aria-label="Stand-ins"><a href="/mail">Mail tray</a></nav>
</header>
<main>
${body}
</main>
</div>
</body>
</html>
`;
}

const FONTS: Readonly<Record<string, string>> = {
  '/stand-ins/sofia-sans.woff2': '@fontsource-variable/sofia-sans/files/sofia-sans-latin-wght-normal.woff2',
  '/stand-ins/lora.woff2': '@fontsource/lora/files/lora-latin-500-normal.woff2',
};

/** Serves the sheet and the two faces. */
export function lookAnswerer(): Answerer {
  const require = createRequire(import.meta.url);
  return ({ method, path }) => {
    if (method !== 'GET') return undefined;
    if (path === '/stand-ins/look.css') return file('text/css; charset=utf-8', LOOK);
    const font = FONTS[path];
    return font === undefined ? undefined : file('font/woff2', readFileSync(require.resolve(font)));
  };
}

function file(type: string, body: string | Buffer): Reply {
  return { status: 200, headers: { 'content-type': type, 'cache-control': 'max-age=300', 'x-content-type-options': 'nosniff' }, body };
}
