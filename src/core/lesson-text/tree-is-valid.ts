// The second look at a tree, when it comes back from where it was kept. Whoever could write into that place could
// otherwise draw what the reader would have refused; so the same rules are asked again, of plain JSON this time.
import { readAttributeValue } from './attribute-value.ts';
import { findBadCharacter } from './characters.ts';
import { attributeNamed, componentNamed } from './components.ts';
import { LIMITS } from './limits.ts';
import { checkLinkAddress } from './link-address.ts';
import { placeReason, type Place } from './read-component.ts';
import { TREE_VERSION, type LessonTree } from './tree.ts';

/** What may stand at a place in the tree. */
type Role = 'block' | 'inline' | 'item' | 'row' | 'cell';

interface Waiting {
  value: unknown;
  role: Role;
  place: Place;
  depth: number;
}

type Fields = Readonly<Record<string, unknown>>;

/** What a node's children are, or undefined when the node itself is not as it should be. `null`: it has none. */
type Judgement = { children: Role; place: Place } | null | undefined;

// Lines with one part only get a paragraph of their own, so a tree can have a few more nodes and levels than the
// parser's.
const MAX_NODES = 2 * LIMITS.nodes;
const MAX_DEPTH = LIMITS.depth + LIMITS.componentDepth;

/** True when `tree` is one that `parseLessonText` of this version could have made. Takes anything; never throws. */
export function treeIsValid(tree: unknown): tree is LessonTree {
  if (!isFields(tree) || tree['type'] !== 'root' || tree['v'] !== TREE_VERSION || !hasOnly(tree, ['v', 'type', 'children'])) return false;
  const waiting: Waiting[] = [];
  if (!pushChildren(waiting, tree['children'], { role: 'block', place: { top: true }, depth: 1 })) return false;
  let nodes = 0;
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    nodes += 1;
    if (nodes > MAX_NODES || next.depth > MAX_DEPTH || !isFields(next.value)) return false;
    const judgement = judge(next.value, next.role, next.place);
    if (judgement === undefined) return false;
    if (judgement !== null && !pushChildren(waiting, next.value['children'], { role: judgement.children, place: judgement.place, depth: next.depth + 1 })) return false;
  }
  return true;
}

function pushChildren(waiting: Waiting[], children: unknown, as: Omit<Waiting, 'value'>): boolean {
  if (!Array.isArray(children) || waiting.length + children.length > MAX_NODES) return false;
  for (const value of children) waiting.push({ value, ...as });
  return true;
}

function judge(node: Fields, role: Role, place: Place): Judgement {
  switch (role) {
    case 'block':
      return judgeBlock(node, place);
    case 'inline':
      return judgeInline(node, place);
    case 'item':
      return node['type'] === 'listItem' && hasOnly(node, ['type', 'children']) ? { children: 'block', place } : undefined;
    case 'row':
      return node['type'] === 'tableRow' && hasOnly(node, ['type', 'children']) ? { children: 'cell', place } : undefined;
    case 'cell':
      return node['type'] === 'tableCell' && hasOnly(node, ['type', 'children']) ? { children: 'inline', place } : undefined;
  }
}

function judgeBlock(node: Fields, place: Place): Judgement {
  const inside: Place = { ...place, top: false };
  switch (node['type']) {
    case 'paragraph':
      return hasOnly(node, ['type', 'children']) ? { children: 'inline', place: inside } : undefined;
    case 'blockquote':
      return hasOnly(node, ['type', 'children']) ? { children: 'block', place: inside } : undefined;
    case 'heading':
      return place.top && isHeading(node) ? { children: 'inline', place: { ...inside, heading: true } } : undefined;
    case 'thematicBreak':
      return hasOnly(node, ['type']) ? null : undefined;
    case 'code':
      return hasOnly(node, ['type', 'value']) && isWords(node['value']) ? null : undefined;
    case 'list':
      return isList(node) ? { children: 'item', place: inside } : undefined;
    case 'table':
      return isTable(node) ? { children: 'row', place: inside } : undefined;
    case 'component':
      return judgeComponent(node, place, 'block');
    default:
      return undefined;
  }
}

function judgeInline(node: Fields, place: Place): Judgement {
  switch (node['type']) {
    case 'text':
    case 'inlineCode':
      return hasOnly(node, ['type', 'value']) && isWords(node['value']) ? null : undefined;
    case 'break':
      return hasOnly(node, ['type']) ? null : undefined;
    case 'emphasis':
    case 'strong':
    case 'delete':
      return hasOnly(node, ['type', 'children']) ? { children: 'inline', place } : undefined;
    case 'link':
      return isLink(node) ? { children: 'inline', place: { ...place, link: true } } : undefined;
    case 'component':
      return judgeComponent(node, place, 'inline');
    default:
      return undefined;
  }
}

function judgeComponent(node: Fields, place: Place, stands: 'block' | 'inline'): Judgement {
  const { name, props, children } = node;
  if (typeof name !== 'string' || !isFields(props) || !Array.isArray(children) || !hasOnly(node, ['type', 'name', 'props', 'children'])) return undefined;
  const known = componentNamed(name);
  if (known === undefined || known.schema.stands !== stands || placeReason(known.name, known.schema, place) !== undefined) return undefined;
  const { schema } = known;
  if ((children.length === 0) !== (schema.holds === 'nothing')) return undefined;
  for (const [attribute, value] of Object.entries(props)) {
    const expected = attributeNamed(schema, attribute);
    if (expected === undefined || typeof value !== 'string' || !readAttributeValue(expected, value).ok) return undefined;
  }
  const complete = Object.entries(schema.attributes).every(([attribute, expected]) => !expected.required || Object.hasOwn(props, attribute));
  return complete ? { children: 'block', place: { top: false, component: known.name } } : undefined;
}

function isHeading(node: Fields): boolean {
  const { depth, id } = node;
  return hasOnly(node, ['type', 'depth', 'id', 'children']) && (depth === 2 || depth === 3 || depth === 4) && typeof id === 'string' && id.length <= 80 && /^[\p{L}\p{N}-]+$/u.test(id);
}

function isList(node: Fields): boolean {
  const { ordered, start, loose } = node;
  return hasOnly(node, ['type', 'ordered', 'start', 'loose', 'children']) && typeof ordered === 'boolean' && typeof loose === 'boolean' && Number.isSafeInteger(start);
}

function isTable(node: Fields): boolean {
  const { align } = node;
  return hasOnly(node, ['type', 'align', 'children']) && Array.isArray(align) && align.length <= LIMITS.tableColumns && align.every((one) => one === null || one === 'left' || one === 'right' || one === 'center');
}

function isLink(node: Fields): boolean {
  const { url, external, title } = node;
  if (typeof url !== 'string' || !hasOnly(node, ['type', 'url', 'external', 'title', 'children'])) return false;
  if (title !== undefined && !(isWords(title) && title.length <= LIMITS.titleLength)) return false;
  const address = checkLinkAddress(url, LIMITS.urlLength);
  return address.ok && address.external === external;
}

function isWords(value: unknown): value is string {
  return typeof value === 'string' && value.length <= LIMITS.sourceLength && findBadCharacter(value) === undefined;
}

function isFields(value: unknown): value is Fields {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function hasOnly(node: Fields, keys: readonly string[]): boolean {
  return Object.keys(node).every((key) => keys.includes(key));
}
