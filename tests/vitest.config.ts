// Four kinds of test, each with the surroundings it needs. tests/browser has its own runner.
import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

export default defineConfig({
  root,
  test: {
    projects: [
      { test: { name: 'unit', root, include: ['tests/unit/**/*.test.ts', 'tests/reference/**/*.test.ts'], environment: 'node' } },
      // What talks to the outside, against the stand-ins; no database.
      { test: { name: 'stand-ins', root, include: ['tests/server/{payments,stand-ins,mail}/**/*.test.ts'], environment: 'node' } },
    ],
  },
});
