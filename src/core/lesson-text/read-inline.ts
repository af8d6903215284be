// The half of the walk that reads what stands within a sentence.
import type { Nodes } from 'mdast';
import { LIMITS } from './limits.ts';
import { checkLinkAddress } from './link-address.ts';
import type { Place } from './read-component.ts';
import type { Inline, Link } from './tree.ts';
import { keepWords, readInlineLater, refuse, takeComponent, type Position, type Walk } from './walk.ts';

export const BRACES = 'Curly braces mean code, and lessons hold none. For an amount of the plan write <Amount of="warp"/>; for the sign itself write \\{.';
const PICTURE_PLACE = 'A picture stands on a line of its own, with empty lines round it.';

/** Copies one node of a sentence to `out`, or refuses it. */
export function readInline(walk: Walk, node: Nodes, out: Inline[], place: Place): void {
  switch (node.type) {
    case 'text':
      out.push({ type: 'text', value: keepWords(walk, node.value, node.position) });
      return;
    case 'inlineCode':
      out.push({ type: 'inlineCode', value: keepWords(walk, node.value, node.position) });
      return;
    case 'break':
      out.push({ type: 'break' });
      return;
    case 'emphasis':
    case 'strong':
    case 'delete': {
      const children: Inline[] = [];
      out.push({ type: node.type, children });
      readInlineLater(walk, node.children, children, place);
      return;
    }
    case 'link':
      readLink(walk, node, node, out, place);
      return;
    case 'linkReference': {
      const definition = walk.definitions.get(node.identifier);
      if (definition === undefined) refuse(walk, node.position, 'address', 'This link names an address that is not set apart anywhere. Write the address into the link.');
      else readLink(walk, node, definition, out, place);
      return;
    }
    case 'image':
    case 'imageReference':
      refuse(walk, node.position, 'place', PICTURE_PLACE);
      return;
    case 'mdxJsxTextElement': {
      const taken = takeComponent(walk, node, place);
      if (taken?.stands === 'inline') out.push(taken.component);
      else if (taken !== undefined) refuse(walk, node.position, 'place', `<${taken.component.name}> cannot stand within a sentence. Put it on a line of its own, with empty lines round it.`);
      return;
    }
    case 'mdxTextExpression':
    case 'mdxFlowExpression':
      refuse(walk, node.position, 'code', BRACES);
      return;
    default:
      refuse(walk, node.position, 'markup', 'This kind of marking is not used in lessons. Write it as plain text.');
  }
}

function readLink(walk: Walk, node: { children: readonly Nodes[]; position?: Position }, target: { url: string; title?: string | null | undefined }, out: Inline[], place: Place): void {
  const address = checkLinkAddress(target.url, LIMITS.urlLength);
  if (!address.ok) {
    refuse(walk, node.position, 'address', address.reason);
    return;
  }
  if (node.children.length === 0) {
    refuse(walk, node.position, 'address', 'The link has no words. Write between the square brackets where it leads.');
    return;
  }
  const title = target.title ?? '';
  if (title.length > LIMITS.titleLength) refuse(walk, node.position, 'address', `The title of a link has at most ${String(LIMITS.titleLength)} characters.`);
  const children: Inline[] = [];
  const link: Link = { type: 'link', url: address.url, external: address.external, ...(title === '' ? {} : { title: keepWords(walk, title, node.position) }), children };
  if (link.url.startsWith('#')) walk.insideLinks.push({ link, position: node.position });
  out.push(link);
  readInlineLater(walk, node.children, children, { ...place, link: true });
}
