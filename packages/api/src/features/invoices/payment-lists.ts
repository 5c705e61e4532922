import type { PaymentListQuery, PaymentRow } from '@bookmatch/common/invoices/invoices-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { Customer } from '../customers/customers-public.js';
import { Member } from '../shops/shops-public.js';
import { Invoice } from './invoice.entity.js';
import { Payment } from './payment.entity.js';

type StoredRow = Omit<PaymentRow, 'createdAt'> & { createdAt: Date };

/** Every payment of the shop, the last received first. */
export async function listPayments(scope: ShopScope, request: PaymentListQuery): Promise<Page<PaymentRow>> {
  const query = paymentsQuery(scope);
  const { q, method, from, to } = request;
  if (q) query.where('customer.name like :q or payment.reference like :q', { q: likePattern(q) });
  if (method) query.where('payment.method = :method', { method });
  if (from) query.where('payment.receivedOn >= :from', { from });
  if (to) query.where('payment.receivedOn <= :to', { to });
  const columns = {
    id: 'payment.id',
    sorts: { receivedOn: 'payment.receivedOn' },
    standard: '-receivedOn',
  } as const;
  const page = await keysetPage<StoredRow, 'receivedOn'>(query, columns, request);
  return { ...page, rows: page.rows.map(viewRow) };
}

/**
 * The last payments since a day, how many there are in all, and what they come to, less what was taken or given back.
 * @param from `YYYY-MM-DD` in the shop's zone
 */
export async function paymentsSince(
  scope: ShopScope,
  from: string,
  limit: number,
): Promise<{ count: number; rows: PaymentRow[]; cents: number }> {
  const rows = await paymentsQuery(scope)
    .pick({ inAll: 'count(*) over ()', centsInAll: 'sum(payment.amountCents) over ()' })
    .where('payment.receivedOn >= :from', { from })
    .orderBy('payment.receivedOn', 'DESC')
    .orderBy('payment.id', 'DESC')
    .limit(limit)
    .all<StoredRow & { inAll: number | string; centsInAll: number | string }>();
  const [first] = rows;
  return {
    count: Number(first?.inAll ?? 0),
    cents: Number(first?.centsInAll ?? 0),
    rows: rows.map(({ inAll: _inAll, centsInAll: _centsInAll, ...row }) => viewRow(row)),
  };
}

function paymentsQuery(scope: ShopScope): ShopQuery {
  return scope
    .query(Payment, 'payment')
    .join(Invoice, 'invoice', 'invoice.id = payment.invoiceId')
    .join(Customer, 'customer', 'customer.id = invoice.customerId')
    .leftJoin(Member, 'member', 'member.id = payment.memberId')
    .leftJoin(Payment, 'reversal', 'reversal.reversesId = payment.id')
    .pick({
      id: 'payment.id',
      kind: 'payment.kind',
      method: 'payment.method',
      amountCents: 'payment.amountCents',
      appliedCents: 'payment.appliedCents',
      receivedOn: 'payment.receivedOn',
      reference: 'payment.reference',
      reversesId: 'payment.reversesId',
      reversedById: 'reversal.id',
      reason: 'payment.reason',
      recordedBy: '(select person.name from person where person.id = member.person_id)',
      createdAt: 'payment.createdAt',
      invoiceId: 'payment.invoiceId',
      invoiceNumber: 'invoice.number',
      customerName: 'customer.name',
    });
}

function viewRow(row: StoredRow): PaymentRow {
  return { ...row, createdAt: row.createdAt.toISOString() };
}
