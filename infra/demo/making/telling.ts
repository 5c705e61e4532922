import type { Person } from '../cast/people.js';
import type { ActList } from './act-list.js';
import type { Desk } from './desk.js';
import type { Trail } from './trail.js';
import type { When } from './when.js';

/** Who does what in a shop. In a small one somebody is several of them. */
export type Cast = { owner: Person; bookkeeper: Person; leadHand: Person; crew: readonly Person[] };

/** What every part of a shop's history is told with: where the acts go, by whom, and when. */
export type Telling = { desk: Desk; trail: Trail; list: ActList; when: When; cast: Cast };
