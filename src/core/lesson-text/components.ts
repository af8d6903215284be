// The parts of our own that a lesson's text may use, as data: where each may stand, what it may hold and which
// attributes it takes. The reader, the check of stored trees and the writer's help all follow this one table.

import { FIGURE_KINDS } from '#core/craft/figures/figure-kinds.ts';

/** How one attribute's value is judged. All values are text in quotes; there are no numbers, switches or code. */
export type AttributeSchema =
  | { kind: 'name'; required: boolean; says: string }
  | { kind: 'amount'; required: boolean; says: string }
  | { kind: 'choice'; required: boolean; says: string; options: readonly string[] }
  | { kind: 'words'; required: boolean; says: string; maximum: number; mayBeEmpty?: boolean };

export interface ComponentSchema {
  /** Stands among paragraphs (`block`) or within a sentence (`inline`). */
  stands: 'block' | 'inline';
  /** `blocks`: must hold paragraphs, lists …; `nothing`: closes itself. */
  holds: 'blocks' | 'nothing';
  /** Components it may stand in; anywhere else a component is refused. Plain text and lists do not count. */
  within: readonly ComponentName[];
  /** True when it must stand at the left edge of the text, within nothing at all. */
  onlyAtTop: boolean;
  /** An example a writer can copy. */
  example: string;
  attributes: Readonly<Record<string, AttributeSchema>>;
}

export const COMPONENT_NAMES = ['Step', 'Caution', 'Tip', 'Amount', 'Figure', 'Picture', 'Video'] as const;

export type ComponentName = (typeof COMPONENT_NAMES)[number];

const caption = { kind: 'words', required: false, maximum: 200, says: 'the line under it' } as const;

const schemas: Readonly<Record<ComponentName, ComponentSchema>> = {
  Step: {
    stands: 'block',
    holds: 'blocks',
    within: [],
    onlyAtTop: true,
    example: '<Step id="tie-on">Tie on at the first nail.</Step>',
    attributes: { id: { kind: 'name', required: true, says: 'a short name for the step' } },
  },
  Caution: {
    stands: 'block',
    holds: 'blocks',
    within: ['Step'],
    onlyAtTop: false,
    example: '<Caution title="Mind the nails">Push a cork on the corner nails.</Caution>',
    attributes: { title: { kind: 'words', required: true, maximum: 120, says: 'what the caution is about' } },
  },
  Tip: {
    stands: 'block',
    holds: 'blocks',
    within: ['Step'],
    onlyAtTop: false,
    example: '<Tip title="If the thread runs out">Join at a nail.</Tip>',
    attributes: { title: { kind: 'words', required: false, maximum: 120, says: 'what the tip is about' } },
  },
  Amount: {
    stands: 'inline',
    holds: 'nothing',
    within: ['Step', 'Caution', 'Tip'],
    onlyAtTop: false,
    example: '<Amount of="warp"/>',
    attributes: { of: { kind: 'amount', required: true, says: 'which amount of the plan' } },
  },
  Figure: {
    stands: 'block',
    holds: 'nothing',
    within: ['Step', 'Tip'],
    onlyAtTop: false,
    example: '<Figure of="soumak" caption="Over four, back two."/>',
    attributes: { of: { kind: 'choice', required: true, options: FIGURE_KINDS, says: 'which figure' }, caption },
  },
  Picture: {
    stands: 'block',
    holds: 'nothing',
    within: ['Step', 'Caution', 'Tip'],
    onlyAtTop: false,
    example: '<Picture name="warped-loom" alt="A frame loom with 66 ends, seen from above"/>',
    attributes: {
      name: { kind: 'name', required: true, says: 'the name the picture has in this series' },
      alt: { kind: 'words', required: true, maximum: 200, mayBeEmpty: true, says: 'what the picture shows, for those who do not see it' },
      caption,
    },
  },
  Video: {
    stands: 'block',
    holds: 'nothing',
    within: [],
    onlyAtTop: true,
    example: '<Video name="dress-the-loom"/>',
    attributes: { name: { kind: 'name', required: true, says: 'the name the video has in this series' } },
  },
};

/** Every component by its name. A Map, so that names such as `constructor` find nothing. */
export const COMPONENTS: ReadonlyMap<string, ComponentSchema> = new Map(Object.entries(schemas));

const byName: ReadonlyMap<string, ComponentName> = new Map(COMPONENT_NAMES.map((name) => [name, name]));

/** The component called `name`, exactly so written, or undefined. */
export function componentNamed(name: string): { name: ComponentName; schema: ComponentSchema } | undefined {
  const known = byName.get(name);
  return known === undefined ? undefined : { name: known, schema: schemas[known] };
}

/** The schema of an attribute, if it is the component's own; inherited names do not count. */
export function attributeNamed(schema: ComponentSchema, name: string): AttributeSchema | undefined {
  return Object.hasOwn(schema.attributes, name) ? schema.attributes[name] : undefined;
}

/** `<Step>, <Caution>, … and <Video>`, for sentences to a writer. */
export function listOfComponents(): string {
  const tags = COMPONENT_NAMES.map((name) => `<${name}>`);
  return `${tags.slice(0, -1).join(', ')} and ${tags.at(-1) ?? ''}`;
}
