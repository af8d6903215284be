/**
 * Four kinds of test, each with the surroundings it needs; tests/browser has its own runner.
 * `npm test -- unit` runs one kind; `npx vitest run --config tests/vitest.config.ts --project server tests/server/db` one folder.
 */
import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;
const shared = {
  root,
  /** A zone far from UTC with daylight saving, so that a mistaken local time shows. */
  env: { TZ: 'America/New_York' },
  maxWorkers: 2,
  /** How long a test takes is a matter of benches; here only one that hangs may end by time. */
  testTimeout: 60_000,
  hookTimeout: 60_000,
};
/** These talk to the outside, stand at the door or run beside, and need no database. */
const withoutDatabase = 'tests/server/{payments,stand-ins,mail,lesson-text,web/front,drawing,start}/**/*.test.ts';

export default defineConfig({
  root,
  test: {
    /** `npm run coverage`: of the craft, in which every branch is a number somebody weaves by. */
    coverage: {
      provider: 'v8',
      include: ['src/core/craft/**/*.ts'],
      reporter: [['text', { skipFull: true }]],
      thresholds: { branches: 95 },
    },
    projects: [
      { test: { name: 'unit', ...shared, include: ['tests/unit/**/*.test.ts', 'tests/reference/**/*.test.ts'], environment: 'node' } },
      { test: { name: 'islands', ...shared, include: ['tests/islands/**/*.test.{ts,tsx}'], environment: 'jsdom', setupFiles: ['tests/support/islands-setup.ts'] } },
      {
        test: {
          name: 'server', ...shared, environment: 'node',
          // Two modules that only Astro's own build knows.
          alias: { 'astro:middleware': `${root}tests/support/astro-middleware.ts`, 'astro:actions': `${root}tests/support/astro-actions.ts` },
          include: ['tests/server/**/*.test.ts'],
          // Minutes each: run by themselves, `npm run test:slow`.
          exclude: [withoutDatabase, ...process.env['FELLMARK_TEST_SLOW'] === 'on' ? [] : ['tests/server/**/*.slow.test.ts']],
          globalSetup: ['tests/support/database-server.ts'],
          setupFiles: ['tests/support/server-setup.ts'],
          pool: 'forks', isolate: true,
        },
      },
      { test: { name: 'edge', ...shared, include: [withoutDatabase], environment: 'node' } },
    ],
  },
});
