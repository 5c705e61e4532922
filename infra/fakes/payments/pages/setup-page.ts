import type Stripe from 'stripe';
import { html } from './html.js';
import { alert, page } from './layout.js';

/** Where a shop would prove to the provider who it is. Here a name is enough. */
export function setupPage(token: string, account: Stripe.Account, error: string | null): string {
  const name = account.business_profile?.name ?? '';
  const content = html`${alert(error)}
    <p>
      This is a test page in place of the payment provider's own. Nothing you enter leaves this machine, and
      no bank account is asked for.
    </p>
    <form method="post" action="/setup/s/${token}">
      <label class="field" for="business_name">Business name</label>
      <input type="text" id="business_name" name="business_name" value="${name}" maxlength="100" required />
      <button type="submit" name="action" value="complete">Finish: payments can begin</button>
      <button type="submit" class="quiet" name="action" value="review">
        Finish: the provider is still reviewing
      </button>
      <button type="submit" class="quiet" name="action" value="later" formnovalidate>
        Leave it unfinished
      </button>
    </form>`;
  return page('Set up card payments', content);
}
