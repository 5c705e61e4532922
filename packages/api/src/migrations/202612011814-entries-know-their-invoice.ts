import type { MigrationInterface, QueryRunner } from 'typeorm';

export class EntriesKnowTheirInvoice1796148861361 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `ledger_entry` ADD `invoice_id` uuid NOT NULL');
    await runner.query(
      'CREATE INDEX `ix_ledger_entry_invoice` ON `ledger_entry` (`shop_id`, `invoice_id`, `number`)',
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP INDEX `ix_ledger_entry_invoice` ON `ledger_entry`');
    await runner.query('ALTER TABLE `ledger_entry` DROP COLUMN `invoice_id`');
  }
}
