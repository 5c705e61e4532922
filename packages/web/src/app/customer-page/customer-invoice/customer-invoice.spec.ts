import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { ActivatedRoute, convertToParamMap } from '@angular/router';
import type { CustomerInvoice as InvoiceView } from '@bookmatch/common/customer-page/customer-page-contract';
import { provideEffects } from '@ngrx/effects';
import { provideState, provideStore } from '@ngrx/store';
import { PageLoad } from '../../platform/session/page-load';
import { provideIcons } from '../../testing/icons';
import * as effects from '../invoice-state/invoice-page.effects';
import { invoicePageFeature } from '../invoice-state/invoice-page.state';
import { buildCustomerInvoice } from '../testing/build-customer-invoice';
import { CustomerInvoice } from './customer-invoice';

const token = 'a'.repeat(64);

async function open(invoice: InvoiceView, payment?: string) {
  const go = jest.fn();
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideStore(),
      provideEffects(effects),
      provideState(invoicePageFeature),
      provideIcons(),
      { provide: PageLoad, useValue: { go } },
      {
        provide: ActivatedRoute,
        useValue: { snapshot: { queryParamMap: convertToParamMap(payment ? { payment } : {}) } },
      },
    ],
  });
  const fixture = TestBed.createComponent(CustomerInvoice);
  fixture.componentRef.setInput('token', token);
  fixture.componentRef.setInput('loaded', invoice);
  fixture.componentRef.setInput('shopName', 'Northgrain Cabinets');
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const button = (text: string) =>
    [...element.querySelectorAll('button')].find((one) => one.textContent?.includes(text));
  return { fixture, element, button, go, http: TestBed.inject(HttpTestingController) };
}

describe('CustomerInvoice', () => {
  it('says what is owed and takes the customer to the page to pay it', async () => {
    const { button, http, go, fixture, element } = await open(buildCustomerInvoice());
    expect(element.querySelector('.amount')?.textContent).toBe('$433.00');
    button('Pay $433.00 by card')!.click();
    http.expectOne(`/api/links/${token}/card-payments`).flush({ url: 'https://pay.test/c/1' });
    await fixture.whenStable();
    expect(go).toHaveBeenCalledWith('https://pay.test/c/1');
  });

  it('offers no card where the shop takes none, and says how else', async () => {
    const { button, element } = await open(buildCustomerInvoice({ canPayByCard: false }));
    expect(button('by card')).toBeUndefined();
    expect(element.textContent).toContain('Pay by check or transfer');
  });

  it('says that nothing was charged after turning back', async () => {
    const { element } = await open(buildCustomerInvoice(), 'canceled');
    expect(element.textContent).toContain('nothing was charged');
  });

  it('waits for the payment to be confirmed, offers no second one meanwhile, and thanks then', async () => {
    const { element, button, http, fixture } = await open(buildCustomerInvoice(), 'made');
    await new Promise((resolve) => setTimeout(resolve));
    expect(element.textContent).toContain('being confirmed');
    expect(button('by card')).toBeUndefined();
    const paid = buildCustomerInvoice({
      ...{ standing: 'paid', paidCents: 43_300, balanceCents: 0, canPayByCard: false },
      payments: [{ receivedOn: '2027-01-12', method: 'card', amountCents: 43_300 }],
    });
    http.expectOne(`/api/links/${token}/card-payments/check`).flush(paid);
    await fixture.whenStable();
    expect(element.textContent).toContain('Your payment came through');
    expect(element.querySelector('.amount')?.textContent).toBe('$0.00');
  });

  it('says what is held when more came than was owed', async () => {
    const { element } = await open(
      buildCustomerInvoice({ standing: 'paid', balanceCents: 0, heldCents: 6000 }),
    );
    expect(element.textContent).toContain('You paid $60.00 more than was owed');
  });
});
