import type { MigrationInterface, QueryRunner } from 'typeorm';

/** What TypeORM remembers of a generated column, since the database writes the expression in its own way. */
const OPEN_MEMBER = 'if(`ended_at` is null and `voided_at` is null,`member_id`,NULL)';

export class TimeEntries1796147912788 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `time_entry` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `member_id` uuid NOT NULL, `job_id` uuid NULL, `operation_id` uuid NULL, `kind` varchar(30) NOT NULL, `started_at` datetime(3) NOT NULL, `ended_at` datetime(3) NULL, `minutes` int NULL, `note` varchar(300) NOT NULL, `source` varchar(30) NOT NULL, `corrected` tinyint NOT NULL, `voided_at` datetime(3) NULL, `labor_cost_cents_per_hour` bigint NULL, `cost_cents` bigint NULL, `open_member_id` uuid AS (if(`ended_at` is null and `voided_at` is null,`member_id`,NULL)) STORED, INDEX `ix_time_entry_operation` (`shop_id`, `operation_id`), INDEX `ix_time_entry_job` (`shop_id`, `job_id`, `operation_id`, `voided_at`, `minutes`, `cost_cents`), INDEX `ix_time_entry_started` (`shop_id`, `started_at`, `id`), INDEX `ix_time_entry_member` (`shop_id`, `member_id`, `started_at`), UNIQUE INDEX `uq_time_entry_open` (`shop_id`, `open_member_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `time_correction` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `entry_id` uuid NOT NULL, `member_id` uuid NOT NULL, `reason` text NOT NULL, `before` longtext NULL, `after` longtext NULL, INDEX `ix_time_correction_member` (`shop_id`, `member_id`), INDEX `ix_time_correction_entry` (`shop_id`, `entry_id`, `created_at`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'ALTER TABLE `time_entry` ADD CONSTRAINT `fk_time_entry_operation` FOREIGN KEY (`shop_id`, `operation_id`) REFERENCES `operation`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `time_entry` ADD CONSTRAINT `fk_time_entry_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `time_entry` ADD CONSTRAINT `fk_time_entry_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `time_correction` ADD CONSTRAINT `fk_time_correction_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `time_correction` ADD CONSTRAINT `fk_time_correction_entry` FOREIGN KEY (`shop_id`, `entry_id`) REFERENCES `time_entry`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'CREATE TABLE IF NOT EXISTS `typeorm_metadata` (`type` varchar(255) NOT NULL, `database` varchar(255) NULL, `schema` varchar(255) NULL, `table` varchar(255) NULL, `name` varchar(255) NULL, `value` text NULL) ENGINE=InnoDB',
    );
    await runner.query(
      "INSERT INTO `typeorm_metadata` (`type`, `database`, `schema`, `table`, `name`, `value`) VALUES ('GENERATED_COLUMN', NULL, database(), 'time_entry', 'open_member_id', ?)",
      [OPEN_MEMBER],
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query("DELETE FROM `typeorm_metadata` WHERE `table` = 'time_entry'");
    await runner.query('ALTER TABLE `time_correction` DROP FOREIGN KEY `fk_time_correction_entry`');
    await runner.query('ALTER TABLE `time_correction` DROP FOREIGN KEY `fk_time_correction_member`');
    await runner.query('ALTER TABLE `time_entry` DROP FOREIGN KEY `fk_time_entry_member`');
    await runner.query('ALTER TABLE `time_entry` DROP FOREIGN KEY `fk_time_entry_job`');
    await runner.query('ALTER TABLE `time_entry` DROP FOREIGN KEY `fk_time_entry_operation`');
    await runner.query('DROP INDEX `ix_time_correction_entry` ON `time_correction`');
    await runner.query('DROP INDEX `ix_time_correction_member` ON `time_correction`');
    await runner.query('DROP TABLE `time_correction`');
    await runner.query('DROP INDEX `uq_time_entry_open` ON `time_entry`');
    await runner.query('DROP INDEX `ix_time_entry_member` ON `time_entry`');
    await runner.query('DROP INDEX `ix_time_entry_started` ON `time_entry`');
    await runner.query('DROP INDEX `ix_time_entry_job` ON `time_entry`');
    await runner.query('DROP INDEX `ix_time_entry_operation` ON `time_entry`');
    await runner.query('DROP TABLE `time_entry`');
  }
}
