import type { MigrationInterface, QueryRunner } from 'typeorm';

export class JobsAndOperations1796146507100 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `operation` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `name` varchar(80) NOT NULL, `position` int NOT NULL, `cost_category` varchar(30) NOT NULL, `on_job` tinyint NOT NULL, `archived_at` datetime(3) NULL, `default_rate_cents_per_hour` bigint NULL, UNIQUE INDEX `uq_operation_name` (`shop_id`, `name`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `number` int NOT NULL, `title` varchar(120) NOT NULL, `customer_id` uuid NOT NULL, `site_id` uuid NULL, `estimate_id` uuid NULL, `estimate_number` int NULL, `revision_number` int NULL, `stage` varchar(30) NOT NULL, `stage_changed_at` datetime(3) NOT NULL, `install_on` date NULL, `install_order` date NOT NULL, `open_to_crew` tinyint NOT NULL, `notes` text NOT NULL, `closed_at` datetime(3) NULL, `planned_minutes` int NOT NULL, `contract_net_cents` bigint NOT NULL, `contract_tax_cents` bigint NOT NULL, `contract_total_cents` bigint NOT NULL, `planned_cost_cents` bigint NOT NULL, INDEX `ix_job_site` (`shop_id`, `site_id`), INDEX `ix_job_customer` (`shop_id`, `customer_id`), INDEX `ix_job_stage` (`shop_id`, `stage`, `number`), INDEX `ix_job_install` (`shop_id`, `install_order`, `id`), INDEX `ix_job_created` (`shop_id`, `created_at`, `id`), INDEX `ix_job_title` (`shop_id`, `title`, `id`), UNIQUE INDEX `uq_job_estimate` (`shop_id`, `estimate_id`), UNIQUE INDEX `uq_job_number` (`shop_id`, `number`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_assignment` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `member_id` uuid NOT NULL, INDEX `ix_job_assignment_member` (`shop_id`, `member_id`, `job_id`), UNIQUE INDEX `uq_job_assignment` (`shop_id`, `job_id`, `member_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_billing_stage` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `position` int NOT NULL, `name` varchar(80) NOT NULL, `share` longtext NOT NULL, `deposit` tinyint NOT NULL, `due` varchar(30) NOT NULL, `net_cents` bigint NOT NULL, `tax_cents` bigint NOT NULL, `total_cents` bigint NOT NULL, `invoice_id` uuid NULL, UNIQUE INDEX `uq_job_billing_stage_invoice` (`shop_id`, `invoice_id`), UNIQUE INDEX `uq_job_billing_stage` (`shop_id`, `job_id`, `position`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_cost` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `category` varchar(30) NOT NULL, `description` varchar(200) NOT NULL, `amount_cents` bigint NOT NULL, `on_date` date NOT NULL, `supplier` varchar(120) NOT NULL, `reverses_id` uuid NULL, `reason` text NOT NULL, `member_id` uuid NOT NULL, INDEX `ix_job_cost_member` (`shop_id`, `member_id`), UNIQUE INDEX `uq_job_cost_reverses` (`shop_id`, `reverses_id`), INDEX `ix_job_cost_job` (`shop_id`, `job_id`, `category`, `amount_cents`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_file` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `name` varchar(200) NOT NULL, `media_type` varchar(30) NOT NULL, `bytes` int NOT NULL, `sha256` varchar(64) NOT NULL, `has_thumbnail` tinyint NOT NULL, `member_id` uuid NOT NULL, INDEX `ix_job_file_member` (`shop_id`, `member_id`), UNIQUE INDEX `uq_job_file_content` (`shop_id`, `job_id`, `sha256`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_operation` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `operation_id` uuid NOT NULL, `planned_minutes` int NOT NULL, `planned_cost_cents` bigint NOT NULL, INDEX `ix_job_operation_operation` (`shop_id`, `operation_id`), UNIQUE INDEX `uq_job_operation` (`shop_id`, `job_id`, `operation_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_planned_cost` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `category` varchar(30) NOT NULL, `planned_cents` bigint NOT NULL, UNIQUE INDEX `uq_job_planned_cost` (`shop_id`, `job_id`, `category`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `job_stage_change` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `job_id` uuid NOT NULL, `from_stage` varchar(30) NULL, `to_stage` varchar(30) NOT NULL, `member_id` uuid NULL, `reason` varchar(300) NOT NULL, INDEX `ix_job_stage_change_member` (`shop_id`, `member_id`), INDEX `ix_job_stage_change_job` (`shop_id`, `job_id`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'ALTER TABLE `operation` ADD CONSTRAINT `fk_operation_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job` ADD CONSTRAINT `fk_job_site` FOREIGN KEY (`shop_id`, `site_id`) REFERENCES `site`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job` ADD CONSTRAINT `fk_job_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_assignment` ADD CONSTRAINT `fk_job_assignment_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_assignment` ADD CONSTRAINT `fk_job_assignment_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_billing_stage` ADD CONSTRAINT `fk_job_billing_stage_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_cost` ADD CONSTRAINT `fk_job_cost_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_cost` ADD CONSTRAINT `fk_job_cost_reverses` FOREIGN KEY (`shop_id`, `reverses_id`) REFERENCES `job_cost`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_cost` ADD CONSTRAINT `fk_job_cost_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_file` ADD CONSTRAINT `fk_job_file_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_file` ADD CONSTRAINT `fk_job_file_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_operation` ADD CONSTRAINT `fk_job_operation_operation` FOREIGN KEY (`shop_id`, `operation_id`) REFERENCES `operation`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_operation` ADD CONSTRAINT `fk_job_operation_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_planned_cost` ADD CONSTRAINT `fk_job_planned_cost_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_stage_change` ADD CONSTRAINT `fk_job_stage_change_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `job_stage_change` ADD CONSTRAINT `fk_job_stage_change_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `job_stage_change` DROP FOREIGN KEY `fk_job_stage_change_job`');
    await runner.query('ALTER TABLE `job_stage_change` DROP FOREIGN KEY `fk_job_stage_change_member`');
    await runner.query('ALTER TABLE `job_planned_cost` DROP FOREIGN KEY `fk_job_planned_cost_job`');
    await runner.query('ALTER TABLE `job_operation` DROP FOREIGN KEY `fk_job_operation_job`');
    await runner.query('ALTER TABLE `job_operation` DROP FOREIGN KEY `fk_job_operation_operation`');
    await runner.query('ALTER TABLE `job_file` DROP FOREIGN KEY `fk_job_file_job`');
    await runner.query('ALTER TABLE `job_file` DROP FOREIGN KEY `fk_job_file_member`');
    await runner.query('ALTER TABLE `job_cost` DROP FOREIGN KEY `fk_job_cost_job`');
    await runner.query('ALTER TABLE `job_cost` DROP FOREIGN KEY `fk_job_cost_reverses`');
    await runner.query('ALTER TABLE `job_cost` DROP FOREIGN KEY `fk_job_cost_member`');
    await runner.query('ALTER TABLE `job_billing_stage` DROP FOREIGN KEY `fk_job_billing_stage_job`');
    await runner.query('ALTER TABLE `job_assignment` DROP FOREIGN KEY `fk_job_assignment_job`');
    await runner.query('ALTER TABLE `job_assignment` DROP FOREIGN KEY `fk_job_assignment_member`');
    await runner.query('ALTER TABLE `job` DROP FOREIGN KEY `fk_job_customer`');
    await runner.query('ALTER TABLE `job` DROP FOREIGN KEY `fk_job_site`');
    await runner.query('ALTER TABLE `operation` DROP FOREIGN KEY `fk_operation_shop`');
    await runner.query('DROP INDEX `ix_job_stage_change_job` ON `job_stage_change`');
    await runner.query('DROP INDEX `ix_job_stage_change_member` ON `job_stage_change`');
    await runner.query('DROP TABLE `job_stage_change`');
    await runner.query('DROP INDEX `uq_job_planned_cost` ON `job_planned_cost`');
    await runner.query('DROP TABLE `job_planned_cost`');
    await runner.query('DROP INDEX `uq_job_operation` ON `job_operation`');
    await runner.query('DROP INDEX `ix_job_operation_operation` ON `job_operation`');
    await runner.query('DROP TABLE `job_operation`');
    await runner.query('DROP INDEX `uq_job_file_content` ON `job_file`');
    await runner.query('DROP INDEX `ix_job_file_member` ON `job_file`');
    await runner.query('DROP TABLE `job_file`');
    await runner.query('DROP INDEX `ix_job_cost_job` ON `job_cost`');
    await runner.query('DROP INDEX `uq_job_cost_reverses` ON `job_cost`');
    await runner.query('DROP INDEX `ix_job_cost_member` ON `job_cost`');
    await runner.query('DROP TABLE `job_cost`');
    await runner.query('DROP INDEX `uq_job_billing_stage` ON `job_billing_stage`');
    await runner.query('DROP INDEX `uq_job_billing_stage_invoice` ON `job_billing_stage`');
    await runner.query('DROP TABLE `job_billing_stage`');
    await runner.query('DROP INDEX `uq_job_assignment` ON `job_assignment`');
    await runner.query('DROP INDEX `ix_job_assignment_member` ON `job_assignment`');
    await runner.query('DROP TABLE `job_assignment`');
    await runner.query('DROP INDEX `uq_job_number` ON `job`');
    await runner.query('DROP INDEX `uq_job_estimate` ON `job`');
    await runner.query('DROP INDEX `ix_job_title` ON `job`');
    await runner.query('DROP INDEX `ix_job_created` ON `job`');
    await runner.query('DROP INDEX `ix_job_install` ON `job`');
    await runner.query('DROP INDEX `ix_job_stage` ON `job`');
    await runner.query('DROP INDEX `ix_job_customer` ON `job`');
    await runner.query('DROP INDEX `ix_job_site` ON `job`');
    await runner.query('DROP TABLE `job`');
    await runner.query('DROP INDEX `uq_operation_name` ON `operation`');
    await runner.query('DROP TABLE `operation`');
  }
}
