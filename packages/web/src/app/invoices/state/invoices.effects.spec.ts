import type { Clipboard } from '@angular/cdk/clipboard';
import type { Router } from '@angular/router';
import { buildInvoice } from '@bookmatch/common/testing/build-invoice';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Actions } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import {
  firstValueFrom,
  lastValueFrom,
  NEVER,
  of,
  Subject,
  throwError,
  toArray,
  type Observable,
} from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import { NavCounts } from '../../platform/page/nav-counts';
import type { Notices } from '../../platform/page/notices';
import type { InvoicesApiClient } from '../invoices-api';
import { InvoicesApi, InvoicesPage } from './invoices.actions';
import * as effects from './invoices.effects';

const invoice = buildInvoice();
const ref = { id: invoice.id, version: invoice.version };
const letter = { to: 'wren@example.com', message: '' };
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const refused = () => throwError(() => new ApiProblem(problem));
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<InvoicesApiClient>) => methods as InvoicesApiClient;
const all = (stream: Observable<Action>) => firstValueFrom(stream.pipe(toArray()));

describe('invoices effects', () => {
  it('shows only the answer to the last question', async () => {
    const page = { rows: [], next: null };
    const list = jest.fn().mockReturnValueOnce(NEVER).mockReturnValueOnce(of(page));
    const ask = InvoicesPage.listOpened({ query: {} });
    expect(await all(effects.loadList(actions(ask, ask), api({ list })))).toEqual([
      InvoicesApi.listLoaded({ page }),
    ]);
  });

  it('records one payment however often the button is pressed', async () => {
    const answer = new Subject<Invoice>();
    const recordPayment = jest.fn(() => answer);
    const payment = { method: 'check', amountCents: 100, receivedOn: '2027-01-11', reference: '' } as const;
    const press = InvoicesPage.paymentSubmitted({ invoice: ref, payment });
    const results = all(effects.recordPayment(actions(press, press), api({ recordPayment })));
    answer.next(invoice);
    answer.complete();
    expect(await results).toEqual([InvoicesApi.done({ invoice, message: 'Payment recorded.' })]);
    expect(recordPayment).toHaveBeenCalledTimes(1);
  });

  it('issues first and sends then, with the version that issuing gave', async () => {
    const issued = { ...invoice, version: 2 };
    const send = jest.fn(() => of({ ...issued, version: 3 }));
    const issue = () => of(issued);
    const press = InvoicesPage.issueAndSendSubmitted({ invoice: ref, letter });
    expect(await all(effects.issueAndSend(actions(press), api({ issue, send })))).toEqual([
      InvoicesApi.issuedFirst({ invoice: issued }),
      InvoicesApi.done({ invoice: { ...issued, version: 3 }, message: 'Invoice issued and sent.' }),
    ]);
    expect(send).toHaveBeenCalledWith(issued, letter);
  });

  it('keeps what was issued when only the letter is refused, and sends none when issuing is', async () => {
    const press = InvoicesPage.issueAndSendSubmitted({ invoice: ref, letter });
    const half = effects.issueAndSend(actions(press), api({ issue: () => of(invoice), send: refused }));
    expect(await all(half)).toEqual([
      InvoicesApi.issuedFirst({ invoice }),
      InvoicesApi.saveFailed({ problem }),
    ]);
    const send = jest.fn(() => NEVER);
    const none = effects.issueAndSend(actions(press), api({ issue: refused, send }));
    expect(await all(none)).toEqual([InvoicesApi.saveFailed({ problem })]);
    expect(send).not.toHaveBeenCalled();
  });

  it('reads the invoice again when somebody was quicker, and after no other refusal', () => {
    const stream = new Subject<Action>();
    const seen: Action[] = [];
    effects.reloadAfterConflict(new Actions(stream)).subscribe((action) => seen.push(action));
    stream.next(InvoicesPage.issueSubmitted({ invoice: ref }));
    stream.next(InvoicesApi.saveFailed({ problem: { ...problem, code: 'conflict' } }));
    expect(seen).toEqual([]);
    stream.next(InvoicesApi.saveFailed({ problem }));
    expect(seen).toEqual([InvoicesPage.invoiceOpened({ id: invoice.id })]);
  });

  it('counts what is overdue beside the entry of the navigation', async () => {
    const counts = new NavCounts();
    const aging = { totalCents: 0 } as never;
    const totals = {
      ...{ on: '2027-01-11', aging, overdueCents: 5, openCount: 3, overdueCount: 2 },
      ...{ draftCents: 0, draftCount: 0 },
    };
    await lastValueFrom(effects.countOverdue(actions(InvoicesApi.totalsLoaded({ totals })), counts));
    expect(counts.all()).toEqual({ invoices: 2 });
  });

  it('goes to the draft that was saved, and to the list when one was deleted', async () => {
    const navigate = jest.fn(() => Promise.resolve(true));
    const router = { navigate } as unknown as Router;
    const notices = { say: jest.fn() } as unknown as Notices;
    await lastValueFrom(effects.openSaved(actions(InvoicesApi.created({ invoice })), router));
    await lastValueFrom(effects.leaveRemoved(actions(InvoicesApi.removed({ id: 'x' })), router, notices));
    expect(navigate.mock.calls).toEqual([[['/invoices', invoice.id]], [['/invoices']]]);
  });

  it('copies the link, or shows it where copying is not allowed', async () => {
    const say = jest.fn();
    const copy = jest.fn().mockReturnValueOnce(true).mockReturnValueOnce(false);
    const made = InvoicesApi.linkMade({ url: 'https://shop.test/c/x' });
    const clipboard = { copy } as unknown as Clipboard;
    await lastValueFrom(effects.copyLink(actions(made, made), clipboard, { say } as unknown as Notices));
    expect(say.mock.calls).toEqual([['Link copied.'], ['The link is https://shop.test/c/x']]);
  });
});
