// The plain compiler knows nothing of .astro files; `astro check` does, and looks at their props.
declare module '*.astro' {
  const component: import('astro/runtime/server/index.js').AstroComponentFactory;
  export default component;
}

// As much of jsdom as reads a drawn page; it comes without types.
declare module 'jsdom' {
  export class JSDOM {
    constructor(text: string, options?: { readonly contentType: 'application/xml' });
    readonly window: { readonly document: Document };
  }
}
