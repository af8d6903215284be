// @ts-check
/** What a person sees once everything runs: where to go, as whom, with which card, and where the letters are. */

/** As the payment service documents its test cards. */
const CARDS = [
  ['4242 4242 4242 4242', 'is paid'],
  ['4000 0000 0000 0002', 'is declined'],
  ['4000 0000 0000 9995', 'has too little money'],
];

const PEOPLE = [
  ['ilse@saltmarsh.example', 'teacher, Low Tide is hers', '/workroom'],
  ['wren@saltmarsh.example', 'helps Ilse at the bench', '/workroom/bench'],
  ['teodor@cordage.example', 'teacher, Three Knotted Cords is his', '/workroom'],
  ['maud@weavers.example', 'student in part 2, her photo waits', '/loom'],
  ['jonas@weavers.example', 'student, nothing done yet', '/loom'],
  ['amara@weavers.example', 'has no seat yet', '/series/low-tide'],
  ['pell@office.example', 'steward', '/office'],
];

/**
 * @param {{ settings: import('./settings.mjs').StartSettings, password: string | undefined }} world
 * @returns {string}
 */
export function welcome({ settings, password }) {
  const ready = `ready ${settings.publicUrl}`;
  if (password === undefined) return `\n${ready}\n\nCtrl-C stops everything and keeps the data.`;
  const standIns = `http://127.0.0.1:${settings.port + 1}`;
  return [
    '',
    ready,
    '',
    `People of the demo (password of each: ${password})`,
    ...PEOPLE.map(([address = '', who = '', begin = '']) => `  ${address.padEnd(24)} ${who.padEnd(38)} begins at ${begin}`),
    '',
    'Cards for the pay page (any date to come, any three digits)',
    ...CARDS.map(([number = '', what = '']) => `  ${number}    ${what}`),
    '',
    `Letters the site sends: ${standIns}/mail`,
    '',
    'Ctrl-C stops everything and keeps the data.',
  ].join('\n');
}
