import {
  BOARD_CLOSED_DAYS,
  BOARD_COLUMN_LIMIT,
  LEAD_STAGES,
  type LeadBoard,
  type LeadBoardQuery,
  type LeadStage,
} from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { IS_OPEN, leadConditions, type Conditions } from './lead-filters.js';
import { leadRows, viewLeadRow, type StoredLeadRow } from './lead-lists.js';
import { seesMoney } from './lead-view.js';
import { Lead } from './lead.entity.js';

type Sums = { stage: LeadStage; count: number | string; expectedCents: number | string | null };
const DAY_MS = 86_400_000;

/** The board: of each stage how many leads, what they may be worth, and the first of them. Two reads, however long. */
export async function leadBoard(scope: ShopScope, request: LeadBoardQuery): Promise<LeadBoard> {
  const conditions = [...(await leadConditions(scope, request)), recent(scope)];
  const [sums, rows] = [await sumsByStage(scope, conditions), await firstOfEach(scope, conditions)];
  return {
    columns: LEAD_STAGES.map((stage) => {
      const sum = sums.find((one) => one.stage === stage);
      return {
        stage,
        count: Number(sum?.count ?? 0),
        rows: rows.filter((row) => row.stage === stage).map(viewLeadRow),
        ...(seesMoney(scope) ? { expectedCents: Number(sum?.expectedCents ?? 0) } : {}),
      };
    }),
  };
}

/** What is open, and what was won or lost lately. */
function recent({ now }: ShopScope): Conditions[number] {
  const since = new Date(now.getTime() - BOARD_CLOSED_DAYS * DAY_MS);
  return { sql: `${IS_OPEN} or lead.stageChangedAt >= :since`, parameters: { since } };
}

function sumsByStage(scope: ShopScope, conditions: Conditions): Promise<Sums[]> {
  const query = scope
    .query(Lead, 'lead')
    .pick({ stage: 'lead.stage', count: 'count(*)', expectedCents: 'sum(lead.expectedCents)' })
    .groupBy('lead.stage');
  for (const { sql, parameters } of conditions) query.where(sql, parameters);
  return query.all<Sums>();
}

/** The rows are numbered within their stage in an inner query that names its table `lead` too, so that the conditions fit. */
function firstOfEach(scope: ShopScope, conditions: Conditions): Promise<StoredLeadRow[]> {
  const inner = conditions.map(({ sql }) => `(${sql})`).join(' and ');
  const place = 'row_number() over (partition by lead.stage order by lead.nextStepOrder, lead.id)';
  const ranked = `select lead.id, ${place} as place from lead lead where lead.shopId = :shopId and ${inner}`;
  return leadRows(scope)
    .where(
      `lead.id in (select ranked.id from (${ranked}) ranked where ranked.place <= ${BOARD_COLUMN_LIMIT})`,
      Object.assign({}, ...conditions.map(({ parameters }) => parameters)) as Record<string, unknown>,
    )
    .orderBy('lead.nextStepOrder')
    .orderBy('lead.id')
    .all<StoredLeadRow>();
}
