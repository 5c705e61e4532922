import type {
  CreateCustomer,
  Customer,
  CustomerRow,
  CustomerWithSites,
  Site,
  SiteFields,
} from '@bookmatch/common/customers/customers-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';
import type { SiteRef } from '../customers-api';

/** What happened on the screens. */
export const CustomersPage = createActionGroup({
  source: 'Customers Page',
  events: {
    listOpened: props<{ query: ListQuery }>(),
    customerOpened: props<{ id: string }>(),
    formOpened: emptyProps(),
    createSubmitted: props<{ fields: CreateCustomer }>(),
    editSubmitted: props<{ id: string; version: number; fields: CreateCustomer }>(),
    archiveConfirmed: props<{ id: string }>(),
    restorePressed: props<{ id: string }>(),
    siteFormOpened: emptyProps(),
    siteAdded: props<{ customerId: string; fields: SiteFields }>(),
    siteEdited: props<{ site: SiteRef; fields: SiteFields }>(),
    siteRemovalConfirmed: props<{ site: SiteRef }>(),
  },
});

/** What the server said. */
export const CustomersApi = createActionGroup({
  source: 'Customers API',
  events: {
    listLoaded: props<{ page: Page<CustomerRow> }>(),
    listFailed: props<{ problem: Problem }>(),
    customerLoaded: props<{ customer: CustomerWithSites }>(),
    customerFailed: props<{ problem: Problem }>(),
    saved: props<{ customer: Customer }>(),
    saveFailed: props<{ problem: Problem }>(),
    archived: props<{ customer: Customer }>(),
    restored: props<{ customer: Customer }>(),
    siteSaved: props<{ site: Site }>(),
    siteSaveFailed: props<{ problem: Problem }>(),
    siteRemoved: props<{ site: SiteRef }>(),
    /** A command without a form of its own was refused. */
    commandFailed: props<{ problem: Problem }>(),
  },
});
