import { isCurrency } from '#core/money/currency.ts';
import { formatPrice } from '#core/money/format-price.ts';
import { html, type Html } from '#stand-ins/html.ts';
import { page } from '#stand-ins/page.ts';
import { COUNTRIES, grouped, type Typed, type TypedField, type Wrong } from './pay-form.ts';
import type { CheckoutRecord } from './payment-state.ts';
import { OFTEN_USED, TEST_ACCOUNTS, TEST_CARDS, type TestCard } from './test-cards.ts';

export interface PayPageView {
  readonly record: CheckoutRecord;
  readonly typed: Typed;
  readonly wrong: Wrong;
  /** What the bank said, when it said no. */
  readonly refused: string | undefined;
}

const CAUTION = html`<p class="say"><strong>Nothing is taken here.</strong> This page stands in for a payment service. Use only the numbers it lists, never your own card.</p>`;

export function payPage(view: PayPageView): Html {
  const { record } = view;
  const total = priceIn(record, record.session.amount_total ?? 0);
  const free = record.session.amount_total === 0;
  return page(
    `Pay ${total}`,
    html`<h1>Pay ${total}</h1>
${CAUTION}
${troubles(view)}
<div class="pair">
${bill(record, total)}
<div>
<form id="pay" method="post" novalidate>
${free ? addressField(view) : cardFields(view, total)}
${free && html`<div class="acts"><button class="btn act" name="do" value="free">Take it for nothing</button>${closeButton()}</div>`}
${!free && accountFields(view)}
</form>
${!free && cardList()}
</div>
</div>`,
  );
}

function troubles({ wrong, refused }: PayPageView): Html | false {
  const sentences = Object.entries(wrong);
  if (refused !== undefined) {
    return html`<div class="notice" role="alert"><h2>The bank said no</h2><p>${refused} Nothing was taken. Try another card.</p></div>`;
  }
  return (
    sentences.length > 0 &&
    html`<div class="notice" role="alert"><h2>Not paid yet</h2><ul>${sentences.map(([name, sentence]) => html`<li><a href="#${name}">${sentence}</a></li>`)}</ul></div>`
  );
}

function cardFields(view: PayPageView, total: string): Html {
  return html`<fieldset>
<legend>By card</legend>
${addressField(view)}
${field(view, 'number', 'Card number', { hint: 'From the list below', inputmode: 'numeric' })}
<div class="narrow">
${field(view, 'expiry', 'Expiry', { hint: 'Month / year', inputmode: 'text' })}
${field(view, 'cvc', 'Security code', { hint: 'Three or four digits', inputmode: 'numeric' })}
</div>
${field(view, 'name', 'Name on the card', { hint: 'May stay empty here', inputmode: 'text' })}
<div class="field"><label for="country">Country</label>
<select id="country" name="country">${COUNTRIES.map(([code, name]) => html`<option value="${code}"${code === view.typed.country && html` selected`}>${name}</option>`)}</select></div>
<div class="acts">
<button class="btn act" name="do" value="pay">Pay ${total}</button>
<button class="btn" name="do" value="decline">Decline</button>
${closeButton()}
</div>
<p class="quiet after">Decline: the bank says no, whatever the card. Close: back to the shop without paying.</p>
</fieldset>`;
}

function closeButton(): Html {
  return html`<button class="btn" name="do" value="close">Close</button>`;
}

function accountFields(view: PayPageView): Html {
  return html`<fieldset>
<legend>From a bank account, which takes a while</legend>
<div class="field${view.wrong.account !== undefined && ' bad'}"><label for="account">Account</label>
<select id="account" name="account">${TEST_ACCOUNTS.map(
    ({ number, what }) => html`<option value="${number}"${number === view.typed.account && html` selected`}>${what} (…${number.slice(-4)})</option>`,
  )}</select>${wrongOf(view, 'account')}</div>
<div class="acts"><button class="btn" name="do" value="debit">Debit this account</button></div>
</fieldset>`;
}

function addressField(view: PayPageView): Html {
  return field(view, 'email', 'Email', { hint: 'Where the receipt goes', inputmode: 'email' });
}

