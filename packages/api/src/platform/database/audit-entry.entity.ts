import { Column, Entity, Index } from 'typeorm';
import { id, line, optionalDocument, optionalId, word } from './columns.js';
import { GlobalRow } from './rows.js';

/**
 * Who changed what, when, from what to what. The application's database account may only insert and read here.
 * `shopId` is empty for changes that belong to a person rather than a shop.
 */
@Entity('audit_entry')
@Index('ix_audit_entry_row', ['shopId', 'rowId', 'id'])
@Index('ix_audit_entry_shop', ['shopId', 'id'])
export class AuditEntry extends GlobalRow {
  @Column(optionalId()) shopId!: string | null;
  /** The person who acted; empty when a customer or the system did. */
  @Column(optionalId()) personId!: string | null;
  /** Who acted in words: `member`, `customer`, `system`. */
  @Column(word()) actor!: string;
  @Column(line(64)) requestId!: string;
  @Column(line(60)) tableName!: string;
  @Column(id()) rowId!: string;
  @Column(word()) action!: string;
  @Column(optionalDocument()) before!: Record<string, unknown> | null;
  @Column(optionalDocument()) after!: Record<string, unknown> | null;
}
