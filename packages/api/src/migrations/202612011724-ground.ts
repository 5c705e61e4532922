import type { MigrationInterface, QueryRunner } from 'typeorm';

export class Ground1796145890667 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `audit_entry` (`id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `shop_id` uuid NULL, `person_id` uuid NULL, `actor` varchar(30) NOT NULL, `request_id` varchar(64) NOT NULL, `table_name` varchar(60) NOT NULL, `row_id` uuid NOT NULL, `action` varchar(30) NOT NULL, `before` longtext NULL, `after` longtext NULL, INDEX `ix_audit_entry_shop` (`shop_id`, `id`), INDEX `ix_audit_entry_row` (`shop_id`, `row_id`, `id`), PRIMARY KEY (`id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `idempotency_key` (`owner_id` uuid NOT NULL, `key` varchar(64) NOT NULL, `request_hash` varchar(64) NOT NULL, `status` int NOT NULL, `answer` mediumtext NOT NULL, `created_at` datetime(3) NOT NULL, INDEX `ix_idempotency_key_age` (`created_at`), PRIMARY KEY (`owner_id`, `key`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `rate_limit` (`key` varchar(255) NOT NULL, `points` int NOT NULL, `expire` bigint UNSIGNED NULL, PRIMARY KEY (`key`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `outbox_message` (`id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `shop_id` uuid NULL, `kind` varchar(30) NOT NULL, `payload` longtext NOT NULL, `attempts` int NOT NULL, `due_at` datetime(3) NOT NULL, `finished_at` datetime(3) NULL, `given_up_at` datetime(3) NULL, `last_error` varchar(500) NULL, INDEX `ix_outbox_shop` (`shop_id`, `id`), INDEX `ix_outbox_due` (`finished_at`, `due_at`), PRIMARY KEY (`id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `webhook_event` (`id` varchar(80) NOT NULL, `type` varchar(80) NOT NULL, `received_at` datetime(3) NOT NULL, INDEX `ix_webhook_event_received` (`received_at`), PRIMARY KEY (`id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `session` (`sid` char(64) NOT NULL, `public_id` uuid NOT NULL, `person_id` uuid NOT NULL, `data` text NOT NULL, `expires` datetime(3) NOT NULL, `created_at` datetime(3) NOT NULL, `last_seen_at` datetime(3) NOT NULL, `user_agent` varchar(300) NOT NULL, `address` varchar(45) NOT NULL, UNIQUE INDEX `uq_session_public_id` (`public_id`), INDEX `ix_session_expires` (`expires`), INDEX `ix_session_person` (`person_id`, `last_seen_at`), PRIMARY KEY (`sid`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `person` (`id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `email` varchar(254) NOT NULL, `name` varchar(120) NOT NULL, `password_hash` varchar(200) NOT NULL, `email_confirmed_at` datetime(3) NULL, UNIQUE INDEX `uq_person_email` (`email`), PRIMARY KEY (`id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `person_token` (`id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `person_id` uuid NOT NULL, `purpose` varchar(30) NOT NULL, `token_hash` varchar(64) NOT NULL, `expires_at` datetime(3) NOT NULL, `used_at` datetime(3) NULL, INDEX `ix_person_token_person` (`person_id`), UNIQUE INDEX `uq_person_token_hash` (`token_hash`), PRIMARY KEY (`id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `shop` (`id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `slug` varchar(60) NOT NULL, `name` varchar(120) NOT NULL, `phone` varchar(40) NOT NULL, `email` varchar(254) NOT NULL, `address` longtext NOT NULL, `time_zone` varchar(60) NOT NULL, `unit_system` varchar(30) NOT NULL, `currency` varchar(3) NOT NULL, `tax_rule` varchar(30) NOT NULL, `default_tax_rate` decimal(9,6) NOT NULL, `estimate_terms` text NOT NULL, `estimate_valid_days` int NOT NULL, `invoice_due_days` int NOT NULL, `default_billing_schedule` longtext NOT NULL, `payment_account_id` varchar(60) NULL, `card_payments` varchar(30) NOT NULL, UNIQUE INDEX `uq_shop_payment_account` (`payment_account_id`), UNIQUE INDEX `uq_shop_slug` (`slug`), PRIMARY KEY (`id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `member` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `person_id` uuid NOT NULL, `role` varchar(30) NOT NULL, `labor_cost_cents_per_hour` bigint NULL, `removed_at` datetime(3) NULL, INDEX `ix_member_person` (`person_id`), UNIQUE INDEX `uq_member_person` (`shop_id`, `person_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `shop_counter` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `kind` varchar(30) NOT NULL, `next_number` int NOT NULL, UNIQUE INDEX `uq_shop_counter_kind` (`shop_id`, `kind`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `customer` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `kind` varchar(30) NOT NULL, `name` varchar(120) NOT NULL, `company` varchar(120) NOT NULL, `email` varchar(254) NOT NULL, `phone` varchar(40) NOT NULL, `billing_address` longtext NOT NULL, `city` varchar(80) NOT NULL, `tax_exempt` tinyint NOT NULL, `exemption_certificate` varchar(60) NOT NULL, `notes` text NOT NULL, `archived_at` datetime(3) NULL, INDEX `ix_customer_created` (`shop_id`, `created_at`, `id`), INDEX `ix_customer_name` (`shop_id`, `name`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `site` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `customer_id` uuid NOT NULL, `name` varchar(120) NOT NULL, `address` longtext NOT NULL, `notes` text NOT NULL, INDEX `ix_site_customer` (`shop_id`, `customer_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `subscription` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `status` varchar(30) NOT NULL, `trial_ends_at` datetime(3) NOT NULL, `current_period_end` datetime(3) NULL, `grace_ends_at` datetime(3) NULL, `paid_members` int NOT NULL, `provider_customer_id` varchar(60) NULL, `provider_subscription_id` varchar(60) NULL, UNIQUE INDEX `uq_subscription_provider` (`provider_subscription_id`), UNIQUE INDEX `uq_subscription_shop` (`shop_id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'ALTER TABLE `person_token` ADD CONSTRAINT `fk_person_token_person` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE CASCADE ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `member` ADD CONSTRAINT `fk_member_person` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `member` ADD CONSTRAINT `fk_member_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `shop_counter` ADD CONSTRAINT `fk_shop_counter_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `customer` ADD CONSTRAINT `fk_customer_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `site` ADD CONSTRAINT `fk_site_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `subscription` ADD CONSTRAINT `fk_subscription_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `subscription` DROP FOREIGN KEY `fk_subscription_shop`');
    await runner.query('ALTER TABLE `site` DROP FOREIGN KEY `fk_site_customer`');
    await runner.query('ALTER TABLE `customer` DROP FOREIGN KEY `fk_customer_shop`');
    await runner.query('ALTER TABLE `shop_counter` DROP FOREIGN KEY `fk_shop_counter_shop`');
    await runner.query('ALTER TABLE `member` DROP FOREIGN KEY `fk_member_shop`');
    await runner.query('ALTER TABLE `member` DROP FOREIGN KEY `fk_member_person`');
    await runner.query('ALTER TABLE `person_token` DROP FOREIGN KEY `fk_person_token_person`');
    await runner.query('DROP INDEX `uq_subscription_shop` ON `subscription`');
    await runner.query('DROP INDEX `uq_subscription_provider` ON `subscription`');
    await runner.query('DROP TABLE `subscription`');
    await runner.query('DROP INDEX `ix_site_customer` ON `site`');
    await runner.query('DROP TABLE `site`');
    await runner.query('DROP INDEX `ix_customer_name` ON `customer`');
    await runner.query('DROP INDEX `ix_customer_created` ON `customer`');
    await runner.query('DROP TABLE `customer`');
    await runner.query('DROP INDEX `uq_shop_counter_kind` ON `shop_counter`');
    await runner.query('DROP TABLE `shop_counter`');
    await runner.query('DROP INDEX `uq_member_person` ON `member`');
    await runner.query('DROP INDEX `ix_member_person` ON `member`');
    await runner.query('DROP TABLE `member`');
    await runner.query('DROP INDEX `uq_shop_slug` ON `shop`');
    await runner.query('DROP INDEX `uq_shop_payment_account` ON `shop`');
    await runner.query('DROP TABLE `shop`');
    await runner.query('DROP INDEX `uq_person_token_hash` ON `person_token`');
    await runner.query('DROP INDEX `ix_person_token_person` ON `person_token`');
    await runner.query('DROP TABLE `person_token`');
    await runner.query('DROP INDEX `uq_person_email` ON `person`');
    await runner.query('DROP TABLE `person`');
    await runner.query('DROP INDEX `ix_session_person` ON `session`');
    await runner.query('DROP INDEX `ix_session_expires` ON `session`');
    await runner.query('DROP INDEX `uq_session_public_id` ON `session`');
    await runner.query('DROP TABLE `session`');
    await runner.query('DROP INDEX `ix_webhook_event_received` ON `webhook_event`');
    await runner.query('DROP TABLE `webhook_event`');
    await runner.query('DROP INDEX `ix_outbox_due` ON `outbox_message`');
    await runner.query('DROP INDEX `ix_outbox_shop` ON `outbox_message`');
    await runner.query('DROP TABLE `outbox_message`');
    await runner.query('DROP TABLE `rate_limit`');
    await runner.query('DROP INDEX `ix_idempotency_key_age` ON `idempotency_key`');
    await runner.query('DROP TABLE `idempotency_key`');
    await runner.query('DROP INDEX `ix_audit_entry_row` ON `audit_entry`');
    await runner.query('DROP INDEX `ix_audit_entry_shop` ON `audit_entry`');
    await runner.query('DROP TABLE `audit_entry`');
  }
}
