import { createConnection, type ResultSetHeader } from 'mysql2/promise';
import { expect } from '@playwright/test';

const DAY_MS = 86_400_000;

/**
 * Moves the end of a shop's trial: what otherwise only two weeks of waiting do.
 *
 * @param slug of the shop
 * @param days from now; below zero when it has ended
 */
export async function endTrial(slug: string, days: number): Promise<void> {
  const database = await createConnection(process.env['BOOKMATCH_E2E_DATABASE'] as string);
  try {
    const [result] = await database.execute<ResultSetHeader>(
      'update subscription set trial_ends_at = ? where shop_id = (select id from shop where slug = ?)',
      [new Date(Date.now() + days * DAY_MS).toISOString().replace('T', ' ').replace('Z', ''), slug],
    );
    expect(result.affectedRows).toBe(1);
  } finally {
    await database.end();
  }
}
