/** Documents that programs read: written as text, with a tag for whoever asks again. */
import { createHash } from 'node:crypto';

/* Signs that XML 1.0 (section 2.2) knows no way to write, and halves of surrogate pairs. */
const UNWRITABLE = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g;

/** Words as they may stand in an element or an attribute. */
export function xmlText(words: string): string {
  return words.replace(UNWRITABLE, '').replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

/** An element with its content, which is XML already; without content an empty one. */
export function element(name: string, attributes: Readonly<Record<string, string>>, content = ''): string {
  const said = Object.entries(attributes).map(([key, value]) => ` ${key}="${xmlText(value)}"`).join('');
  return content === '' ? `<${name}${said}/>` : `<${name}${said}>${content}</${name}>`;
}

const FIVE_MINUTES = 'public, max-age=300';

/** An answer that everybody may keep for five minutes; who has it still, is told so (RFC 9110, section 13.1.2). */
export function sendDocument(request: Request, body: string, contentType: string): Response {
  const tag = `"${createHash('sha256').update(body).digest('base64url').slice(0, 27)}"`;
  const headers = { ETag: tag, 'Cache-Control': FIVE_MINUTES, 'Content-Type': contentType };
  const known = (request.headers.get('if-none-match') ?? '').split(',').map((word) => word.trim().replace(/^W\//, ''));
  return known.includes(tag) || known.includes('*') ? new Response(null, { status: 304, headers }) : new Response(body, { headers });
}
