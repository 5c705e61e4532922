import { ESTIMATE_STATUS_NAMES } from '@bookmatch/common/estimates/estimate-words';
import type { EstimateExportQuery, EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import {
  amountCell,
  csvDownload,
  EXPORT_BATCH,
  everyRow,
  type CsvColumns,
} from '../../platform/http/csv-download.js';
import type { Download } from '../../platform/http/route.js';
import { listEstimates } from './estimate-lists.js';

/** The list as a file, with its filters and in its order, every page of it. */
export function exportEstimates(scope: ShopScope, request: EstimateExportQuery): Download {
  const rows = everyRow((after) => listEstimates(scope, { ...request, ...after, limit: EXPORT_BATCH }));
  return csvDownload<EstimateRow>('estimates', COLUMNS, rows);
}

const COLUMNS: CsvColumns<EstimateRow> = {
  Number: (row) => row.number,
  Estimate: (row) => row.title,
  Customer: (row) => row.customerName,
  Status: (row) => ESTIMATE_STATUS_NAMES[row.status],
  Revision: (row) => row.revisionNumber,
  'Valid until': (row) => row.validUntil,
  Sent: (row) => row.sentAt,
  Started: (row) => row.createdAt,
  'Price with tax': (row) => amountCell(row.totalCents),
};
