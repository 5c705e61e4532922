import type { EntryKind, EntrySource } from '@bookmatch/common/ledger/ledger-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { date, id, line, whole, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Shop } from '../shops/shops-public.js';

/**
 * One money event. Never changed and never removed: the application's database account may only read and insert here.
 * The source has no foreign key, since what makes entries stands above the ledger.
 */
@Entity('ledger_entry')
@Index('uq_ledger_entry_number', ['shopId', 'number'], { unique: true })
@Index('uq_ledger_entry_source', ['shopId', 'sourceId', 'kind'], { unique: true })
@Index('ix_ledger_entry_invoice', ['shopId', 'invoiceId', 'number'])
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_ledger_entry_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class LedgerEntry extends ShopRow {
  @Column(whole()) number!: number;
  /** The day it counts on, in the shop's zone; a payment counts on the day it came. */
  @Column(date()) postedOn!: string;
  @Column(word()) kind!: EntryKind;
  @Column(line(200)) memo!: string;
  @Column(word()) sourceKind!: EntrySource['kind'];
  @Column(id()) sourceId!: string;
  /** The invoice that the source belongs to, or is. */
  @Column(id()) invoiceId!: string;
}
