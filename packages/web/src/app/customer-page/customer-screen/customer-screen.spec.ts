import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { Title } from '@angular/platform-browser';
import { TestBed } from '@angular/core/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import type { CustomerEstimate, CustomerPage } from '@bookmatch/common/customer-page/customer-page-contract';
import { acceptedDocument } from '@bookmatch/common/estimates/accepted-document';
import { buildRevisionContent } from '@bookmatch/common/testing/build-estimate';
import { openShopScreen } from '../../testing/shop-screen';
import customerPageRoutes from '../customer-page.routes';

const routes = [{ path: 'c', children: customerPageRoutes }];
const token = 'a'.repeat(64);
const link = `/api/links/${token}`;
const revisionId = '01940000-0000-7000-8000-0000000000b1';
const frame = {
  ...{ shopName: 'Northgrain Cabinets', customerName: 'Tobias Wren', site: null },
  ...{ estimateNumber: 318, revisionNumber: 2, revisionId, title: 'Library wall', currency: 'USD' },
};
const offer: CustomerEstimate = {
  status: 'open',
  document: acceptedDocument(frame, buildRevisionContent()),
  documentHash: 'b'.repeat(64),
  questions: [],
  acceptance: null,
};
const shop = {
  ...{ name: 'Northgrain Cabinets', phone: '(802) 555-0101', email: 'shop@example.test' },
  address: { street: '1 Mill Lane', street2: '', city: 'Stowe', region: 'VT', postalCode: '05672' },
  timeZone: 'America/Los_Angeles',
};
const acceptance = {
  ...{ name: 'Tobias Wren', acceptedAt: '2026-03-06T02:15:00.000Z', documentHash: offer.documentHash },
};

async function open(answer: CustomerEstimate | { status: number; code: string } = offer) {
  const screen = await openShopScreen(routes, `/c/${token}`);
  const { http, fixture, element } = screen;
  const request = http.expectOne(link);
  if ('code' in answer)
    request.flush(
      { ...answer, type: '', title: '', detail: 'No.' },
      { status: answer.status, statusText: '' },
    );
  else request.flush({ subject: 'estimate', shop, estimate: answer } satisfies CustomerPage);
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const press = async (text: string) => {
    const buttons = [...document.querySelectorAll<HTMLElement>('button')];
    buttons.find(({ textContent }) => textContent?.trim() === text)!.click();
    await fixture.whenStable();
  };
  const type = async (selector: string, text: string) => {
    const field = element.querySelector<HTMLInputElement>(selector)!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const agree = async () => (await loader.getHarness(MatCheckboxHarness)).check();
  return { ...screen, press, type, agree, text: () => element.textContent?.replace(/\s+/g, ' ') ?? '' };
}

describe('the customer’s page of an estimate', () => {
  it('carries the shop’s name, what it costs and when it is paid, and nothing of ours', async () => {
    const { text } = await open();
    expect(text()).toContain('Estimate 318 , revision 2 for Tobias Wren');
    expect(text()).toContain('$402.69');
    expect(text()).toContain('Deposit');
    expect(text()).toContain('1 Mill Lane');
    expect(text()).not.toContain('Bookmatch');
    expect(TestBed.inject(Title).getTitle()).toBe('Estimate 318 · Northgrain Cabinets');
  });

  it('asks for a name and the box before it accepts', async () => {
    const { press, http, text } = await open();
    await press('Accept estimate');
    expect(text()).toContain('Your name cannot be empty.');
    expect(text()).toContain('Tick the box to say that you accept the estimate.');
    http.expectNone(`${link}/accept`);
  });

  it('accepts exactly what stands on the screen, and says thanks and what comes next', async () => {
    const { press, type, agree, http, fixture, text } = await open();
    await type('bm-accept-form input', ' Tobias Wren ');
    await agree();
    await press('Accept estimate');
    const call = http.expectOne(`${link}/accept`);
    expect(call.request.body).toEqual({
      ...{ name: 'Tobias Wren', agreed: true, revisionId, documentHash: offer.documentHash },
    });
    call.flush({ ...offer, status: 'accepted', acceptance });
    await fixture.whenStable();
    expect(text()).toContain('Thank you, Tobias Wren');
    // Times are the shop's, wherever the customer is.
    expect(text()).toContain('Thu, Mar 5, 6:15 pm');
    expect(document.querySelector('bm-accept-form')).toBeNull();
  });

  it('offers to read it again when the shop sent another one meanwhile', async () => {
    const { press, type, agree, http, fixture, text } = await open();
    await type('bm-accept-form input', 'Tobias Wren');
    await agree();
    await press('Accept estimate');
    const detail = 'A newer revision of this estimate was sent. Open that one.';
    const problem = { type: '', title: '', status: 409, code: 'conflict', detail };
    http.expectOne(`${link}/accept`).flush(problem, { status: 409, statusText: '' });
    await fixture.whenStable();
    expect(text()).toContain(detail);
    await press('Read it again');
    http.expectOne(link);
  });

  it('declines with a reason after asking once more', async () => {
    const { press, http, fixture, text } = await open();
    await press('Decline');
    const dialog = document.querySelector('bm-confirm-dialog')!;
    const reason = dialog.querySelector('textarea')!;
    reason.value = 'We wait a year.';
    reason.dispatchEvent(new Event('input'));
    dialog.querySelector<HTMLButtonElement>('button[type=submit]')!.click();
    await fixture.whenStable();
    const call = http.expectOne(`${link}/decline`);
    expect(call.request.body).toEqual({ revisionId, reason: 'We wait a year.' });
    call.flush({ ...offer, status: 'declined' });
    await fixture.whenStable();
    expect(text()).toContain('You declined this estimate');
  });

  it('asks a question and keeps it on the page', async () => {
    const { press, type, http, fixture, text } = await open();
    await press('Send question');
    expect(text()).toContain('The question cannot be empty.');
    await type('bm-question-box textarea', 'Oak or ash?');
    await press('Send question');
    const asked = { id: revisionId, body: 'Oak or ash?', askedAt: '2026-03-06T02:15:00.000Z' };
    const question = { ...asked, answer: null, answeredBy: null, answeredAt: null };
    http.expectOne(`${link}/questions`).flush(question);
    await fixture.whenStable();
    expect(text()).toContain('Northgrain Cabinets has been told.');
    expect(document.querySelector<HTMLTextAreaElement>('bm-question-box textarea')?.value).toBe('');
  });

  it('takes no yes to what has expired', async () => {
    const { text, element } = await open({ ...offer, status: 'expired' });
    expect(text()).toContain('This estimate has expired');
    expect(element.querySelector('bm-accept-form')).toBeNull();
  });

  it('says in plain words why a link shows nothing', async () => {
    const ended = await open({ status: 410, code: 'link-expired' });
    expect(ended.text()).toContain('This link no longer works');
    TestBed.resetTestingModule();
    const forged = await open({ status: 404, code: 'not-found' });
    expect(forged.text()).toContain('This link is not complete');
  });
});
