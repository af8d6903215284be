// The half of the walk that reads paragraphs and whatever else stands on lines of its own.
import type { Image, Nodes, Paragraph as MarkdownParagraph, Table as MarkdownTable } from 'mdast';
import { isName } from './attribute-value.ts';
import { checkLinkAddress } from './link-address.ts';
import { LIMITS } from './limits.ts';
import type { Place, Tag } from './read-component.ts';
import { componentNamed } from './components.ts';
import { BRACES } from './read-inline.ts';
import type { Block, Inline, List, Table } from './tree.ts';
import { keepWords, readBlocksLater, readInlineLater, refuse, takeComponent, type Walk } from './walk.ts';

/** Copies one node that stands on lines of its own to `out`, or refuses it. */
export function readBlock(walk: Walk, node: Nodes, out: Block[], place: Place): void {
  if (place.top && looksLikeProgram(walk.source, node)) {
    refuse(walk, node.position, 'code', 'A paragraph cannot begin with "import" or "export": those words begin program code. Begin it with another word.');
    return;
  }
  switch (node.type) {
    case 'paragraph':
      readParagraph(walk, node, out, place);
      return;
    case 'heading':
      readHeading(walk, node, out, place);
      return;
    case 'thematicBreak':
      out.push({ type: 'thematicBreak' });
      return;
    case 'code':
      out.push({ type: 'code', value: keepWords(walk, node.value, node.position) });
      return;
    case 'blockquote': {
      const children: Block[] = [];
      out.push({ type: 'blockquote', children });
      readBlocksLater(walk, node.children, children, { ...place, top: false });
      return;
    }
    case 'list': {
      const list: List = { type: 'list', ordered: node.ordered === true, start: node.start ?? 1, loose: node.spread === true, children: [] };
      out.push(list);
      readItems(walk, node.children, list, { ...place, top: false });
      return;
    }
    case 'table':
      readTable(walk, node, out, { ...place, top: false });
      return;
    case 'definition': {
      const address = checkLinkAddress(node.url, LIMITS.urlLength);
      if (!address.ok) refuse(walk, node.position, 'address', address.reason);
      return;
    }
    case 'mdxJsxFlowElement':
    case 'mdxJsxTextElement':
      readTag(walk, node, out, place);
      return;
    case 'image':
      readPicture(walk, node, out);
      return;
    case 'mdxFlowExpression':
    case 'mdxTextExpression':
      refuse(walk, node.position, 'code', BRACES);
      return;
    default:
      refuse(walk, node.position, 'markup', 'This kind of marking is not used in lessons. Write it as plain text.');
  }
}

/**
 * MDX reads a paragraph at the left edge that begins so as a program. Here it would be harmless text, but a lesson
 * must mean the same wherever its file is opened.
 */
function looksLikeProgram(source: string, node: Nodes): boolean {
  const start = node.position?.start;
  if (start?.offset === undefined || start.column !== 1) return false;
  return source.startsWith('import ', start.offset) || source.startsWith('export ', start.offset);
}

function readParagraph(walk: Walk, node: MarkdownParagraph, out: Block[], place: Place): void {
  const parts = partsOnTheirOwn(node);
  if (parts !== undefined) {
    readBlocksLater(walk, parts, out, place);
    return;
  }
  const children: Inline[] = [];
  out.push({ type: 'paragraph', children });
  readInlineLater(walk, node.children, children, { ...place, top: false });
}

/**
 * Markdown makes a paragraph of a line that holds nothing but `<Step id="a">…</Step>` or a picture. Those are blocks
 * all the same: here they are taken out of their paragraph.
 */
function partsOnTheirOwn(node: MarkdownParagraph): (Tag | Image)[] | undefined {
  const parts: (Tag | Image)[] = [];
  for (const child of node.children) {
    if (child.type === 'text' && child.value.trim() === '') continue;
    const block = child.type === 'image' || (child.type === 'mdxJsxTextElement' && child.name !== null && componentNamed(child.name)?.schema.stands === 'block');
    if (!block) return undefined;
    parts.push(child);
  }
  return parts.length > 0 ? parts : undefined;
}

