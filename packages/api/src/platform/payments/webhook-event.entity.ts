import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { instant, line } from '../database/columns.js';

/** The provider's events that were taken in. The key refuses the second arrival of one. */
@Entity('webhook_event')
@Index('ix_webhook_event_received', ['receivedAt'])
export class WebhookEvent {
  @PrimaryColumn({ type: 'varchar', length: 80 }) id!: string;
  @Column(line(80)) type!: string;
  @Column(instant()) receivedAt!: Date;
}
