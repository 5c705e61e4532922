import { formatDate, formatTime } from '@bookmatch/common/calendar/format';
import { costedParts } from '@bookmatch/common/time/entry-parts';
import type { WeekQuery } from '@bookmatch/common/time/week-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import {
  amountCell,
  csvDownload,
  EXPORT_BATCH,
  everyRow,
  type CsvColumns,
} from '../../platform/http/csv-download.js';
import { keysetPage } from '../../platform/http/keyset.js';
import type { Download } from '../../platform/http/route.js';
import { pricedEntryQuery, seesTimeMoney, type StoredEntry } from './entry-rows.js';
import { onlyWeek, weekFrame, type WeekFrame } from './weeks.js';

/**
 * A week as a file, for payroll and for checking: a row for each closed entry and day, so that the minutes of a shift
 * across midnight stand in the day they fall in and the file adds up to the week's screen.
 */
export async function exportWeek(scope: ShopScope, query: WeekQuery): Promise<Download> {
  const frame = await weekFrame(scope, query);
  const columns = seesTimeMoney(scope) ? { ...COLUMNS, ...MONEY_COLUMNS } : COLUMNS;
  return csvDownload(`time-${frame.startsOn}`, columns, partsOf(scope, frame));
}

type Part = StoredEntry & { on: string; partMinutes: number; partCents: number; zone: string };

async function* partsOf(scope: ShopScope, frame: WeekFrame): AsyncGenerator<Part> {
  const rows = everyRow((after) =>
    keysetPage<StoredEntry, 'startedAt'>(
      onlyWeek(pricedEntryQuery(scope), frame).where('entry.voidedAt is null and entry.endedAt is not null'),
      { id: 'entry.id', sorts: { startedAt: 'entry.startedAt' }, standard: 'startedAt' },
      { ...after, limit: EXPORT_BATCH },
    ),
  );
  for await (const row of rows) yield* partsOfEntry(row, frame);
}

function partsOfEntry(row: StoredEntry, { startsOn, endsOn, timeZone }: WeekFrame): Part[] {
  const { kind, startedAt, endedAt, costCents } = row;
  const stretch = { kind, startedAt: startedAt.toISOString(), endedAt: (endedAt ?? startedAt).toISOString() };
  return costedParts({ ...stretch, costCents: costCents ?? 0 }, timeZone)
    .filter((part) => part.on >= startsOn && part.on <= endsOn)
    .map((part) => ({
      ...row,
      on: part.on,
      partMinutes: part.minutes,
      partCents: part.costCents,
      zone: timeZone,
    }));
}

const COLUMNS: CsvColumns<Part> = {
  Member: (part) => part.memberName,
  Date: (part) => part.on,
  Day: (part) => formatDate(part.on).slice(0, 3),
  From: (part) => formatTime(part.startedAt.toISOString(), part.zone),
  To: (part) => formatTime((part.endedAt ?? part.startedAt).toISOString(), part.zone),
  Kind: (part) => (part.kind === 'work' ? 'Work' : 'Meal break'),
  Minutes: (part) => part.partMinutes,
  Hours: (part) => (part.partMinutes / 60).toFixed(2),
  Job: (part) => part.jobNumber,
  Title: (part) => part.jobTitle,
  Operation: (part) => part.operationName,
  Note: (part) => part.note,
  Corrected: (part) => (part.corrected ? 'Yes' : ''),
};
const MONEY_COLUMNS: CsvColumns<Part> = { 'Labor cost': (part) => amountCell(part.partCents) };
