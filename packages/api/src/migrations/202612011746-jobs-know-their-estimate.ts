import type { MigrationInterface, QueryRunner } from 'typeorm';

export class JobsKnowTheirEstimate1796147211547 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `job` ADD `assigned_at` datetime(3) NULL');
    await runner.query(
      'ALTER TABLE `job` ADD CONSTRAINT `fk_job_estimate` FOREIGN KEY (`shop_id`, `estimate_id`) REFERENCES `estimate`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `job` DROP FOREIGN KEY `fk_job_estimate`');
    await runner.query('ALTER TABLE `job` DROP COLUMN `assigned_at`');
  }
}
