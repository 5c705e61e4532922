import { Decimal } from 'decimal.js';
import type { ColumnOptions } from 'typeorm';

/**
 * The kinds of column there are. Every `@Column` takes one of these, so that a kind's storage, reading and writing are
 * said once.
 */

export const id = (): ColumnOptions & { nullable?: false } => ({ type: 'uuid' });
export const optionalId = (): ColumnOptions => ({ type: 'uuid', nullable: true });

/** One line of text of at most `length` characters. */
export const line = (length: number): ColumnOptions => ({ type: 'varchar', length });
export const optionalLine = (length: number): ColumnOptions => ({ type: 'varchar', length, nullable: true });
export const notes = (): ColumnOptions => ({ type: 'text' });

/** A word from a fixed list, kept as text: the list stands in the contract and may grow without a migration. */
export const word = (): ColumnOptions => ({ type: 'varchar', length: 30 });
export const optionalWord = (): ColumnOptions => ({ type: 'varchar', length: 30, nullable: true });

export const whole = (): ColumnOptions => ({ type: 'int' });
export const optionalWhole = (): ColumnOptions => ({ type: 'int', nullable: true });

const toNumber = {
  to: (value: number | null | undefined) => value,
  from: (value: string | number | null) => (value === null ? null : Number(value)),
};
/** Money in cents: BIGINT, read as a safe integer. */
export const cents = (): ColumnOptions => ({ type: 'bigint', transformer: toNumber });
export const optionalCents = (): ColumnOptions => ({ type: 'bigint', nullable: true, transformer: toNumber });

/** An exact decimal in text. Written in one spelling, since `1.50` for `1.5` would count as a change. */
export const decimal = (precision: number, scale: number): ColumnOptions => ({
  type: 'decimal',
  precision,
  scale,
  transformer: { to: normal, from: normal },
});
function normal(value: string | null | undefined): string | null | undefined {
  return value === null || value === undefined ? value : new Decimal(value).toFixed();
}
export const rate = (): ColumnOptions => decimal(9, 6);
export const quantity = (): ColumnOptions => decimal(12, 3);

const toFlag = {
  to: (value: boolean | undefined) => value,
  from: (value: number | boolean | null) => value === 1 || value === true,
};
export const flag = (): ColumnOptions => ({ type: 'tinyint', transformer: toFlag });

/** An instant in UTC to the millisecond. */
export const instant = (): ColumnOptions => ({ type: 'datetime', precision: 3 });
export const optionalInstant = (): ColumnOptions => ({ type: 'datetime', precision: 3, nullable: true });
/** A calendar date as `YYYY-MM-DD` text. */
export const date = (): ColumnOptions => ({ type: 'date' });
export const optionalDate = (): ColumnOptions => ({ type: 'date', nullable: true });

const json = {
  to: (value: unknown) => (value === undefined || value === null ? value : JSON.stringify(value)),
  from: (value: string | null) => (value === null ? null : (JSON.parse(value) as unknown)),
};
/** A small document that is always read and written whole. */
export const document = (): ColumnOptions => ({ type: 'longtext', transformer: json });
export const optionalDocument = (): ColumnOptions => ({
  type: 'longtext',
  nullable: true,
  transformer: json,
});
