/** Material as one would buy it: each yarn once, however many roles it plays. */
import type { Material } from '#core/craft/craft.ts';

export interface YarnLine {
  /** `Fenwool 6/2`. */
  readonly name: string;
  /** What sets it apart from its sisters: `Slack Water`. Empty when the label says no more. */
  readonly detail: string;
  readonly colour: string | undefined;
  /** To have in hand, margins included; undefined for what is only weighed. */
  readonly lengthMm: number | undefined;
  readonly grams: number;
}

export interface YarnTable {
  readonly lines: readonly YarnLine[];
  readonly grams: number;
}

function lineOf({ name: role, label, colour, lengthMm, grams }: Material): YarnLine {
  const [name = '', ...detail] = (label ?? role).split(',').map((part) => part.trim());
  return { name: name === '' ? role : name, detail: detail.join(', '), colour, lengthMm, grams };
}

const sum = (a: number | undefined, b: number | undefined): number | undefined => (a === undefined && b === undefined ? undefined : (a ?? 0) + (b ?? 0));

/** In the order of the materials. */
export function yarnLines(materials: readonly Material[]): YarnTable {
  const together = new Map<string, YarnLine>();
  for (const material of materials) {
    if (material.lengthMm === 0) continue;
    const line = lineOf(material);
    const key = `${line.name}|${line.detail}|${line.colour ?? ''}`;
    const before = together.get(key);
    together.set(key, before === undefined ? line : { ...line, lengthMm: sum(before.lengthMm, line.lengthMm), grams: before.grams + line.grams });
  }
  const lines = [...together.values()];
  return { lines, grams: lines.reduce((total, { grams }) => total + grams, 0) };
}
