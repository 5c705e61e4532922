import type { MigrationInterface, QueryRunner } from 'typeorm';

export class InvitationsAndCheckout1796147597485 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      'CREATE TABLE `invitation` (`shop_id` uuid NOT NULL, `id` uuid NOT NULL, `created_at` datetime(3) NOT NULL, `email` varchar(254) NOT NULL, `open_email` varchar(254) NULL, `role` varchar(30) NOT NULL, `token_hash` varchar(64) NOT NULL, `invited_by_member_id` uuid NOT NULL, `sent_at` datetime(3) NOT NULL, `expires_at` datetime(3) NOT NULL, `accepted_at` datetime(3) NULL, `withdrawn_at` datetime(3) NULL, INDEX `ix_invitation_inviter` (`shop_id`, `invited_by_member_id`), UNIQUE INDEX `uq_invitation_token` (`token_hash`), UNIQUE INDEX `uq_invitation_open` (`shop_id`, `open_email`), PRIMARY KEY (`shop_id`, `id`)) ENGINE=InnoDB',
    );
    await runner.query('ALTER TABLE `subscription` ADD `cancel_at_period_end` tinyint NOT NULL');
    await runner.query('ALTER TABLE `subscription` ADD `checkout_session_id` varchar(100) NULL');
    await runner.query('ALTER TABLE `subscription` ADD `failed_invoice_id` varchar(60) NULL');
    await runner.query('ALTER TABLE `subscription` ADD `trial_letter` varchar(30) NULL');
    await runner.query(
      'CREATE UNIQUE INDEX `uq_subscription_customer` ON `subscription` (`provider_customer_id`)',
    );
    await runner.query(
      'ALTER TABLE `invitation` ADD CONSTRAINT `fk_invitation_inviter` FOREIGN KEY (`shop_id`, `invited_by_member_id`) REFERENCES `member`(`shop_id`,`id`) ON DELETE RESTRICT ON UPDATE NO ACTION',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `invitation` DROP FOREIGN KEY `fk_invitation_inviter`');
    await runner.query('DROP INDEX `uq_subscription_customer` ON `subscription`');
    await runner.query('ALTER TABLE `subscription` DROP COLUMN `trial_letter`');
    await runner.query('ALTER TABLE `subscription` DROP COLUMN `failed_invoice_id`');
    await runner.query('ALTER TABLE `subscription` DROP COLUMN `checkout_session_id`');
    await runner.query('ALTER TABLE `subscription` DROP COLUMN `cancel_at_period_end`');
    await runner.query('DROP INDEX `uq_invitation_open` ON `invitation`');
    await runner.query('DROP INDEX `uq_invitation_token` ON `invitation`');
    await runner.query('DROP INDEX `ix_invitation_inviter` ON `invitation`');
    await runner.query('DROP TABLE `invitation`');
  }
}
