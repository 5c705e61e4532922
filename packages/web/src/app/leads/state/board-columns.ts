import type { Lead, LeadBoard, LeadRow } from '@bookmatch/common/leads/leads-contract';

export type BoardColumn = LeadBoard['columns'][number];

/**
 * Takes a card off its column, if it has one, and puts it where its stage and next step say. Counts and sums follow.
 * A lead that no column shows is left alone: which of the many not shown it was counted among is the server's to say.
 */
export function placeOnBoard(columns: readonly BoardColumn[], row: LeadRow): BoardColumn[] {
  if (!columns.some((column) => hasCard(column, row.id))) return [...columns];
  return columns.map((column) => {
    const without = hasCard(column, row.id) ? taken(column, row.id) : column;
    return column.stage === row.stage ? added(without, row) : without;
  });
}

export function findCard(columns: readonly BoardColumn[], id: string): LeadRow | null {
  return columns.flatMap(({ rows }) => rows).find((row) => row.id === id) ?? null;
}

/** The lead as a card shows it. */
export function cardOf(lead: Lead): LeadRow {
  const { id, version, title, contactName, company, phone, source, stage, nextStep, nextStepOn } = lead;
  const { createdAt, expectedCents } = lead;
  const card = { id, version, title, contactName, company, phone, source, stage, nextStep, nextStepOn };
  return { ...card, createdAt, expectedCents };
}

const hasCard = ({ rows }: BoardColumn, id: string): boolean => rows.some((row) => row.id === id);

function taken(column: BoardColumn, id: string): BoardColumn {
  const row = column.rows.find((card) => card.id === id);
  return counted({ ...column, rows: column.rows.filter((card) => card !== row) }, -1, row);
}

function added(column: BoardColumn, row: LeadRow): BoardColumn {
  const rows = [...column.rows, row].sort(bySoonestStep);
  return counted({ ...column, rows }, 1, row);
}

function counted(column: BoardColumn, by: 1 | -1, row: LeadRow | undefined): BoardColumn {
  const { count, expectedCents } = column;
  const sum = expectedCents === undefined ? undefined : expectedCents + by * (row?.expectedCents ?? 0);
  return { ...column, count: count + by, ...(sum === undefined ? {} : { expectedCents: sum }) };
}

/** As the server orders: the soonest next step first, those without one last. */
function bySoonestStep(a: LeadRow, b: LeadRow): number {
  const last = '9999-12-31';
  return (a.nextStepOn ?? last).localeCompare(b.nextStepOn ?? last) || a.id.localeCompare(b.id);
}
