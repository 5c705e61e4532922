import type {
  Customer,
  CustomerRow,
  CustomerWithSites,
  Site,
} from '@bookmatch/common/customers/customers-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { CustomersApi, CustomersPage } from './customers.actions';

export type CustomersState = {
  list: ListState<CustomerRow>;
  /** The customers that were opened, with their sites. */
  opened: EntityState<CustomerWithSites>;
  openProblem: Problem | null;
  save: SaveState;
  siteSave: SaveState;
};

export const customerList = createListState<CustomerRow>();
export const openedCustomers = createEntityAdapter<CustomerWithSites>();

export const initialCustomers: CustomersState = {
  list: customerList.initial,
  opened: openedCustomers.getInitialState(),
  openProblem: null,
  save: notSaved,
  siteSave: notSaved,
};

export const customersFeature = createFeature({
  name: 'customers',
  reducer: createReducer(
    initialCustomers,
    on(CustomersPage.listOpened, (state): CustomersState => ({
      ...state,
      list: customerList.requested(state.list),
    })),
    on(CustomersApi.listLoaded, (state, { page }): CustomersState => ({
      ...state,
      list: customerList.loaded(state.list, page),
    })),
    on(CustomersApi.listFailed, (state, { problem }): CustomersState => ({
      ...state,
      list: customerList.failed(state.list, problem),
    })),
    on(CustomersPage.customerOpened, (state): CustomersState => ({ ...state, openProblem: null })),
    on(CustomersApi.customerLoaded, (state, { customer }): CustomersState => ({
      ...state,
      opened: openedCustomers.upsertOne(customer, state.opened),
    })),
    on(CustomersApi.customerFailed, (state, { problem }): CustomersState => ({
      ...state,
      openProblem: problem,
    })),
    on(CustomersPage.formOpened, (state): CustomersState => ({ ...state, save: notSaved })),
    on(CustomersPage.createSubmitted, CustomersPage.editSubmitted, (state): CustomersState => ({
      ...state,
      save: saving,
    })),
    on(CustomersApi.saved, (state, { customer }): CustomersState => ({
      ...withFields(state, customer),
      save: saved,
    })),
    on(CustomersApi.saveFailed, (state, { problem }): CustomersState => ({
      ...state,
      save: saveFailed(problem),
    })),
    on(CustomersApi.archived, CustomersApi.restored, (state, { customer }): CustomersState =>
      withFields(state, customer),
    ),
    on(CustomersPage.siteFormOpened, (state): CustomersState => ({ ...state, siteSave: notSaved })),
    on(CustomersPage.siteAdded, CustomersPage.siteEdited, (state): CustomersState => ({
      ...state,
      siteSave: saving,
    })),
    on(CustomersApi.siteSaved, (state, { site }): CustomersState => ({
      ...withSites(state, site.customerId, (sites) => placeSite(sites, site)),
      siteSave: saved,
    })),
    on(CustomersApi.siteSaveFailed, (state, { problem }): CustomersState => ({
      ...state,
      siteSave: saveFailed(problem),
    })),
    on(CustomersApi.siteRemoved, (state, { site }): CustomersState =>
      withSites(state, site.customerId, (sites) => sites.filter(({ id }) => id !== site.id)),
    ),
  ),
});

/** The answer to a change has no sites: those known stay. */
function withFields(state: CustomersState, customer: Customer): CustomersState {
  return {
    ...state,
    opened: openedCustomers.updateOne({ id: customer.id, changes: customer }, state.opened),
  };
}

function withSites(
  state: CustomersState,
  customerId: string,
  change: (sites: Site[]) => Site[],
): CustomersState {
  const customer = state.opened.entities[customerId];
  if (!customer) return state;
  const changes = { sites: change(customer.sites) };
  return { ...state, opened: openedCustomers.updateOne({ id: customerId, changes }, state.opened) };
}

function placeSite(sites: Site[], site: Site): Site[] {
  const known = sites.some(({ id }) => id === site.id);
  return known ? sites.map((other) => (other.id === site.id ? site : other)) : [...sites, site];
}
