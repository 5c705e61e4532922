/** What other slices may use of `shops`. */
export { Shop } from './shop.entity.js';
export { Member } from './member.entity.js';
export { Operation } from './operation.entity.js';
export { createShop } from './shop-creation.js';
export { lockCounter, takeNumber, COUNTER_STARTS, type CounterKind } from './shop-counters.js';
export { shopOf, todayAt, todayOf } from './shop-of.js';
export { memberNames } from './member-names.js';
