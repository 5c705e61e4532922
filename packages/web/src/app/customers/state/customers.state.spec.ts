import {
  buildCustomer,
  buildCustomerRow,
  buildCustomerWithSites,
  buildSite,
} from '../testing/build-customer';
import { CustomersApi, CustomersPage } from './customers.actions';
import { selectCustomer, selectCustomerList } from './customers.selectors';
import { customersFeature, initialCustomers, type CustomersState } from './customers.state';

type Action = Parameters<typeof customersFeature.reducer>[1];
const run = (...actions: Action[]): CustomersState =>
  actions.reduce(customersFeature.reducer, initialCustomers);

const opened = CustomersApi.customerLoaded({ customer: buildCustomerWithSites() });
const { id } = buildCustomer();
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const find = (state: CustomersState) => selectCustomer(id)({ customers: state });

describe('customers', () => {
  it('shows the list as loading until the first answer', () => {
    expect(selectCustomerList({ customers: run() }).loading).toBe(true);
    const page = { rows: [buildCustomerRow()], next: null, total: 1 };
    const list = selectCustomerList({ customers: run(CustomersApi.listLoaded({ page })) });
    expect(list).toMatchObject({ loading: false, total: 1, rows: page.rows });
  });

  it('keeps the sites it knows when only the fields were saved', () => {
    const state = run(
      opened,
      CustomersApi.saved({ customer: buildCustomer({ name: 'Wrenna', version: 2 }) }),
    );
    expect(find(state)).toMatchObject({ name: 'Wrenna', version: 2, sites: [buildSite()] });
    expect(state.save.status).toBe('saved');
  });

  it('keeps why a save was refused until the form is opened again', () => {
    const refused = run(opened, CustomersApi.saveFailed({ problem }));
    expect(refused.save).toEqual({ status: 'failed', problem });
    expect(customersFeature.reducer(refused, CustomersPage.formOpened()).save.status).toBe('idle');
  });

  it('marks a customer as archived and back', () => {
    const archivedAt = '2026-04-01T12:00:00Z';
    const archived = run(opened, CustomersApi.archived({ customer: buildCustomer({ archivedAt }) }));
    expect(find(archived)?.archivedAt).toBe(archivedAt);
    const back = customersFeature.reducer(archived, CustomersApi.restored({ customer: buildCustomer() }));
    expect(find(back)?.archivedAt).toBeNull();
  });

  it('adds a new site, replaces a changed one, and drops a removed one', () => {
    const another = buildSite({ id: 'another', name: 'Lake cabin' });
    const changed = buildSite({ name: 'Old house', version: 2 });
    const state = run(
      opened,
      CustomersApi.siteSaved({ site: another }),
      CustomersApi.siteSaved({ site: changed }),
    );
    expect(find(state)?.sites).toEqual([changed, another]);
    const without = customersFeature.reducer(state, CustomersApi.siteRemoved({ site: changed }));
    expect(find(without)?.sites).toEqual([another]);
  });

  it('does nothing to a customer that is not open', () => {
    expect(run(CustomersApi.siteSaved({ site: buildSite() })).opened.ids).toEqual([]);
  });
});
