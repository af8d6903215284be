import { Html, html, linkified } from '#stand-ins/html.ts';
import { jsonReply, pageReply, type Answerer } from '#stand-ins/http.ts';
import { page, pagePolicy } from '#stand-ins/page.ts';
import type { CaughtMail, MailTray } from './mail-tray.ts';

/** A mail's own markup: nothing runs, nothing is fetched, its links open beside it. */
const MAIL_POLICY = "sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'self'";

/** Answers `/mail`, `/mail.json` and what lies below `/mail/`. */
export function mailAnswerer(tray: MailTray): Answerer {
  return ({ method, path }) => {
    if (method !== 'GET') return undefined;
    if (path === '/mail.json') return jsonReply(tray.newestFirst().map(shown));
    if (path === '/mail' || path === '/mail/') return pageReply(trayPage(tray.newestFirst()), { policy: pagePolicy() });
    const match = /^\/mail\/([\w-]{1,40})(\/html|\.eml)?$/.exec(path);
    if (!match) return undefined;
    const mail = tray.find(match[1] ?? '');
    if (!mail) return pageReply(page('No such mail', html`<h1>No such mail</h1><p><a href="/mail">Back to the tray</a></p>`), { status: 404, policy: pagePolicy() });
    if (match[2] === '/html') return pageReply(inNewWindow(mail.html), { policy: MAIL_POLICY });
    if (match[2] === '.eml') return { status: 200, headers: { 'content-type': 'message/rfc822', 'x-content-type-options': 'nosniff', 'cache-control': 'no-store' }, body: Buffer.from(mail.raw, 'latin1') };
    return pageReply(mailPage(mail), { policy: pagePolicy() });
  };
}

function shown({ id, receivedAt, from, to, subject, text, html: markup, headers, envelope }: CaughtMail) {
  return { id, receivedAt, from, to, subject, text, html: markup, headers, envelope };
}

function trayPage(mails: readonly CaughtMail[]): Html {
  return page(
    'Mail tray',
    html`<h1>Mail tray</h1>
<p>Every mail the house sends ends here; none leaves this machine. Newest first.</p>
<p><a class="btn" href="/mail">Look again</a></p>
${mails.length === 0 && html`<p class="say">No mail yet. Sign up or buy a seat, and it comes here.</p>`}
${mails.length > 0 && html`<ul class="mails">${mails.map(
      (mail) =>
        html`<li><span>${mail.to}</span><a href="/mail/${mail.id}">${mail.subject || 'Without a subject'}</a><time class="quiet num" datetime="${mail.receivedAt}">${clockTime(mail)}</time></li>`,
    )}</ul>`}`,
  );
}

function mailPage(mail: CaughtMail): Html {
  return page(
    mail.subject || 'Without a subject',
    html`<h1>${mail.subject || 'Without a subject'}</h1>
<p><a href="/mail">Back to the tray</a></p>
<dl>
<dt>To</dt><dd>${mail.to}</dd>
<dt>From</dt><dd>${mail.from}</dd>
<dt>Received</dt><dd><time datetime="${mail.receivedAt}">${clockTime(mail)}</time></dd>
</dl>
<h2>As text</h2>
<div class="text">${linkified(mail.text)}</div>
${mail.html !== '' && html`<h2>As it looks</h2><iframe title="The mail as it looks" src="/mail/${mail.id}/html" sandbox="allow-popups allow-popups-to-escape-sandbox"></iframe>`}
<details><summary>All header lines</summary>
<dl>${Object.entries(mail.headers).map(([name, value]) => html`<dt>${name}</dt><dd>${[value].flat().join(' · ')}</dd>`)}</dl>
<p><a href="/mail/${mail.id}.eml" download="mail.eml">The whole mail as a file</a></p>
</details>`,
  );
}

function clockTime({ receivedAt }: CaughtMail): string {
  return `${receivedAt.slice(0, 10)} ${receivedAt.slice(11, 19)} UTC`;
}

/** Links of a mail must not replace the page that shows it. */
function inNewWindow(markup: string): Html {
  const base = '<base target="_blank">';
  const text = /<head[^>]*>/i.test(markup) ? markup.replace(/<head[^>]*>/i, (head) => head + base) : base + markup;
  return new Html(text);
}
