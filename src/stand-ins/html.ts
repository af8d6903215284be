/** Markup that is safe to send: what goes into it is escaped unless it is markup itself. */
export class Html {
  readonly text: string;
  constructor(text: string) {
    this.text = text;
  }
}

type Piece = string | number | Html | false | null | undefined | readonly Piece[];

/** Tag for templates: every value is escaped, arrays are joined, `false` and nothing leave no trace. */
export function html(parts: TemplateStringsArray, ...values: readonly Piece[]): Html {
  return new Html(parts.reduce((text, part, index) => text + markupOf(values[index - 1]) + part));
}

function markupOf(piece: Piece): string {
  if (piece === false || piece === null || piece === undefined) return '';
  if (piece instanceof Html) return piece.text;
  if (typeof piece === 'string' || typeof piece === 'number') return escapeHtml(String(piece));
  return piece.map(markupOf).join('');
}

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

/** Text with its http addresses as links; everything else escaped. */
export function linkified(text: string): Html {
  const parts = text.split(/(https?:\/\/[^\s<>"']+)/);
  return new Html(
    parts
      .map((part, index) => {
        if (index % 2 === 0) return escapeHtml(part);
        const address = part.replace(/[).,;:!?\]]+$/, '');
        return `<a href="${escapeHtml(address)}">${escapeHtml(address)}</a>${escapeHtml(part.slice(address.length))}`;
      })
      .join(''),
  );
}
