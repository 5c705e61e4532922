/** The provider's client says so when it was not reached, answered with a fault of its own, or is asked too often. */
const TYPES = new Set(['StripeConnectionError', 'StripeAPIError', 'StripeRateLimitError']);

/** Whether this error is the payment provider being away for a moment: nobody's fault here, and worth a second try. */
export function isProviderDown(error: unknown): boolean {
  return TYPES.has(String((error as { type?: unknown } | null)?.type));
}
