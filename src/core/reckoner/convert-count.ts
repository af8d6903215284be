/** One count turned into all the others, from two fields of the reckoner: what the handbook's converter answers. */
import type { Yarn } from '#core/craft/piece.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { reckonYarn } from '#core/craft/reckoning/reckon-yarn.ts';
import type { AnswerLine } from '#core/reckoner/answer-line.ts';
import { FormReader } from '#core/reckoner/form-reader.ts';
import { readTypedYarn, YARN_WAYS } from '#core/reckoner/read-fields.ts';
import { RECKONER_DEFAULTS } from '#core/reckoner/reckoner-form.ts';
import { countLines, plyLines, thicknessLines } from '#core/reckoner/yarn-lines.ts';

export interface Converted {
  /** The way that was asked for, or the first one in its place. */
  readonly way: string;
  readonly typed: string;
  /** What is wrong with what was typed; then there are no lines. */
  readonly wrong?: string;
  readonly lines: readonly AnswerLine[];
  /** What is worth knowing, such as a notation that can be read in two ways. */
  readonly notes: readonly string[];
}

/** What the converter shows before anything is typed: a yarn whose counts are told on the page. */
export const CONVERTER_EXAMPLE = { way: 'nm', typed: '16/2' } as const;

/**
 * @param way one of the ways a thickness is told, by its value in `YARN_WAYS`
 * @param typed as it stands on the label: `16`, `8/2`, `12,5`
 */
export function convertCount(way: string, typed: string): Converted {
  const known = YARN_WAYS.find(({ value }) => value === way)?.value ?? YARN_WAYS[0].value;
  const of = { way: known, typed };
  const reader = new FormReader({ ...RECKONER_DEFAULTS, 'yarn-by': known, yarn: typed });
  const yarn = readTypedYarn(reader);
  if (yarn === undefined || reader.errors.yarn !== undefined) return { ...of, wrong: reader.errors.yarn ?? UNREAD, lines: [], notes: [] };
  return { ...of, ...answer(yarn) };
}

const UNREAD = 'That is no number this count can have.';

function answer(yarn: Yarn): Pick<Converted, 'wrong' | 'lines' | 'notes'> {
  const findings = Findings.in('cm');
  const told = findings.outcome(reckonYarn(Fields.of({ yarn }, '', 'A yarn', findings)));
  if (!told.ok) return { wrong: told.problems[0]?.message ?? UNREAD, lines: [], notes: [] };
  return { lines: [...plyLines(yarn, told.value), ...countLines(told.value, 'cm'), ...thicknessLines(told.value, yarn)], notes: told.value.warnings.map(({ message }) => message) };
}
