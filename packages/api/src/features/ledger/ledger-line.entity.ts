import type { AccountCode, LedgerSide } from '@bookmatch/common/ledger/chart-of-accounts';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, date, id, line, optionalId, whole, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Customer } from '../customers/customers-public.js';
import { Job } from '../jobs/jobs-public.js';
import { LedgerEntry } from './ledger-entry.entity.js';

/** One side of an entry on one account. Number and day of its entry stand here again, for balances and activity. */
@Entity('ledger_line')
@Index('uq_ledger_line_position', ['shopId', 'entryId', 'position'], { unique: true })
@Index('ix_ledger_line_account', ['shopId', 'account', 'postedOn', 'side', 'amountCents'])
@Index('ix_ledger_line_activity', ['shopId', 'account', 'entryNumber', 'id'])
@Index('ix_ledger_line_order', ['shopId', 'entryNumber', 'id'])
@Index('ix_ledger_line_customer', ['shopId', 'customerId', 'entryNumber'])
@Index('ix_ledger_line_job', ['shopId', 'jobId', 'account'])
@ForeignKey(() => LedgerEntry, ['shopId', 'entryId'], ['shopId', 'id'], {
  name: 'fk_ledger_line_entry',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_ledger_line_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_ledger_line_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class LedgerLine extends ShopRow {
  @Column(id()) entryId!: string;
  @Column(whole()) entryNumber!: number;
  @Column(whole()) position!: number;
  @Column(date()) postedOn!: string;
  @Column(line(4)) account!: AccountCode;
  @Column(word()) side!: LedgerSide;
  /** Always above zero. */
  @Column(cents()) amountCents!: number;
  @Column(optionalId()) customerId!: string | null;
  @Column(optionalId()) jobId!: string | null;
}
