import type { MigrationClass } from '../platform/database/migration-class.js';
import { Ground1796145890667 } from './202612011724-ground.js';

/** Every migration, oldest first. */
export const MIGRATIONS: readonly MigrationClass[] = [Ground1796145890667];
