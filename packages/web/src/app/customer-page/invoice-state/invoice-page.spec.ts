import type { CustomerInvoice } from '@bookmatch/common/customer-page/customer-page-contract';
import { Actions } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { firstValueFrom, lastValueFrom, of, throwError, toArray } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { PageLoad } from '../../platform/session/page-load';
import type { InvoicePageApi } from '../invoice-page-api';
import { buildCustomerInvoice } from '../testing/build-customer-invoice';
import { InvoicePage, InvoicePageServer } from './invoice-page.actions';
import * as effects from './invoice-page.effects';
import { initialInvoicePage, invoicePageFeature, type InvoicePageState } from './invoice-page.state';

const { reducer, selectNews } = invoicePageFeature;
const owed = buildCustomerInvoice();
const paid = buildCustomerInvoice({
  standing: 'paid',
  paidCents: 43_300,
  balanceCents: 0,
  canPayByCard: false,
});
const token = 'a'.repeat(64);
const problem = { type: '', title: '', status: 503, code: 'not-ready', detail: 'Not now.' };
const opened = (invoice: CustomerInvoice, arrival: 'by-link' | 'paid' | 'canceled') =>
  InvoicePage.opened({ token, invoice, arrival });
const after = (...actions: Action[]): InvoicePageState => actions.reduce(reducer, initialInvoicePage);
const newsAfter = (...actions: Action[]) => {
  const { invoice, arrival, payment } = after(...actions);
  return selectNews.projector(invoice, arrival, payment);
};
const api = (methods: Partial<InvoicePageApi>) => methods as InvoicePageApi;

describe('what a customer is told about a card payment', () => {
  it('is nothing without one, thanks when it came through, and the truth while nobody knows', () => {
    expect(newsAfter(opened(owed, 'by-link'))).toBe('none');
    expect(newsAfter(opened(paid, 'paid'))).toBe('paid');
    expect(newsAfter(opened(owed, 'paid'))).toBe('confirming');
    expect(newsAfter(opened(owed, 'canceled'))).toBe('canceled');
    expect(newsAfter(opened(owed, 'paid'), InvoicePageServer.checked({ invoice: owed }))).toBe('confirming');
    expect(newsAfter(opened(owed, 'paid'), InvoicePageServer.checked({ invoice: paid }))).toBe('paid');
    expect(newsAfter(opened(owed, 'paid'), InvoicePageServer.checkingGivenUp())).toBe('unheard');
  });

  it('is the refusal, after which paying can be tried again', () => {
    const state = after(
      opened(owed, 'by-link'),
      InvoicePage.payPressed({ token }),
      InvoicePageServer.paymentRefused({ problem }),
    );
    expect(state).toMatchObject({ payment: 'idle', problem });
  });
});

describe('paying by card', () => {
  it('goes to the page that the server names', async () => {
    const url = 'https://pay.test/c/1';
    const start = effects.startPayment(
      new Actions(of(InvoicePage.payPressed({ token }))),
      api({ startCardPayment: () => of({ url }) }),
    );
    expect(await firstValueFrom(start)).toEqual(InvoicePageServer.paymentPageReady({ url }));
    const go = jest.fn();
    const ready = new Actions(of(InvoicePageServer.paymentPageReady({ url })));
    await lastValueFrom(effects.goToPaymentPage(ready, { go } as unknown as PageLoad));
    expect(go).toHaveBeenCalledWith(url);
  });

  it('asks after the way back until the payment is there, also through a failure', async () => {
    jest.useFakeTimers();
    const answers = [of(owed), throwError(() => new ApiProblem(problem)), of(paid), of(paid)];
    const checkCardPayment = jest.fn(() => answers.shift()!);
    const stream = effects.confirmPayment(new Actions(of(opened(owed, 'paid'))), api({ checkCardPayment }));
    const seen = firstValueFrom(stream.pipe(toArray()));
    await jest.advanceTimersByTimeAsync(60_000);
    expect(await seen).toEqual([
      InvoicePageServer.checked({ invoice: owed }),
      InvoicePageServer.checkFailed(),
      InvoicePageServer.checked({ invoice: paid }),
    ]);
    expect(checkCardPayment).toHaveBeenCalledTimes(3);
    jest.useRealTimers();
  });

  it('stops asking after half a minute, and asks nothing of who did not pay', async () => {
    jest.useFakeTimers();
    const checkCardPayment = jest.fn(() => of(owed));
    const stream = effects.confirmPayment(new Actions(of(opened(owed, 'paid'))), api({ checkCardPayment }));
    const seen = firstValueFrom(stream.pipe(toArray()));
    await jest.advanceTimersByTimeAsync(60_000);
    expect((await seen).at(-1)).toEqual(InvoicePageServer.checkingGivenUp());
    expect(checkCardPayment).toHaveBeenCalledTimes(10);
    const idle = new Actions(of(opened(owed, 'by-link'), opened(owed, 'canceled'), opened(paid, 'paid')));
    expect(
      await firstValueFrom(effects.confirmPayment(idle, api({ checkCardPayment })).pipe(toArray())),
    ).toEqual([]);
    jest.useRealTimers();
  });
});
