// Puts the page of all components at /_components, in development only: the built site does not know the route.

/** @returns {import('astro').AstroIntegration} */
export function showComponents() {
  return {
    name: 'show-components',
    hooks: {
      'astro:config:setup': ({ command, injectRoute }) => {
        if (command === 'dev') injectRoute({ pattern: '/_components', entrypoint: './src/pages/_components/day-and-evening.astro', prerender: true });
      },
    },
  };
}
