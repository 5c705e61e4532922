/** What the rest of the application may use of this slice. */
export const subscriptionBanner = () =>
  import('./subscription-banner/subscription-banner').then(({ SubscriptionBanner }) => SubscriptionBanner);
