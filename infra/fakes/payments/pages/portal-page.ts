import type Stripe from 'stripe';
import { paymentMethodOf } from '../acts/invoicing.js';
import { periodEndOf } from '../acts/cancel-at-period-end.js';
import { openInvoices } from '../acts/renew.js';
import type { Desk } from '../desk.js';
import { cardChoice } from './card-choice.js';
import { html, type Html } from './html.js';
import { alert, page } from './layout.js';
import { day, money } from './money.js';

export interface PortalView {
  desk: Desk;
  session: Stripe.BillingPortal.Session;
  subscriptions: Stripe.Subscription[];
  error: string | null;
}

export function portalPage(view: PortalView): string {
  const { session, subscriptions } = view;
  const parts = subscriptions.map((one) => subscriptionPart(view, one));
  const content = html`${alert(view.error)} ${parts.length === 0 ? html`<p>No subscription.</p>` : parts}
  ${invoicesPart(view)}
  ${session.return_url === null ? null : html`<p><a href="${session.return_url}">Return</a></p>`}`;
  return page('Manage your subscription', content);
}

function subscriptionPart(view: PortalView, subscription: Stripe.Subscription): Html {
  return html`<h2>Subscription</h2>
    ${facts(view.desk, subscription)}
    ${subscription.status === 'canceled' ? null : actions(view, subscription)}`;
}

function facts(desk: Desk, subscription: Stripe.Subscription): Html {
  const item = subscription.items.data[0];
  const last4 = paymentMethodOf(desk, subscription)?.card?.last4 ?? 'none';
  const unit = money(item?.price.unit_amount ?? 0, subscription.currency);
  const end = day(periodEndOf(subscription));
  return html`<table>
    <tbody>
      <tr>
        <th scope="row">Status</th>
        <td id="status">${subscription.status}</td>
      </tr>
      <tr>
        <th scope="row">Quantity</th>
        <td>${item?.quantity ?? 0} at ${unit}</td>
      </tr>
      <tr>
        <th scope="row">${subscription.cancel_at_period_end ? 'Ends on' : 'Period ends'}</th>
        <td>${end}</td>
      </tr>
      <tr>
        <th scope="row">Card</th>
        <td>ending in ${last4}</td>
      </tr>
    </tbody>
  </table>`;
}

function actions({ desk, session }: PortalView, subscription: Stripe.Subscription): Html {
  const owing = openInvoices(desk, subscription).length > 0;
  const form = (content: Html): Html =>
    html`<form method="post" action="/p/session/${session.id}">
      <input type="hidden" name="subscription" value="${subscription.id}" />
      ${content}
    </form> `;
  const cancel = subscription.cancel_at_period_end
    ? action('resume', 'Keep the subscription')
    : action('cancel', 'Cancel at the end of the period');
  return html`${owing ? form(action('pay', 'Pay the open invoice now')) : null}
  ${form(html`${cardChoice('pays', true)}${action('card', 'Change the card')}`)} ${form(cancel)}
  ${form(testControls())}`;
}

function action(name: string, label: string): Html {
  return html`<button type="submit" class="quiet" name="action" value="${name}">${label}</button>`;
}

function testControls(): Html {
  return html`<fieldset class="test">
    <legend>Test controls, not on a real page</legend>
    ${action('fail-next', 'Make the next renewal fail')} ${action('advance', 'Go to the end of this period')}
  </fieldset>`;
}

function invoicesPart({ desk, session }: PortalView): Html | null {
  const invoices = Object.values(desk.book.invoices).filter((one) => one.customer === session.customer);
  if (invoices.length === 0) return null;
  const rows = invoices.reverse().map(
    (one) =>
      html`<tr>
        <td>${one.number}</td>
        <td>${day(one.created)}</td>
        <td>${one.status}</td>
        <td class="number">${money(one.amount_due, one.currency)}</td>
      </tr> `,
  );
  return html`<h2>Invoices</h2>
    <table>
      <thead>
        <tr>
          <th scope="col">Number</th>
          <th scope="col">Date</th>
          <th scope="col">Status</th>
          <th scope="col" class="number">Amount</th>
        </tr>
      </thead>
      <tbody>
        ${rows}
      </tbody>
    </table>`;
}
