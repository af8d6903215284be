// Judging one tag of a lesson's text: is it ours, may it stand here, does it hold what it should, are its attributes
// in order. What comes back has passed; everything else is told to the writer.
import type { MdxJsxFlowElement, MdxJsxTextElement } from 'mdast-util-mdx-jsx';
import { readAttributeValue } from './attribute-value.ts';
import { attributeNamed, componentNamed, listOfComponents, type ComponentName, type ComponentSchema } from './components.ts';
import { problemAt, type LessonProblem } from './problem.ts';

export type Tag = MdxJsxFlowElement | MdxJsxTextElement;

/** Where a part of the text stands. */
export interface Place {
  /** Within nothing: at the left edge of the text. */
  top: boolean;
  /** The innermost component around it. */
  component?: ComponentName;
  heading?: true;
  link?: true;
}

export type ReadComponent =
  | { ok: true; name: ComponentName; schema: ComponentSchema; props: Record<string, string> }
  | { ok: false; problems: LessonProblem[] };

/** Checks a tag by its component's schema and by the place where it stands. */
export function readComponent(tag: Tag, place: Place): ReadComponent {
  const known = tag.name === null ? undefined : componentNamed(tag.name);
  if (known === undefined) return { ok: false, problems: [problemAt(tag.position, 'component', unknownReason(tag.name))] };
  const { name, schema } = known;
  const misplaced = placeReason(name, schema, place);
  if (misplaced !== undefined) return { ok: false, problems: [problemAt(tag.position, 'place', misplaced)] };
  const read = readAttributes(tag, name, schema);
  const problems = [...read.problems];
  const contents = contentsReason(tag, name, schema);
  if (contents !== undefined) problems.push(problemAt(tag.position, 'component', contents));
  return problems.length > 0 ? { ok: false, problems } : { ok: true, name, schema, props: read.props };
}

function unknownReason(name: string | null): string {
  if (name === null) return 'Empty tags <></> mean nothing in a lesson. Take them out.';
  const tag = name.length > 40 ? `${name.slice(0, 40)}…` : name;
  if (/^[a-z]/.test(name)) return `<${tag}> is not read: lessons hold no HTML. There are ${listOfComponents()}; write \\< if you mean the sign itself.`;
  return `There is no <${tag}>. There are ${listOfComponents()}, written exactly so.`;
}

/** Why a component may not stand here, or undefined when it may; also asked for stored trees. */
export function placeReason(name: ComponentName, schema: ComponentSchema, place: Place): string | undefined {
  if (place.component !== undefined && !schema.within.includes(place.component)) return `<${name}> cannot stand inside <${place.component}>. Close that first.`;
  if (schema.onlyAtTop && !place.top) return `<${name}> stands on its own, not in a list, a quote or anything else. Begin it at the left edge.`;
  if (place.heading === true) return `<${name}> cannot stand in a heading. Put it into the text below.`;
  if (place.link === true) return `<${name}> cannot stand in a link. Close the link first.`;
  return undefined;
}

function contentsReason(tag: Tag, name: ComponentName, schema: ComponentSchema): string | undefined {
  const blank = tag.children.every((child) => child.type === 'text' && child.value.trim() === '');
  if (schema.holds === 'nothing') return blank ? undefined : `<${name}> holds nothing and closes itself. Write it as ${schema.example}.`;
  return blank ? `<${name}> is empty. Write its words between the two tags: ${schema.example}.` : undefined;
}

function readAttributes(tag: Tag, name: ComponentName, schema: ComponentSchema): { props: Record<string, string>; problems: LessonProblem[] } {
  const values = new Map<string, string>();
  const seen = new Set<string>();
  const problems: LessonProblem[] = [];
  for (const attribute of tag.attributes) {
    const place = attribute.position ?? tag.position;
    if (attribute.type === 'mdxJsxExpressionAttribute') {
      problems.push(problemAt(place, 'code', `Curly braces mean code, and lessons hold none. Write each attribute out: ${schema.example}.`));
      continue;
    }
    const expected = attributeNamed(schema, attribute.name);
    if (expected === undefined) {
      problems.push(problemAt(place, 'attribute', `<${name}> has no "${attribute.name.slice(0, 40)}". It takes ${Object.keys(schema.attributes).join(', ')}.`));
    } else if (seen.has(attribute.name)) {
      problems.push(problemAt(place, 'attribute', `"${attribute.name}" is written twice. Keep one of them.`));
    } else if (typeof attribute.value !== 'string') {
      problems.push(problemAt(place, 'attribute', `The value of "${attribute.name}" stands in straight quotes: ${schema.example}.`));
    } else {
      const read = readAttributeValue(expected, attribute.value);
      if (read.ok) values.set(attribute.name, read.value);
      else problems.push(problemAt(place, 'attribute', `"${attribute.name}" of <${name}> does not work. ${read.reason}`));
    }
    seen.add(attribute.name);
  }
  // Where braces stand for attributes, nobody can say which of them are missing.
  if (problems.some((problem) => problem.code === 'code')) return { props: {}, problems };
  for (const [attribute, expected] of Object.entries(schema.attributes)) {
    if (expected.required && !seen.has(attribute)) problems.push(problemAt(tag.position, 'attribute', `<${name}> needs ${attribute}="…": ${expected.says}. Like this: ${schema.example}.`));
  }
  return { props: Object.fromEntries(values), problems };
}
