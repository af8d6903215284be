/** Stands in for `astro:middleware`, which only Astro's own build knows. */
export function defineMiddleware<T>(handler: T): T {
  return handler;
}
