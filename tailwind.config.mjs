// The house's scale and colours in Tailwind's words. Values of the colours: src/styles/tokens.mjs.
import plugin from 'tailwindcss/plugin.js';
import { day, ramps, tokenRules } from './src/styles/tokens.mjs';

/** @param {string} name */
const channel = (name) => `rgb(var(--${name}) / <alpha-value>)`;

/** @param {string} name */
const ramp = (name) => Object.fromEntries(Object.keys(ramps[name] ?? {}).map((step) => [step, channel(`${name}-${step}`)]));

const rampNames = Object.keys(ramps);
const roles = Object.keys(day).filter((role) => !rampNames.includes(role));

/** @type {import('tailwindcss').Config} */
export default {
  content: ['./src/**/*.{astro,tsx,ts,mdx}', './content/handbook/**/*.mdx'],
  // A person's choice wins; without one, the system's wish (the same order as in the tokens).
  darkMode: ['variant', ['[data-scheme="dark"] &', '@media (prefers-color-scheme: dark) { :root:not([data-scheme]) & }']],
  theme: {
    screens: { hand: '520px', desk: '900px', wide: '1180px', loom: '1280px' },
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(roles.map((role) => [role, channel(role)])),
      wool: ramp('wool'),
      woad: ramp('woad'),
      weld: { DEFAULT: channel('weld'), ...ramp('weld') },
      madder: ramp('madder'),
      moss: { DEFAULT: channel('moss'), ...ramp('moss') },
    },
    fontFamily: {
      serif: ['Lora', 'Georgia', '"Times New Roman"', 'serif'],
      sans: ['"Sofia Sans Variable"', '"Sofia Sans"', '"Segoe UI"', '"Helvetica Neue"', 'Arial', 'sans-serif'],
    },
    // Named by their nominal pixels on a desk. Sofia Sans is small on the body, so interface text is 17 px.
    fontSize: {
      12: ['.8125rem', '1.3'],
      14: ['.9375rem', '1.45'],
      16: ['1.0625rem', '1.45'],
      18: ['1.1875rem', '1.62'],
      21: ['1.375rem', '1.3'],
      28: ['clamp(1.5rem, 1.3rem + .8vw, 1.875rem)', '1.18'],
      40: ['clamp(1.875rem, 1.4rem + 2vw, 2.75rem)', '1.1'],
      56: ['clamp(2.25rem, 1.5rem + 3.2vw, 3.75rem)', '1.04'],
      fig: ['1.75rem', '1.15'],
      price: ['2.25rem', '1.1'],
      side: ['clamp(2.25rem, 5.2vw, 5rem)', '1.13'],
    },
    spacing: {
      0: '0', px: '1px', 1: '4px', 2: '8px', 3: '12px', 4: '16px', 5: '24px', 6: '32px', 7: '48px', 8: '64px', 9: '96px', touch: '44px',
    },
    borderRadius: { none: '0', DEFAULT: '2px', key: '3px', full: '9999px' },
    boxShadow: {
      none: 'none',
      cast: '6px 7px 0 rgb(var(--cast))',
      fell: 'inset 0 -4px 0 rgb(var(--weld))',
      'fell-wide': 'inset 0 -7px 0 rgb(var(--weld))',
      'fell-over': 'inset 0 4px 0 rgb(var(--weld))',
    },
    transitionDuration: { beat: '140ms', shed: '240ms' },
    transitionTimingFunction: { beat: 'cubic-bezier(.3, .05, .2, 1)' },
    extend: {
      maxWidth: { page: '1200px', read: '36em' },
      gridTemplateColumns: {
        lesson: '272px minmax(0, 1fr) 276px',
        bench: '248px minmax(0, 1fr) 336px',
        design: '424px minmax(0, 1fr) 268px',
        gather: 'minmax(0, 1fr) 320px',
        day: 'minmax(0, 1fr) 420px',
        money: 'minmax(0, 1fr) 348px',
      },
    },
  },
  plugins: [plugin(({ addBase }) => addBase(tokenRules()))],
};