function field(view: PayPageView, name: TypedField, label: string, look: { hint: string; inputmode: string }): Html {
  const wrong = view.wrong[name];
  // Browsers must not offer the person's own card to a stand-in.
  return html`<div class="field${wrong !== undefined && ' bad'}"><label for="${name}">${label}</label><span class="hint" id="${name}-hint">${look.hint}</span>
<input id="${name}" name="${name}" value="${view.typed[name]}" inputmode="${look.inputmode}" autocomplete="off" aria-describedby="${name}-hint${wrong !== undefined && ` ${name}-wrong`}"${
    wrong !== undefined && html` aria-invalid="true"`
  }${Object.keys(view.wrong)[0] === name && html` autofocus`}>${wrongOf(view, name)}</div>`;
}

function wrongOf(view: PayPageView, name: TypedField): Html | false {
  const wrong = view.wrong[name];
  return wrong !== undefined && html`<span class="wrong" id="${name}-wrong">${wrong}</span>`;
}

function cardList(): Html {
  return html`${cardTable('Test cards', TEST_CARDS.slice(0, OFTEN_USED))}
<details><summary>More test cards</summary>${cardTable('More test cards', TEST_CARDS.slice(OFTEN_USED))}</details>`;
}

function cardTable(caption: string, cards: readonly TestCard[]): Html {
  return html`<div class="scroll" tabindex="0" role="region" aria-label="${caption}"><table>
<caption>${caption}</caption>
<thead><tr><th scope="col">Number</th><th scope="col">What happens</th><th scope="col">Fill in</th></tr></thead>
<tbody>${cards.map(
    ({ number, what }) => html`<tr><td class="num">${grouped(number)}</td><td>${what}</td>
<td><button class="btn small" form="pay" formaction="#pay" name="fill" value="${number}" aria-label="Use the card ending in ${number.slice(-4)}">Use</button></td></tr>`,
  )}</tbody>
</table></div>`;
}

function bill(record: CheckoutRecord, total: string): Html {
  const ends = new Date(record.session.expires_at * 1000).toISOString().slice(11, 16);
  return html`<section class="sheet" aria-label="What is bought">
<p class="price">${total}</p>
<ul class="lines">${record.lineItems.map(
    (line) =>
      html`<li><span>${line.description}${(line.quantity ?? 1) > 1 && html` × ${line.quantity}`}</span><span>${priceIn(record, line.amount_total)}</span></li>`,
  )}</ul>
${record.session.custom_text.submit && html`<p>${record.session.custom_text.submit.message}</p>`}
<p class="quiet">This page ends at ${ends} UTC.</p>
</section>`;
}

/** The bank's question to its customer. */
export function bankPage(record: CheckoutRecord): Html {
  const total = priceIn(record, record.session.amount_total ?? 0);
  return page(
    'Your bank asks',
    html`<h1>Your bank asks</h1>
${CAUTION}
<form method="post" class="room">
<p>Is this you, paying ${total} with the card ending in ${record.challenge?.last4}?</p>
<div class="acts">
<button class="btn act" name="do" value="yes">Yes, it is me</button>
<button class="btn" name="do" value="no">No, stop it</button>
</div>
</form>`,
  );
}

/** Where a checkout that is over leads. */
export function overPage(record: CheckoutRecord, back: string | null): Html {
  const paid = record.session.status === 'complete';
  const title = paid ? 'This is done' : 'This page has ended';
  return page(
    title,
    html`<h1>${title}</h1>
<p>${paid ? 'The payment went through before. Nothing is taken a second time.' : 'Nobody can pay here any more. Nothing was taken.'}</p>
${back !== null && html`<p><a class="btn" href="${back}">Back to the shop</a></p>`}`,
  );
}

export function unknownPage(): Html {
  return page('No such payment', html`<h1>No such payment</h1><p>There is nothing to pay at this address. Start again in the shop.</p>`);
}

function priceIn(record: CheckoutRecord, amountMinor: number): string {
  const currency = (record.session.currency ?? '').toUpperCase();
  return isCurrency(currency) ? formatPrice({ amountMinor, currency }) : `${amountMinor} ${currency}`;
}
