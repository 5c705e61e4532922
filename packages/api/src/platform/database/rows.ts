import { Column, PrimaryColumn } from 'typeorm';
import { id, instant, whole } from './columns.js';

/**
 * A row that belongs to one shop. The primary key is (`shop_id`, `id`): one shop's rows lie together on disk, and every
 * foreign key between tenant tables carries the shop.
 */
export abstract class ShopRow {
  @PrimaryColumn(id()) shopId!: string;
  @PrimaryColumn(id()) id!: string;
  @Column(instant()) createdAt!: Date;
}

/** A shop's row that people edit: `version` goes up by one at each change and guards against lost updates. */
export abstract class EditableRow extends ShopRow {
  @Column(whole()) version!: number;
  @Column(instant()) updatedAt!: Date;
}

/** A row that belongs to no shop: a person, the shop itself, a session. Only the platform and `accounts` hold these. */
export abstract class GlobalRow {
  @PrimaryColumn(id()) id!: string;
  @Column(instant()) createdAt!: Date;
}
