import type { CustomerListQuery, CustomerRow } from '@bookmatch/common/customers/customers-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopScope } from '../../platform/database/scope.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { Customer } from './customer.entity.js';

type StoredRow = Omit<CustomerRow, 'archivedAt' | 'createdAt'> & { archivedAt: Date | null; createdAt: Date };

/** The list of customers. */
export async function listCustomers(
  scope: ShopScope,
  request: CustomerListQuery,
): Promise<Page<CustomerRow>> {
  const query = scope.query(Customer, 'customer').pick({
    id: 'customer.id',
    kind: 'customer.kind',
    name: 'customer.name',
    company: 'customer.company',
    email: 'customer.email',
    phone: 'customer.phone',
    city: 'customer.city',
    archivedAt: 'customer.archivedAt',
    createdAt: 'customer.createdAt',
  });
  if (request.kind) query.where('customer.kind = :kind', { kind: request.kind });
  if (request.archived === 'only') query.where('customer.archivedAt is not null');
  else if (request.archived !== 'all') query.where('customer.archivedAt is null');
  if (request.q)
    query.where(
      'customer.name like :q or customer.company like :q or customer.email like :q or customer.phone like :q',
      {
        q: likePattern(request.q),
      },
    );

  const columns = {
    id: 'customer.id',
    sorts: { name: 'customer.name', createdAt: 'customer.createdAt' },
    standard: 'name',
  } as const;
  const page = await keysetPage<StoredRow, 'name' | 'createdAt'>(query, columns, request);
  return { ...page, rows: page.rows.map(viewRow) };
}

function viewRow(row: StoredRow): CustomerRow {
  return {
    ...row,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  };
}
