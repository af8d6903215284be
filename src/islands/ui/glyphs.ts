// The house's own glyphs, drawn as threads on a 20 by 20 field (line ends round, 1.6 thick; see `.g` in the sheet).
// Plain data, so that pages (Glyph.astro) and islands (Glyph.tsx) draw the same ones.

export const glyphs = {
  // where a thing stands
  on: 'M3.5 10.5l4.2 4.3L16.8 5.6', // the hook that says weave on
  mend: 'M1.5 11.2h3.8c2.6 0 1.8-5.2 4.2-5.2M18.5 8.8h-3.8c-2.6 0-1.8 5.2-4.2 5.2', // a broken thread
  waits: 'M5 3v14M10 3v14M15 3v14', // three bare warps
  opens: 'M3.8 5h12.4v11.2H3.8zM3.8 9h12.4M7.4 3v3.6M12.6 3v3.6', // a leaf of the calendar
  held: 'M2 6c5.2 0 6.4 8 10.6 8a3.6 3.6 0 0 0 0-7.2C8.2 6.8 7.2 14 2 14', // an overhand knot
  here: 'M2.5 13.6h15M6 3v7.4M10 3v7.4M14 3v7.4', // the fell under its warps
  care: 'M10 3l8 13.6H2zM10 8v4.2M10 14.3v.01',
  info: 'M10 3a7 7 0 1 0 0 14a7 7 0 1 0 0-14zM10 9.2v4.6M10 6.3v.01',
  // places
  loom: 'M3.2 2.5v15M16.8 2.5v15M3.2 4.2h13.6M3.2 15.8h13.6M6.6 4.2v11.6M10 4.2v11.6M13.4 4.2v11.6M3.2 11.6h13.6',
  bench: 'M2 7.2h16v3.6H2zM4.4 10.8V17M15.6 10.8V17M6 7.2V4h8v3.2',
  today: 'M3 17V4.8M17 17V4.8M3 4.8h14M6.6 4.8V11M10 4.8V14M13.4 4.8V9',
  people: 'M7 4a2.8 2.8 0 1 0 .1 0M2 16.2c0-3.6 2-5.4 5-5.4s5 1.8 5 5.4M13 5a2.4 2.4 0 1 1 .9 4.5M14.4 11.4c2.3.4 3.6 2 3.6 4.8',
  coin: 'M10 3a7 7 0 1 0 0 14a7 7 0 1 0 0-14zM12.6 7.4c-3.1-1.7-5.2.1-5.2 2.6s2.1 4.3 5.2 2.6M5.9 9.1h4.4M5.9 10.9h4.4',
  series: 'M3.5 3.5h13M5.2 3.5v9M8.4 3.5v11M11.6 3.5v11M14.8 3.5v9M5.2 7h9.6M5.2 10h9.6M8.4 14.5v2.3M11.6 14.5v2.3', // pieces from one rail
  book: 'M10 5.2C7.8 3.6 5.2 3.4 2.8 4v11.6c2.4-.6 5-.4 7.2 1.2M10 5.2c2.2-1.6 4.8-1.8 7.2-1.2v11.6c-2.4-.6-5-.4-7.2 1.2zM10 5.2v11.6',
  reckoner: 'M4 3h12v14H4zM7 3v14M13 3v14M4 7h12M10 7v10M4 11.4h12', // an abacus of ends and picks
  gather: 'M3 5l1.5 1.5L7 3.8M3 11l1.5 1.5L7 9.8M10 5.4h7M10 11.4h7M10 16.6h7M3 16.6h3.4',
  office: 'M3 17V8l7-5 7 5v9zM3 10.6h14M7 17v-6.4M13 17v-6.4',
  person: 'M10 3.4a3.3 3.3 0 1 0 .1 0M3.6 17c.3-4.2 2.7-6.2 6.4-6.2s6.1 2 6.4 6.2',
  // yarn and tools
  skein: 'M10 3a7 7 0 1 0 0 14a7 7 0 1 0 0-14zM4.5 6c5 .5 8.5 4 9.5 9.5M3.2 9.6c4 .5 6.5 3 7.3 7M8 3.3c4.5 1 7.5 4 8.5 8.5',
  shuttle: 'M2 10c3-3 13-3 16 0c-3 3-13 3-16 0zM6.6 10h6.8M10 12.2c2.4 2.2 4 3.6 8 3.8',
  butterfly: 'M10 10C6.4 4.6 3 4.4 3 7.4S6.4 12 10 10c3.6-2 7-5.6 7-2.6s-3.4 5-7 2.6zM9 9v2.4M11 9v2.4M10 11.6v5.4',
  ruler: 'M2.5 7h15v6h-15zM5.5 7v2.6M8.5 7v3.6M11.5 7v2.6M14.5 7v3.6',
  scissors: 'M4.6 12.4a2.3 2.3 0 1 0 .1 0M15.4 12.4a2.3 2.3 0 1 1-.1 0M6.2 13L14 3M13.8 13L6 3',
  // doing
  up: 'M10 16.4V4M4.8 9.2L10 4l5.2 5.2',
  down: 'M10 3.6V16M4.8 10.8L10 16l5.2-5.2',
  back: 'M16.4 10H4M9.2 4.8L4 10l5.2 5.2',
  next: 'M3.6 10H16M10.8 4.8L16 10l-5.2 5.2',
  plus: 'M10 4v12M4 10h12',
  minus: 'M4 10h12',
  close: 'M5 5l10 10M15 5L5 15',
  grip: 'M7 5v.01M13 5v.01M7 10v.01M13 10v.01M7 15v.01M13 15v.01',
  copy: 'M7.2 7.2H17V17H7.2zM12.8 7.2V3H3v9.8h4.2',
  takeOut: 'M4 6h12M8 6V3.4h4V6M5.4 6l.9 11h7.4l.9-11M8.6 9v5M11.4 9v5',
  undo: 'M4 8h8.2a4 4 0 0 1 0 8H8M7.6 4.4L4 8l3.6 3.6',
  turn: 'M4 8a6.5 6.5 0 0 1 12-.6M16.4 3.4v4h-4M16 12a6.5 6.5 0 0 1-12 .6M3.6 16.6v-4h4',
  search: 'M13 13l4.4 4.4M8.5 3a5.5 5.5 0 1 0 0 11a5.5 5.5 0 1 0 0-11z',
  write: 'M4 16.4l.8-3.8L13.6 3.8l3 3L7.8 15.6zM11.6 5.8l3 3',
  print: 'M6 7V3h8v4M6 14.4H3V7h14v7.4h-3M6 12h8v5H6z',
  save: 'M10 3v9.8M6 8.8l4 4 4-4M4 17h12',
  send: 'M2.8 10L17.2 3.4 13 16.8l-3.4-5.6zM9.6 11.2l7.6-7.8',
  ask: 'M3 4h14v9.6H9.2L5.6 17v-3.4H3z',
  gift: 'M3 8h14v9H3zM3 8V6h14v2M10 6v11M10 6C6.2 6 6 2.2 8.2 2.4S10 6 10 6s-.4-3.4 1.8-3.6S13.8 6 10 6z',
  post: 'M2.8 5h14.4v10.4H2.8zM2.8 5.6l7.2 5.6 7.2-5.6',
  signOut: 'M8.6 3.4H3.8v13.2h4.8M7.6 10h9.2M13 6.2l3.8 3.8-3.8 3.8',
  link: 'M8.4 11.6a3.4 3.4 0 0 0 5 .3l2.3-2.3a3.4 3.4 0 0 0-4.8-4.8L9.6 6.1M11.6 8.4a3.4 3.4 0 0 0-5-.3L4.3 10.4a3.4 3.4 0 0 0 4.8 4.8l1.3-1.3',
  // seeing and hearing
  photo: 'M3 6h3l1.5-2.2h5L14 6h3v10.2H3zM10 8a3 3 0 1 0 0 6a3 3 0 1 0 0-6z',
  play: 'M6 3.6l10.2 6.4L6 16.4z',
  pause: 'M6.4 4v12M13.6 4v12',
  captions: 'M2.6 5h14.8v10.2H2.6zM9 8.6c-2.5-1.5-4 .2-4 1.5s1.5 3 4 1.4M15 8.6c-2.5-1.5-4 .2-4 1.5s1.5 3 4 1.4',
  full: 'M3 8V3h5M12 3h5v5M17 12v5h-5M8 17H3v-5',
  sound: 'M3 8v4h3l4 3.4V4.6L6 8zM13 7.4a3.6 3.6 0 0 1 0 5.2M15 5a7 7 0 0 1 0 10',
  quietSound: 'M3 8v4h3l4 3.4V4.6L6 8zM13.2 7.8l4.4 4.4M17.6 7.8l-4.4 4.4',
  signal: 'M3 16v-3M8 16v-6M13 16V7M17.4 3L2.6 17.4', // none there
  wake: 'M10 6.5a3.5 3.5 0 1 0 .1 0M10 1.8v2M10 16.2v2M1.8 10h2M16.2 10h2M4.2 4.2l1.4 1.4M14.4 14.4l1.4 1.4M15.8 4.2l-1.4 1.4M5.6 14.4l-1.4 1.4',
  eye: 'M1.8 10c3.6-6.2 12.8-6.2 16.4 0c-3.6 6.2-12.8 6.2-16.4 0zM10 7.4a2.6 2.6 0 1 0 .1 0',
  menu: 'M3 5.4h14M3 10h14M3 14.6h14',
  more: 'M4.6 10v.01M10 10v.01M15.4 10v.01',
} as const;

export type GlyphName = keyof typeof glyphs;

/** Classes that set a glyph's size in pixels. */
export const glyphSizes = { 20: 'g', 24: 'g g-24', 32: 'g g-32', 40: 'g g-40' } as const;
export type GlyphSize = keyof typeof glyphSizes;
