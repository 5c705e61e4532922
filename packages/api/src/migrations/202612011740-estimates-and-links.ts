import type { MigrationInterface, QueryRunner } from 'typeorm';

export class EstimatesAndLinks1796146823778 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `estimate` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `number` int NOT NULL, `title` varchar(120) NOT NULL, `customer_id` uuid NOT NULL, `site_id` uuid NULL, `lead_id` uuid NULL, `status` varchar(30) NOT NULL, `open_until` datetime(3) NULL, `current_revision_number` int NOT NULL, INDEX `ix_estimate_lead` (`shop_id`, `lead_id`), INDEX `ix_estimate_site` (`shop_id`, `site_id`), INDEX `ix_estimate_customer` (`shop_id`, `customer_id`), INDEX `ix_estimate_status` (`shop_id`, `status`, `number`), INDEX `ix_estimate_created` (`shop_id`, `created_at`, `id`), INDEX `ix_estimate_title` (`shop_id`, `title`, `id`), UNIQUE INDEX `uq_estimate_number` (`shop_id`, `number`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_revision` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `estimate_id` uuid NOT NULL, `number` int NOT NULL, `status` varchar(30) NOT NULL, `valid_until` date NOT NULL, `tax_rule` varchar(30) NOT NULL, `tax_rate` decimal(9,6) NOT NULL, `intro` text NOT NULL, `terms` text NOT NULL, `exclusions` text NOT NULL, `discount_cents` bigint NOT NULL, `net_cents` bigint NOT NULL, `tax_cents` bigint NOT NULL, `total_cents` bigint NOT NULL, `planned_cost_cents` bigint NOT NULL, `saved_at` datetime(3) NOT NULL, `sent_at` datetime(3) NULL, `document` longtext NULL, `document_hash` varchar(64) NULL, `decline_reason` text NOT NULL, UNIQUE INDEX `uq_estimate_revision_number` (`shop_id`, `estimate_id`, `number`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_billing_stage` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `revision_id` uuid NOT NULL, `position` int NOT NULL, `name` varchar(80) NOT NULL, `share_percent` decimal(7,3) NULL, `share_cents` bigint NULL, `deposit` tinyint NOT NULL, `due` varchar(30) NOT NULL, `net_cents` bigint NOT NULL, `tax_cents` bigint NOT NULL, `total_cents` bigint NOT NULL, INDEX `ix_estimate_billing_stage_revision` (`shop_id`, `revision_id`, `position`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `customer_link` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `customer_id` uuid NOT NULL, `estimate_id` uuid NULL, `invoice_id` uuid NULL, `expires_at` datetime(3) NOT NULL, `revoked_at` datetime(3) NULL, `last_seen_at` datetime(3) NULL, INDEX `ix_customer_link_id` (`id`), INDEX `ix_customer_link_invoice` (`shop_id`, `invoice_id`, `created_at`), INDEX `ix_customer_link_estimate` (`shop_id`, `estimate_id`, `created_at`), INDEX `ix_customer_link_customer` (`shop_id`, `customer_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_acceptance` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `estimate_id` uuid NOT NULL, `revision_id` uuid NOT NULL, `link_id` uuid NOT NULL, `name` varchar(120) NOT NULL, `address` varchar(45) NOT NULL, `user_agent` varchar(300) NOT NULL, `document` mediumtext NOT NULL, `document_hash` varchar(64) NOT NULL, INDEX `ix_estimate_acceptance_revision` (`shop_id`, `revision_id`), UNIQUE INDEX `uq_estimate_acceptance_estimate` (`shop_id`, `estimate_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_room` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `revision_id` uuid NOT NULL, `position` int NOT NULL, `name` varchar(120) NOT NULL, INDEX `ix_estimate_room_revision` (`shop_id`, `revision_id`, `position`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_line` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `revision_id` uuid NOT NULL, `room_id` uuid NOT NULL, `position` int NOT NULL, `kind` varchar(30) NOT NULL, `description` varchar(300) NOT NULL, `quantity` decimal(12,3) NOT NULL, `unit` varchar(30) NOT NULL, `unit_cost_cents` bigint NOT NULL, `unit_price_cents` bigint NOT NULL, `operation_id` uuid NULL, `planned_minutes_per_unit` decimal(12,3) NULL, `taxable` tinyint NOT NULL, INDEX `ix_estimate_line_operation` (`shop_id`, `operation_id`), INDEX `ix_estimate_line_room` (`shop_id`, `room_id`), INDEX `ix_estimate_line_revision` (`shop_id`, `revision_id`, `position`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_question` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `estimate_id` uuid NOT NULL, `link_id` uuid NOT NULL, `body` text NOT NULL, `answer` text NULL, `answered_by` varchar(120) NULL, `answered_at` datetime(3) NULL, INDEX `ix_estimate_question_estimate` (`shop_id`, `estimate_id`, `created_at`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `estimate_send` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `estimate_id` uuid NOT NULL, `revision_id` uuid NOT NULL, `to` varchar(254) NOT NULL, `message` text NOT NULL, INDEX `ix_estimate_send_revision` (`shop_id`, `revision_id`), INDEX `ix_estimate_send_estimate` (`shop_id`, `estimate_id`, `created_at`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'ALTER TABLE `estimate` ADD CONSTRAINT `fk_estimate_site` FOREIGN KEY (`shop_id`, `site_id`) REFERENCES `site`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate` ADD CONSTRAINT `fk_estimate_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_revision` ADD CONSTRAINT `fk_estimate_revision_estimate` FOREIGN KEY (`shop_id`, `estimate_id`) REFERENCES `estimate`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_billing_stage` ADD CONSTRAINT `fk_estimate_billing_stage_revision` FOREIGN KEY (`shop_id`, `revision_id`) REFERENCES `estimate_revision`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `customer_link` ADD CONSTRAINT `fk_customer_link_estimate` FOREIGN KEY (`shop_id`, `estimate_id`) REFERENCES `estimate`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `customer_link` ADD CONSTRAINT `fk_customer_link_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_acceptance` ADD CONSTRAINT `fk_estimate_acceptance_revision` FOREIGN KEY (`shop_id`, `revision_id`) REFERENCES `estimate_revision`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_acceptance` ADD CONSTRAINT `fk_estimate_acceptance_estimate` FOREIGN KEY (`shop_id`, `estimate_id`) REFERENCES `estimate`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_room` ADD CONSTRAINT `fk_estimate_room_revision` FOREIGN KEY (`shop_id`, `revision_id`) REFERENCES `estimate_revision`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_line` ADD CONSTRAINT `fk_estimate_line_operation` FOREIGN KEY (`shop_id`, `operation_id`) REFERENCES `operation`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_line` ADD CONSTRAINT `fk_estimate_line_room` FOREIGN KEY (`shop_id`, `room_id`) REFERENCES `estimate_room`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_line` ADD CONSTRAINT `fk_estimate_line_revision` FOREIGN KEY (`shop_id`, `revision_id`) REFERENCES `estimate_revision`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_question` ADD CONSTRAINT `fk_estimate_question_estimate` FOREIGN KEY (`shop_id`, `estimate_id`) REFERENCES `estimate`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_send` ADD CONSTRAINT `fk_estimate_send_revision` FOREIGN KEY (`shop_id`, `revision_id`) REFERENCES `estimate_revision`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate_send` ADD CONSTRAINT `fk_estimate_send_estimate` FOREIGN KEY (`shop_id`, `estimate_id`) REFERENCES `estimate`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `estimate_send` DROP FOREIGN KEY `fk_estimate_send_estimate`');
    await runner.query('ALTER TABLE `estimate_send` DROP FOREIGN KEY `fk_estimate_send_revision`');
    await runner.query('ALTER TABLE `estimate_question` DROP FOREIGN KEY `fk_estimate_question_estimate`');
    await runner.query('ALTER TABLE `estimate_line` DROP FOREIGN KEY `fk_estimate_line_revision`');
    await runner.query('ALTER TABLE `estimate_line` DROP FOREIGN KEY `fk_estimate_line_room`');
    await runner.query('ALTER TABLE `estimate_line` DROP FOREIGN KEY `fk_estimate_line_operation`');
    await runner.query('ALTER TABLE `estimate_room` DROP FOREIGN KEY `fk_estimate_room_revision`');
    await runner.query(
      'ALTER TABLE `estimate_acceptance` DROP FOREIGN KEY `fk_estimate_acceptance_estimate`',
    );
    await runner.query(
      'ALTER TABLE `estimate_acceptance` DROP FOREIGN KEY `fk_estimate_acceptance_revision`',
    );
    await runner.query('ALTER TABLE `customer_link` DROP FOREIGN KEY `fk_customer_link_customer`');
    await runner.query('ALTER TABLE `customer_link` DROP FOREIGN KEY `fk_customer_link_estimate`');
    await runner.query(
      'ALTER TABLE `estimate_billing_stage` DROP FOREIGN KEY `fk_estimate_billing_stage_revision`',
    );
    await runner.query('ALTER TABLE `estimate_revision` DROP FOREIGN KEY `fk_estimate_revision_estimate`');
    await runner.query('ALTER TABLE `estimate` DROP FOREIGN KEY `fk_estimate_customer`');
    await runner.query('ALTER TABLE `estimate` DROP FOREIGN KEY `fk_estimate_site`');
    await runner.query('DROP INDEX `ix_estimate_send_estimate` ON `estimate_send`');
    await runner.query('DROP INDEX `ix_estimate_send_revision` ON `estimate_send`');
    await runner.query('DROP TABLE `estimate_send`');
    await runner.query('DROP INDEX `ix_estimate_question_estimate` ON `estimate_question`');
    await runner.query('DROP TABLE `estimate_question`');
    await runner.query('DROP INDEX `ix_estimate_line_revision` ON `estimate_line`');
    await runner.query('DROP INDEX `ix_estimate_line_room` ON `estimate_line`');
    await runner.query('DROP INDEX `ix_estimate_line_operation` ON `estimate_line`');
    await runner.query('DROP TABLE `estimate_line`');
    await runner.query('DROP INDEX `ix_estimate_room_revision` ON `estimate_room`');
    await runner.query('DROP TABLE `estimate_room`');
    await runner.query('DROP INDEX `uq_estimate_acceptance_estimate` ON `estimate_acceptance`');
    await runner.query('DROP INDEX `ix_estimate_acceptance_revision` ON `estimate_acceptance`');
    await runner.query('DROP TABLE `estimate_acceptance`');
    await runner.query('DROP INDEX `ix_customer_link_customer` ON `customer_link`');
    await runner.query('DROP INDEX `ix_customer_link_estimate` ON `customer_link`');
    await runner.query('DROP INDEX `ix_customer_link_invoice` ON `customer_link`');
    await runner.query('DROP INDEX `ix_customer_link_id` ON `customer_link`');
    await runner.query('DROP TABLE `customer_link`');
    await runner.query('DROP INDEX `ix_estimate_billing_stage_revision` ON `estimate_billing_stage`');
    await runner.query('DROP TABLE `estimate_billing_stage`');
    await runner.query('DROP INDEX `uq_estimate_revision_number` ON `estimate_revision`');
    await runner.query('DROP TABLE `estimate_revision`');
    await runner.query('DROP INDEX `uq_estimate_number` ON `estimate`');
    await runner.query('DROP INDEX `ix_estimate_title` ON `estimate`');
    await runner.query('DROP INDEX `ix_estimate_created` ON `estimate`');
    await runner.query('DROP INDEX `ix_estimate_status` ON `estimate`');
    await runner.query('DROP INDEX `ix_estimate_customer` ON `estimate`');
    await runner.query('DROP INDEX `ix_estimate_site` ON `estimate`');
    await runner.query('DROP INDEX `ix_estimate_lead` ON `estimate`');
    await runner.query('DROP TABLE `estimate`');
  }
}
