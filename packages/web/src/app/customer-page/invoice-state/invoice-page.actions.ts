import type { CustomerInvoice } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createActionGroup, emptyProps, props } from '@ngrx/store';

/** How the customer came here: by the link, or back from the payment provider's page. */
export type Arrival = 'by-link' | 'paid' | 'canceled';

export const InvoicePage = createActionGroup({
  source: 'Invoice Page',
  events: {
    opened: props<{ token: string; invoice: CustomerInvoice; arrival: Arrival }>(),
    payPressed: props<{ token: string }>(),
    checkPressed: props<{ token: string }>(),
  },
});

export const InvoicePageServer = createActionGroup({
  source: 'Invoice Page API',
  events: {
    paymentPageReady: props<{ url: string }>(),
    paymentRefused: props<{ problem: Problem }>(),
    checked: props<{ invoice: CustomerInvoice }>(),
    /** The provider could not be asked; the next try may. */
    checkFailed: emptyProps(),
    /** Nobody has heard of the payment for a while. */
    checkingGivenUp: emptyProps(),
  },
});
