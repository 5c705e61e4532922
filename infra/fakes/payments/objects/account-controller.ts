import type Stripe from 'stripe';

/** What was asked for, either by the older `type` or by the controller's properties. */
export interface ControllerWish {
  type?: 'standard' | 'express' | 'custom';
  feesPayer?: 'account' | 'application';
  lossesPayments?: 'application' | 'stripe';
  requirementCollection?: 'application' | 'stripe';
  dashboard?: 'express' | 'full' | 'none';
}

const BY_TYPE: Record<'standard' | 'express' | 'custom', Required<Omit<ControllerWish, 'type'>>> = {
  standard: {
    feesPayer: 'account',
    lossesPayments: 'stripe',
    requirementCollection: 'stripe',
    dashboard: 'full',
  },
  express: {
    feesPayer: 'application',
    lossesPayments: 'application',
    requirementCollection: 'stripe',
    dashboard: 'express',
  },
  custom: {
    feesPayer: 'application',
    lossesPayments: 'application',
    requirementCollection: 'application',
    dashboard: 'none',
  },
};

function settled(wish: ControllerWish): Required<Omit<ControllerWish, 'type'>> {
  const base = BY_TYPE[wish.type ?? 'standard'];
  return {
    feesPayer: wish.feesPayer ?? base.feesPayer,
    lossesPayments: wish.lossesPayments ?? base.lossesPayments,
    requirementCollection: wish.requirementCollection ?? base.requirementCollection,
    dashboard: wish.dashboard ?? base.dashboard,
  };
}

export function buildController(wish: ControllerWish): Stripe.Account.Controller {
  const chosen = settled(wish);
  return {
    fees: { payer: chosen.feesPayer },
    is_controller: true,
    losses: { payments: chosen.lossesPayments },
    requirement_collection: chosen.requirementCollection,
    stripe_dashboard: { type: chosen.dashboard },
    type: 'application',
  };
}

/** The older type that these properties amount to, `none` when they amount to none. */
export function accountTypeOf(wish: ControllerWish): Stripe.Account.Type {
  const chosen = JSON.stringify(settled(wish));
  const types = ['standard', 'express', 'custom'] as const;
  return types.find((type) => JSON.stringify(BY_TYPE[type]) === chosen) ?? 'none';
}
