// Puts the front of the built server before the development server too, so that addresses, limits and people's files
// behave alike in both.

/** @returns {import('astro').AstroIntegration} */
export function devFront() {
  return {
    name: 'dev-front',
    hooks: {
      'astro:server:setup': ({ server }) => {
        /** @type {Promise<import('../src/server/web/front/handler.ts').Handler> | undefined} */
        let front;
        const load = async () => {
          const [{ developmentFront }, { config }] = await Promise.all([
            server.ssrLoadModule('/src/server/web/front/front.ts'),
            server.ssrLoadModule('/src/server/config.ts'),
          ]);
          const { publicUrl, uploadsFolder, trustedProxies } = config();
          return developmentFront({ publicUrl, uploadsFolder, trustedProxies, loopback: true });
        };
        server.middlewares.use((request, response, next) => {
          front ??= load();
          front.then((handle) => handle(request, response, next), next);
        });
      },
    },
  };
}
