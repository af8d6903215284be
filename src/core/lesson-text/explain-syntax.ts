// The parser stops at the first tag or brace it cannot read and says so in its own terms. This says it in a weaver's.
import { COMPONENT_NAMES, componentNamed } from './components.ts';
import type { LessonProblem } from './problem.ts';

interface ParserMessage {
  reason: string;
  ruleId: string;
  line: number;
  column: number;
}

/**
 * The problem behind an error thrown by the parser. Besides its messages it has assertions of its own, which some
 * tangled tags set off in development builds before the message comes: those refuse the text as well.
 */
export function explainSyntaxError(error: unknown, source: string): LessonProblem {
  const message = parserMessage(error);
  if (message === undefined) return { line: 1, column: 1, code: 'markup', reason: 'The text cannot be read as it is. Look for a tag that is opened but not closed, and for headings and tables inside tags.' };
  const { line, column } = message;
  const brace = message.reason.includes('corresponding closing brace') || message.reason.includes('in expression');
  if (brace) {
    return { line, column, code: 'code', reason: 'A curly brace opens here or above and is not closed. Lessons hold no code: write \\{ if you want to show a brace.' };
  }
  return { line, column, code: 'tag', reason: tagReason(message, source) };
}

/** True for an error at a sign within the text: not for one that the end of the text caused, nor for tags that do not match. */
export function isErrorOfSigns(error: unknown): boolean {
  return parserMessage(error)?.ruleId === 'unexpected-character';
}

function tagReason(message: ParserMessage, source: string): string {
  const { reason, ruleId } = message;
  const named = /`<\/?([^`>]{0,80})>`/.exec(reason)?.[1];
  if (ruleId === 'end-tag-mismatch') return unclosedReason(named ?? '');
  if (ruleId === 'unexpected-closing-slash') return 'This tag closes something that was never opened. Take it out, or open it above.';
  if (ruleId === 'unexpected-attribute' || ruleId === 'unexpected-self-closing-slash') return 'A closing tag holds nothing but its name, such as </Step>.';
  if (reason.includes('character `!`')) return 'Hidden remarks cannot stand in a lesson. Keep your notes elsewhere, and take this one out.';
  if (reason.includes('before attribute value') || reason.includes('in attribute value')) return 'Values stand in straight quotes, such as title="Mind the nails".';
  if (reason.includes('before local name') || reason.includes('`@`')) return 'A bare address in < and > is not read. Write it as a link: [what it is](https://…).';
  if (reason.includes('end of file') && reason.includes('name')) return 'A tag opens here and does not end. Write \\< if you mean the sign itself.';
  if (reason.includes('attribute name') || reason.includes('in name') || reason.includes('after name')) {
    return `This tag cannot be read. It looks like this when it is right: ${exampleNear(message, source)}. Write \\< if you mean the sign itself.`;
  }
  return 'After < comes the name of a component, such as <Step>. Write \\< if you mean the sign itself.';
}

function unclosedReason(name: string): string {
  const known = componentNamed(name);
  if (known?.schema.holds === 'nothing') return `<${name}> holds nothing and closes itself. Write it as ${known.schema.example}.`;
  const tag = name === '' ? 'This tag' : `<${name}>`;
  return `${tag} is opened but not closed where it should be. Both tags belong at the same place in the text: put each on a line of its own.`;
}

/** The example of the component the writer seems to mean, by the words of the line. */
function exampleNear(message: ParserMessage, source: string): string {
  const line = source.split('\n', message.line)[message.line - 1] ?? '';
  const name = COMPONENT_NAMES.find((each) => line.includes(`<${each}`)) ?? 'Step';
  return componentNamed(name)?.schema.example ?? '';
}

function parserMessage(error: unknown): ParserMessage | undefined {
  if (!(error instanceof Error) || !('reason' in error) || !('ruleId' in error)) return undefined;
  const { reason, ruleId } = error;
  if (typeof reason !== 'string' || typeof ruleId !== 'string') return undefined;
  const line = 'line' in error && typeof error.line === 'number' ? error.line : 1;
  const column = 'column' in error && typeof error.column === 'number' ? error.column : 1;
  return { reason, ruleId, line, column };
}
