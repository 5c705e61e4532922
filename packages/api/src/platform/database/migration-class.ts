import type { MigrationInterface } from 'typeorm';

export type MigrationClass = new () => MigrationInterface;
