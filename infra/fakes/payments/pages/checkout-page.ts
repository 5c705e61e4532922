import type Stripe from 'stripe';
import type { SessionRecord } from '../state/book.js';
import { cardChoice } from './card-choice.js';
import { html, type Html } from './html.js';
import { alert, page } from './layout.js';
import { day, money } from './money.js';

export interface CheckoutView {
  record: SessionRecord;
  seller: string;
  /** What was typed and chosen, kept after an error. */
  email: string;
  card: string;
  error: string | null;
}

export function checkoutPage(view: CheckoutView): string {
  const { session } = view.record;
  const title = session.mode === 'subscription' ? `Subscribe to ${view.seller}` : `Pay ${view.seller}`;
  const content = html`${alert(view.error)} ${summary(view.record)}
    <form method="post" action="/c/pay/${session.id}">
      ${emailField(view)} ${cardChoice(view.card, session.mode === 'subscription')}
      <button type="submit" name="action" value="pay">${buttonText(view.record)}</button>
    </form>
    ${backLink(session)}`;
  return page(title, content);
}

function summary(record: SessionRecord): Html {
  const { session } = record;
  const currency = session.currency ?? 'usd';
  const rows = record.lines.map(
    (line) =>
      html`<tr>
        <td>${line.description}</td>
        <td class="number">${line.quantity}</td>
        <td class="number">${money(line.amount_total, currency)}</td>
      </tr> `,
  );
  return html`<table>
      <thead>
        <tr>
          <th scope="col">What</th>
          <th scope="col" class="number">Quantity</th>
          <th scope="col" class="number">Amount</th>
        </tr>
      </thead>
      <tbody>
        ${rows}
      </tbody>
    </table>
    <p>Due now: <span class="total" id="amount">${money(session.amount_total ?? 0, currency)}</span></p>
    ${trialNote(record)}`;
}

function trialNote(record: SessionRecord): Html | null {
  if (record.session.mode !== 'subscription') return null;
  if (record.trialEnd === null) return html`<p>Renews every period until it is canceled.</p>`;
  return html`<p>Free until ${day(record.trialEnd)}; then the amount above is charged every period.</p>`;
}

/** An address the seller gave, or the customer's own, is shown and cannot be changed. */
function emailField(view: CheckoutView): Html {
  const { session } = view.record;
  const fixed = session.customer_email ?? session.customer_details?.email ?? null;
  if (fixed !== null) {
    return html`<p>Email: <strong>${fixed}</strong><input type="hidden" name="email" value="${fixed}" /></p>`;
  }
  return html`<label class="field" for="email">Email</label>
    <input
      type="email"
      id="email"
      name="email"
      value="${view.email}"
      autocomplete="email"
      maxlength="254"
      required
    />`;
}

function buttonText(record: SessionRecord): string {
  const { session } = record;
  if (session.mode === 'payment') return `Pay ${money(session.amount_total ?? 0, session.currency ?? 'usd')}`;
  return record.trialEnd === null ? 'Subscribe' : 'Start trial';
}

function backLink(session: Stripe.Checkout.Session): Html | null {
  return session.cancel_url === null
    ? null
    : html`<p><a href="${session.cancel_url}">Back without paying</a></p>`;
}

/** For a session that can no longer be paid. */
export function closedPage(title: string, message: string): string {
  return page(title, html`<p>${message}</p>`);
}
