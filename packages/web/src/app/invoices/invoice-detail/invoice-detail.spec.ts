import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import type { Invoice, Payment } from '@bookmatch/common/invoices/invoices-contract';
import { buildInvoice } from '@bookmatch/common/testing/build-invoice';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import invoicesRoutes from '../invoices.routes';

const routes = [{ path: 'invoices', children: invoicesRoutes }];
const letter = {
  id: '01940000-0000-7000-8000-00000000cccc',
  document: 'invoice',
  to: 'wren@example.com',
  sentAt: '2027-01-11T15:00:00.000Z',
} as const;
const check: Payment = {
  id: '01940000-0000-7000-8000-00000000aaaa',
  kind: 'payment',
  method: 'check',
  amountCents: 100_000,
  appliedCents: 100_000,
  receivedOn: '2027-01-12',
  reference: '1041',
  reversesId: null,
  reversedById: null,
  reason: '',
  recordedBy: 'Ada Fenwick',
  createdAt: '2027-01-12T15:00:00.000Z',
};

async function open(invoice: Invoice) {
  const path = `/invoices/${invoice.id}`;
  const screen = await openShopScreen(routes, path, buildMembership());
  screen.http.expectOne(screen.shop(path)).flush(invoice);
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const press = async (text: string | RegExp) =>
    (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const field = async (label: string) => {
    for (const input of await loader.getAllHarnesses(MatInputHarness))
      if ((await (await input.host()).getAttribute('formcontrolname')) === label) return input;
    throw new Error(`no field ${label}`);
  };
  return { ...screen, path, loader, press, field };
}

describe('InvoiceDetail', () => {
  it('shows where it stands, what is billed and what became of it', async () => {
    const { element } = await open(
      buildInvoice({ paidCents: 100_000, payments: [check], sends: [letter] }, '2027-02-01'),
    );
    const text = element.textContent ?? '';
    expect(text).toContain('Wren Halloway');
    expect(text).toContain('Overdue 7 days');
    expect(text).toContain('$3,330.00');
    expect(text).toContain('1041');
    expect(text).toContain('to wren@example.com');
  });

  it('records a payment of all that is owed, and shows the balance that is left', async () => {
    const invoice = buildInvoice({ sends: [letter] });
    const { http, shop, path, press, field, element, fixture } = await open(invoice);
    await press(/Record payment/);
    expect(await (await field('amountCents')).getValue()).toBe('4,330.00');
    await (await field('amountCents')).setValue('1,000');
    await (await field('reference')).setValue('1041');
    const dialogPress = await (
      await TestbedHarnessEnvironment.documentRootLoader(fixture).getHarness(MatDialogHarness)
    ).getHarness(MatButtonHarness.with({ text: 'Record payment' }));
    await dialogPress.click();
    const request = http.expectOne(shop(`${path}/payments`));
    expect(request.request.headers.get('If-Match')).toBe('"1"');
    expect(request.request.body).toMatchObject({ method: 'check', amountCents: 100_000, reference: '1041' });
    request.flush({ ...invoice, version: 2, paidCents: 100_000, balanceCents: 333_000, payments: [check] });
    await fixture.whenStable();
    expect(element.textContent).toContain('$3,330.00');
  });

  it('keeps what was typed when the server refuses, with the sentence at its field', async () => {
    const invoice = buildInvoice({ sends: [letter] });
    const { http, shop, path, press, field, loader } = await open(invoice);
    await press(/Record payment/);
    await (await field('amountCents')).setValue('9,000');
    const dialog = await loader.getHarness(MatDialogHarness);
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Record payment' }))).click();
    const detail = 'This payment is more than the $4,330.00 that is owed.';
    const problem = { type: '', title: '', status: 409, code: 'conflict', detail };
    const refusal = { ...problem, fields: [{ path: 'amountCents', message: detail }] };
    http.expectOne(shop(`${path}/payments`)).flush(refusal, { status: 409, statusText: '' });
    expect(await (await field('amountCents')).getValue()).toBe('9,000');
    expect(await dialog.getText()).toContain(detail);
  });

  it('issues a draft and sends it in one go', async () => {
    const draft = buildInvoice({ status: 'draft' });
    const { http, shop, path, press, loader, fixture, element } = await open(draft);
    await press(/Issue and send/);
    const dialog = await loader.getHarness(MatDialogHarness);
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Issue and send' }))).click();
    const issued = { ...buildInvoice({ number: 2207 }), id: draft.id, version: 2 };
    http.expectOne(shop(`${path}/issue`)).flush(issued);
    const send = http.expectOne(shop(`${path}/send`));
    expect(send.request.headers.get('If-Match')).toBe('"2"');
    expect(send.request.body).toEqual({ to: 'wren@example.com', message: '' });
    send.flush({ ...issued, version: 3, sends: [letter] });
    await fixture.whenStable();
    expect(element.textContent).toContain('Invoice 2207');
    expect(document.querySelector('bm-send-dialog')).toBeNull();
  });

  it('takes a wrong payment back with a reason, and offers it for no card payment', async () => {
    const card = { ...check, id: '01940000-0000-7000-8000-00000000bbbb', method: 'card' as const };
    const invoice = buildInvoice({ paidCents: 200_000, payments: [check, card], sends: [letter] });
    const { http, shop, loader } = await open(invoice);
    const menus = await loader.getAllHarnesses(MatMenuHarness);
    const ofPayments = [];
    for (const menu of menus)
      if ((await (await menu.host()).getAttribute('aria-label'))?.startsWith('More for the payment'))
        ofPayments.push(menu);
    await ofPayments[1]!.open();
    expect(await Promise.all((await ofPayments[1]!.getItems()).map((item) => item.getText()))).not.toContain(
      'Take back',
    );
    await ofPayments[1]!.close();
    await ofPayments[0]!.clickItem({ text: 'Take back' });
    const dialog = await loader.getHarness(MatDialogHarness);
    await (await dialog.getHarness(MatInputHarness)).setValue('Typed twice.');
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Take back' }))).click();
    const request = http.expectOne(shop(`/payments/${check.id}/reverse`));
    expect(request.request.body).toEqual({ reason: 'Typed twice.' });
  });

  it('says that money beyond the debt is held, and asks for the refund first', async () => {
    const { element } = await open(buildInvoice({ status: 'paid', overpaidCents: 6000 }));
    expect(element.querySelector('.note.over')?.textContent).toContain('$60.00 came by card beyond');
    expect(element.textContent).toContain('Record refund');
  });
});
