import type { Payments } from '../../platform/payments/payments-client.js';

const KEPT_MS = 10 * 60_000;

/** What the plan costs, as the provider charges it. Asked for at most every ten minutes. */
export class PriceList {
  private kept: { cents: number; at: number } | undefined;

  constructor(
    private readonly payments: Payments,
    readonly priceId: string,
    private readonly clock: () => Date,
  ) {}

  /** Cents a month for each active member. */
  async perMemberCents(): Promise<number> {
    const now = this.clock().getTime();
    if (!this.kept || now - this.kept.at > KEPT_MS) {
      const { unit_amount } = await this.payments.prices.retrieve(this.priceId);
      if (unit_amount === null) throw new TypeError(`The price ${this.priceId} is not one for each member.`);
      this.kept = { cents: unit_amount, at: now };
    }
    return this.kept.cents;
  }
}
