/** A letter before it is laid out: said once, written both as plain text and as HTML. */
import type { Run, SaidBlock } from '#core/notices/said.ts';

export type Block =
  | SaidBlock
  /** The one thing to do, with its address. */
  | { readonly kind: 'act'; readonly label: string; readonly href: string }
  /** Why she has this letter, below the signature. It belongs to the letter, not to what it says. */
  | { readonly kind: 'foot'; readonly words: string; readonly act?: { readonly label: string; readonly href: string } };

/** A list of letters that can be left. */
export interface MailingList {
  /** First labels of the list's id, before the house's own domain: `notices.saltmarsh`. */
  readonly label: string;
  /** A POST there leaves the list, with nothing else asked (RFC 8058). */
  readonly leaveHref: string;
}

export interface Letter {
  readonly subject: string;
  readonly blocks: readonly Block[];
  readonly list?: MailingList;
}

export interface LaidOutLetter {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const ESCAPES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escaped = (words: string): string => words.replace(/[&<>"']/g, (sign) => ESCAPES[sign] ?? sign);

/** An address as it works from anywhere: paths of the site get its name before them. */
const absolute = (href: string, publicUrl: string): string => (href.startsWith('/') ? `${publicUrl}${href}` : href);

function runsText(runs: readonly Run[], publicUrl: string): string {
  return runs.map(({ words, href }) => (href === undefined ? words : `${words} (${absolute(href, publicUrl).replace(/^mailto:/, '')})`)).join('');
}

function runsHtml(runs: readonly Run[], publicUrl: string): string {
  return runs.map(({ words, strong, href }) => {
    const said = escaped(words).replaceAll('\n', '<br>');
    const stressed = strong === true ? `<strong>${said}</strong>` : said;
    return href === undefined ? stressed : `<a href="${escaped(absolute(href, publicUrl))}">${stressed}</a>`;
  }).join('');
}

function blockText(block: Block, publicUrl: string): string {
  switch (block.kind) {
    case 'words': return block.words;
    case 'act': return `${block.label}:\n${block.href}`;
    case 'rows': return block.rows.map(([label, value]) => `${label}: ${value}`).join('\n');
    case 'list': return block.items.map((item) => `- ${item}`).join('\n');
    case 'prose': return runsText(block.runs, publicUrl);
    case 'points': return block.items.map((item) => `- ${runsText(item, publicUrl)}`).join('\n');
    case 'foot': return [block.words, ...(block.act === undefined ? [] : [`${block.act.label}:\n${block.act.href}`])].join('\n');
  }
}

function blockHtml(block: Block, publicUrl: string): string {
  switch (block.kind) {
    case 'words': return `<p>${escaped(block.words).replaceAll('\n', '<br>')}</p>`;
    case 'act': return `<p><a href="${escaped(block.href)}">${escaped(block.label)}</a></p>`;
    case 'rows': return `<table>${block.rows.map(([label, value]) => `<tr><th align="left">${escaped(label)}</th><td>${escaped(value)}</td></tr>`).join('')}</table>`;
    case 'list': return `<ul>${block.items.map((item) => `<li>${escaped(item)}</li>`).join('')}</ul>`;
    case 'prose': return `<p>${runsHtml(block.runs, publicUrl)}</p>`;
    case 'points': return `<ul>${block.items.map((item) => `<li>${runsHtml(item, publicUrl)}</li>`).join('')}</ul>`;
    case 'foot': return `<p><small>${escaped(block.words).replaceAll('\n', '<br>')}${block.act === undefined ? '' : `<br><a href="${escaped(block.act.href)}">${escaped(block.act.label)}</a>`}</small></p>`;
  }
}

/** Both forms of a letter, greeted by name and signed by the house; its feet stand below the signature. */
export function layOut(letter: Letter, toName: string, publicUrl: string): LaidOutLetter {
  const feet = letter.blocks.filter(({ kind }) => kind === 'foot');
  const body = letter.blocks.filter(({ kind }) => kind !== 'foot');
  const blocks: Block[] = [{ kind: 'words', words: `Dear ${toName},` }, ...body, { kind: 'words', words: `Fellmark\n${publicUrl}` }, ...feet];
  return {
    subject: letter.subject,
    text: `${blocks.map((block) => blockText(block, publicUrl)).join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escaped(letter.subject)}</title></head><body>${blocks.map((block) => blockHtml(block, publicUrl)).join('\n')}</body></html>`,
  };
}
