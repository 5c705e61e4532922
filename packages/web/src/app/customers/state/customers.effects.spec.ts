import type { Router } from '@angular/router';
import { Actions } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { firstValueFrom, NEVER, of, Subject, throwError, toArray } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { Notices } from '../../platform/page/notices';
import type { CustomersApiClient } from '../customers-api';
import { buildCustomer, buildSite } from '../testing/build-customer';
import { CustomersApi, CustomersPage } from './customers.actions';
import * as effects from './customers.effects';

const customer = buildCustomer();
const { id } = customer;
const fields = { ...customer };
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const refused = () => throwError(() => new ApiProblem(problem));
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<CustomersApiClient>) => methods as CustomersApiClient;
const all = (stream: ReturnType<typeof effects.create>) => firstValueFrom(stream.pipe(toArray()));

describe('customers effects', () => {
  it('shows only the answer to the last question', async () => {
    const page = { rows: [], next: null };
    const slowThenQuick = jest.fn().mockReturnValueOnce(NEVER).mockReturnValueOnce(of(page));
    const asked = actions(
      CustomersPage.listOpened({ query: { q: 'w' } }),
      CustomersPage.listOpened({ query: {} }),
    );
    const answers = await firstValueFrom(
      effects.loadList(asked, api({ list: slowThenQuick })).pipe(toArray()),
    );
    expect(answers).toEqual([CustomersApi.listLoaded({ page })]);
  });

  it('takes no second press while a customer is being saved', async () => {
    const answer = new Subject<typeof customer>();
    const create = jest.fn(() => answer);
    const press = CustomersPage.createSubmitted({ fields });
    const results = all(effects.create(actions(press, press), api({ create })));
    answer.next(customer);
    answer.complete();
    expect(await results).toEqual([CustomersApi.saved({ customer })]);
    expect(create).toHaveBeenCalledTimes(1);
  });

  it('sends a change with the version it was made from, and hands over a refusal', async () => {
    const update = jest.fn(refused);
    const press = CustomersPage.editSubmitted({ id, version: 3, fields });
    expect(await firstValueFrom(effects.edit(actions(press), api({ update })))).toEqual(
      CustomersApi.saveFailed({ problem }),
    );
    expect(update).toHaveBeenCalledWith(id, 3, fields);
  });

  it('reads the newer version after a conflict, and after nothing else', () => {
    const press = CustomersPage.editSubmitted({ id, version: 3, fields });
    const other = { ...problem, code: 'invalid-input' };
    const stream = new Subject<Action>();
    const seen: Action[] = [];
    effects.reloadAfterConflict(new Actions(stream)).subscribe((action) => seen.push(action));
    stream.next(press);
    stream.next(CustomersApi.saveFailed({ problem: other }));
    expect(seen).toEqual([]);
    stream.next(CustomersApi.saveFailed({ problem }));
    expect(seen).toEqual([CustomersPage.customerOpened({ id })]);
  });

  it('opens what was saved', async () => {
    const navigate = jest.fn(() => Promise.resolve(true));
    const router = { navigate } as unknown as Router;
    await firstValueFrom(effects.openSaved(actions(CustomersApi.saved({ customer })), router));
    expect(navigate).toHaveBeenCalledWith(['/customers', id]);
  });

  it('says what was done, and why a command was refused', async () => {
    const notices = { say: jest.fn(), problem: jest.fn() };
    const told = actions(CustomersPage.formOpened(), CustomersApi.archived({ customer }));
    await firstValueFrom(effects.say(told, notices as unknown as Notices).pipe(toArray()));
    expect(notices.say.mock.calls).toEqual([['Customer archived.']]);
    const failed = actions(CustomersApi.commandFailed({ problem }));
    await firstValueFrom(effects.sayProblem(failed, notices as unknown as Notices));
    expect(notices.problem).toHaveBeenCalledWith(problem);
  });

  it('keeps going after a command was refused', async () => {
    const site = buildSite();
    const removeSite = jest.fn().mockImplementationOnce(refused).mockReturnValueOnce(of(undefined));
    const press = CustomersPage.siteRemovalConfirmed({ site });
    const results = await firstValueFrom(
      effects.removeSite(actions(press, press), api({ removeSite })).pipe(toArray()),
    );
    expect(results).toEqual([CustomersApi.commandFailed({ problem }), CustomersApi.siteRemoved({ site })]);
  });
});
