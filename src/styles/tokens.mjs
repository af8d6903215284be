// The colours, as channels ("r g b"), so that Tailwind can add alpha. This is their only definition: the Tailwind
// settings turn them into CSS variables for day, evening and paper. Components use roles; ramps are for what keeps its
// colour in both schemes (video, charts, filled verdict buttons).

/** Fixed ramps, light to dark. @type {Record<string, Record<number, string>>} */
export const ramps = {
  wool: {
    0: '248 251 249', 50: '240 243 242', 100: '231 235 233', 200: '220 225 223', 300: '203 209 207', 400: '176 184 184',
    500: '138 148 152', 600: '100 111 119', 700: '74 84 95', 800: '47 57 69',
  },
  woad: {
    100: '221 232 242', 200: '191 212 231', 300: '151 181 211', 400: '109 147 188', 500: '68 110 159', 600: '43 82 131',
    700: '32 61 102', 800: '23 42 71', 900: '17 30 51', 950: '10 19 33',
  },
  weld: {
    100: '248 242 204', 200: '244 232 162', 300: '239 218 106', 400: '232 202 51', 500: '207 175 29', 600: '153 125 12',
    700: '110 88 5', 800: '74 59 5',
  },
  madder: {
    100: '248 224 219', 300: '236 151 137', 400: '223 105 91', 500: '194 67 56', 600: '159 47 39', 700: '129 35 29',
    800: '82 22 18',
  },
  moss: {
    100: '225 236 216', 300: '162 192 134', 400: '125 159 93', 500: '91 126 61', 600: '67 97 43', 700: '51 76 33',
    800: '32 49 23',
  },
};

/** A role's value is either channels of its own or the name of a ramp step. @type {Record<string, string>} */
export const day = {
  ground: 'wool-200', sheet: 'wool-50', field: 'wool-0', sunk: 'wool-300',
  ink: 'woad-900', 'ink-2': 'wool-700', link: 'woad-600',
  rule: 'wool-400', edge: 'wool-600', warp: '197 204 202',
  beam: 'woad-800', act: 'woad-800', 'on-act': 'wool-0', big: 'woad-800',
  weld: 'weld-400', 'weld-edge': 'woad-900', tint: 'weld-100', 'on-tint': 'woad-900',
  mend: 'madder-600', 'mend-tint': 'madder-100', 'on-mend': 'wool-0',
  moss: 'moss-600', 'moss-tint': 'moss-100', 'on-moss': 'wool-0',
  ring: 'woad-900', 'ring-2': 'weld-400',
  bar: 'woad-500', toast: 'woad-900', 'on-toast': 'wool-50', said: 'woad-900', cord: 'wool-600',
};

/** @type {Record<string, string>} */
export const evening = {
  ground: '15 22 33', sheet: '22 32 45', field: '9 15 24', sunk: '9 15 24',
  ink: '224 229 227', 'ink-2': '168 179 187', link: 'woad-300',
  rule: '55 68 84', edge: '120 134 147', warp: '30 41 55',
  beam: '55 68 84', act: '224 229 227', 'on-act': 'woad-950', big: 'woad-700',
  weld: 'weld-400', 'weld-edge': '9 15 24', tint: '54 46 16', 'on-tint': '244 238 208',
  mend: 'madder-300', 'mend-tint': '62 26 24', 'on-mend': 'woad-950',
  moss: 'moss-300', 'moss-tint': '27 42 24', 'on-moss': 'woad-950',
  ring: 'weld-400', 'ring-2': '9 15 24',
  bar: 'woad-400', toast: 'wool-200', 'on-toast': 'woad-900', said: 'weld-400', cord: 'wool-500',
};

/** What a printer gets, whatever the scheme: ink on white. Roles not named here keep their day value. @type {Record<string, string>} */
export const paper = {
  ground: '255 255 255', sheet: '255 255 255', field: '255 255 255', sunk: '255 255 255',
  ink: '0 0 0', 'ink-2': '60 60 60', link: '0 0 0', rule: '150 150 150', edge: '0 0 0', warp: '220 220 220',
  act: '255 255 255', 'on-act': '0 0 0', 'weld-edge': '0 0 0',
  mend: '0 0 0', 'mend-tint': '255 255 255', 'on-mend': '255 255 255',
  moss: '0 0 0', 'moss-tint': '255 255 255', 'on-moss': '255 255 255',
  tint: '255 255 255', 'on-tint': '0 0 0',
};

/**
 * Values beside the colours that change with the scheme: shadow, veil, brightness of cloth and photos, and whether the
 * amount at the loom side stands on a weld marker (day) or is weld itself (evening).
 * @type {Record<'day' | 'evening' | 'paper', Record<string, string>>}
 */
export const light = {
  day: { cast: '17 30 51 / 0.13', veil: '17 30 51 / 0.55', lamp: '1', marker: '1' },
  evening: { cast: '0 0 0 / 0.45', veil: '4 8 14 / 0.7', lamp: '0.92', marker: '0' },
  paper: { cast: '0 0 0 / 0', veil: '0 0 0 / 0', lamp: '1', marker: '0' },
};

/** Channels written out, or a reference to the ramp. @param {string} value */
const channels = (value) => (/^\d/.test(value) ? value : `var(--${value})`);

/** @param {Record<string, string>} roles @param {Record<string, string>} rest @returns {Record<string, string>} */
const variables = (roles, rest) => ({
  ...Object.fromEntries(Object.entries(roles).map(([name, value]) => [`--${name}`, channels(value)])),
  ...Object.fromEntries(Object.entries(rest).map(([name, value]) => [`--${name}`, value])),
});

/**
 * The rules that set all variables. An attribute `data-scheme` on any element decides for what is inside it; without one
 * the system's wish holds.
 * @returns {Record<string, Record<string, unknown>>}
 */
export function tokenRules() {
  const ramp = Object.entries(ramps).flatMap(([name, steps]) => Object.entries(steps).map(([step, value]) => [`--${name}-${step}`, value]));
  const atDay = { colorScheme: 'light', ...variables(day, light.day) };
  const atEvening = { colorScheme: 'dark', ...variables(evening, light.evening) };
  return {
    ':root': Object.fromEntries(ramp),
    ':root, [data-scheme="light"]': atDay,
    '[data-scheme="dark"]': atEvening,
    '@media (prefers-color-scheme: dark)': { ':root:not([data-scheme])': atEvening },
    '@media print': { ':root, :root:not([data-scheme]), [data-scheme]': { colorScheme: 'light', ...variables({ ...day, ...paper }, light.paper) } },
  };
}
