/** Integer cents as a person reads them. */
export function money(cents: number, currency: string): string {
  return new Intl.NumberFormat('en-US', { style: 'currency', currency }).format(cents / 100);
}

/** Unix seconds as a UTC date. */
export function day(unixSeconds: number): string {
  const options = { timeZone: 'UTC', year: 'numeric', month: 'short', day: 'numeric' } as const;
  return new Intl.DateTimeFormat('en-US', options).format(unixSeconds * 1000);
}
