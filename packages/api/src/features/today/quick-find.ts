import { FOUND_KINDS, type Found, type FoundKind } from '@bookmatch/common/today/quick-find-contract';
import {
  quickFindQuestion,
  quickFindRank,
  type QuickFindQuestion,
} from '@bookmatch/common/today/quick-find-question';
import type { ShopScope } from '../../platform/database/scope.js';
import { likePattern } from '../../platform/http/keyset.js';
import { FINDABLE, type StoredFound } from './found-kinds.js';

const FOUND_LIMIT = 20;
/** So that one kind with many matches does not hide the others. */
const LIMIT_OF_KIND = 8;

/** Everything of the shop that the one who asks may read and that answers, the best match first: a read for each kind. */
export async function quickFind(scope: ShopScope, typed: string): Promise<{ rows: Found[] }> {
  const question = quickFindQuestion(typed);
  const kinds = FOUND_KINDS.filter(
    (kind) => (question.kind === null || question.kind === kind) && scope.can('read', FINDABLE[kind].subject),
  );
  const found: Found[] = [];
  for (const kind of kinds) found.push(...(await findKind(scope, kind, question)));
  const rows = found
    .map((row, index) => ({ row, index, rank: quickFindRank(row, question) }))
    .sort((a, b) => a.rank - b.rank || a.index - b.index)
    .slice(0, FOUND_LIMIT)
    .map(({ row }) => row);
  return { rows };
}

async function findKind(scope: ShopScope, kind: FoundKind, question: QuickFindQuestion): Promise<Found[]> {
  const findable = FINDABLE[kind];
  const { text, number } = question;
  const numbered = number === null || !findable.number ? null : `${findable.number} = :number`;
  const inTexts = findable.texts.map((column) => `${column} like :pattern`).join(' or ');
  // `Job 1042` asks for a number and nothing else.
  const matches = question.kind !== null ? (numbered ?? '1 = 0') : joinedOr(numbered, inTexts);
  const rows = await findable
    .query(scope)
    .where(matches, { number, pattern: likePattern(text), beginning: likePattern(text).slice(1) })
    .orderBy(
      `case ${numbered ? `when ${numbered} then 0` : ''} when ${findable.texts[0]} like :beginning then 1 else 2 end`,
    )
    .orderBy(findable.newestFirst, 'DESC')
    .limit(LIMIT_OF_KIND)
    .all<StoredFound>();
  return rows.map((row) => ({
    kind,
    id: row.id,
    title: row.title,
    line: findable.line(row),
    number: row.number,
  }));
}

const joinedOr = (...conditions: (string | null)[]) => conditions.filter(Boolean).join(' or ');
