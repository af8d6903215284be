// The colours as the browser gets them: read from the rules Tailwind writes, not from the table they are made of.
import postcss, { type Root } from 'postcss';
import tailwind from 'tailwindcss';
import config from '../../../tailwind.config.mjs';
import type { Channels } from './contrast.ts';

export type Scheme = 'day' | 'evening' | 'evening by the system' | 'paper';

const selectors: Record<Scheme, { readonly media: string | null; readonly selector: string }> = {
  day: { media: null, selector: '[data-scheme="light"]' },
  evening: { media: null, selector: '[data-scheme="dark"]' },
  'evening by the system': { media: '(prefers-color-scheme: dark)', selector: ':root:not([data-scheme])' },
  paper: { media: 'print', selector: '[data-scheme]' },
};

export async function shippedSheet(): Promise<Root> {
  const { css } = await postcss([tailwind({ ...config, content: [{ raw: '' }] })]).process('@tailwind base;', { from: undefined });
  return postcss.parse(css);
}

/** All variables that hold in a scheme, with those that hold everywhere. */
export function variables(sheet: Root, scheme: Scheme): Map<string, string> {
  const found = new Map<string, string>();
  const { media, selector } = selectors[scheme];
  sheet.walkDecls(/^--/, (declaration) => {
    const rule = declaration.parent;
    if (rule?.type !== 'rule') return;
    const inMedia = rule.parent instanceof postcss.AtRule ? rule.parent.params : null;
    const names = 'selectors' in rule ? rule.selectors : [];
    const everywhere = inMedia === null && names.length === 1 && names[0] === ':root';
    if (everywhere || (inMedia === media && names.includes(selector))) found.set(declaration.prop.slice(2), declaration.value);
  });
  return found;
}

/** The channels of a colour, followed through `var()`. */
export function colour(all: ReadonlyMap<string, string>, name: string): Channels {
  const value = all.get(name);
  if (value === undefined) throw new Error(`The sheet has no colour called ${name}`);
  const other = /^var\(--(.+)\)$/.exec(value)?.[1];
  if (other !== undefined) return colour(all, other);
  const [r, g, b] = value.split(' ').map(Number);
  if (r === undefined || g === undefined || b === undefined || [r, g, b].some((channel) => !(channel >= 0 && channel <= 255))) throw new Error(`${name} is no colour: ${value}`);
  return [r, g, b];
}
