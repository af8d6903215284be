/** A gathering list as plain text: to be sent to somebody, or read where nothing else is shown. */
import type { ShownLine } from '#core/gathering/rows.ts';

const amountOf = ({ amount, also }: ShownLine): string => {
  const much = amount === null ? '' : typeof amount === 'string' ? amount : amount.map(({ text }) => text).join('');
  return [much, also].filter((words) => words !== '').join(', ');
};

function lineText(line: ShownLine, ticked: boolean): string {
  const amount = amountOf(line);
  const standIn = line.standIn === '' ? '' : `\n    or: ${line.standIn}`;
  return `${ticked ? '[x]' : '[ ]'} ${line.name}${amount === '' ? '' : `: ${amount}`}${standIn}`.replaceAll(/[\u00a0\u202f\u2009]/g, ' ');
}

export interface ListTextOptions {
  readonly title: string;
  /** What stands over the yarns: `Yarn`, `Cord`. */
  readonly material: string;
  readonly isTicked?: (line: ShownLine) => boolean;
}

/** Title, then each kind of thing under its heading, one line a thing; ends with a line break. */
export function listText(lines: readonly ShownLine[], { title, material, isTicked = ({ ticked }) => ticked }: ListTextOptions): string {
  const groups = ([['yarn', material], ['tool', 'Tools'], ['material', 'Material']] as const).flatMap(([kind, heading]) => {
    const own = lines.filter((line) => line.kind === kind);
    return own.length === 0 ? [] : [`${heading}\n${own.map((line) => lineText(line, isTicked(line))).join('\n')}`];
  });
  return `${[title, ...groups].join('\n\n')}\n`;
}
