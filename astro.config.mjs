// The site: server-rendered by default, with React only where a page must answer the hand at once.
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'astro/config';
import node from '@astrojs/node';
import react from '@astrojs/react';
import mdx from '@astrojs/mdx';
import tailwind from '@astrojs/tailwind';
import { devFront } from './scripts/dev-front.mjs';
import { showComponents } from './scripts/show-components.mjs';

export default defineConfig({
  output: 'server',
  // Our own HTTP server stands in front (src/processes/web.ts): it knows limits, ranges and graceful stop.
  adapter: node({ mode: 'middleware' }),
  integrations: [react(), mdx(), tailwind({ applyBaseStyles: false }), showComponents(), devFront()],
  trailingSlash: 'ignore',
  // Our middleware checks origins against the address set at run time; Astro's own check is frozen at build time.
  security: { checkOrigin: false },
  experimental: {
    liveContentCollections: true,
    // Scripts and styles by their hashes; form targets and framing are added at run time (src/server/web/page-headers.ts).
    csp: {
      directives: [
        "default-src 'none'", "connect-src 'self'", "img-src 'self' blob: data:", "media-src 'self' blob:", "font-src 'self'",
        "worker-src 'self' blob:", "base-uri 'none'", "object-src 'none'", "manifest-src 'self'",
      ],
    },
  },
  devToolbar: { enabled: false },
  vite: {
    // A lesson's text is read in a worker, where the browser's own file of this package finds no document to ask.
    resolve: { alias: { 'decode-named-character-reference': fileURLToPath(import.meta.resolve('decode-named-character-reference')) } },
    worker: { format: 'es' },
    ssr: { external: ['sequelize', 'mariadb', 'sharp', '@node-rs/argon2', 'stripe', 'nodemailer', 'multer'] },
  },
});
