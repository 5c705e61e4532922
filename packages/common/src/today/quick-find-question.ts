import type { FoundKind } from './quick-find-contract.js';

/** What somebody looks for: a number of any kind or of one, or a text. */
export type QuickFindQuestion = { text: string; number: number | null; kind: FoundKind | null };

const NUMBERED = /^(?:(estimate|job|invoice)s?\s+)?(?:no\.?\s*|#\s*)?(\d{1,9})$/i;

/** Reads `1042`, `#1042`, `Job 1042` and `invoice no. 2207` as numbers, everything else as text. */
export function quickFindQuestion(typed: string): QuickFindQuestion {
  const text = typed.trim();
  const [, kind, digits] = NUMBERED.exec(text) ?? [];
  if (digits === undefined) return { text, number: null, kind: null };
  return { text, number: Number(digits), kind: (kind?.toLowerCase() as FoundKind | undefined) ?? null };
}

/** How well a row answers, the smaller the better: its number, its name's beginning, or something in it. */
export function quickFindRank(
  { title, number }: { title: string; number: number | null },
  question: QuickFindQuestion,
): number {
  if (question.number !== null && number === question.number) return 0;
  return title.toLowerCase().startsWith(question.text.toLowerCase()) ? 1 : 2;
}
