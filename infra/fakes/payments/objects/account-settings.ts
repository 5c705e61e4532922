import type Stripe from 'stripe';

export function buildAccountSettings(displayName: string | null): Stripe.Account.Settings {
  return {
    bacs_debit_payments: { display_name: null, service_user_number: null },
    branding: { icon: null, logo: null, primary_color: null, secondary_color: null },
    card_issuing: { tos_acceptance: { date: null, ip: null } },
    card_payments: {
      decline_on: { avs_failure: true, cvc_failure: true },
      statement_descriptor_prefix: null,
      statement_descriptor_prefix_kana: null,
      statement_descriptor_prefix_kanji: null,
    },
    dashboard: { display_name: displayName, timezone: 'Etc/UTC' },
    invoices: { default_account_tax_ids: null, hosted_payment_method_save: null },
    payments: {
      statement_descriptor: null,
      statement_descriptor_kana: null,
      statement_descriptor_kanji: null,
      statement_descriptor_prefix_kana: null,
      statement_descriptor_prefix_kanji: null,
    },
    payouts: {
      debit_negative_balances: true,
      schedule: { delay_days: 2, interval: 'daily' },
      statement_descriptor: null,
    },
    sepa_debit_payments: {},
  };
}
