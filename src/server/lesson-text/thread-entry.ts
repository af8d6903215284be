// Where the file of the parsing thread lies. This module runs from source (tsx, Vitest, the development server), from
// a process bundled to dist/processes and from the site bundled to dist/server; a thread needs a file of its own in
// each of these cases.

/** Address of the thread's file, seen from a module at `here`. */
export function threadEntry(here: string = import.meta.url): URL {
  const source = here.lastIndexOf('/src/server/lesson-text/');
  if (source !== -1) return new URL(`${here.slice(0, source)}/src/server/lesson-text/thread-from-source.mjs`);
  const built = here.lastIndexOf('/dist/');
  if (built !== -1) return new URL(`${here.slice(0, built)}/dist/processes/lesson-text-worker.mjs`);
  throw new Error(`No parsing thread is known for a program at ${here}.`);
}
