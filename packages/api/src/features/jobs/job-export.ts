import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import type { JobExportQuery, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import {
  amountCell,
  csvDownload,
  EXPORT_BATCH,
  everyRow,
  type CsvColumns,
} from '../../platform/http/csv-download.js';
import type { Download } from '../../platform/http/route.js';
import type { ClockedTime } from './clocked-time.js';
import { seesMoney } from './job-access.js';
import { listJobs } from './job-lists.js';

/** The list as a file, with its filters and in its order, every page of it. */
export function exportJobs(scope: ShopScope, request: JobExportQuery, time: ClockedTime): Download {
  const columns = seesMoney(scope) ? { ...FLOOR_COLUMNS, ...MONEY_COLUMNS } : FLOOR_COLUMNS;
  const rows = everyRow((after) => listJobs(scope, { ...request, ...after, limit: EXPORT_BATCH }, time));
  return csvDownload<JobRow>('jobs', columns, rows);
}

const FLOOR_COLUMNS: CsvColumns<JobRow> = {
  Job: (row) => row.number,
  Title: (row) => row.title,
  Customer: (row) => row.customerName,
  City: (row) => row.siteCity,
  Stage: (row) => JOB_STAGE_NAMES[row.stage],
  Install: (row) => row.installOn,
  'Planned hours': (row) => hoursCell(row.plannedMinutes),
  'Clocked hours': (row) => hoursCell(row.clockedMinutes),
};
const MONEY_COLUMNS: CsvColumns<JobRow> = {
  'Contract with tax': (row) => amountCell(row.contractTotalCents ?? 0),
  'Planned cost': (row) => amountCell(row.plannedCostCents ?? 0),
  'Actual cost': (row) => amountCell(row.actualCostCents ?? 0),
};

const hoursCell = (minutes: number) => (minutes / 60).toFixed(2);
