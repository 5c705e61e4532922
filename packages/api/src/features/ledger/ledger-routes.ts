import {
  accountActivityQuerySchema,
  accountActivitySchema,
  ledgerEntrySchema,
  ledgerExportQuerySchema,
  ledgerListQuerySchema,
  ledgerPageSchema,
  trialBalanceQuerySchema,
  trialBalanceSchema,
} from '@bookmatch/common/ledger/ledger-contract';
import type { AccountCode } from '@bookmatch/common/ledger/chart-of-accounts';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { todayOf } from '../shops/shops-public.js';
import { accountActivity } from './account-activity.js';
import { exportLedger } from './ledger-export.js';
import { listEntries, readEntry } from './ledger-lists.js';
import { readTrialBalance } from './ledger-sums.js';

/** The ledger is only read over the wire: entries are made by what they stand for. */
export function ledgerRoutes(): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/ledger/entries',
      summary: 'List ledger entries',
      allow: ['read', 'LedgerEntry'],
      query: ledgerListQuerySchema,
      answer: ledgerPageSchema,
      handle: ({ scope, query }) => listEntries(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/ledger/entries/:id',
      summary: 'Read a ledger entry',
      allow: ['read', 'LedgerEntry'],
      answer: ledgerEntrySchema,
      handle: ({ scope, params }) => readEntry(scope, params.id),
    }),
    shopRoute({
      method: 'get',
      path: '/ledger/trial-balance',
      summary: 'Read the balance of every account',
      allow: ['read', 'LedgerEntry'],
      query: trialBalanceQuerySchema,
      answer: trialBalanceSchema,
      handle: async ({ scope, query }) => readTrialBalance(scope, query.on ?? (await todayOf(scope))),
    }),
    shopRoute({
      method: 'get',
      path: '/ledger/accounts/:code',
      summary: 'Read what happened on an account',
      allow: ['read', 'LedgerEntry'],
      query: accountActivityQuerySchema,
      answer: accountActivitySchema,
      // A code that is none finds no account.
      handle: ({ scope, params, query }) => accountActivity(scope, params.code as AccountCode, query),
    }),
    shopRoute({
      method: 'get',
      path: '/ledger/export',
      summary: 'Export the ledger as CSV',
      allow: ['export', 'LedgerEntry'],
      query: ledgerExportQuerySchema,
      handle: async ({ scope, query }) => exportLedger(scope, query),
    }),
  ];
}
