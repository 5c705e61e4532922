/** A receiver of webhooks: its address, the secret its deliveries are signed with, and whose events it gets. */
export interface Endpoint {
  url: string;
  secret: string;
  sends: 'all' | 'platform' | 'connected';
}

/** `account` is the connected account of the event, or null for the platform's own. */
export function receives(endpoint: Endpoint, account: string | null): boolean {
  if (endpoint.sends === 'all') return true;
  return endpoint.sends === (account === null ? 'platform' : 'connected');
}
