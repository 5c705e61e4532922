import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { whole, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Shop } from './shop.entity.js';

/**
 * The next number of a kind of document. Taken with the row locked, in the transaction that uses the number, so that
 * numbers are distinct and without gaps.
 */
@Entity('shop_counter')
@Index('uq_shop_counter_kind', ['shopId', 'kind'], { unique: true })
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_shop_counter_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class ShopCounter extends ShopRow {
  @Column(word()) kind!: string;
  @Column(whole()) nextNumber!: number;
}
