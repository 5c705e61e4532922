import { OutboxMessage } from '@bookmatch/api/platform/outbox/outbox-message.entity';
import { MAIL, type Letter } from '@bookmatch/api/platform/mail/mail';
import type { Platform } from '@bookmatch/api/platform/platform';

/** The demo's letters lie in the outbox and are read here, as their addressees would read them; none is ever sent. */
export class Letters {
  constructor(private readonly platform: Platform) {}

  /** The secret in the link of the newest letter to an address. */
  async tokenTo(email: string): Promise<string> {
    const [message] = await this.waiting()
      .andWhere(`json_value(message.payload, '$.to') = :email`, { email })
      .orderBy('message.id', 'DESC')
      .limit(1)
      .getMany();
    const token = /[?&]token=([\w-]+)/.exec(
      (message?.payload as Letter | undefined)?.content.action?.url ?? '',
    );
    if (!token?.[1]) throw new RangeError(`There is no letter with a link for ${email}.`);
    return token[1];
  }

  /**
   * Marks as done what waits to be sent to the people and from the shops of the demo. Like every letter that was sent, it
   * loses its text, which may hold the secret of a link.
   */
  async keepFromSending(shopIds: readonly string[], emails: readonly string[], at: Date): Promise<void> {
    await this.platform.dataSource.manager
      .createQueryBuilder()
      .update(OutboxMessage)
      .set({ finishedAt: at, lastError: 'not sent: demo', payload: {} })
      .where('kind = :kind and finished_at is null', { kind: MAIL })
      .andWhere(`(shop_id in (:...shopIds) or json_value(payload, '$.to') in (:...emails))`, {
        shopIds,
        emails,
      })
      .execute();
  }

  private waiting() {
    return this.platform.dataSource.manager
      .createQueryBuilder(OutboxMessage, 'message')
      .where('message.kind = :kind and message.finishedAt is null', { kind: MAIL });
  }
}
