import { expect, test } from 'vitest';
import { listText } from '#core/gathering/list-text.ts';
import type { ShownLine } from '#core/gathering/rows.ts';

const line = (name: string, given: Partial<ShownLine> = {}): ShownLine =>
  ({ key: name, items: [name], kind: 'tool', name, ticked: false, colour: undefined, amount: null, also: '', when: 'Part 1', note: '', standIn: '', lookOut: '', getFrom: '', ...given });

test('a list as text tells each thing with its amount, what may stand in for it, and whether it is there', () => {
  const lines = [
    line('Fenwool 6/2', { kind: 'yarn', amount: [{ kind: 'number', text: '29' }, { kind: 'text', text: '\u00a0' }, { kind: 'unit', text: 'm' }], also: '10\u00a0g, 1 ball', standIn: 'any wool' }),
    line('Blunt needle', { amount: '1', ticked: true }),
    line('Scissors'),
  ];
  expect(listText(lines, { title: 'Gather for Low Tide', material: 'Yarn' })).toBe(`Gather for Low Tide

Yarn
[ ] Fenwool 6/2: 29 m, 10 g, 1 ball
    or: any wool

Tools
[x] Blunt needle: 1
[ ] Scissors
`);
  expect(listText(lines.slice(2), { title: 'T', material: 'Yarn', isTicked: () => true })).toBe('T\n\nTools\n[x] Scissors\n');
});
