import type { BillingShare, BillingStage } from '@bookmatch/common/estimates/billing-schedule-contract';
import {
  saveRevisionSchema,
  type EstimateLine,
  type EstimateRoom,
  type RevisionContent,
  type SaveRevision,
} from '@bookmatch/common/estimates/revision-contract';
import type { FieldProblem } from '@bookmatch/common/problems/problem';
import type { DraftFields, LineFields, ShareFields } from './draft-form';

type Read = { content: SaveRevision } | { problems: FieldProblem[] };
type RoomFields = DraftFields['rooms'][number];

/**
 * What is typed as the server takes it, or what is wrong with it, field by field. A line nobody has begun to write is
 * not there yet.
 */
export function readDraft(fields: DraftFields): Read {
  const begun = fields.rooms.map(({ lines }) =>
    lines.map((_, index) => index).filter((at) => isBegun(lines[at])),
  );
  const rooms = fields.rooms.map((room, at) => ({
    ...room,
    lines: (begun[at] ?? []).flatMap((index) => room.lines[index] ?? []),
  }));
  const parsed = saveRevisionSchema.safeParse(contentOf({ ...fields, rooms }));
  if (parsed.success) return { content: parsed.data };
  const problems = parsed.error.issues.map(({ path, message }) => ({
    path: placeOnForm(path, begun).map(String).join('.'),
    message,
  }));
  return { problems: onePerField(problems) };
}

/** The same for figures that follow the typing: what cannot be read yet counts nothing. */
export function contentSoFar(fields: DraftFields): RevisionContent {
  const rooms = fields.rooms.map((room) => ({ ...room, lines: room.lines.map(countable) }));
  const taxRate = isDecimal(fields.taxRate) ? fields.taxRate : '0';
  return contentOf({ ...fields, rooms, taxRate });
}

export function isBegun(line: LineFields | undefined): boolean {
  return (
    line !== undefined && (line.description !== '' || Boolean(line.unitCostCents ?? line.unitPriceCents))
  );
}

function contentOf(fields: DraftFields): RevisionContent {
  return {
    ...fields,
    discountCents: fields.discountCents ?? 0,
    rooms: fields.rooms.map(roomOf),
    billingSchedule: fields.billingSchedule.map(stageOf),
  };
}

function roomOf({ id, name, lines }: RoomFields): EstimateRoom {
  return { id, name, lines: lines.map(lineOf) };
}

/** Without an operation no time is planned, whatever stands in the field of hours. */
function lineOf(line: LineFields): EstimateLine {
  const minutes = line.operationId === null ? null : line.plannedMinutesPerUnit;
  return {
    ...line,
    unitCostCents: line.unitCostCents ?? 0,
    unitPriceCents: line.unitPriceCents ?? 0,
    plannedMinutesPerUnit: minutes === '' ? null : minutes,
  };
}

function stageOf({ id, name, share, deposit, due }: DraftFields['billingSchedule'][number]): BillingStage {
  return { id, name, share: shareOf(share), deposit, due };
}

function shareOf({ kind, percent, amountCents }: ShareFields): BillingShare {
  if (kind === 'percent') return { percent };
  return kind === 'amount' ? { amountCents: amountCents ?? 0 } : { remainder: true };
}

function countable(line: LineFields): LineFields {
  const minutes = line.plannedMinutesPerUnit;
  return {
    ...line,
    quantity: isDecimal(line.quantity) ? line.quantity : '0',
    plannedMinutesPerUnit: minutes !== null && isDecimal(minutes) ? minutes : null,
  };
}

/** Lines that are not begun have no place in the content, so a line's place there is not its place on the form. */
function placeOnForm(path: readonly PropertyKey[], begun: readonly number[][]): readonly PropertyKey[] {
  const [rooms, room, lines, line, ...field] = path;
  if (rooms !== 'rooms' || lines !== 'lines' || line === undefined) return path;
  return [rooms, room ?? 0, lines, begun[Number(room)]?.[Number(line)] ?? line, ...field];
}

/** The first sentence for each field; what is said of a whole follows from what is wrong with a part of it. */
function onePerField(problems: readonly FieldProblem[]): FieldProblem[] {
  return problems.filter(
    ({ path }, at) =>
      problems.findIndex((other) => other.path === path) === at &&
      !problems.some((other) => other.path.startsWith(`${path}.`)),
  );
}

const isDecimal = (text: string): boolean => /^\d{1,9}(\.\d{1,6})?$/.test(text);