function readHeading(walk: Walk, node: Extract<Nodes, { type: 'heading' }>, out: Block[], place: Place): void {
  const { depth } = node;
  if (depth !== 2 && depth !== 3 && depth !== 4) {
    const reason = depth === 1 ? 'The title of the lesson is its only heading with one #. Write ## here.' : 'Headings go from ## to ####. Use fewer signs.';
    refuse(walk, node.position, 'heading', reason);
    return;
  }
  if (!place.top) {
    refuse(walk, node.position, 'heading', 'A heading stands at the left edge, not in a list, a quote or a component. Set the words in ** instead.');
    return;
  }
  if (node.children.length === 0) {
    refuse(walk, node.position, 'heading', 'The heading has no words. Write them behind the signs, or take the signs out.');
    return;
  }
  const children: Inline[] = [];
  // Its id comes from its words, which are known when the walk is over.
  out.push({ type: 'heading', depth, id: '', children });
  readInlineLater(walk, node.children, children, { ...place, top: false, heading: true });
}

function readItems(walk: Walk, items: readonly Nodes[], list: List, place: Place): void {
  // The runs of the items wait in reverse, so that the first is read first.
  const runs: { nodes: readonly Nodes[]; out: Block[] }[] = [];
  for (const item of items) {
    if (item.type !== 'listItem') continue;
    const children: Block[] = [];
    list.children.push({ type: 'listItem', children });
    runs.push({ nodes: item.children, out: children });
    if (item.spread === true) list.loose = true;
  }
  for (const run of runs.reverse()) readBlocksLater(walk, run.nodes, run.out, place);
}

function readTable(walk: Walk, node: MarkdownTable, out: Block[], place: Place): void {
  const columns = node.children[0]?.children.length ?? 0;
  const table: Table = { type: 'table', align: Array.from({ length: columns }, (_, column) => node.align?.[column] ?? null), children: [] };
  const runs: { nodes: readonly Nodes[]; out: Inline[] }[] = [];
  for (const row of node.children) {
    const cells = row.children.map((cell) => {
      const children: Inline[] = [];
      runs.push({ nodes: cell.children, out: children });
      return { type: 'tableCell' as const, children };
    });
    table.children.push({ type: 'tableRow', children: cells });
  }
  out.push(table);
  for (const run of runs.reverse()) readInlineLater(walk, run.nodes, run.out, place);
}

function readTag(walk: Walk, tag: Tag, out: Block[], place: Place): void {
  const taken = takeComponent(walk, tag, place);
  if (taken === undefined) return;
  const { component, stands } = taken;
  if (stands === 'inline') {
    out.push({ type: 'paragraph', children: [component] });
    return;
  }
  out.push(component);
  const inside: Place = { top: false, component: component.name };
  if (tag.type === 'mdxJsxFlowElement') readBlocksLater(walk, tag.children, component.children, inside);
  else if (tag.children.length > 0) readBlocksLater(walk, [{ type: 'paragraph', children: tag.children, ...(tag.position === undefined ? {} : { position: tag.position }) }], component.children, inside);
}

/** `![alt](name)`: Markdown's own way of writing a picture, by the name it has in the series. */
function readPicture(walk: Walk, node: Image, out: Block[]): void {
  if (!isName(node.url)) {
    refuse(walk, node.position, 'picture', 'A picture is named as you named it in this series, in small letters, digits and hyphens: ![what it shows](warped-loom). Addresses do not work here.');
    return;
  }
  const alt = keepWords(walk, node.alt ?? '', node.position).trim();
  const caption = keepWords(walk, node.title ?? '', node.position).trim();
  if (alt.length > LIMITS.titleLength || caption.length > LIMITS.titleLength) {
    refuse(walk, node.position, 'picture', `What a picture shows is said in at most ${String(LIMITS.titleLength)} characters.`);
    return;
  }
  out.push({ type: 'component', name: 'Picture', props: { name: node.url, alt, ...(caption === '' ? {} : { caption }) }, children: [] });
}
