// Four kinds of test, each with the surroundings it needs. tests/browser has its own runner.
import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

export default defineConfig({
  root,
  test: {
    projects: [
      { test: { name: 'unit', root, include: ['tests/unit/**/*.test.ts', 'tests/reference/**/*.test.ts'], environment: 'node' } },
    ],
  },
});
