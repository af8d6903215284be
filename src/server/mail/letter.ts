/** A letter before it is laid out: said once, written both as plain text and as HTML. */

export type Block =
  | { readonly kind: 'words'; readonly words: string }
  /** The one thing to do, with its address. */
  | { readonly kind: 'act'; readonly label: string; readonly href: string }
  | { readonly kind: 'rows'; readonly rows: readonly (readonly [label: string, value: string])[] }
  | { readonly kind: 'list'; readonly items: readonly string[] };

export interface Letter {
  readonly subject: string;
  readonly blocks: readonly Block[];
}

export interface LaidOutLetter {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const ESCAPES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escaped = (words: string): string => words.replace(/[&<>"']/g, (sign) => ESCAPES[sign] ?? sign);

function blockText(block: Block): string {
  switch (block.kind) {
    case 'words': return block.words;
    case 'act': return `${block.label}:\n${block.href}`;
    case 'rows': return block.rows.map(([label, value]) => `${label}: ${value}`).join('\n');
    case 'list': return block.items.map((item) => `- ${item}`).join('\n');
  }
}

function blockHtml(block: Block): string {
  switch (block.kind) {
    case 'words': return `<p>${escaped(block.words).replaceAll('\n', '<br>')}</p>`;
    case 'act': return `<p><a href="${escaped(block.href)}">${escaped(block.label)}</a></p>`;
    case 'rows': return `<table>${block.rows.map(([label, value]) => `<tr><th align="left">${escaped(label)}</th><td>${escaped(value)}</td></tr>`).join('')}</table>`;
    case 'list': return `<ul>${block.items.map((item) => `<li>${escaped(item)}</li>`).join('')}</ul>`;
  }
}

/** Both forms of a letter, greeted by name and signed by the house. */
export function layOut(letter: Letter, toName: string, publicUrl: string): LaidOutLetter {
  const blocks: Block[] = [{ kind: 'words', words: `Dear ${toName},` }, ...letter.blocks, { kind: 'words', words: `Fellmark\n${publicUrl}` }];
  return {
    subject: letter.subject,
    text: `${blocks.map(blockText).join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escaped(letter.subject)}</title></head><body>${blocks.map(blockHtml).join('\n')}</body></html>`,
  };
}
