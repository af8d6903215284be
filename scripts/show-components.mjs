// Puts all components at /_components, and the frames of pages below it, in development only: the built site does not
// know these routes.
const shown = { '/_components': 'day-and-evening', '/_components/lesson': 'lesson', '/_components/workroom': 'workroom', '/_components/door': 'door' };

/** @returns {import('astro').AstroIntegration} */
export function showComponents() {
  return {
    name: 'show-components',
    hooks: {
      'astro:config:setup': ({ command, injectRoute }) => {
        if (command !== 'dev') return;
        for (const [pattern, page] of Object.entries(shown)) injectRoute({ pattern, entrypoint: `./src/pages/_components/${page}.astro`, prerender: true });
      },
    },
  };
}
