// Components drawn as the site draws them. Apart from the other kinds, because Astro's whole build has to come up first.
import { getViteConfig } from 'astro/config';

const root = new URL('../..', import.meta.url).pathname;
const test = { name: 'astro', root, include: ['tests/astro/**/*.test.ts'], environment: 'node', env: { TZ: 'America/New_York' }, testTimeout: 60_000, hookTimeout: 120_000 };

export default getViteConfig({ test });
