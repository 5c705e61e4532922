import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import { LEAD_SOURCE_NAMES } from '@bookmatch/common/leads/lead-words';
import type { LeadExportQuery, LeadRow } from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import {
  amountCell,
  csvDownload,
  EXPORT_BATCH,
  everyRow,
  type CsvColumns,
} from '../../platform/http/csv-download.js';
import type { Download } from '../../platform/http/route.js';
import { listLeads } from './lead-lists.js';
import { seesMoney } from './lead-view.js';

/** The list as a file, with its filters and in its order, every page of it. */
export function exportLeads(scope: ShopScope, request: LeadExportQuery): Download {
  const rows = everyRow((after) => listLeads(scope, { ...request, ...after, limit: EXPORT_BATCH }));
  return csvDownload<LeadRow>('leads', seesMoney(scope) ? { ...COLUMNS, ...MONEY_COLUMNS } : COLUMNS, rows);
}

const COLUMNS: CsvColumns<LeadRow> = {
  Lead: (row) => row.title,
  Contact: (row) => row.contactName,
  Company: (row) => row.company,
  Phone: (row) => row.phone,
  Source: (row) => LEAD_SOURCE_NAMES[row.source],
  Stage: (row) => LEAD_STAGE_NAMES[row.stage],
  'Next step': (row) => row.nextStep,
  'Next step on': (row) => row.nextStepOn,
  'Came in': (row) => row.createdAt,
};
const MONEY_COLUMNS: CsvColumns<LeadRow> = {
  'Expected amount': (row) => (row.expectedCents == null ? null : amountCell(row.expectedCents)),
};
