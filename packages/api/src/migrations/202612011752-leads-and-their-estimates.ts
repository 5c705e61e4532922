import type { MigrationInterface, QueryRunner } from 'typeorm';

export class LeadsAndTheirEstimates1796147529297 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `lead` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `version` int NOT NULL, `updated_at` datetime(3) NOT NULL, `title` varchar(120) NOT NULL, `contact_name` varchar(120) NOT NULL, `company` varchar(120) NOT NULL, `email` varchar(254) NOT NULL, `phone` varchar(40) NOT NULL, `site_address` longtext NOT NULL, `source` varchar(30) NOT NULL, `stage` varchar(30) NOT NULL, `stage_changed_at` datetime(3) NOT NULL, `next_step` varchar(160) NOT NULL, `next_step_on` date NULL, `next_step_order` date NOT NULL, `customer_id` uuid NULL, `site_id` uuid NULL, `lost_reason` varchar(30) NULL, `lost_note` text NOT NULL, `expected_cents` bigint NULL, INDEX `ix_lead_site` (`shop_id`, `site_id`), INDEX `ix_lead_customer` (`shop_id`, `customer_id`), INDEX `ix_lead_stage_changed` (`shop_id`, `stage`, `stage_changed_at`), INDEX `ix_lead_stage` (`shop_id`, `stage`, `next_step_order`, `id`), INDEX `ix_lead_next_step` (`shop_id`, `next_step_order`, `id`), INDEX `ix_lead_created` (`shop_id`, `created_at`, `id`), INDEX `ix_lead_title` (`shop_id`, `title`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `lead_stage_change` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `lead_id` uuid NOT NULL, `from_stage` varchar(30) NULL, `to_stage` varchar(30) NOT NULL, `member_id` uuid NULL, INDEX `ix_lead_stage_change_member` (`shop_id`, `member_id`), INDEX `ix_lead_stage_change_lead` (`shop_id`, `lead_id`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'CREATE TABLE `lead_note` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `lead_id` uuid NOT NULL, `member_id` uuid NOT NULL, `body` text NOT NULL, INDEX `ix_lead_note_member` (`shop_id`, `member_id`), INDEX `ix_lead_note_lead` (`shop_id`, `lead_id`, `id`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query(
      'ALTER TABLE `lead` ADD CONSTRAINT `fk_lead_site` FOREIGN KEY (`shop_id`, `site_id`) REFERENCES `site`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `lead` ADD CONSTRAINT `fk_lead_customer` FOREIGN KEY (`shop_id`, `customer_id`) REFERENCES `customer`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `lead` ADD CONSTRAINT `fk_lead_shop` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `lead_stage_change` ADD CONSTRAINT `fk_lead_stage_change_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `lead_stage_change` ADD CONSTRAINT `fk_lead_stage_change_lead` FOREIGN KEY (`shop_id`, `lead_id`) REFERENCES `lead`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `estimate` ADD CONSTRAINT `fk_estimate_lead` FOREIGN KEY (`shop_id`, `lead_id`) REFERENCES `lead`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `lead_note` ADD CONSTRAINT `fk_lead_note_member` FOREIGN KEY (`shop_id`, `member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
    await runner.query(
      'ALTER TABLE `lead_note` ADD CONSTRAINT `fk_lead_note_lead` FOREIGN KEY (`shop_id`, `lead_id`) REFERENCES `lead`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `lead_note` DROP FOREIGN KEY `fk_lead_note_lead`');
    await runner.query('ALTER TABLE `lead_note` DROP FOREIGN KEY `fk_lead_note_member`');
    await runner.query('ALTER TABLE `estimate` DROP FOREIGN KEY `fk_estimate_lead`');
    await runner.query('ALTER TABLE `lead_stage_change` DROP FOREIGN KEY `fk_lead_stage_change_lead`');
    await runner.query('ALTER TABLE `lead_stage_change` DROP FOREIGN KEY `fk_lead_stage_change_member`');
    await runner.query('ALTER TABLE `lead` DROP FOREIGN KEY `fk_lead_shop`');
    await runner.query('ALTER TABLE `lead` DROP FOREIGN KEY `fk_lead_customer`');
    await runner.query('ALTER TABLE `lead` DROP FOREIGN KEY `fk_lead_site`');
    await runner.query('DROP INDEX `ix_lead_note_lead` ON `lead_note`');
    await runner.query('DROP INDEX `ix_lead_note_member` ON `lead_note`');
    await runner.query('DROP TABLE `lead_note`');
    await runner.query('DROP INDEX `ix_lead_stage_change_lead` ON `lead_stage_change`');
    await runner.query('DROP INDEX `ix_lead_stage_change_member` ON `lead_stage_change`');
    await runner.query('DROP TABLE `lead_stage_change`');
    await runner.query('DROP INDEX `ix_lead_title` ON `lead`');
    await runner.query('DROP INDEX `ix_lead_created` ON `lead`');
    await runner.query('DROP INDEX `ix_lead_next_step` ON `lead`');
    await runner.query('DROP INDEX `ix_lead_stage` ON `lead`');
    await runner.query('DROP INDEX `ix_lead_stage_changed` ON `lead`');
    await runner.query('DROP INDEX `ix_lead_customer` ON `lead`');
    await runner.query('DROP INDEX `ix_lead_site` ON `lead`');
    await runner.query('DROP TABLE `lead`');
  }
}
