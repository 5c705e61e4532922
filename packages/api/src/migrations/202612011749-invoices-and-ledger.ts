import type { MigrationInterface, QueryRunner } from 'typeorm';

export class InvoicesAndLedger1796147362217 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `invoice` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `number` int NULL, `number_order` int NOT NULL, `kind` varchar(30) NOT NULL, `status` varchar(30) NOT NULL, `customer_id` uuid NOT NULL, `job_id` uuid NULL, `billing_stage_id` uuid NULL, `issued_on` date NULL, `due_on` date NULL, `issued_order` date NOT NULL, `due_order` date NOT NULL, `tax_rate` decimal(9,6) NOT NULL, `net_cents` bigint NOT NULL, `tax_cents` bigint NOT NULL, `total_cents` bigint NOT NULL, `paid_cents` bigint NOT NULL, `credited_cents` bigint NOT NULL, `balance_cents` bigint NOT NULL, `overpaid_cents` bigint NOT NULL, `deposit_earned_on` date NULL, `memo` text NOT NULL, `frame` longtext NULL, INDEX `ix_invoice_stage` (`shop_id`, `billing_stage_id`), INDEX `ix_invoice_job` (`shop_id`, `job_id`, `number_order`), INDEX `ix_invoice_customer` (`shop_id`, `customer_id`, `number_order`), INDEX `ix_invoice_created` (`shop_id`, `created_at`, `id`), INDEX `ix_invoice_issued` (`shop_id`, `issued_order`, `id`), INDEX `ix_invoice_due` (`shop_id`, `status`, `due_order`, `balance_cents`, `customer_id`), INDEX `ix_invoice_order` (`shop_id`, `number_order`, `id`), UNIQUE INDEX `uq_invoice_number` (`shop_id`, `number`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `credit_note` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `invoice_id` uuid NOT NULL, `number` int NOT NULL, `issued_on` date NOT NULL, `net_cents` bigint NOT NULL, `tax_cents` bigint NOT NULL, `amount_cents` bigint NOT NULL, `reason` text NOT NULL, `member_id` uuid NOT NULL, INDEX `ix_credit_note_member` (`shop_id`, `member_id`), INDEX `ix_credit_note_invoice` (`shop_id`, `invoice_id`, `id`), UNIQUE INDEX `uq_credit_note_number` (`shop_id`, `number`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `invoice_line` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `invoice_id` uuid NOT NULL, `position` int NOT NULL, `description` varchar(300) NOT NULL, `quantity` decimal(12,3) NOT NULL, `unit_price_cents` bigint NOT NULL, `taxable` tinyint NOT NULL, `amount_cents` bigint NOT NULL, INDEX `ix_invoice_line_invoice` (`shop_id`, `invoice_id`, `position`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `card_checkout` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `invoice_id` uuid NOT NULL, `link_id` uuid NOT NULL, `status` varchar(30) NOT NULL, `amount_cents` bigint NOT NULL, `payer_email` varchar(254) NOT NULL, `account_id` varchar(60) NOT NULL, `session_id` varchar(120) NULL, `url` varchar(2000) NULL, `expires_at` datetime(3) NULL, UNIQUE INDEX `uq_card_checkout_session` (`shop_id`, `session_id`), INDEX `ix_card_checkout_invoice` (`shop_id`, `invoice_id`, `status`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `payment` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `invoice_id` uuid NOT NULL, `kind` varchar(30) NOT NULL, `method` varchar(30) NOT NULL, `amount_cents` bigint NOT NULL, `applied_cents` bigint NOT NULL, `received_on` date NOT NULL, `reference` varchar(80) NOT NULL, `reverses_id` uuid NULL, `checkout_id` uuid NULL, `reason` text NOT NULL, `member_id` uuid NULL, INDEX `ix_payment_member` (`shop_id`, `member_id`), UNIQUE INDEX `uq_payment_checkout` (`shop_id`, `checkout_id`), UNIQUE INDEX `uq_payment_reverses` (`shop_id`, `reverses_id`), INDEX `ix_payment_received` (`shop_id`, `received_on`, `id`), INDEX `ix_payment_invoice` (`shop_id`, `invoice_id`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `invoice_letter` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `invoice_id` uuid NOT NULL, `document` varchar(30) NOT NULL, `document_id` uuid NOT NULL, `recipient` varchar(254) NOT NULL, `member_id` uuid NULL, INDEX `ix_invoice_letter_member` (`shop_id`, `member_id`), INDEX `ix_invoice_letter_invoice` (`shop_id`, `invoice_id`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `ledger_entry` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `number` int NOT NULL, `posted_on` date NOT NULL, `kind` varchar(30) NOT NULL, `memo` varchar(200) NOT NULL, `source_kind` varchar(30) NOT NULL, `source_id` uuid NOT NULL, UNIQUE INDEX `uq_ledger_entry_source` (`shop_id`, `source_id`, `kind`), UNIQUE INDEX `uq_ledger_entry_number` (`shop_id`, `number`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `ledger_line` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `entry_id` uuid NOT NULL, `entry_number` int NOT NULL, `position` int NOT NULL, `posted_on` date NOT NULL, `account` varchar(4) NOT NULL, `side` varchar(30) NOT NULL, `amount_cents` bigint NOT NULL, `customer_id` uuid NULL, `job_id` uuid NULL, INDEX `ix_ledger_line_job` (`shop_id`, `job_id`, `account`), INDEX `ix_ledger_line_customer` (`shop_id`, `customer_id`, `entry_number`), INDEX `ix_ledger_line_order` (`shop_id`, `entry_number`, `id`), INDEX `ix_ledger_line_activity` (`shop_id`, `account`, `entry_number`, `id`), INDEX `ix_ledger_line_account` (`shop_id`, `account`, `posted_on`, `side`, `amount_cents`), UNIQUE INDEX `uq_ledger_line_position` (`shop_id`, `entry_id`, `position`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'ALTER TABLE `invoice` ADD CONSTRAINT `fk_invoice_stage` FOREIGN KEY (`shop_id`, `billing_stage_id`) REFERENCES `job_billing_stage`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `invoice` ADD CONSTRAINT `fk_invoice_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `invoice` ADD CONSTRAINT `fk_invoice_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `credit_note` ADD CONSTRAINT `fk_credit_note_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `credit_note` ADD CONSTRAINT `fk_credit_note_invoice` FOREIGN KEY (`shop_id`, `invoice_id`) REFERENCES `invoice`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `invoice_line` ADD CONSTRAINT `fk_invoice_line_invoice` FOREIGN KEY (`shop_id`, `invoice_id`) REFERENCES `invoice`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `card_checkout` ADD CONSTRAINT `fk_card_checkout_invoice` FOREIGN KEY (`shop_id`, `invoice_id`) REFERENCES `invoice`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `payment` ADD CONSTRAINT `fk_payment_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `payment` ADD CONSTRAINT `fk_payment_checkout` FOREIGN KEY (`shop_id`, `checkout_id`) REFERENCES `card_checkout`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `payment` ADD CONSTRAINT `fk_payment_reverses` FOREIGN KEY (`shop_id`, `reverses_id`) REFERENCES `payment`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `payment` ADD CONSTRAINT `fk_payment_invoice` FOREIGN KEY (`shop_id`, `invoice_id`) REFERENCES `invoice`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `customer_link` ADD CONSTRAINT `fk_customer_link_invoice` FOREIGN KEY (`shop_id`, `invoice_id`) REFERENCES `invoice`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `invoice_letter` ADD CONSTRAINT `fk_invoice_letter_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `invoice_letter` ADD CONSTRAINT `fk_invoice_letter_invoice` FOREIGN KEY (`shop_id`, `invoice_id`) REFERENCES `invoice`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `ledger_entry` ADD CONSTRAINT `fk_ledger_entry_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `ledger_line` ADD CONSTRAINT `fk_ledger_line_job` FOREIGN KEY (`shop_id`, `job_id`) REFERENCES `job`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `ledger_line` ADD CONSTRAINT `fk_ledger_line_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `ledger_line` ADD CONSTRAINT `fk_ledger_line_entry` FOREIGN KEY (`shop_id`, `entry_id`) REFERENCES `ledger_entry`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `ledger_line` DROP FOREIGN KEY `fk_ledger_line_entry`');
    await runner.query('ALTER TABLE `ledger_line` DROP FOREIGN KEY `fk_ledger_line_customer`');
    await runner.query('ALTER TABLE `ledger_line` DROP FOREIGN KEY `fk_ledger_line_job`');
    await runner.query('ALTER TABLE `ledger_entry` DROP FOREIGN KEY `fk_ledger_entry_shop`');
    await runner.query('ALTER TABLE `invoice_letter` DROP FOREIGN KEY `fk_invoice_letter_invoice`');
    await runner.query('ALTER TABLE `invoice_letter` DROP FOREIGN KEY `fk_invoice_letter_member`');
    await runner.query('ALTER TABLE `customer_link` DROP FOREIGN KEY `fk_customer_link_invoice`');
    await runner.query('ALTER TABLE `payment` DROP FOREIGN KEY `fk_payment_invoice`');
    await runner.query('ALTER TABLE `payment` DROP FOREIGN KEY `fk_payment_reverses`');
    await runner.query('ALTER TABLE `payment` DROP FOREIGN KEY `fk_payment_checkout`');
    await runner.query('ALTER TABLE `payment` DROP FOREIGN KEY `fk_payment_member`');
    await runner.query('ALTER TABLE `card_checkout` DROP FOREIGN KEY `fk_card_checkout_invoice`');
    await runner.query('ALTER TABLE `invoice_line` DROP FOREIGN KEY `fk_invoice_line_invoice`');
    await runner.query('ALTER TABLE `credit_note` DROP FOREIGN KEY `fk_credit_note_invoice`');
    await runner.query('ALTER TABLE `credit_note` DROP FOREIGN KEY `fk_credit_note_member`');
    await runner.query('ALTER TABLE `invoice` DROP FOREIGN KEY `fk_invoice_customer`');
    await runner.query('ALTER TABLE `invoice` DROP FOREIGN KEY `fk_invoice_job`');
    await runner.query('ALTER TABLE `invoice` DROP FOREIGN KEY `fk_invoice_stage`');
    await runner.query('DROP INDEX `uq_ledger_line_position` ON `ledger_line`');
    await runner.query('DROP INDEX `ix_ledger_line_account` ON `ledger_line`');
    await runner.query('DROP INDEX `ix_ledger_line_activity` ON `ledger_line`');
    await runner.query('DROP INDEX `ix_ledger_line_order` ON `ledger_line`');
    await runner.query('DROP INDEX `ix_ledger_line_customer` ON `ledger_line`');
    await runner.query('DROP INDEX `ix_ledger_line_job` ON `ledger_line`');
    await runner.query('DROP TABLE `ledger_line`');
    await runner.query('DROP INDEX `uq_ledger_entry_number` ON `ledger_entry`');
    await runner.query('DROP INDEX `uq_ledger_entry_source` ON `ledger_entry`');
    await runner.query('DROP TABLE `ledger_entry`');
    await runner.query('DROP INDEX `ix_invoice_letter_invoice` ON `invoice_letter`');
    await runner.query('DROP INDEX `ix_invoice_letter_member` ON `invoice_letter`');
    await runner.query('DROP TABLE `invoice_letter`');
    await runner.query('DROP INDEX `ix_payment_invoice` ON `payment`');
    await runner.query('DROP INDEX `ix_payment_received` ON `payment`');
    await runner.query('DROP INDEX `uq_payment_reverses` ON `payment`');
    await runner.query('DROP INDEX `uq_payment_checkout` ON `payment`');
    await runner.query('DROP INDEX `ix_payment_member` ON `payment`');
    await runner.query('DROP TABLE `payment`');
    await runner.query('DROP INDEX `ix_card_checkout_invoice` ON `card_checkout`');
    await runner.query('DROP INDEX `uq_card_checkout_session` ON `card_checkout`');
    await runner.query('DROP TABLE `card_checkout`');
    await runner.query('DROP INDEX `ix_invoice_line_invoice` ON `invoice_line`');
    await runner.query('DROP TABLE `invoice_line`');
    await runner.query('DROP INDEX `uq_credit_note_number` ON `credit_note`');
    await runner.query('DROP INDEX `ix_credit_note_invoice` ON `credit_note`');
    await runner.query('DROP INDEX `ix_credit_note_member` ON `credit_note`');
    await runner.query('DROP TABLE `credit_note`');
    await runner.query('DROP INDEX `uq_invoice_number` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_order` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_due` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_issued` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_created` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_customer` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_job` ON `invoice`');
    await runner.query('DROP INDEX `ix_invoice_stage` ON `invoice`');
    await runner.query('DROP TABLE `invoice`');
  }
}
