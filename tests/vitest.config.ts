// Four kinds of test, each with the surroundings it needs. tests/browser has its own runner.
import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

export default defineConfig({
  root,
  test: {
    projects: [
      { test: { name: 'unit', root, include: ['tests/unit/**/*.test.ts', 'tests/reference/**/*.test.ts'], environment: 'node' } },
      {
        test: {
          name: 'server', root, environment: 'node',
          include: ['tests/server/**/*.test.ts'],
          exclude: ['tests/server/{payments,stand-ins,mail,web/front}/**'],
          setupFiles: ['tests/support/server-setup.ts'],
          pool: 'forks', maxWorkers: 2, isolate: true, testTimeout: 20_000, hookTimeout: 60_000,
        },
      },
      // What talks to the outside, against the stand-ins; no database.
      { test: { name: 'stand-ins', root, include: ['tests/server/{payments,stand-ins,mail}/**/*.test.ts'], environment: 'node' } },
    ],
  },
});
